import type { SweepAxis } from '../../../../shared/run.ts';
import { LIMITS } from '../../../../shared/limits.ts';
import type { StackLayer } from '../../../../shared/stack.ts';
import { Quantity } from '../../../components/Quantity.tsx';
import { axisProblems } from '../model/sweepAxis.ts';

type Props = {
  axis: SweepAxis;
  /** Layers to choose from for a thickness. */
  layers: readonly { layer: StackLayer; name: string }[];
  onChange: (axis: SweepAxis) => void;
  onChooseLayer: (layerId: string) => void;
};

const units = {
  wavelength: 'nm',
  angle: '°',
  thickness: 'nm',
  direction: '°',
  voigtScale: '',
  repeat: '',
  graded: 'nm',
} as const;

/** From, to, points and spacing of the swept quantity, in one line under its tab. */
export function AxisForm({ axis, layers, onChange, onChooseLayer }: Props) {
  const problems = axisProblems(axis);
  const limits =
    axis.kind === 'angle' ? { min: 0, max: 90, below: true } : { min: axis.kind === 'thickness' ? 0 : 1 };
  const unit = units[axis.kind];
  return (
    <div className="flex flex-wrap items-center gap-x-2.5 gap-y-1 text-note text-muted">
      {axis.kind === 'thickness' && (
        <label className="inline-flex items-center gap-1.5">
          of
          <select
            value={axis.layerId}
            onChange={(event) => onChooseLayer(event.target.value)}
            className="h-7 max-w-44 field-sizing-content rounded-box border border-line bg-panel px-1.5 text-ink"
          >
            {layers.map(({ layer, name }, index) => (
              <option key={layer.id} value={layer.id}>
                {index + 1}. {name}
                {layer.note ? `, ${layer.note}` : ''}
              </option>
            ))}
          </select>
        </label>
      )}
      <span className="inline-flex items-center gap-0.5">
        from
        <Quantity
          label={`${axis.kind} from`}
          unit={unit}
          value={axis.from}
          error={problems.from}
          {...limits}
          onChange={(from) => onChange({ ...axis, from })}
          className="[&>span:first-child]:bg-panel"
        />
        to
        <Quantity
          label={`${axis.kind} to`}
          unit={unit}
          value={axis.to}
          error={problems.to}
          {...limits}
          onChange={(to) => onChange({ ...axis, to })}
          className="[&>span:first-child]:bg-panel"
        />
      </span>
      <Quantity
        label="points of the run"
        unit="points"
        value={axis.points}
        whole
        min={1}
        max={LIMITS.runPoints}
        step={100}
        error={problems.points}
        onChange={(points) => onChange({ ...axis, points })}
        className="[&>span:first-child]:bg-panel"
      />
      <label className="inline-flex items-center gap-1.5">
        <span className="sr-only">Spacing of the points</span>
        <select
          value={axis.spacing}
          onChange={(event) =>
            onChange({ ...axis, spacing: event.target.value === 'log' ? 'log' : 'linear' })
          }
          className="h-7 field-sizing-content rounded-box border border-transparent bg-transparent px-1 hover:border-edge"
        >
          <option value="linear">evenly spaced</option>
          <option value="log">log spaced</option>
        </select>
      </label>
    </div>
  );
}
