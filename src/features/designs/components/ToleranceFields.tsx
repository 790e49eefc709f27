import { Plus, X } from 'lucide-react';
import { materialKeyOf } from '../../../../shared/designPoint.ts';
import type { Tolerance } from '../../../../shared/designPoint.ts';
import type { StackMedium } from '../../../../shared/stack.ts';
import { Button, IconButton } from '../../../components/Button.tsx';
import { mediumWords } from '../model/layerNames.ts';
import type { NamedMaterial } from '../model/layerNames.ts';
import { FieldIssue } from './FieldIssue.tsx';
import { FormSection } from './FormSection.tsx';
import { NumberField } from './NumberField.tsx';

type Props = {
  tolerance: Tolerance;
  /** What the film is made of: single materials may have errors of their own. */
  media: readonly StackMedium[];
  materials: readonly NamedMaterial[];
  onChange: (tolerance: Tolerance) => void;
};

const errors = [
  { name: 'ratePercent', label: 'Rate' },
  { name: 'randomPercent', label: 'Each layer' },
  { name: 'indexPercent', label: 'n and k' },
  { name: 'voigtPercent', label: 'Q' },
] as const;

/** How far the film may be off. Every value is one standard deviation. */
export function ToleranceFields({ tolerance, media, materials, onChange }: Props) {
  const { samples, seed, materials: own } = tolerance;
  const known = new Map(media.map((medium) => [materialKeyOf(medium), mediumWords(medium, materials)]));
  const free = [...known].filter(([key]) => !own.some(({ material }) => material === key));
  const change = (part: Partial<Tolerance>) => onChange({ ...tolerance, ...part });
  return (
    <FormSection
      title="Tolerances"
      hint="One standard deviation each. The rate error of a material is shared by all its layers; the other belongs to each layer alone. Starting values are common practice, no source."
    >
      <div className="flex flex-wrap items-start gap-3">
        {errors.map(({ name, label }) => (
          <NumberField
            key={name}
            label={label}
            path={`tolerance.${name}`}
            value={tolerance[name]}
            unit="%"
            className="w-28"
            onChange={(value) => change({ [name]: value })}
          />
        ))}
        <NumberField
          label="Films drawn"
          path="tolerance.samples"
          value={samples}
          whole
          step={100}
          onChange={(value) => change({ samples: value })}
        />
        <NumberField
          label="Seed"
          path="tolerance.seed"
          value={seed}
          whole
          className="w-28"
          onChange={(value) => change({ seed: value })}
        />
      </div>
      {own.map((one, position) => {
        const name = known.get(one.material) ?? one.material;
        return (
          <div
            key={one.material}
            role="group"
            aria-label={`Errors of ${name}`}
            className="flex flex-wrap gap-3"
          >
            <span className="w-24 self-center font-semibold">{name}</span>
            {errors.map(({ name: error, label }) => (
              <NumberField
                key={error}
                label={label}
                path={`tolerance.materials[${position}].${error}`}
                value={one[error] ?? tolerance[error]}
                unit="%"
                className="w-28"
                onChange={(value) =>
                  change({
                    materials: own.map((other) => (other === one ? { ...one, [error]: value } : other)),
                  })
                }
              />
            ))}
            <IconButton
              label={`Remove the errors of ${name}`}
              className="self-center"
              onClick={() => change({ materials: own.filter((other) => other !== one) })}
            >
              <X aria-hidden="true" className="size-4" />
            </IconButton>
            <FieldIssue path={`tolerance.materials[${position}].material`} />
          </div>
        );
      })}
      {free.length > 0 && (
        <div className="flex flex-wrap items-center gap-1.5">
          <span className="text-note text-muted">Other errors for</span>
          {free.map(([material, name]) => (
            <Button
              key={material}
              className="py-0.5!"
              icon={<Plus aria-hidden="true" className="size-4" />}
              onClick={() =>
                change({
                  materials: [
                    ...own,
                    { material, ratePercent: tolerance.ratePercent, randomPercent: tolerance.randomPercent },
                  ],
                })
              }
            >
              {name}
            </Button>
          ))}
        </div>
      )}
    </FormSection>
  );
}
