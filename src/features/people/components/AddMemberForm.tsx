import { zodResolver } from '@hookform/resolvers/zod';
import { Controller, useForm } from 'react-hook-form';
import type { z } from 'zod';
import { addMemberSchema } from '../../../../shared/account.ts';
import { Button } from '../../../components/Button.tsx';
import { Field, FormError } from '../../../components/Field.tsx';
import { useNotify } from '../../../components/Notices.tsx';
import { Select } from '../../../components/Select.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { showServerIssues } from '../../../lib/formIssues.ts';
import { useAddMember } from '../api/addMember.ts';
import { roleOptions } from './roleTexts.ts';

type Values = z.infer<typeof addMemberSchema>;

/** For owners: somebody who has an account joins at once, without an invitation to answer. */
export function AddMemberForm({ groupId }: { groupId: string }) {
  const add = useAddMember(groupId);
  const notify = useNotify();
  const form = useForm<Values>({
    resolver: zodResolver(addMemberSchema),
    defaultValues: { email: '', role: 'viewer' },
  });
  const { errors } = form.formState;
  const submit = form.handleSubmit((values) =>
    add.mutate(values, {
      onSuccess: (member) => {
        form.reset();
        notify.done(`${member.name} is now ${member.role} of this group.`);
      },
      onError: (error) => showServerIssues(error, form.setError, ['email', 'role']),
    }),
  );
  return (
    <form noValidate aria-label="Add a person" onSubmit={(event) => void submit(event)} className="mt-4">
      <div className="flex flex-wrap items-start gap-3">
        <Field
          label="Add a person by e-mail"
          hint="They need an account here first."
          error={errors.email?.message}
          className="w-80 max-sm:w-full"
        >
          {(control) => (
            <TextInput {...control} {...form.register('email')} type="email" autoComplete="off" />
          )}
        </Field>
        <Field label="Role" error={errors.role?.message}>
          {(control) => (
            <Controller
              control={form.control}
              name="role"
              render={({ field }) => (
                <Select
                  {...control}
                  value={field.value}
                  options={roleOptions}
                  onValueChange={field.onChange}
                />
              )}
            />
          )}
        </Field>
        <Button type="submit" tone="primary" busy={add.isPending} className="mt-[22px]">
          Add
        </Button>
      </div>
      <FormError message={errors.root?.['server']?.message} />
    </form>
  );
}
