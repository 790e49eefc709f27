import { zodResolver } from '@hookform/resolvers/zod';
import { Check, Copy } from 'lucide-react';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { LIMITS } from '../../../../shared/limits.ts';
import { Button, IconButton } from '../../../components/Button.tsx';
import { Field, FormError } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { showServerIssues } from '../../../lib/formIssues.ts';
import { useCreateLink } from '../api/links.ts';
import type { LinkSubject } from '../api/links.ts';

/** As a person fills it in: the last day on which the link opens, empty for no end. */
const formSchema = z.object({
  label: z.string().trim().max(LIMITS.nameLength),
  lastDay: z
    .string()
    .refine((day) => day === '' || endOfDay(day) > new Date(), { error: 'must be today or later' }),
});

type Values = z.infer<typeof formSchema>;

/** Midnight after that day in the reader's time zone. */
function endOfDay(day: string): Date {
  const end = new Date(`${day}T00:00:00`);
  end.setDate(end.getDate() + 1);
  return end;
}

/** Makes a link and shows its address, which the server cannot show again. */
export function NewLinkForm({ subject }: { subject: LinkSubject }) {
  const create = useCreateLink(subject);
  const form = useForm<Values>({
    resolver: zodResolver(formSchema),
    defaultValues: { label: '', lastDay: '' },
  });
  const { errors } = form.formState;
  const submit = form.handleSubmit(async ({ label, lastDay }) => {
    try {
      await create.mutateAsync({
        label,
        expiresAt: lastDay === '' ? null : endOfDay(lastDay).toISOString(),
      });
      form.reset();
    } catch (error) {
      showServerIssues(error, form.setError, ['label']);
    }
  });
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="flex flex-col gap-2">
      <div className="flex flex-wrap items-start gap-2">
        <Field label="For whom (only you see it)" error={errors.label?.message} className="min-w-44 flex-1">
          {(control) => (
            <TextInput {...control} {...form.register('label')} placeholder="such as Group meeting" />
          )}
        </Field>
        <Field label="Opens until" error={errors.lastDay?.message} hint="Empty: no end">
          {(control) => <TextInput {...control} type="date" {...form.register('lastDay')} />}
        </Field>
        <Button type="submit" busy={create.isPending} className="mt-[23px]">
          Make a link
        </Button>
      </div>
      <FormError message={errors.root?.['server']?.message} />
      {create.data && <NewLink url={create.data.url} />}
    </form>
  );
}

function NewLink({ url }: { url: string }) {
  const [copied, setCopied] = useState(false);
  return (
    <div role="status" className="rounded-control bg-accent-soft px-3 py-2">
      <p className="text-note">Copy it now: the address is shown this once.</p>
      <div className="mt-1 flex items-center gap-1">
        <input
          readOnly
          aria-label="Address of the new link"
          value={url}
          onFocus={(event) => event.currentTarget.select()}
          className="min-w-0 flex-1 rounded-box border border-line bg-panel px-2 py-1 text-note"
        />
        <IconButton
          label={copied ? 'Copied' : 'Copy the address'}
          onClick={() => void navigator.clipboard.writeText(url).then(() => setCopied(true))}
        >
          {copied ? <Check size={15} aria-hidden /> : <Copy size={15} aria-hidden />}
        </IconButton>
      </div>
    </div>
  );
}
