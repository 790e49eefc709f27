import { materialClasses } from '../../../../shared/material.ts';
import { confidences } from '../../../../shared/materialSource.ts';
import { Field } from '../../../components/Field.tsx';
import { Select } from '../../../components/Select.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { places, voigtChoices } from '../model/materialFilter.ts';
import type { MaterialFilter } from '../model/materialFilter.ts';
import { classLabel } from './ClassMark.tsx';
import { WavelengthFields } from './WavelengthFields.tsx';

const classOptions = [
  { value: 'all' as const, label: 'Any class' },
  ...materialClasses.map((one) => ({ value: one, label: classLabel(one) })),
];

const voigtTexts = {
  any: 'With or without Q',
  known: 'With Q',
  'over the range': 'With Q at both wavelengths',
  unknown: 'Without Q',
} as const;
const voigtOptions = voigtChoices.map((value) => ({ value, label: voigtTexts[value] }));

const placeTexts = { all: 'Both libraries', group: 'This group', shipped: 'Shipped library' } as const;
const placeOptions = places.map((value) => ({ value, label: placeTexts[value] }));

const confidenceOptions = [
  { value: 'all' as const, label: 'Any confidence' },
  ...confidences.map((value) => ({ value, label: value })),
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
      <Field label="Search" className="min-w-56 flex-1 max-sm:basis-full">
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
      <WavelengthFields filter={filter} onChange={onChange} />
      <Field label="Magneto-optic data">
        {(control) => (
          <Select
            {...control}
            value={filter.voigt}
            options={voigtOptions}
            onValueChange={(value) => onChange({ voigt: value })}
          />
        )}
      </Field>
      <Field label="Where">
        {(control) => (
          <Select
            {...control}
            value={filter.place}
            options={placeOptions}
            onValueChange={(value) => onChange({ place: value })}
          />
        )}
      </Field>
      <Field label="n, k or Q are">
        {(control) => (
          <Select
            {...control}
            value={filter.confidence}
            options={confidenceOptions}
            onValueChange={(value) => onChange({ confidence: value })}
          />
        )}
      </Field>
      <p role="status" className="ml-auto py-2 text-note text-muted">
        {found === total ? `${total} materials` : `${found} of ${total} materials`}
      </p>
    </div>
  );
}
