import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import type { MaterialSummary } from '../../../../shared/material.ts';
import { stackNameSchema } from '../../../../shared/stack.ts';
import type { Stack } from '../../../../shared/stack.ts';
import { Button } from '../../../components/Button.tsx';
import { Field, FormError } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { showServerIssues } from '../../../lib/formIssues.ts';
import { useCreateStack } from '../api/createStack.ts';
import { documentOf, stackTemplates, templateTexts } from '../templates.ts';

const newStackSchema = z.object({ name: stackNameSchema, template: z.enum(stackTemplates) });
type NewStack = z.infer<typeof newStackSchema>;

type NewStackFormProps = {
  groupId: string;
  /** The library the templates choose from. */
  materials: readonly MaterialSummary[];
  onCreated: (stack: Stack) => void;
  onCancel: () => void;
};

export function NewStackForm({ groupId, materials, onCreated, onCancel }: NewStackFormProps) {
  const create = useCreateStack(groupId);
  const form = useForm<NewStack>({
    resolver: zodResolver(newStackSchema),
    defaultValues: { name: '', template: 'pt-co-pt' },
  });
  const { errors } = form.formState;
  const refuse = (error: unknown) => showServerIssues(error, form.setError, ['name']);
  const submit = form.handleSubmit(({ name, template }) => {
    try {
      const document = documentOf(template, materials);
      create.mutate({ name, document }, { onSuccess: onCreated, onError: refuse });
    } catch (error) {
      refuse(error);
    }
  });
  return (
    <form
      noValidate
      aria-label="New stack"
      onSubmit={(event) => void submit(event)}
      className="card mb-5 flex flex-col gap-4 p-5"
    >
      <Field label="Name" error={errors.name?.message} className="max-w-md">
        {(control) => <TextInput {...control} {...form.register('name')} autoComplete="off" autoFocus />}
      </Field>
      <fieldset className="flex flex-col gap-2">
        <legend className="mb-1 text-note font-semibold">Start from</legend>
        {stackTemplates.map((template) => (
          <label key={template} className="flex items-baseline gap-2">
            <input type="radio" value={template} {...form.register('template')} className="accent-accent" />
            <span>
              {templateTexts[template].label}{' '}
              <span className="text-note text-muted">{templateTexts[template].hint}</span>
            </span>
          </label>
        ))}
      </fieldset>
      <FormError message={errors.root?.['server']?.message} />
      <div className="flex gap-2">
        <Button type="submit" tone="primary" busy={create.isPending}>
          Create stack
        </Button>
        <Button tone="plain" onClick={onCancel}>
          Cancel
        </Button>
      </div>
    </form>
  );
}
