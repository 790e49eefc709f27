import type { FieldErrors, UseFormRegister } from 'react-hook-form';
import { materialClasses } from '../../../../shared/material.ts';
import { Field } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { controlLook } from '../../../components/controlLook.ts';
import type { NamingForm } from '../model/naming.ts';

type NameFieldsProps = { register: UseFormRegister<NamingForm>; errors: FieldErrors<NamingForm> };

/** What a new material is called. */
export function NameFields({ register, errors }: NameFieldsProps) {
  return (
    <div className="grid gap-3 sm:grid-cols-[2fr_1fr_1fr]">
      <Field label="Name" error={errors.name?.message}>
        {(control) => (
          <TextInput
            {...control}
            {...register('name')}
            placeholder="such as Cobalt, our films 2026"
            autoComplete="off"
          />
        )}
      </Field>
      <Field label="Formula" error={errors.formula?.message}>
        {(control) => (
          <TextInput {...control} {...register('formula')} placeholder="such as Co" autoComplete="off" />
        )}
      </Field>
      <Field label="Class" error={errors.class?.message}>
        {(control) => (
          <select {...control} {...register('class')} className={controlLook}>
            <option value="">choose</option>
            {materialClasses.map((one) => (
              <option key={one} value={one}>
                {one}
              </option>
            ))}
          </select>
        )}
      </Field>
      <Field
        label="Notes"
        hint="One a line; shown on the page of the material."
        error={errors.notes?.message}
        className="sm:col-span-3"
      >
        {(control) => <textarea {...control} {...register('notes')} rows={2} className={controlLook} />}
      </Field>
    </div>
  );
}
