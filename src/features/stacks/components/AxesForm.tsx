import { X } from 'lucide-react';
import { LIMITS } from '../../../../shared/limits.ts';
import type { AxisKind, SweepAxis } from '../../../../shared/run.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import { axisKindNames, axisTargets } from '../model/axisTargets.ts';
import type { Materials } from '../model/media.ts';
import { defaultAxis, sweepableKinds, withFewerPoints } from '../model/sweepAxis.ts';
import type { PreviewAxes } from '../model/sweepAxis.ts';
import type { ViewState } from '../model/viewState.ts';
import { AxisForm, quietBox } from './AxisForm.tsx';

type Props = {
  document: StackDocument;
  materials: Materials;
  axes: PreviewAxes;
  /** Kinds that the first axis can be changed to here; none where a tab says it. */
  kinds: readonly AxisKind[];
  onView: (change: Partial<ViewState>) => void;
};

/** The swept quantities, one a line: the first, the second of a map, and the parameter of a family. */
export function AxesForm({ document, materials, axes, kinds, onView }: Props) {
  const { axis, second, family } = axes;
  const of = (one: SweepAxis) => axisTargets(one.kind, document, materials);
  const withTarget = (one: SweepAxis, id: string): SweepAxis => {
    switch (one.kind) {
      case 'repeat':
        return { ...one, blockId: id };
      case 'direction':
      case 'voigtScale': {
        const { layerId: _layerId, ...rest } = one;
        return id === '' ? rest : { ...rest, layerId: id };
      }
      default:
        return { ...(defaultAxis(one.kind, document, materials, id) ?? one), points: one.points };
    }
  };
  const fresh = (kind: AxisKind, role: 'map' | 'family') => {
    const made = defaultAxis(kind, document, materials);
    return made && withFewerPoints(made, role);
  };
  const free = sweepableKinds(document).filter((kind) => kind !== axis.kind && kind !== second?.kind);
  return (
    <div className="flex flex-col gap-1">
      <AxisForm
        axis={axis}
        targets={of(axis)}
        onChange={(next) => onView({ axis: next })}
        onTarget={(id) => onView({ axis: withTarget(axis, id) })}
        lead={
          kinds.length > 0 && (
            <KindSelect
              label={second ? 'across' : 'sweep'}
              value={axis.kind}
              kinds={kinds}
              onChange={(kind) => onView({ kind, axis: second ? fresh(kind, 'map') : null })}
            />
          )
        }
      />
      {second && (
        <AxisForm
          axis={second}
          targets={of(second)}
          onChange={(next) => onView({ second: next })}
          onTarget={(id) => onView({ second: withTarget(second, id) })}
          lead={
            <KindSelect
              label="up"
              value={second.kind}
              kinds={sweepableKinds(document).filter((kind) => kind !== axis.kind)}
              onChange={(kind) => onView({ second: fresh(kind, 'map') })}
            />
          }
        />
      )}
      {family ? (
        <AxisForm
          axis={family}
          targets={of(family)}
          most={LIMITS.familyCurves}
          onChange={(next) => onView({ family: next })}
          onTarget={(id) => onView({ family: withTarget(family, id) })}
          lead={
            <KindSelect
              label="a curve for each"
              value={family.kind}
              kinds={[family.kind, ...free.filter((kind) => kind !== family.kind)]}
              onChange={(kind) => onView({ family: fresh(kind, 'family') })}
            />
          }
          end={
            <button
              type="button"
              aria-label="No family"
              title="No family"
              onClick={() => onView({ family: null })}
              className="inline-flex size-6 items-center justify-center rounded-box hover:bg-accent-soft hover:text-accent"
            >
              <X size={14} aria-hidden />
            </button>
          }
        />
      ) : (
        !second &&
        free.length > 0 && (
          <button
            type="button"
            onClick={() =>
              onView({ family: fresh(free.includes('thickness') ? 'thickness' : free[0]!, 'family') })
            }
            className="w-fit rounded-box text-note text-accent hover:underline"
          >
            Repeat for a second parameter
          </button>
        )
      )}
    </div>
  );
}

type KindProps = {
  label: string;
  value: AxisKind;
  kinds: readonly AxisKind[];
  onChange: (kind: AxisKind) => void;
};

function KindSelect({ label, value, kinds, onChange }: KindProps) {
  return (
    <label className="inline-flex items-center gap-1.5">
      {label}
      <select
        value={value}
        onChange={(event) => {
          const kind = kinds.find((one) => one === event.target.value);
          if (kind) onChange(kind);
        }}
        className={quietBox}
      >
        {kinds.map((kind) => (
          <option key={kind} value={kind}>
            {axisKindNames[kind]}
          </option>
        ))}
      </select>
    </label>
  );
}
