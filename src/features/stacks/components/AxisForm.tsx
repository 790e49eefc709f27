import type { ReactNode } from 'react';
import { LIMITS } from '../../../../shared/limits.ts';
import { directionPlanes } from '../../../../shared/run.ts';
import type { SweepAxis } from '../../../../shared/run.ts';
import { planeEnds } from '../../../components/plot/readingSeries.ts';
import { Quantity } from '../../../components/Quantity.tsx';
import { targetOf } from '../model/axisTargets.ts';
import type { AxisTarget } from '../model/axisTargets.ts';
import { axisProblems } from '../model/sweepAxis.ts';

type Props = {
  axis: SweepAxis;
  /** What it can be of. */
  targets: readonly AxisTarget[];
  /** Most points of this axis. */
  most?: number;
  onChange: (axis: SweepAxis) => void;
  onTarget: (id: string) => void;
  /** Before the rest, such as the choice of the quantity. */
  lead?: ReactNode;
  /** After the rest. */
  end?: ReactNode;
};

const units = {
  wavelength: 'nm',
  angle: '°',
  thickness: 'nm',
  direction: '°',
  voigtScale: '×',
  repeat: '×',
  graded: 'nm',
} as const;

const limits = {
  wavelength: { min: 1 },
  angle: { min: 0, max: 90, below: true },
  thickness: { min: 0 },
  direction: { min: -360, max: 360 },
  voigtScale: { min: 0 },
  repeat: { min: 0, max: LIMITS.repeat, whole: true },
  graded: { min: 0 },
} as const;

export const quietBox =
  'h-7 max-w-44 field-sizing-content rounded-box border border-line bg-panel px-1.5 text-ink';

/** Of what, from, to, points and spacing of one swept quantity, in a line. */
export function AxisForm(props: Props) {
  const { axis, targets, most = LIMITS.runPoints, onChange, onTarget, lead, end } = props;
  const problems = axisProblems(axis);
  const unit = units[axis.kind];
  const bound = { unit, ...limits[axis.kind], className: '[&>span:first-child]:bg-panel' };
  return (
    <div className="flex flex-wrap items-center gap-x-2.5 gap-y-1 text-note text-muted">
      {lead}
      {targets.length > 0 && (
        <label className="inline-flex items-center gap-1.5">
          of
          <select
            value={targetOf(axis)}
            onChange={(event) => onTarget(event.target.value)}
            className={quietBox}
          >
            {targets.map(({ id, label }) => (
              <option key={id} value={id}>
                {label}
              </option>
            ))}
          </select>
        </label>
      )}
      {axis.kind === 'direction' && (
        <label className="inline-flex items-center gap-1.5">
          turning
          <select
            value={axis.plane}
            onChange={(event) => {
              const plane = directionPlanes.find((one) => one === event.target.value);
              if (plane) onChange({ ...axis, plane });
            }}
            className={quietBox}
          >
            {directionPlanes.map((plane) => (
              <option key={plane} value={plane}>
                {planeEnds[plane]}
              </option>
            ))}
          </select>
        </label>
      )}
      <span className="inline-flex items-center gap-0.5">
        from
        <Quantity
          label={`${axis.kind} from`}
          value={axis.from}
          error={problems.from}
          {...bound}
          onChange={(from) => onChange({ ...axis, from })}
        />
        to
        <Quantity
          label={`${axis.kind} to`}
          value={axis.to}
          error={problems.to}
          {...bound}
          onChange={(to) => onChange({ ...axis, to })}
        />
      </span>
      <Quantity
        label={`points of the run along ${axis.kind}`}
        unit="points"
        value={axis.points}
        whole
        min={1}
        max={most}
        step={most > 20 ? 100 : 1}
        error={problems.points}
        onChange={(points) => onChange({ ...axis, points })}
        className="[&>span:first-child]:bg-panel"
      />
      {axis.kind !== 'repeat' && (
        <select
          aria-label="Spacing of the points"
          value={axis.spacing}
          onChange={(event) =>
            onChange({ ...axis, spacing: event.target.value === 'log' ? 'log' : 'linear' })
          }
          className="h-7 field-sizing-content rounded-box border border-transparent bg-transparent px-1 hover:border-edge"
        >
          <option value="linear">evenly spaced</option>
          <option value="log">log spaced</option>
        </select>
      )}
      {end}
    </div>
  );
}
