import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { stackNameSchema } from '../../../../shared/stack.ts';
import { studyDocumentSchema } from '../../../../shared/study.ts';
import type { Study } from '../../../../shared/study.ts';
import { Button } from '../../../components/Button.tsx';
import { Field, FormError } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { controlLook } from '../../../components/controlLook.ts';
import { ApiError } from '../../../lib/apiClient.ts';
import { showServerIssues } from '../../../lib/formIssues.ts';
import { useCreateStudy } from '../api/changeStudy.ts';

const newStudySchema = z.object({ title: stackNameSchema, question: studyDocumentSchema.shape.question });
type NewStudy = z.infer<typeof newStudySchema>;

type Props = { groupId: string; onCreated: (study: Study) => void; onCancel: () => void };

export function NewStudyForm({ groupId, onCreated, onCancel }: Props) {
  const create = useCreateStudy(groupId);
  const form = useForm<NewStudy>({
    resolver: zodResolver(newStudySchema),
    defaultValues: { title: '', question: '' },
  });
  const { errors } = form.formState;
  const submit = form.handleSubmit(({ title, question }) =>
    create.mutate(
      { title, document: { question, items: [] } },
      {
        onSuccess: onCreated,
        onError: (error) => showServerIssues(flattened(error), form.setError, ['title', 'question']),
      },
    ),
  );
  return (
    <form
      noValidate
      aria-label="New study"
      onSubmit={(event) => void submit(event)}
      className="card mb-5 flex flex-col gap-4 p-5"
    >
      <Field label="Title" error={errors.title?.message} className="max-w-md">
        {(control) => <TextInput {...control} {...form.register('title')} autoComplete="off" autoFocus />}
      </Field>
      <Field
        label="Question"
        error={errors.question?.message}
        hint="Such as: which cap for Pt/Co/Pt, read at 632.8 nm?"
        className="max-w-prose"
      >
        {(control) => (
          <textarea {...control} {...form.register('question')} rows={2} className={controlLook} />
        )}
      </Field>
      <FormError message={errors.root?.['server']?.message} />
      <div className="flex gap-2">
        <Button type="submit" tone="primary" busy={create.isPending}>
          Create study
        </Button>
        <Button tone="plain" onClick={onCancel}>
          Cancel
        </Button>
      </div>
    </form>
  );
}

/** The form has the question beside the title; the API has it in the document. */
function flattened(error: Error): Error {
  if (!(error instanceof ApiError)) return error;
  const issues = error.issues.map((issue) => ({ ...issue, path: issue.path.replace(/^document\./, '') }));
  return new ApiError(error.status, error.code, error.message, issues, error.requestId);
}
