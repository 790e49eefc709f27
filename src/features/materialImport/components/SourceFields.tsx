import type { FieldErrors, UseFormRegister } from 'react-hook-form';
import { confidences } from '../../../../shared/materialSource.ts';
import { Field } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { controlLook } from '../../../components/controlLook.ts';
import type { NamingForm } from '../model/naming.ts';

const lines = [
  { field: 'doi', label: 'DOI', placeholder: '10.1103/PhysRevB.9.5056' },
  { field: 'licence', label: 'Licence', placeholder: 'such as CC BY 4.0, own data' },
  { field: 'sample', label: 'Sample', placeholder: 'such as 40 nm film on glass, sputtered' },
  { field: 'temperature', label: 'Temperature', placeholder: 'such as 295 K' },
  { field: 'method', label: 'Method', placeholder: 'such as ellipsometry' },
  { field: 'caution', label: 'Caution', placeholder: 'what a reader must know before use' },
] as const;

type SourceFieldsProps = {
  which: 'indexSource' | 'voigtSource';
  title: string;
  register: UseFormRegister<NamingForm>;
  errors: FieldErrors<NamingForm>;
};

/** Where the constants come from; it travels with every run, link and export. */
export function SourceFields({ which, title, register, errors }: SourceFieldsProps) {
  const wrong = errors.content?.[which];
  const at = `content.${which}` as const;
  return (
    <fieldset className="flex flex-col gap-3">
      <legend className="mb-1 font-semibold">{title}</legend>
      <Field label="Citation (required)" error={wrong?.citation?.message}>
        {(control) => (
          <textarea
            {...control}
            {...register(`${at}.citation`)}
            rows={2}
            placeholder="Authors, journal, volume, page (year); or who measured it, where and when"
            className={controlLook}
          />
        )}
      </Field>
      <div className="grid gap-3 sm:grid-cols-2">
        <Field label="Confidence (required)" error={wrong?.confidence?.message}>
          {(control) => (
            <select {...control} {...register(`${at}.confidence`)} className={controlLook}>
              <option value="">choose</option>
              {confidences.map((confidence) => (
                <option key={confidence} value={confidence}>
                  {confidence}
                </option>
              ))}
            </select>
          )}
        </Field>
        {lines.map(({ field, label, placeholder }) => (
          <Field key={field} label={label} error={wrong?.[field]?.message}>
            {(control) => (
              <TextInput
                {...control}
                {...register(`${at}.${field}`)}
                placeholder={placeholder}
                autoComplete="off"
              />
            )}
          </Field>
        ))}
      </div>
    </fieldset>
  );
}
