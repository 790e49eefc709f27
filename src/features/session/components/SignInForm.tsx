import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { signInSchema } from '../../../../shared/account.ts';
import type { SignIn } from '../../../../shared/account.ts';
import { Button } from '../../../components/Button.tsx';
import { Field, FormError } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { showServerIssues } from '../../../lib/formIssues.ts';
import { useSignIn } from '../api/signIn.ts';

export function SignInForm({ onSignedIn }: { onSignedIn: () => void }) {
  const signIn = useSignIn();
  const form = useForm<SignIn>({
    resolver: zodResolver(signInSchema),
    defaultValues: { email: '', password: '' },
  });
  const { errors } = form.formState;
  const submit = form.handleSubmit((values) =>
    signIn.mutate(values, {
      onSuccess: onSignedIn,
      onError: (error) => showServerIssues(error, form.setError, ['email', 'password']),
    }),
  );
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="card flex flex-col gap-3.5 p-5">
      <Field label="E-mail" error={errors.email?.message}>
        {(control) => (
          <TextInput
            {...control}
            {...form.register('email')}
            type="email"
            autoComplete="username"
            autoFocus
          />
        )}
      </Field>
      <Field label="Password" error={errors.password?.message}>
        {(control) => (
          <TextInput
            {...control}
            {...form.register('password')}
            type="password"
            autoComplete="current-password"
          />
        )}
      </Field>
      <FormError message={errors.root?.['server']?.message} />
      <Button type="submit" tone="primary" busy={signIn.isPending}>
        {signIn.isPending ? 'Signing in' : 'Sign in'}
      </Button>
    </form>
  );
}
