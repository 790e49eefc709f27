import { toPixel } from '../plotScale.ts';
import type { MapLayout, Size } from './mapLayout.ts';

type Place = { x: number; y: number };

type Props = {
  layout: MapLayout;
  size: Size;
  cursor: Place | null;
  /** Where the working point stands. */
  marker: Place | null;
  /** The line along which the cut is drawn. */
  cut: { along: 'x' | 'y' } & Place;
  selection: { start: { px: number; py: number }; now: { px: number; py: number } } | null;
};

/** Crosshair, cut line, working point and zoom selection, over the map so that they move without a redraw. */
export function MapOverlay({ layout, size, cursor, marker, cut, selection }: Props) {
  const { frame } = layout;
  const inside = ({ x, y }: Place) =>
    x >= layout.x.min && x <= layout.x.max && y >= layout.y.min && y <= layout.y.max;
  return (
    <svg
      width={size.width}
      height={size.height}
      className="pointer-events-none absolute inset-0"
      aria-hidden="true"
      focusable="false"
    >
      <Line layout={layout} place={cut} along={cut.along} className="stroke-paper" width={3.5} />
      <Line layout={layout} place={cut} along={cut.along} className="stroke-accent" width={1.6} />
      {marker && inside(marker) && (
        <g transform={`translate(${toPixel(layout.x, marker.x)} ${toPixel(layout.y, marker.y)})`}>
          <circle r="6" className="fill-none stroke-paper" strokeWidth="3.5" />
          <circle r="6" className="fill-none stroke-ink" strokeWidth="1.6" />
        </g>
      )}
      {cursor && inside(cursor) && (
        <g>
          <Line layout={layout} place={cursor} along="x" className="stroke-ink" width={1} dash="2 3" />
          <Line layout={layout} place={cursor} along="y" className="stroke-ink" width={1} dash="2 3" />
        </g>
      )}
      {selection && (
        <rect
          x={Math.min(selection.start.px, selection.now.px)}
          y={Math.min(selection.start.py, selection.now.py)}
          width={Math.abs(selection.now.px - selection.start.px)}
          height={Math.abs(selection.now.py - selection.start.py)}
          className="fill-accent/15 stroke-accent"
        />
      )}
      <rect
        x={frame.left}
        y={frame.top}
        width={frame.right - frame.left}
        height={frame.bottom - frame.top}
        className="fill-none stroke-edge"
      />
    </svg>
  );
}

type LineProps = {
  layout: MapLayout;
  place: Place;
  along: 'x' | 'y';
  className: string;
  width: number;
  dash?: string;
};

function Line({ layout, place, along, className, width, dash }: LineProps) {
  const { frame } = layout;
  const scale = along === 'x' ? layout.y : layout.x;
  const value = along === 'x' ? place.y : place.x;
  if (value < scale.min || value > scale.max) return null;
  const at = toPixel(scale, value);
  const ends =
    along === 'x'
      ? { x1: frame.left, x2: frame.right, y1: at, y2: at }
      : { x1: at, x2: at, y1: frame.top, y2: frame.bottom };
  return <line {...ends} className={className} strokeWidth={width} strokeDasharray={dash} />;
}
