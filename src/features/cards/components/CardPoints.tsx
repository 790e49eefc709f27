import { Plus, X } from 'lucide-react';
import { useFieldArray } from 'react-hook-form';
import type { UseFormReturn } from 'react-hook-form';
import { LIMITS } from '../../../../shared/limits.ts';
import { Button, IconButton } from '../../../components/Button.tsx';
import { controlLook } from '../../../components/controlLook.ts';
import { Field } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import type { CardForm } from '../model/cardDraft.ts';

/** Where the film will be read: the card predicts its readings there. */
export function CardPoints({ form }: { form: UseFormReturn<CardForm> }) {
  const { fields, append, remove } = useFieldArray({ control: form.control, name: 'points' });
  const { register, formState, getValues } = form;
  return (
    <fieldset className="flex flex-col gap-3">
      <legend className="mb-1 text-lead font-semibold">Working points</legend>
      {fields.map(({ id }, index) => {
        const errors = formState.errors.points?.[index];
        const name = `point ${index + 1}`;
        return (
          <div
            key={id}
            className="grid grid-cols-2 items-start gap-2 sm:grid-cols-[minmax(0,1fr)_120px_100px_110px_36px]"
          >
            <Field label="Name" error={errors?.label?.message}>
              {(control) => <TextInput {...control} {...register(`points.${index}.label`)} />}
            </Field>
            <Field label="Wavelength (nm)" error={errors?.wavelengthNm?.message}>
              {(control) => (
                <TextInput
                  {...control}
                  inputMode="decimal"
                  {...register(`points.${index}.wavelengthNm`, { valueAsNumber: true })}
                />
              )}
            </Field>
            <Field label="Angle (°)" error={errors?.angleDeg?.message}>
              {(control) => (
                <TextInput
                  {...control}
                  inputMode="decimal"
                  {...register(`points.${index}.angleDeg`, { valueAsNumber: true })}
                />
              )}
            </Field>
            <Field label="Light">
              {(control) => (
                <select {...control} {...register(`points.${index}.input`)} className={controlLook}>
                  <option value="p">p light</option>
                  <option value="s">s light</option>
                </select>
              )}
            </Field>
            {fields.length > 1 && (
              <IconButton label={`Remove ${name}`} className="mt-6" onClick={() => remove(index)}>
                <X size={15} aria-hidden />
              </IconButton>
            )}
          </div>
        );
      })}
      {fields.length < LIMITS.designPoints && (
        <Button
          className="self-start"
          icon={<Plus size={15} aria-hidden />}
          onClick={() => {
            const last = getValues('points').at(-1);
            if (last) append({ ...last, label: `Point ${fields.length + 1}` });
          }}
        >
          Add a working point
        </Button>
      )}
    </fieldset>
  );
}
