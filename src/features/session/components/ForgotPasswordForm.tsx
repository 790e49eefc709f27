import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import { requestPasswordResetSchema } from '../../../../shared/account.ts';
import { Button } from '../../../components/Button.tsx';
import { Field, FormError } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { showServerIssues } from '../../../lib/formIssues.ts';
import { useRequestPasswordReset } from '../api/requestPasswordReset.ts';

type Values = z.infer<typeof requestPasswordResetSchema>;

export function ForgotPasswordForm() {
  const reset = useRequestPasswordReset();
  const form = useForm<Values>({
    resolver: zodResolver(requestPasswordResetSchema),
    defaultValues: { email: '' },
  });
  const { errors } = form.formState;
  const submit = form.handleSubmit((values) =>
    reset.mutate(values, { onError: (error) => showServerIssues(error, form.setError, ['email']) }),
  );
  if (reset.isSuccess) {
    return (
      <p role="status" className="card p-5">
        If there is an account with this address, a mail with a link is on its way. The link opens once and
        only for a while; if no mail comes, check the address and ask again.
      </p>
    );
  }
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="card flex flex-col gap-3.5 p-5">
      <Field
        label="E-mail"
        hint="The address you sign in with. It gets a link for choosing a new password."
        error={errors.email?.message}
      >
        {(control) => (
          <TextInput {...control} {...form.register('email')} type="email" autoComplete="username" />
        )}
      </Field>
      <FormError message={errors.root?.['server']?.message} />
      <Button type="submit" tone="primary" busy={reset.isPending}>
        Send the link
      </Button>
    </form>
  );
}
