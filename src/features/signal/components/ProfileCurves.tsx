import { niceScale, formatTick } from '../../../components/plot/niceScale.ts';
import type { DepthScale, ProfileCurve } from '../model/profile.ts';

type Props = {
  width: number;
  stripPx: number;
  scale: DepthScale;
  /** Height of each sample, px. */
  pixels: readonly number[];
  curves: readonly ProfileCurve[];
  substrate: { name: string; fill: string };
  cursor: number | null;
};

/** Boundaries closer than this would only grey the figure, px. */
const LINED_PX = 6;
/** Lower rows than this have no room for a name, px. */
const NAMED_PX = 13;

/** The film as a strip, its boundaries, and the curves with depth running down. */
export function ProfileCurves({ width, stripPx, scale, pixels, curves, substrate, cursor }: Props) {
  const most = Math.max(1e-300, ...curves.flatMap(({ values }) => values.filter(Number.isFinite)));
  const axis = niceScale(0, most, 4);
  const left = stripPx + 10;
  const right = width - 26;
  const xOf = (value: number) => left + ((value - axis.min) / (axis.max - axis.min)) * (right - left);
  return (
    <svg width={width} height={scale.height + 22} className="block text-[11px]" aria-hidden="true">
      {scale.rows.map(({ layer, top, height }, index) => (
        <g key={index}>
          <rect x={0} y={top} width={stripPx} height={height} fill={layer.fill} />
          {layer.magnetic && <Hatch top={top} height={height} width={stripPx} />}
          {height >= NAMED_PX && (
            <text x={6} y={top + height / 2 + 4} className="fill-ink">
              {layer.label}
            </text>
          )}
          {(height >= LINED_PX || index === 0) && (
            <line x1={0} x2={right} y1={top} y2={top} className="stroke-line" />
          )}
        </g>
      ))}
      <rect
        x={0}
        y={scale.filmPx}
        width={stripPx}
        height={scale.height - scale.filmPx}
        fill={substrate.fill}
        opacity="0.6"
      />
      <text x={6} y={scale.filmPx + 15} className="fill-ink">
        {substrate.name}
      </text>
      <line x1={0} x2={right} y1={scale.filmPx} y2={scale.filmPx} className="stroke-edge" />
      {axis.ticks.map((tick) => (
        <g key={tick}>
          <line x1={xOf(tick)} x2={xOf(tick)} y1={0} y2={scale.height} className="stroke-line" />
          <text x={xOf(tick)} y={scale.height + 15} textAnchor="middle" className="fill-muted">
            {formatTick(tick, axis.ticks)}
          </text>
        </g>
      ))}
      {curves.map((curve) => (
        <Curve key={curve.name} curve={curve} pixels={pixels} xOf={xOf} />
      ))}
      <CurveNames curves={curves} pixels={pixels} xOf={xOf} right={right} />
      {cursor !== null && (
        <g>
          <line
            x1={0}
            x2={right}
            y1={pixels[cursor]}
            y2={pixels[cursor]}
            className="stroke-ink"
            strokeDasharray="2 3"
          />
          {curves.map(({ name, values }) => (
            <circle
              key={name}
              cx={xOf(values[cursor]!)}
              cy={pixels[cursor]}
              r="3.5"
              className="fill-accent"
            />
          ))}
        </g>
      )}
    </svg>
  );
}

function Curve({
  curve: { light, values },
  pixels,
  xOf,
}: {
  curve: ProfileCurve;
  pixels: readonly number[];
  xOf: (value: number) => number;
}) {
  const points = values.map((value, index) => `${xOf(value).toFixed(1)},${pixels[index]!.toFixed(1)}`);
  return (
    <polyline
      points={points.join(' ')}
      className={`fill-none ${light === null ? 'stroke-magnet' : 'stroke-accent'}`}
      strokeWidth={light === 's' ? 1.2 : 2.2}
      strokeDasharray={light === 's' ? '5 2.5' : undefined}
    />
  );
}

/** Each name at the depth where its curve is farthest from the other. */
function CurveNames({
  curves,
  pixels,
  xOf,
  right,
}: {
  curves: readonly ProfileCurve[];
  pixels: readonly number[];
  xOf: (value: number) => number;
  right: number;
}) {
  const [p, s] = curves;
  if (!p || !s) return null;
  let apart = 0;
  for (const index of pixels.keys()) {
    const distance = (at: number) => Math.abs(xOf(p.values[at]!) - xOf(s.values[at]!));
    if (distance(index) > distance(apart)) apart = index;
  }
  const rightmost = p.values[apart]! >= s.values[apart]! ? p : s;
  return curves.map((curve) => {
    const x = xOf(curve.values[apart]!);
    return (
      <text
        key={curve.name}
        x={Math.min(Math.max(x + (curve === rightmost ? 6 : -6), 8), right + 20)}
        y={Math.max(11, pixels[apart]! + 4)}
        textAnchor={curve === rightmost ? 'start' : 'end'}
        className="fill-accent font-semibold stroke-panel"
        strokeWidth="3"
        paintOrder="stroke"
      >
        {curve.light}
      </text>
    );
  });
}

function Hatch({ top, height, width }: { top: number; height: number; width: number }) {
  const lines = [];
  for (let x = -height; x < width; x += 7) {
    const from = Math.max(0, x);
    const to = Math.min(width, x + height);
    lines.push(`M${from} ${top + height - (from - x)}L${to} ${top + height - (to - x)}`);
  }
  return <path d={lines.join('')} className="stroke-magnet" strokeWidth="1" opacity="0.4" />;
}
