import { formatNumber } from '../../../lib/format.ts';
import { arrowChain, namedArrows } from '../model/arrowChain.ts';
import type { ArrowPlace } from '../model/arrowChain.ts';
import type { ShareSum } from '../model/shares.ts';

type Props = {
  sum: ShareSum;
  width: number;
  height: number;
  /** Index of the share pointed at. */
  active: number | null;
  onActive: (index: number | null) => void;
  label: string;
};

/** Layer shares as arrows that add up to the total, drawn dashed; the exact answer is the open ring. */
export function ShareArrows({ sum, width, height, active, onActive, label }: Props) {
  const chain = arrowChain(sum, { width, height });
  const named = namedArrows(sum.shares.length, active);
  const { origin, total, exact, scaleBar } = chain;
  return (
    <svg role="img" aria-label={label} width={width} height={height} className="block text-[12px]">
      <line x1={8} x2={width - 8} y1={origin.y} y2={origin.y} className="stroke-line" />
      <line x1={origin.x} x2={origin.x} y1={8} y2={height - 8} className="stroke-line" />
      <text x={width - 8} y={origin.y - 5} textAnchor="end" className="fill-muted">
        Re
      </text>
      <text x={origin.x + 5} y={16} className="fill-muted">
        Im
      </text>
      {chain.arrows.map((arrow, index) => (
        <g
          key={sum.shares[index]!.key}
          onPointerEnter={() => onActive(index)}
          onPointerLeave={() => onActive(null)}
        >
          <Arrow arrow={arrow} strong={active === index} />
        </g>
      ))}
      <line
        x1={origin.x}
        y1={origin.y}
        x2={total.x}
        y2={total.y}
        className="pointer-events-none stroke-ink"
        strokeWidth="1.5"
        strokeDasharray="4 3"
      />
      <circle cx={exact.x} cy={exact.y} r="4.5" className="fill-none stroke-ink" strokeWidth="1.4" />
      {sum.shares.map((share, index) =>
        named.has(index) ? (
          <ArrowName
            key={share.key}
            arrow={chain.arrows[index]!}
            name={share.label}
            origin={origin}
            width={width}
          />
        ) : null,
      )}
      {scaleBar.px > 0 && (
        <g transform={`translate(10 ${height - 8})`}>
          <path d={`M0 -4V0H${scaleBar.px}V-4`} className="fill-none stroke-muted" />
          <text x={scaleBar.px + 6} y={1} className="fill-muted text-[11px]">
            {formatNumber(scaleBar.value * 1000, { digits: 1 })} × 10⁻³
          </text>
        </g>
      )}
    </svg>
  );
}

function Arrow({ arrow: { from, to }, strong }: { arrow: ArrowPlace; strong: boolean }) {
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  const head = Math.min(9, length * 0.6);
  const [ux, uy] = length > 0 ? [(to.x - from.x) / length, (to.y - from.y) / length] : [0, 0];
  const base = { x: to.x - ux * head, y: to.y - uy * head };
  const side = head * 0.42;
  return (
    <>
      <line x1={from.x} y1={from.y} x2={to.x} y2={to.y} stroke="transparent" strokeWidth="14" />
      <line
        x1={from.x}
        y1={from.y}
        x2={base.x}
        y2={base.y}
        className="stroke-magnet"
        strokeWidth={strong ? 3.4 : 2}
      />
      <path
        d={`M${to.x} ${to.y}L${base.x - uy * side} ${base.y + ux * side}L${base.x + uy * side} ${base.y - ux * side}Z`}
        className="fill-magnet"
      />
    </>
  );
}

type NameProps = { arrow: ArrowPlace; name: string; origin: { x: number; y: number }; width: number };

/** The name beside the middle of its arrow, on the side away from the axes, within the drawing. */
function ArrowName({ arrow: { from, to }, name, origin, width }: NameProps) {
  const [x, y] = [(from.x + to.x) / 2, (from.y + to.y) / 2];
  const length = Math.hypot(to.x - from.x, to.y - from.y) || 1;
  // Perpendicular to the arrow; below it where the arrow runs above the axis and the other way round.
  const [nx, ny] = [-(to.y - from.y) / length, (to.x - from.x) / length];
  const side = ny * (y <= origin.y ? 1 : -1) >= 0 ? 1 : -1;
  const room = 4 + Math.abs(nx) * 3.4 * name.length + Math.abs(ny) * 9;
  const at = Math.min(Math.max(x + side * nx * room, 3.4 * name.length), width - 3.4 * name.length);
  return (
    <text
      x={at}
      y={y + side * ny * room + 4}
      textAnchor="middle"
      className="pointer-events-none fill-muted stroke-panel"
      strokeWidth="3"
      paintOrder="stroke"
    >
      {name}
    </text>
  );
}
