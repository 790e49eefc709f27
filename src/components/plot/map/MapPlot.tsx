import { useEffect, useId, useMemo, useState } from 'react';
import type { KeyboardEvent, ReactNode } from 'react';
import { nearestIndex } from '../curveValues.ts';
import { zoomWindow } from '../plotScale.ts';
import { PlotButton } from '../PlotToolbar.tsx';
import { usePlotTokens } from '../plotTokens.ts';
import { fileNameOf, saveFile } from '../saveFile.ts';
import { useElementWidth } from '../useElementWidth.ts';
import { drawMap, mapPng } from './drawMap.ts';
import { MapCut } from './MapCut.tsx';
import { wholeRange } from './mapLayout.ts';
import type { MapWindow } from './mapLayout.ts';
import { MapOverlay } from './MapOverlay.tsx';
import { colourDomain, extremesOf } from './mapRange.ts';
import type { ColourDomain } from './mapRange.ts';
import { describeMap, mapCsv, printPlace, printValue } from './mapText.ts';
import { MapToolbar } from './MapToolbar.tsx';
import type { MapData, MapPlace, MapValue } from './mapTypes.ts';
import { useMapLook } from './useMapLook.ts';
import type { MapLook } from './useMapLook.ts';
import { useMapPicture } from './useMapPicture.ts';
import { useMapPointer } from './useMapPointer.ts';
import type { PlotAxis } from '../plotTypes.ts';

type Props = {
  data: MapData;
  xAxis: PlotAxis;
  yAxis: PlotAxis;
  value: MapValue;
  /** Height of the map without its controls and its cut, px. */
  height: number;
  /** Where the working point stands; null for a coordinate that it does not have. */
  marker?: { x: number | null; y: number | null };
  /** Told the point of the grid that is being read, null when none. */
  onCursor?: (place: MapPlace | null) => void;
  fileName: string;
  controls?: ReactNode;
  downloads?: ReactNode;
  /** Share of the values that have been computed; contours wait for the last one. */
  computed?: number;
  /** Ends of the colour scale where it is not that of these values alone. */
  colours?: ColourDomain;
  /** Shared with other maps on the same grid. */
  look?: MapLook;
  /** Whether the cut is drawn as a curve below; its line in the map stays. */
  withCut?: boolean;
  renderer?: 'canvas' | 'svg';
};

/**
 * A quantity over two axes as a smooth map with contours, and a cut through it as a curve below. Values are read by
 * pointer and by keyboard (arrow keys, Page up and down, Home, End; Enter sets the cut, plus and minus zoom, 0 shows
 * all) and announced. A million values stay fluid: the picture is made once and moved by the browser.
 */
