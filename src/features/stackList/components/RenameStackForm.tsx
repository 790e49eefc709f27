import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { stackNameSchema } from '../../../../shared/stack.ts';
import type { StackSummary } from '../../../../shared/stack.ts';
import { Button } from '../../../components/Button.tsx';
import { Field, FormError } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { showServerIssues } from '../../../lib/formIssues.ts';
import { useRenameStack } from '../api/renameStack.ts';

const renameSchema = z.object({ name: stackNameSchema });

/** In the row, in place of the name. Escape leaves everything as it was. */
export function RenameStackForm({ stack, onClose }: { stack: StackSummary; onClose: () => void }) {
  const rename = useRenameStack(stack.groupId);
  const form = useForm({ resolver: zodResolver(renameSchema), defaultValues: { name: stack.name } });
  const { errors } = form.formState;
  const submit = form.handleSubmit(({ name }) =>
    rename.mutate(
      { stack, name },
      { onSuccess: onClose, onError: (error) => showServerIssues(error, form.setError, ['name']) },
    ),
  );
  return (
    <form
      noValidate
      className="flex w-full flex-col gap-2 font-normal"
      onSubmit={(event) => void submit(event)}
      onKeyDown={(event) => {
        if (event.key === 'Escape') onClose();
      }}
    >
      <Field label="New name" error={errors.name?.message}>
        {(control) => <TextInput {...control} {...form.register('name')} autoFocus />}
      </Field>
      <FormError message={errors.root?.['server']?.message} />
      <div className="flex gap-2">
        <Button type="submit" busy={rename.isPending}>
          Rename
        </Button>
        <Button tone="plain" onClick={onClose}>
          Cancel
        </Button>
      </div>
    </form>
  );
}
