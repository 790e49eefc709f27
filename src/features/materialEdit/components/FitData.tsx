import type { MaterialSummary } from '../../../../shared/material.ts';
import { Field } from '../../../components/Field.tsx';
import { Select } from '../../../components/Select.tsx';
import { formatFormula, formatRange } from '../../../lib/format.ts';

type Props = {
  target: 'index' | 'voigt';
  materials: readonly MaterialSummary[];
  chosen: string;
  onChoose: (materialId: string) => void;
};

/** A table of one point determines nothing. */
function isData(
  target: Props['target'],
  { indexKind, voigtKind, rangeNm, voigtRangeNm }: MaterialSummary,
): boolean {
  const range = target === 'index' ? rangeNm : voigtRangeNm;
  return (target === 'index' ? indexKind : voigtKind) === 'table' && range !== null && range[0] < range[1];
}

/** The material whose table is the data. */
export function FitData({ target, materials, chosen, onChoose }: Props) {
  const found = materials.filter((material) => isData(target, material));
  const what = target === 'index' ? 'n and k' : 'Q';
  const options = found.map(({ id, formula, name, rangeNm, voigtRangeNm }) => ({
    value: id,
    label: `${formatFormula(formula)}, ${name}, ${formatRange((target === 'voigt' && voigtRangeNm) || rangeNm, 'nm')}`,
  }));
  return (
    <Field
      label={`The data: a material with a table of ${what}`}
      className="max-w-xl"
      hint={
        found.length === 0 ? `No material of this group or the library has a table of ${what}.` : undefined
      }
    >
      {(control) => (
        <Select
          {...control}
          value={chosen}
          options={[{ value: '', label: 'Choose a material' }, ...options]}
          onValueChange={onChoose}
        />
      )}
    </Field>
  );
}
