import { linearTicks, logTicks, niceScale } from '../niceScale.ts';
import { offScale, onScale } from '../plotScale.ts';
import type { PlotScale, Window } from '../plotScale.ts';
import type { PlotAxis, PlotFrame } from '../plotTypes.ts';
import type { ColourDomain } from './mapRange.ts';

export type AxisScale = PlotScale & { ticks: number[] };
export type MapWindow = { x: Window; y: Window };
export type Size = { width: number; height: number };

/** Where a map's axes run, and the ticks of its colour bar, which are the levels of its contours too. */
export type MapLayout = {
  frame: PlotFrame;
  x: AxisScale;
  y: AxisScale;
  bar: PlotFrame;
  levels: number[];
};

const BAR_WIDTH = 12;
/** Room right of the map for the bar and its numbers. */
const BAR_ROOM = 84;

export function layoutMap(
  window: MapWindow,
  axes: { x: PlotAxis; y: PlotAxis },
  domain: ColourDomain,
  size: Size,
): MapLayout {
  const frame = {
    left: size.width < 480 ? 44 : 56,
    right: size.width - BAR_ROOM,
    top: 26,
    bottom: size.height - 44,
  };
  const bar = { ...frame, left: frame.right + 16, right: frame.right + 16 + BAR_WIDTH };
  return {
    frame,
    bar,
    x: axisScale(window.x, axes.x, frame.left, frame.right, 95),
    y: axisScale(window.y, axes.y, frame.bottom, frame.top, 55),
    levels: niceScale(domain.low, domain.high, 6).ticks.filter(
      (tick) => tick >= domain.low && tick <= domain.high,
    ),
  };
}

function axisScale(window: Window, axis: PlotAxis, from: number, to: number, pxPerTick: number): AxisScale {
  const log = axis.log === true && window[0] > 0;
  const count = Math.max(3, Math.round(Math.abs(to - from) / pxPerTick));
  const ticks = log ? logTicks(...window) : linearTicks(window[0], window[1], count);
  return { min: window[0], max: window[1], from, to, log, ticks };
}

/** The whole range of an axis; one value alone gets room around it. */
export function wholeRange(grid: ArrayLike<number>): Window {
  const [first, last] = [grid[0] ?? 0, grid[grid.length - 1] ?? 1];
  if (first === last) return [first - (Math.abs(first) || 1) * 0.1, first + (Math.abs(first) || 1) * 0.1];
  return [Math.min(first, last), Math.max(first, last)];
}

/** Where a value stands on a rising grid, as a position (0 for its lowest value, n - 1 for its highest). */
export function gridPosition(grid: ArrayLike<number>, value: number, log: boolean): number {
  if (grid.length < 2) return 0;
  const [low, high] = wholeRange(grid);
  const [from, to] = [onScale(low, log), onScale(high, log)];
  return ((onScale(value, log) - from) / (to - from)) * (grid.length - 1);
}

/** The value at a position of the grid as it is stored, whichever way it runs; between two values on the scale. */
export function valueAtPosition(grid: ArrayLike<number>, position: number, log: boolean): number {
  const [first, last] = [onScale(grid[0]!, log), onScale(grid[grid.length - 1]!, log)];
  return offScale(first + ((last - first) * position) / Math.max(1, grid.length - 1), log);
}
