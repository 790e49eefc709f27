import type { MaterialSummary } from '../../../../shared/material.ts';
import { Field } from '../../../components/Field.tsx';
import { Select } from '../../../components/Select.tsx';
import { formatFormula, formatRange } from '../../../lib/format.ts';
import type { ColumnPlan } from '../model/columnPlan.ts';

type IndexOfFieldProps = {
  materials: readonly MaterialSummary[];
  value: ColumnPlan['indexOf'];
  onChange: (value: ColumnPlan['indexOf']) => void;
};

/** The material that gives N where the table has only magneto-optic columns. */
export function IndexOfField({ materials, value, onChange }: IndexOfFieldProps) {
  const sorted = [...materials].sort((a, b) => a.formula.localeCompare(b.formula, 'en'));
  const options = [
    { value: '', label: 'choose a material', disabled: true },
    ...sorted.map(({ id, formula, name, rangeNm }) => ({
      value: id,
      label: `${formatFormula(formula)}, ${name} (${id}), ${formatRange(rangeNm, 'nm')}`,
    })),
  ];
  return (
    <Field
      label="N is that of"
      hint="The table has no n and k. Its magneto-optic columns are converted with the N of this material, and the new material takes over its n and k with their source."
      className="max-w-xl"
    >
      {(control) => (
        <Select
          {...control}
          value={value?.material ?? ''}
          options={options}
          onValueChange={(id) => {
            const chosen = materials.find((material) => material.id === id);
            if (chosen) onChange({ material: chosen.id, version: chosen.version });
          }}
        />
      )}
    </Field>
  );
}
