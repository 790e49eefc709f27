import ReactEChartsCore from 'echarts-for-react/esm/core';
import { useId, useMemo, useState } from 'react';
import type { KeyboardEvent, ReactNode } from 'react';
import { nearestIndex, valueAt } from './curveValues.ts';
import { echarts, renderPng, renderSvg } from './plotEngine.ts';
import { fullWindow, layoutPlot } from './plotLayout.ts';
import type { PlotLayout } from './plotLayout.ts';
import { plotOption } from './plotOption.ts';
import { PlotOverlay } from './PlotOverlay.tsx';
import { PlotReadout } from './PlotReadout.tsx';
import { zoomWindow } from './plotScale.ts';
import type { Window } from './plotScale.ts';
import { PlotToolbar } from './PlotToolbar.tsx';
import { usePlotTokens } from './plotTokens.ts';
import type { PlotAxis, PlotMark, PlotSeries } from './plotTypes.ts';
import { fileNameOf, saveFile } from './saveFile.ts';
import { useElementWidth } from './useElementWidth.ts';
import { usePlotPointer } from './usePlotPointer.ts';

type Props = {
  series: readonly PlotSeries[];
  xAxis: PlotAxis;
  yAxes: readonly PlotAxis[];
  /** Height of the figure without its controls, px. */
  height: number;
  /** What the figure shows, in a sentence. */
  ariaLabel: string;
  /** Where the working point stands on x. */
  marker?: number;
  /** Named places on x, drawn as fine lines. */
  marks?: readonly PlotMark[];
  /** Sets the working point; without it a click does nothing. */
  onPickX?: (x: number) => void;
  /** Told the x at which values are read, null when nowhere. */
  onCursorX?: (x: number | null) => void;
  /** Name of downloaded files, without ending. */
  fileName?: string;
  /** Controls of the page, left of zoom and downloads. */
  controls?: ReactNode;
  /** Further files beside PNG and SVG. */
  downloads?: ReactNode;
  /** Under the figure and along its x axis, such as bars of a window; follows the zoom. */
  below?: (layout: PlotLayout) => ReactNode;
  /** The SVG renderer is for tests: jsdom has no canvas. */
  renderer?: 'canvas' | 'svg';
};

/**
 * Curves on a canvas with a crosshair that reads all of them, by pointer and by keyboard (arrow keys, Page up and
 * down, Home, End; plus and minus zoom, 0 shows all, Enter sets the working point). Values are announced.
 * Names stand at the curves. Any number of samples: what is drawn is thinned to the pixels without losing a peak.
 */
