import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { signUpSchema } from '../../../../shared/account.ts';
import type { SignUp } from '../../../../shared/account.ts';
import { Button } from '../../../components/Button.tsx';
import { Field, FormError } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { showServerIssues } from '../../../lib/formIssues.ts';
import { useSignUp } from '../api/signUp.ts';

export function SignUpForm({ onSignedIn }: { onSignedIn: () => void }) {
  const signUp = useSignUp();
  const form = useForm<SignUp>({
    resolver: zodResolver(signUpSchema),
    defaultValues: { name: '', email: '', password: '' },
  });
  const { errors } = form.formState;
  const submit = form.handleSubmit((values) =>
    signUp.mutate(values, {
      onSuccess: onSignedIn,
      onError: (error) => showServerIssues(error, form.setError, ['name', 'email', 'password']),
    }),
  );
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="card flex flex-col gap-3.5 p-5">
      <Field label="Name" hint="As the people of your groups will see it." error={errors.name?.message}>
        {(control) => <TextInput {...control} {...form.register('name')} autoComplete="name" />}
      </Field>
      <Field label="E-mail" error={errors.email?.message}>
        {(control) => (
          <TextInput {...control} {...form.register('email')} type="email" autoComplete="username" />
        )}
      </Field>
      <Field label="Password" hint="At least 10 characters." error={errors.password?.message}>
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
      <Button type="submit" tone="primary" busy={signUp.isPending}>
        {signUp.isPending ? 'Making the account' : 'Make an account'}
      </Button>
    </form>
  );
}
