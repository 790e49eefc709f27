import type { MaterialSummary } from '../../../../shared/material.ts';
import { Button } from '../../../components/Button.tsx';
import { formatFormula } from '../../../lib/format.ts';
import type { FormOf, IndexForm } from '../model/form.ts';
import { ChoiceField } from './ChoiceField.tsx';
import { Definition } from './Definition.tsx';
import { NumberField } from './NumberField.tsx';

type MixtureForm = FormOf<IndexForm, 'mixture of'>;
type Part = MixtureForm['parts'][number];

type Props = {
  form: MixtureForm;
  materials: readonly MaterialSummary[];
  onChange: (form: MixtureForm) => void;
};

const modelOptions = [
  { value: 'bruggeman' as const, label: 'Bruggeman: both alike' },
  { value: 'maxwell-garnett' as const, label: 'Maxwell Garnett: spheres of the second in the first' },
];

/** Two materials of the library mixed far below the wavelength. */
export function MixtureFields({ form, materials, onChange }: Props) {
  const [first, second] = form.parts;
  return (
    <>
      <ChoiceField
        label="Model"
        path="index.model"
        value={form.model}
        options={modelOptions}
        className="max-w-md"
        onChange={(model) => onChange({ ...form, model })}
      />
      <Definition
        formula={
          form.model === 'bruggeman'
            ? '(1 − f) (ε₁ − ε) / (ε₁ + 2ε) + f (ε₂ − ε) / (ε₂ + 2ε) = 0'
            : '(ε − ε₁) / (ε + 2ε₁) = f (ε₂ − ε₁) / (ε₂ + 2ε₁)'
        }
      >
        f is the volume fraction of the second material, ε₁ and ε₂ are the squares of the two indices. The
        parts are copied in whole as they are now.
      </Definition>
      <PartFields
        label="First material"
        path="index.parts[0]"
        part={first}
        materials={materials}
        onChange={(part) => onChange({ ...form, parts: [part, second] })}
      />
      <PartFields
        label="Second material"
        path="index.parts[1]"
        part={second}
        materials={materials}
        onChange={(part) => onChange({ ...form, parts: [first, part] })}
      />
      <NumberField
        label="f, fraction of the second"
        path="index.fraction"
        value={form.fraction}
        step={0.05}
        className="w-48"
        hint="From 0 to 1, by volume."
        onChange={(fraction) => onChange({ ...form, fraction })}
      />
    </>
  );
}

type PartProps = {
  label: string;
  path: string;
  part: Part;
  materials: readonly MaterialSummary[];
  onChange: (part: Part) => void;
};

/** A mixture is made of materials with one index each; tensors and further mixtures are no parts. */
const canBePart = ({ indexKind }: MaterialSummary) => indexKind !== 'tensor' && indexKind !== 'mixture';

function PartFields({ label, path, part, materials, onChange }: PartProps) {
  const chosen = materials.find(({ id }) => id === part.material);
  const options = [
    { value: '', label: 'Choose a material' },
    ...materials
      .filter(canBePart)
      .map(({ id, formula, name }) => ({ value: id, label: `${formatFormula(formula)}, ${name}` })),
  ];
  const known = part.material === '' || options.some(({ value }) => value === part.material);
  return (
    <div className="flex flex-wrap items-end gap-3">
      <ChoiceField
        label={label}
        path={`${path}.material`}
        value={part.material}
        options={known ? options : [...options, { value: part.material, label: part.material }]}
        className="w-96 max-w-full"
        onChange={(material) => {
          const version = materials.find(({ id }) => id === material)?.version ?? 1;
          onChange({ material, version });
        }}
      />
      {part.material === '' ? null : (
        <p className="flex min-h-9 items-center gap-2 text-note text-muted">
          version {part.version}
          {chosen && chosen.version !== part.version ? (
            <Button className="py-1!" onClick={() => onChange({ ...part, version: chosen.version })}>
              Use version {chosen.version}
            </Button>
          ) : null}
        </p>
      )}
    </div>
  );
}
