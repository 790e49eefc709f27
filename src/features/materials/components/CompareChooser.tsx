import type { Material, MaterialSummary } from '../../../../shared/material.ts';
import { Field } from '../../../components/Field.tsx';
import { Select } from '../../../components/Select.tsx';
import { materialTitle } from '../model/materialTitle.ts';

type Props = {
  letter: 'A' | 'B';
  library: readonly MaterialSummary[];
  /** Null while none is chosen. */
  chosen: string | null;
  /** The one that is loaded, for its versions. */
  material: Material | null;
  onChoose: (id: string) => void;
  onVersion: (version: number) => void;
};

/** Which material is compared, and in which version where it has several. */
export function CompareChooser({ letter, library, chosen, material, onChoose, onVersion }: Props) {
  const sorted = [...library].sort((one, other) => one.formula.localeCompare(other.formula, 'en'));
  const options = [
    ...(chosen === null ? [{ value: '', label: 'Choose a material' }] : []),
    ...sorted.map((one) => ({
      value: one.id,
      label: `${materialTitle(one)} (${one.groupId === null ? one.id : 'of this group'})`,
    })),
  ];
  const versions = Array.from({ length: material?.newestVersion ?? 0 }, (_, before) => String(before + 1));
  return (
    <div className="flex min-w-0 flex-wrap items-end gap-2">
      <Field label={`Material ${letter}`} className="min-w-0 flex-1 basis-64">
        {(control) => (
          <Select
            {...control}
            className="w-full"
            value={chosen ?? ''}
            options={options}
            onValueChange={(id) => {
              if (id !== '') onChoose(id);
            }}
          />
        )}
      </Field>
      {material && versions.length > 1 ? (
        <Field label="Version">
          {(control) => (
            <Select
              {...control}
              value={String(material.version)}
              options={versions.map((value) => ({ value, label: value }))}
              onValueChange={(value) => onVersion(Number(value))}
            />
          )}
        </Field>
      ) : null}
    </div>
  );
}
