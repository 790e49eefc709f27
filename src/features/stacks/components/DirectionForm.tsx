import type { Vector } from '../../../../shared/complex.ts';
import { Field } from '../../../components/Field.tsx';
import { NumberInput } from '../../../components/NumberInput.tsx';
import { formatPlain } from '../../../lib/format.ts';
import { describeM, geometries, lengthOf, withComponent, withLength } from '../model/magnetization.ts';
import { DirectionDial } from './DirectionDial.tsx';

type Props = { m: Vector; label: string; onChange: (m: Vector) => void };

/** m in full: the geometries by name, the three components and the length as a fraction of saturation. */
export function DirectionForm({ m, label, onChange }: Props) {
  const length = lengthOf(m);
  const kept = length > 0 ? length : 1;
  return (
    <div className="flex flex-col gap-3">
      <div role="group" aria-label="Geometry" className="grid grid-cols-2 gap-1">
        {geometries.map((geometry) => {
          const there = withLength(geometry.m, kept);
          const chosen = describeM(m) === describeM(there);
          return (
            <button
              key={geometry.name}
              type="button"
              aria-pressed={chosen}
              onClick={() => onChange(there)}
              className="flex items-center gap-1.5 rounded-box px-1.5 py-1 text-left text-note text-ink hover:bg-accent-soft aria-pressed:bg-accent-soft aria-pressed:font-semibold"
            >
              <span aria-hidden="true" className="inline-flex">
                <DirectionDial m={geometry.m} label={geometry.name} size={20} />
              </span>
              {geometry.name}
            </button>
          );
        })}
      </div>
      <div className="grid grid-cols-4 gap-2">
        {(['x', 'y', 'z'] as const).map((name, index) => (
          <Field key={name} label={`m ${name}`}>
            {(control) => (
              <NumberInput
                {...control}
                value={m[index]!}
                min={-1}
                max={1}
                step={0.1}
                format={fourDigits}
                onChange={(value) => onChange(withComponent(m, index === 0 ? 0 : index === 1 ? 1 : 2, value))}
              />
            )}
          </Field>
        ))}
        <Field label="|m|">
          {(control) => (
            <NumberInput
              {...control}
              value={Number(length.toPrecision(9))}
              min={0}
              max={1}
              step={0.1}
              format={fourDigits}
              onChange={(value) => onChange(withLength(m, value))}
            />
          )}
        </Field>
      </div>
      <p className="text-note text-muted">
        x lies in the plane of incidence, z points into the film ({label}). |m| = 1 is saturation.
      </p>
    </div>
  );
}

/** As many digits as the box has room for; the full number is there while it is edited. */
function fourDigits(value: number): string {
  return formatPlain(Number(value.toPrecision(4)));
}
