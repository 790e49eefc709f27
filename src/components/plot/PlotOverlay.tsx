import { valueAt } from './curveValues.ts';
import { markPlaces } from './markPlaces.ts';
import type { PlotLayout } from './plotLayout.ts';
import { toPixel } from './plotScale.ts';
import type { PlotMark, PlotSeries } from './plotTypes.ts';

type Props = {
  layout: PlotLayout;
  series: readonly PlotSeries[];
  size: { width: number; height: number };
  cursor: number | null;
  marker: number | undefined;
  marks: readonly PlotMark[];
  selection: { startX: number; x: number } | null;
};

/** Crosshair, working point and zoom selection, drawn over the curves so that they move without a redraw. */
export function PlotOverlay({ layout, series, size, cursor, marker, marks, selection }: Props) {
  const { frame } = layout;
  const visible = (value: number) => value >= layout.x.min && value <= layout.x.max;
  const places = markPlaces(
    marks.filter(({ x }) => visible(x)),
    (x) => toPixel(layout.x, x),
    frame,
  );
  return (
    <svg
      width={size.width}
      height={size.height}
      className="pointer-events-none absolute inset-0"
      aria-hidden="true"
      focusable="false"
    >
      {selection && (
        <rect
          x={Math.min(selection.startX, selection.x)}
          width={Math.abs(selection.x - selection.startX)}
          y={frame.top}
          height={frame.bottom - frame.top}
          fill="var(--accent)"
          opacity="0.14"
        />
      )}
      {places.map(({ x, label, px, y, anchor }) => (
        <g key={`${label} ${x}`}>
          <VerticalLine layout={layout} x={px} stroke="var(--muted)" dash="1 3" />
          <text x={px} y={y} textAnchor={anchor} fontSize="11" fill="var(--muted)">
            {label}
          </text>
        </g>
      ))}
      {marker !== undefined && visible(marker) && (
        <g>
          <VerticalLine layout={layout} x={toPixel(layout.x, marker)} stroke="var(--accent)" />
          <path
            d={`M${toPixel(layout.x, marker) - 5} ${frame.top - 7}h10l-5 7z`}
            fill="var(--accent)"
            stroke="var(--panel)"
          />
          {/* While values are read elsewhere, the working point steps back. */}
          {cursor === null && <Dots layout={layout} series={series} at={marker} />}
        </g>
      )}
      {cursor !== null && visible(cursor) && (
        <g>
          <VerticalLine layout={layout} x={toPixel(layout.x, cursor)} stroke="var(--ink)" dash="2 3" />
          <Dots layout={layout} series={series} at={cursor} />
        </g>
      )}
    </svg>
  );
}

function VerticalLine({
  layout,
  x,
  stroke,
  dash,
}: {
  layout: PlotLayout;
  x: number;
  stroke: string;
  dash?: string;
}) {
  return (
    <line
      x1={x}
      x2={x}
      y1={layout.frame.top}
      y2={layout.frame.bottom}
      stroke={stroke}
      strokeWidth="1.2"
      strokeDasharray={dash}
    />
  );
}

/** A dot on each curve: filled on a solid line, open on a broken one. */
function Dots({ layout, series, at }: { layout: PlotLayout; series: readonly PlotSeries[]; at: number }) {
  const x = toPixel(layout.x, at);
  return series.map((one) => {
    const scale = layout.y[one.yAxisIndex ?? 0]!;
    const value = valueAt(one, at);
    const y = toPixel(scale, scale.log ? Math.abs(value) : value);
    if (!Number.isFinite(y)) return null;
    const filled = (one.dash ?? 'solid') === 'solid' && one.symbol !== 'open';
    return (
      <circle
        key={one.name}
        cx={x}
        cy={y}
        r="4"
        fill={filled ? `var(--${one.tone})` : 'var(--panel)'}
        stroke={filled ? 'var(--panel)' : `var(--${one.tone})`}
        strokeWidth={filled ? 1 : 2}
      />
    );
  });
}
