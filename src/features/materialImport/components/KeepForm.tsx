import { zodResolver } from '@hookform/resolvers/zod';
import { useEffect, useRef } from 'react';
import type { FormEvent } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { Button } from '../../../components/Button.tsx';
import { Field, FormError } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { showServerIssues } from '../../../lib/formIssues.ts';
import { namingRules, shownSources } from '../model/naming.ts';
import type { Asked, NamingForm } from '../model/naming.ts';
import { NameFields } from './NameFields.tsx';
import { SourceFields } from './SourceFields.tsx';

type KeepFormProps = {
  asked: Asked;
  /** The verb: "Create material". */
  action: string;
  values: NamingForm;
  onChange: (values: NamingForm) => void;
  busy: boolean;
  /** `refuse` puts what the server says at its field. */
  onKeep: (values: NamingForm, refuse: (error: unknown) => void) => Promise<void>;
};

const sourceFields = [
  'citation',
  'doi',
  'licence',
  'sample',
  'temperature',
  'method',
  'confidence',
  'caution',
] as const;

const fields = [
  ...(['name', 'formula', 'class', 'notes'] as const),
  ...sourceFields.map((field) => `content.indexSource.${field}` as const),
  ...sourceFields.map((field) => `content.voigtSource.${field}` as const),
];

/** Name, source and the button that keeps what was imported. What was typed outlives a refusal and a reload. */
export function KeepForm({ asked, action, values, onChange, busy, onKeep }: KeepFormProps) {
  const form = useForm<NamingForm>({ resolver: zodResolver(namingRules(asked)), defaultValues: values });
  const { errors } = form.formState;
  const { subscribe, register } = form;
  useEffect(
    () =>
      subscribe({
        formState: { values: true },
        callback: ({ values: typed }) => onChange(typed),
      }),
    [subscribe, onChange],
  );
  const apart = useWatch({ control: form.control, name: 'apart' });
  const shown = shownSources(asked, apart);
  const both = asked.indexSource && asked.voigtSource;
  const underWay = useRef(false);
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    // A second press before the first is answered says nothing new.
    if (underWay.current) return;
    underWay.current = true;
    await form.handleSubmit((typed) =>
      onKeep(typed, (error) => showServerIssues(error, form.setError, fields)),
    )();
    underWay.current = false;
  };
  return (
    <form
      noValidate
      aria-label={action}
      onSubmit={(event) => void submit(event)}
      className="flex max-w-[820px] flex-col gap-5"
    >
      {asked.name ? (
        <NameFields register={register} errors={errors} />
      ) : (
        <Field
          label="Why this version"
          hint="For those who read the history; may stay empty."
          error={errors.versionNote?.message}
        >
          {(control) => <TextInput {...control} {...register('versionNote')} autoComplete="off" />}
        </Field>
      )}
      {shown.indexSource ? (
        <SourceFields
          which="indexSource"
          title={
            shown.voigtSource
              ? 'Where n and k come from'
              : both
                ? 'Where the constants come from'
                : 'Where n and k come from'
          }
          register={register}
          errors={errors}
        />
      ) : null}
      {both ? (
        <label className="flex items-center gap-2">
          <input type="checkbox" {...register('apart')} className="size-4 accent-accent" />Q has another
          source than n and k
        </label>
      ) : null}
      {shown.voigtSource ? (
        <SourceFields which="voigtSource" title="Where Q comes from" register={register} errors={errors} />
      ) : null}
      <FormError message={errors.root?.['server']?.message} />
      <div>
        <Button type="submit" tone="primary" busy={busy}>
          {action}
        </Button>
      </div>
    </form>
  );
}