export function LinePlot(props: Props) {
  const { series, xAxis, yAxes, height, ariaLabel, marker, onPickX, onCursorX, controls, downloads } = props;
  const { fileName = ariaLabel, renderer = 'canvas' } = props;
  const { tokens, fontsReady } = usePlotTokens();
  const [measure, width] = useElementWidth(760);
  const [surface, setSurface] = useState<HTMLElement | null>(null);
  const [zoom, setZoom] = useState<Window | null>(null);
  const [cursor, setCursor] = useState<number | null>(null);
  const hintId = useId();

  const full = useMemo(() => fullWindow(series), [series]);
  // A zoom outlives new values, but not a range that it no longer lies in.
  const zoomed = zoom !== null && zoom[0] < full[1] && zoom[1] > full[0];
  const low = zoomed ? Math.max(zoom[0], full[0]) : full[0];
  const high = zoomed ? Math.min(zoom[1], full[1]) : full[1];
  const size = useMemo(() => ({ width, height }), [width, height]);
  const layout = useMemo(
    () => layoutPlot(series, xAxis, yAxes, [low, high], size),
    [series, xAxis, yAxes, low, high, size],
  );
  const option = useMemo(
    () => plotOption(layout, series, xAxis, yAxes, size, tokens),
    [layout, series, xAxis, yAxes, size, tokens],
  );

  const readAt = (x: number | null) => {
    const grid = series[0]?.x ?? [];
    const near = x === null ? -1 : nearestIndex(grid, x);
    const snapped = near < 0 ? null : grid[near]!;
    setCursor(snapped);
    onCursorX?.(snapped);
  };
  const pointer = usePlotPointer(surface, {
    layout,
    full,
    marker,
    onWindow: setZoom,
    onCursor: readAt,
    onPick: onPickX,
  });

  const shown = cursor !== null && cursor >= low && cursor <= high ? cursor : null;
  const rows = readRows(series, yAxes, shown ?? marker ?? NaN);
  const title = shown === null ? '' : (xAxis.format ?? String)(shown);
  const zoomBy = (factor: number) =>
    setZoom(zoomWindow([low, high], full, cursor ?? marker ?? (low + high) / 2, factor, layout.x.log));

  const onKeyDown = (event: KeyboardEvent) => {
    const step = keySteps[event.key];
    if (step !== undefined) moveCursor(step);
    else if (event.key === '+' || event.key === '=') zoomBy(0.5);
    else if (event.key === '-') zoomBy(2);
    else if (event.key === '0') setZoom(null);
    else if (event.key === 'Escape' && cursor !== null) readAt(null);
    else if (event.key === 'Enter' && cursor !== null && onPickX) onPickX(cursor);
    else return;
    event.preventDefault();
  };
  const moveCursor = (step: number) => {
    const grid = series[0]?.x ?? [];
    if (grid.length === 0) return;
    const start = nearestIndex(grid, cursor ?? marker ?? low);
    const forward = grid[grid.length - 1]! >= grid[0]! ? 1 : -1;
    // Large grids move by what is a pixel or so, else a million presses would be needed.
    const stride = Math.max(1, Math.round(grid.length / 800));
    const wanted = start + forward * (Math.abs(step) === 1 ? step * stride : step * grid.length);
    const next = Math.min(
      Math.max(Math.round(cursor === null && Math.abs(step) === 1 ? start : wanted), 0),
      grid.length - 1,
    );
    const x = grid[next]!;
    if (x < low || x > high) setZoom([x - (high - low) / 2, x + (high - low) / 2]);
    readAt(x);
  };

  const summary = rows.map(({ series: one, value }) => `${one.name} ${value}`).join(', ');
  return (
    <figure className="m-0" aria-label={ariaLabel}>
      <PlotToolbar
        downloads={downloads}
        zoomed={zoomed}
        onZoom={zoomBy}
        onReset={() => setZoom(null)}
        onSvg={() => saveFile(fileNameOf(fileName, 'svg'), renderSvg(option, size), 'image/svg+xml')}
        onPng={() => {
          void renderPng(option, size, tokens.panel).then((png) =>
            saveFile(fileNameOf(fileName, 'png'), png),
          );
        }}
      >
        {controls}
      </PlotToolbar>
      <div ref={measure} style={{ height }} className="relative overflow-hidden">
        <ReactEChartsCore
          key={fontsReady ? 'shipped font' : 'waiting for the font'}
          echarts={echarts}
          option={option}
          replaceMerge={replaced}
          lazyUpdate
          opts={{ renderer, width, height }}
          style={{ height, width: '100%' }}
          aria-hidden="true"
        />
        <PlotOverlay
          layout={layout}
          series={series}
          size={size}
          cursor={shown}
          marker={marker}
          marks={props.marks ?? noMarks}
          selection={pointer.selection}
        />
        {shown !== null && <PlotReadout layout={layout} rows={rows} cursor={shown} title={title} />}
        <div
          ref={setSurface}
          role="slider"
          tabIndex={0}
          aria-label={`${ariaLabel}: read values along ${xAxis.label}`}
          aria-describedby={hintId}
          aria-valuemin={withoutExponent(low)}
          aria-valuemax={withoutExponent(high)}
          aria-valuenow={withoutExponent(shown ?? marker ?? low)}
          aria-valuetext={shown === null ? 'no value is being read' : `${title}: ${summary}`}
          className="absolute inset-0 touch-pan-y"
          style={{ cursor: pointer.draggingMarker ? 'ew-resize' : 'crosshair' }}
          onKeyDown={onKeyDown}
          onDoubleClick={() => setZoom(null)}
          {...pointer.handlers}
        />
        <span id={hintId} hidden>
          Arrow keys read values, plus and minus zoom, 0 shows all
          {onPickX ? ', Enter sets the working point' : ''}.
        </span>
      </div>
      {props.below?.(layout)}
    </figure>
  );
}

/** Values of ARIA are decimal numbers: 2.5e-14 is none. */
function withoutExponent(value: number): number {
  return Number(value.toFixed(6));
}

const noMarks: readonly PlotMark[] = [];

/** Curves and axes keep their place by id and take the new values; what is no longer there goes. */
const replaced = ['series', 'xAxis', 'yAxis'];

/** Samples (1) or share of the grid that a key moves the cursor by. */
const keySteps: Record<string, number> = {
  ArrowRight: 1,
  ArrowUp: 1,
  ArrowLeft: -1,
  ArrowDown: -1,
  PageUp: 0.1,
  PageDown: -0.1,
  Home: -2,
  End: 2,
};

function readRows(series: readonly PlotSeries[], yAxes: readonly PlotAxis[], x: number) {
  return series.map((one) => {
    const value = valueAt(one, x);
    const format =
      one.format ?? yAxes[one.yAxisIndex ?? 0]?.format ?? ((number: number) => number.toPrecision(5));
    return { series: one, value: Number.isFinite(value) ? format(value) : 'no value' };
  });
}
