import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { Link } from 'react-router-dom';
import { resetPasswordSchema } from '../../../../shared/account.ts';
import { Button } from '../../../components/Button.tsx';
import { Field, FormError } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { showServerIssues } from '../../../lib/formIssues.ts';
import { paths } from '../../../lib/paths.ts';
import { useResetPassword } from '../api/resetPassword.ts';

const passwordSchema = resetPasswordSchema.pick({ password: true });

export function ResetPasswordForm({ token }: { token: string }) {
  const reset = useResetPassword();
  const form = useForm({ resolver: zodResolver(passwordSchema), defaultValues: { password: '' } });
  const { errors } = form.formState;
  const submit = form.handleSubmit(({ password }) =>
    reset.mutate(
      { token, password },
      { onError: (error) => showServerIssues(error, form.setError, ['password']) },
    ),
  );
  if (reset.isSuccess) {
    return (
      <p role="status" className="card p-5">
        The new password holds from now on.{' '}
        <Link to={paths.signIn} className="prose-link">
          Sign in with it
        </Link>
        .
      </p>
    );
  }
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="card flex flex-col gap-3.5 p-5">
      <Field label="New password" hint="At least 10 characters." error={errors.password?.message}>
        {(control) => (
          <TextInput
            {...control}
            {...form.register('password')}
            type="password"
            autoComplete="new-password"
          />
        )}
      </Field>
      <FormError message={errors.root?.['server']?.message} />
      {errors.root?.['server'] ? (
        <p className="text-note">
          A link that was used or is too old does not open any more.{' '}
          <Link to={paths.forgotPassword} className="prose-link">
            Ask for a new one
          </Link>
          .
        </p>
      ) : null}
      <Button type="submit" tone="primary" busy={reset.isPending}>
        Set the password
      </Button>
    </form>
  );
}
