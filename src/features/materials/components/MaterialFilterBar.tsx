import { materialClasses } from '../../../../shared/material.ts';
import { Field } from '../../../components/Field.tsx';
import { Select } from '../../../components/Select.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import type { MaterialFilter } from '../hooks/useMaterialFilter.ts';
import { classLabel } from './ClassMark.tsx';

const classOptions = [
  { value: 'all' as const, label: 'Any class' },
  ...materialClasses.map((one) => ({ value: one, label: classLabel(one) })),
];

type MaterialFilterBarProps = {
  filter: MaterialFilter;
  onChange: (change: Partial<MaterialFilter>) => void;
  found: number;
  total: number;
};

export function MaterialFilterBar({ filter, onChange, found, total }: MaterialFilterBarProps) {
  return (
    <div role="search" aria-label="Materials" className="mb-4 flex flex-wrap items-end gap-x-4 gap-y-3">
      <Field label="Search" className="w-72 max-sm:w-full">
        {(control) => (
          <TextInput
            {...control}
            type="search"
            placeholder="Name, formula or source"
            value={filter.words}
            onChange={(event) => onChange({ words: event.target.value })}
          />
        )}
      </Field>
      <Field label="Class">
        {(control) => (
          <Select
            {...control}
            value={filter.class}
            options={classOptions}
            onValueChange={(value) => onChange({ class: value })}
          />
        )}
      </Field>
      <label className="flex items-center gap-2 py-2">
        <input
          type="checkbox"
          className="size-4 accent-accent"
          checked={filter.magnetoOptic}
          onChange={(event) => onChange({ magnetoOptic: event.target.checked })}
        />
        With magneto-optic constant
      </label>
      <p role="status" className="ml-auto py-2 text-note text-muted">
        {found === total ? `${total} materials` : `${found} of ${total} materials`}
      </p>
    </div>
  );
}
