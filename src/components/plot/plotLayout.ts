import { rangeWithin } from './curveValues.ts';
import { decimateMinMax } from './decimate.ts';
import type { Drawn } from './decimate.ts';
import { placeLabels } from './labelPlaces.ts';
import type { LabelPlace } from './labelPlaces.ts';
import { alignedScale, linearTicks, logScale, logTicks, niceScale } from './niceScale.ts';
import type { NiceScale } from './niceScale.ts';
import { toPixel } from './plotScale.ts';
import type { PlotScale, Window } from './plotScale.ts';
import type { PlotAxis, PlotFrame, PlotSeries } from './plotTypes.ts';

/** Width of one y axis on the right: its numbers and a gap. */
const RIGHT_AXIS = 54;

/** Everything about a figure but its colours: where the axes run, what is drawn, where the names stand. */
export type PlotLayout = {
  frame: PlotFrame;
  x: PlotScale & { ticks: number[] };
  y: (PlotScale & { ticks: number[] })[];
  drawn: Drawn[];
  labels: (LabelPlace | null)[];
};

/** The whole range of x over all curves; [0, 1] while there is nothing. A single value gets room around it. */
export function fullWindow(series: readonly PlotSeries[]): Window {
  let low = Infinity;
  let high = -Infinity;
  for (const { x } of series) {
    if (x.length === 0) continue;
    const [first, last] = [x[0]!, x[x.length - 1]!];
    low = Math.min(low, first, last);
    high = Math.max(high, first, last);
  }
  if (!(low <= high)) return [0, 1];
  if (low === high) return low === 0 ? [-1, 1] : [low - Math.abs(low) * 0.1, low + Math.abs(low) * 0.1];
  return [low, high];
}

export function layoutPlot(
  series: readonly PlotSeries[],
  xAxis: PlotAxis,
  yAxes: readonly PlotAxis[],
  window: Window,
  size: { width: number; height: number },
): PlotLayout {
  const rightAxes = Math.max(0, yAxes.length - 1);
  const frame = {
    left: size.width < 480 ? 46 : 56,
    right: size.width - (rightAxes > 0 ? 8 + rightAxes * RIGHT_AXIS : 18),
    top: 26,
    bottom: size.height - 46,
  };
  // A window that reaches 0 or below cannot be drawn on a log axis.
  const xLog = xAxis.log === true && window[0] > 0;
  const tickCount = Math.max(3, Math.round((frame.right - frame.left) / 95));
  const x = {
    min: window[0],
    max: window[1],
    from: frame.left,
    to: frame.right,
    log: xLog,
    ticks: xLog ? logTicks(...window) : linearTicks(window[0], window[1], tickCount),
  };
  let intervals: number | null = null;
  const y = yAxes.map((axis, index) => {
    const own = series.filter((one) => (one.yAxisIndex ?? 0) === index);
    const scale = scaleOf(axis, own, window, intervals);
    // The grid lines are those of the left axis; the others put their ticks on them where that wastes no room.
    if (index === 0 && !axis.log) intervals = scale.ticks.length - 1;
    return { ...scale, from: frame.bottom, to: frame.top, log: axis.log === true };
  });
  const buckets = Math.max(50, Math.round(frame.right - frame.left));
  const drawn = series.map((one) => {
    const thinned = decimateMinMax(one, window[0], window[1], buckets);
    return yAxes[one.yAxisIndex ?? 0]?.log ? { x: thinned.x, y: thinned.y.map(forLog) } : thinned;
  });
  const labels = placeLabels(
    drawn.map((curve, index) => {
      const scale = y[series[index]!.yAxisIndex ?? 0]!;
      return {
        x: curve.x.map((value) => toPixel(x, value)),
        y: curve.y.map((value) => toPixel(scale, value)),
        textWidth: textWidth(series[index]!.name),
      };
    }),
    frame,
  );
  return { frame, x, y, drawn, labels };
}

/** A log axis shows the absolute value, and nothing where that is 0. */
function forLog(value: number): number {
  return value === 0 ? NaN : Math.abs(value);
}

function scaleOf(
  axis: PlotAxis,
  series: readonly PlotSeries[],
  window: Window,
  intervals: number | null,
): NiceScale {
  let low = Infinity;
  let high = -Infinity;
  for (const one of series) {
    for (const y of one.band ? [one.y, one.band.low, one.band.high] : [one.y]) {
      const range = rangeWithin({ x: one.x, y }, window[0], window[1], axis.log === true);
      if (range === null) continue;
      low = Math.min(low, range[0]);
      high = Math.max(high, range[1]);
    }
  }
  if (axis.log) return logScale(low, high);
  if (low <= high)
    for (const value of axis.include ?? []) [low, high] = [Math.min(low, value), Math.max(high, value)];
  const aligned = intervals !== null && low <= high ? alignedScale(low, high, intervals) : null;
  return aligned && aligned.max <= (axis.most ?? Infinity) ? aligned : niceScale(low, high);
}

/** About 6.6 px a character at 12 px semibold; only used to keep names apart. */
function textWidth(text: string): number {
  return text.length * 6.6 + 4;
}
