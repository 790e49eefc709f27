import { zodResolver } from '@hookform/resolvers/zod';
import { useEffect, useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import type { UseFormReturn } from 'react-hook-form';
import type { GrowthCard } from '../../../../shared/growthCard.ts';
import type { StackMedium } from '../../../../shared/stack.ts';
import { Button } from '../../../components/Button.tsx';
import { controlLook } from '../../../components/controlLook.ts';
import { Field, FormError } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { showServerIssues } from '../../../lib/formIssues.ts';
import { useMakeCard } from '../hooks/useMakeCard.ts';
import { cardFormSchema, cardRequest, emptyForm } from '../model/cardDraft.ts';
import type { CardForm, CardStart } from '../model/cardDraft.ts';
import { loadKeptCard, storeKeptCard } from '../model/keptCard.ts';
import { CancelledCard } from './CancelledCard.tsx';
import { CardPoints } from './CardPoints.tsx';
import { CardProgress } from './CardProgress.tsx';
import { CardRates } from './CardRates.tsx';
import { KeptCard } from './KeptCard.tsx';

type Props = {
  groupId: string;
  start: CardStart;
  /** Names what the form begins with, so that what is filled in comes back to the same form after a reload. */
  keptUnder: string;
  nameOf: (medium: StackMedium) => string;
  onMade: (card: GrowthCard) => void;
};

const errors = [
  ['ratePercent', 'Rate, shared by a material (%)'],
  ['randomPercent', 'Random, each layer (%)'],
  ['indexPercent', 'n and k (%)'],
  ['voigtPercent', 'Q (%)'],
] as const;

/** What a card says beside the film itself. It cannot be changed once it is made. */
export function NewCardForm({ groupId, start, keptUnder, nameOf, onMade }: Props) {
  const [blank] = useState(() => emptyForm(start));
  const [kept, setKept] = useState(() => loadKeptCard(window.sessionStorage, keptUnder, blank));
  const form = useForm<CardForm>({ resolver: zodResolver(cardFormSchema), defaultValues: kept ?? blank });
  const { register, formState, setError } = form;
  const making = useMakeCard(groupId, (card) => {
    storeKeptCard(window.sessionStorage, keptUnder, null);
    onMade(card);
  });
  // Only now can a field be focused again.
  useEffect(() => {
    if (making.error) showServerIssues(making.error, setError, ['title', 'sampleId', 'bench', 'signal']);
  }, [making.error, setError]);
  const submit = form.handleSubmit((values) => {
    setKept(null);
    making.make(cardRequest(start, values));
  });
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="flex max-w-[820px] flex-col gap-6">
      <KeptCard control={form.control} blank={blank} keptUnder={keptUnder} isMade={making.isMade} />
      {kept && (
        <p role="status" className="text-note text-muted">
          What you had filled in is back; no card was made of it.{' '}
          <button
            type="button"
            className="prose-link"
            onClick={() => {
              setKept(null);
              form.reset(blank);
            }}
          >
            Start anew
          </button>
        </p>
      )}
      <fieldset disabled={making.busy} className="contents">
        <div className="grid gap-3 sm:grid-cols-[minmax(0,1fr)_220px]">
          <Field label="Title" error={formState.errors.title?.message}>
            {(control) => <TextInput {...control} {...register('title')} />}
          </Field>
          <Field label="Sample id" error={formState.errors.sampleId?.message} hint="Empty: written by hand">
            {(control) => <TextInput {...control} {...register('sampleId')} />}
          </Field>
        </div>
        <CardPoints form={form} />
        <fieldset>
          <legend className="mb-1 text-lead font-semibold">Errors to reckon with</legend>
          <p className="mb-2 text-note text-muted">
            One standard deviation each. The card prints the band that holds 68.27 % of{' '}
            {start.tolerance.samples} films drawn with them.
          </p>
          <div className="grid grid-cols-2 gap-3 sm:grid-cols-4">
            {errors.map(([name, label]) => (
              <Field key={name} label={label} error={formState.errors[name]?.message}>
                {(control) => (
                  <TextInput {...control} inputMode="decimal" {...register(name, { valueAsNumber: true })} />
                )}
              </Field>
            ))}
          </div>
          <Field label="Signal that counts" className="mt-3 max-w-64">
            {(control) => (
              <select {...control} {...register('signal')} className={controlLook}>
                <option value="rotation">Kerr rotation</option>
                <option value="ellipticity">Kerr ellipticity</option>
                <option value="amplitude">Cross-polarized amplitude</option>
                <option value="contrast">Transverse contrast</option>
              </select>
            )}
          </Field>
        </fieldset>
        <CardRates form={form} document={start.document} nameOf={nameOf} />
        <Field
          label="Bench"
          error={formState.errors.bench?.message}
          hint="How the film will be measured: source, polarizer, analyzer offset, detector"
        >
          {(control) => <textarea {...control} rows={2} {...register('bench')} className={controlLook} />}
        </Field>
        <Field label="Decision" error={formState.errors.decision?.message} hint="What was decided, and why">
          {(control) => <textarea {...control} rows={3} {...register('decision')} className={controlLook} />}
        </Field>
        <LinkFields form={form} start={start} />
      </fieldset>
      <FormError message={formState.errors.root?.['server']?.message} />
      {making.cancelledKey !== null && <CancelledCard groupId={groupId} requestKey={making.cancelledKey} />}
      {making.busy ? (
        <CardProgress
          progress={making.progress}
          films={start.tolerance.samples}
          hasLink={form.getValues('hasLink')}
          onCancel={making.cancel}
        />
      ) : (
        // It comes back where the focus was: after a cancel or a refusal.
        <Button type="submit" tone="primary" className="self-start" autoFocus={formState.isSubmitted}>
          Make the card
        </Button>
      )}
    </form>
  );
}

/** The link opens where the card comes from; only a card that stands alone is opened itself. */
function LinkFields({ form, start }: { form: UseFormReturn<CardForm>; start: CardStart }) {
  const { register, control, formState } = form;
  const hasLink = useWatch({ control, name: 'hasLink' });
  const opened = start.studyId
    ? 'the study it comes from'
    : start.designId
      ? 'the design it comes from'
      : 'the card';
  return (
    <fieldset className="flex flex-wrap items-start gap-x-6 gap-y-2">
      <legend className="mb-1 text-lead font-semibold">Link</legend>
      <label className="flex items-center gap-2 pt-1">
        <input type="checkbox" {...register('hasLink')} className="size-4 accent-(--accent)" />
        Print a QR code that opens {opened} without signing in
      </label>
      {hasLink && (
        <Field label="Opens until" error={formState.errors.lastDay?.message} hint="Empty: no end">
          {(one) => <TextInput {...one} type="date" {...register('lastDay')} />}
        </Field>
      )}
    </fieldset>
  );
}