export function MapPlot(props: Props) {
  const { data, xAxis, yAxis, value, height, marker, onCursor, fileName, controls, downloads } = props;
  const { computed = 1, renderer, colours, withCut = true } = props;
  const { tokens, fontsReady } = usePlotTokens();
  const [measure, width] = useElementWidth(760);
  const [canvas, setCanvas] = useState<HTMLCanvasElement | null>(null);
  const [surface, setSurface] = useState<HTMLElement | null>(null);
  const own = useMapLook();
  const { zoom, setZoom, cursor, setCursor, pinned, setPinned, along, setAlong } = props.look ?? own;
  const [hintId, summaryId] = [useId(), useId()];
  const density = globalThis.devicePixelRatio || 1;

  const axes = useMemo(() => ({ x: xAxis, y: yAxis, value: value.axis }), [xAxis, yAxis, value.axis]);
  const full = useMemo(() => ({ x: wholeRange(data.x), y: wholeRange(data.y) }), [data.x, data.y]);
  const window = zoom && overlaps(zoom, full) ? zoom : full;
  const size = useMemo(() => ({ width, height }), [width, height]);
  const extremes = useMemo(() => extremesOf(data), [data]);
  const domain = useMemo(() => colours ?? colourDomain(extremes), [colours, extremes]);
  const picture = useMapPicture(data, axes, domain, window, size, tokens, computed >= 1);
  const { layout } = picture;

  useEffect(() => {
    const context = canvas?.getContext('2d');
    if (!context) return;
    context.setTransform(density, 0, 0, density, 0, 0);
    drawMap(context, picture);
    // The font arrives later than the first picture.
  }, [canvas, picture, density, fontsReady]);

  const bounded = ({ ix, iy }: MapPlace): MapPlace => ({
    ix: Math.min(Math.max(ix, 0), data.x.length - 1),
    iy: Math.min(Math.max(iy, 0), data.y.length - 1),
  });
  const home = bounded({
    ix: nearestIndex(data.x, marker?.x ?? (full.x[0] + full.x[1]) / 2),
    iy: nearestIndex(data.y, marker?.y ?? (full.y[0] + full.y[1]) / 2),
  });
  const cut = bounded(pinned ?? home);
  const read = cursor && bounded(cursor);
  const move = (place: MapPlace | null) => {
    setCursor(place);
    onCursor?.(place);
  };
  const nearest = ({ x, y }: { x: number; y: number }): MapPlace => ({
    ix: nearestIndex(data.x, x),
    iy: nearestIndex(data.y, y),
  });
  const pointer = useMapPointer(surface, {
    layout,
    full,
    onWindow: setZoom,
    onCursor: (values) => move(values && nearest(values)),
    onPick: (values) => setPinned(nearest(values)),
  });

  const valueAt = ({ ix, iy }: MapPlace) => data.values[iy * data.x.length + ix] ?? NaN;
  const spoken = (place: MapPlace) =>
    `${printPlace(data, axes, place)}: ${value.name} ${printValue(value.axis, valueAt(place))}`;
  const pointOf = ({ ix, iy }: MapPlace) => ({ x: data.x[ix] ?? NaN, y: data.y[iy] ?? NaN });

  const zoomBy = (factor: number) => {
    const center = pointOf(read ?? cut);
    setZoom({
      x: zoomWindow(window.x, full.x, center.x, factor, layout.x.log),
      y: zoomWindow(window.y, full.y, center.y, factor, layout.y.log),
    });
  };
  const step = (dx: number, dy: number) => {
    const [sx, sy] = [risingSign(data.x), risingSign(data.y)];
    const from = read ?? cut;
    const next = read ? bounded({ ix: from.ix + sx * dx, iy: from.iy + sy * dy }) : from;
    const { x, y } = pointOf(next);
    const centred = (range: [number, number], at: number): [number, number] =>
      at >= range[0] && at <= range[1]
        ? range
        : [at - (range[1] - range[0]) / 2, at + (range[1] - range[0]) / 2];
    if (zoom) setZoom({ x: centred(window.x, x), y: centred(window.y, y) });
    move(next);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    // Large maps move by what is a pixel or so.
    const [dx, dy] = [stride(data.x.length), stride(data.y.length)];
    const steps: Record<string, [number, number]> = {
      ArrowRight: [dx, 0],
      ArrowLeft: [-dx, 0],
      ArrowUp: [0, dy],
      ArrowDown: [0, -dy],
      PageUp: [0, Math.ceil(data.y.length / 10)],
      PageDown: [0, -Math.ceil(data.y.length / 10)],
      Home: [-data.x.length, 0],
      End: [data.x.length, 0],
    };
    const asked = steps[event.key];
    if (asked) step(...asked);
    else if (event.key === '+' || event.key === '=') zoomBy(0.5);
    else if (event.key === '-') zoomBy(2);
    else if (event.key === '0') setZoom(null);
    else if (event.key === 'Enter' && read) setPinned(read);
    else if (event.key === 'Escape' && read) move(null);
    else return;
    event.preventDefault();
  };

  return (
    <figure className="m-0" aria-label={`${value.name} over ${xAxis.label} and ${yAxis.label}`}>
      <MapToolbar
        zoomed={window !== full}
        onZoom={zoomBy}
        onReset={() => setZoom(null)}
        onPng={() => {
          void mapPng(picture).then((png) => saveFile(fileNameOf(fileName, 'png'), png));
        }}
        downloads={
          <>
            {downloads}
            <PlotButton
              label="Download the map as CSV"
              onClick={() => saveFile(fileNameOf(fileName, 'csv'), mapCsv(data, axes), 'text/csv')}
            >
              CSV
            </PlotButton>
          </>
        }
      >
        {controls}
      </MapToolbar>
      <div ref={measure} style={{ height }} className="relative overflow-hidden">
        <canvas
          ref={setCanvas}
          aria-hidden="true"
          width={Math.round(width * density)}
          height={Math.round(height * density)}
          style={{ width, height }}
          className="block"
        />
        <MapOverlay
          layout={layout}
          size={size}
          cursor={read && pointOf(read)}
          marker={marker?.x != null && marker.y != null ? { x: marker.x, y: marker.y } : null}
          cut={{ along, ...pointOf(cut) }}
          selection={pointer.selection}
        />
        <div
          ref={setSurface}
          role="slider"
          tabIndex={0}
          aria-label={`${value.name}: read values of the map`}
          aria-describedby={`${hintId} ${summaryId}`}
          aria-valuemin={full.x[0]}
          aria-valuemax={full.x[1]}
          aria-valuenow={pointOf(read ?? cut).x}
          aria-valuetext={spoken(read ?? cut)}
          className="absolute inset-0 cursor-crosshair touch-pan-y"
          onKeyDown={onKeyDown}
          onDoubleClick={() => setZoom(null)}
          {...pointer.handlers}
        />
        <span id={hintId} hidden>
          Arrow keys read values, Enter sets the cut, plus and minus zoom, 0 shows all.
        </span>
      </div>
      <p className="flex min-h-5 flex-wrap justify-between gap-x-4 text-small text-muted" aria-hidden="true">
        <span className="font-semibold text-ink">{spoken(read ?? cut)}</span>
        {computed < 1 && <span>{Math.floor(100 * computed)} % computed, the rest is hatched</span>}
      </p>
      <figcaption id={summaryId} className="sr-only">
        {describeMap(value.name, data, axes, extremes)}
      </figcaption>
      {withCut && (
        <MapCut
          data={data}
          axes={axes}
          value={value}
          along={along}
          onAlong={setAlong}
          place={cut}
          reading={read ?? cut}
          fileName={`${fileName} cut`}
          renderer={renderer}
        />
      )}
    </figure>
  );
}

function risingSign(grid: ArrayLike<number>): 1 | -1 {
  return (grid[grid.length - 1] ?? 0) >= (grid[0] ?? 0) ? 1 : -1;
}

function stride(count: number): number {
  return Math.max(1, Math.round(count / 400));
}

/** A zoom outlives new values, but not a range that it no longer lies in. */
function overlaps(zoom: MapWindow, full: MapWindow): boolean {
  return (['x', 'y'] as const).every(
    (axis) => zoom[axis][0] >= full[axis][0] - 1e-9 && zoom[axis][1] <= full[axis][1] + 1e-9,
  );
}
