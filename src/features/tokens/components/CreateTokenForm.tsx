import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { createTokenSchema } from '../../../../shared/account.ts';
import type { CreatedApiToken } from '../../../../shared/account.ts';
import { Button } from '../../../components/Button.tsx';
import { CopyButton } from '../../../components/CopyButton.tsx';
import { Field, FormError } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { showServerIssues } from '../../../lib/formIssues.ts';
import { useCreateToken } from '../api/createToken.ts';

/** Makes a token and shows it, this once. */
export function CreateTokenForm() {
  const create = useCreateToken();
  const form = useForm({ resolver: zodResolver(createTokenSchema), defaultValues: { name: '' } });
  const { errors } = form.formState;
  const submit = form.handleSubmit((values) =>
    create.mutate(values, {
      onSuccess: () => form.reset(),
      onError: (error) => showServerIssues(error, form.setError, ['name']),
    }),
  );
  return (
    <>
      <form
        noValidate
        aria-label="Create a token"
        onSubmit={(event) => void submit(event)}
        className="mb-4 flex flex-col gap-2"
      >
        <div className="flex flex-wrap items-start gap-3">
          <Field
            label="Name of the new token"
            hint="Where it will be used, such as “beamline script”."
            error={errors.name?.message}
            className="w-80 max-sm:w-full"
          >
            {(control) => <TextInput {...control} {...form.register('name')} autoComplete="off" />}
          </Field>
          <Button type="submit" tone="primary" busy={create.isPending} className="sm:mt-[22px]">
            Create token
          </Button>
        </div>
        <FormError message={errors.root?.['server']?.message} />
      </form>
      {create.data ? <NewToken token={create.data} /> : null}
    </>
  );
}

function NewToken({ token }: { token: CreatedApiToken }) {
  return (
    <div role="status" className="mb-5 rounded-card border border-accent bg-accent-soft px-5 py-4">
      <p className="font-semibold">“{token.name}” is made. Copy it now: it is not shown again.</p>
      <div className="mt-2 flex flex-wrap items-center gap-3">
        <code className="rounded-box bg-panel px-2.5 py-1.5 wrap-anywhere select-all">{token.token}</code>
        <CopyButton text={token.token} what="token" />
      </div>
    </div>
  );
}
