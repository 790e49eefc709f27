import type { UseFormReturn } from 'react-hook-form';
import type { StackDocument, StackMedium } from '../../../../shared/stack.ts';
import { plainNumber } from '../../../../shared/cardWords.ts';
import { Field } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { grownLayers } from '../model/cardDraft.ts';
import type { CardForm } from '../model/cardDraft.ts';

type Props = {
  form: UseFormReturn<CardForm>;
  document: StackDocument;
  nameOf: (medium: StackMedium) => string;
};

/** Deposition rates that the grower knows, in the order of growth. */
export function CardRates({ form, document, nameOf }: Props) {
  const { register, formState } = form;
  return (
    <fieldset>
      <legend className="mb-1 text-lead font-semibold">Deposition rates</legend>
      <p className="mb-2 text-note text-muted">
        In nm per minute, in the order of growth. An empty one leaves room on the card to write it by hand.
      </p>
      <div className="grid gap-x-4 gap-y-2 sm:grid-cols-2">
        {grownLayers(document.layers).map((layer, index) => (
          <Field
            key={layer.id}
            label={`${nameOf(layer.medium)}${layer.note ? ` (${layer.note})` : ''}, ${plainNumber(layer.thicknessNm)} nm`}
            error={formState.errors.rates?.[index]?.nmPerMin?.message}
          >
            {(control) => (
              <TextInput
                {...control}
                inputMode="decimal"
                placeholder="nm/min"
                {...register(`rates.${index}.nmPerMin`)}
              />
            )}
          </Field>
        ))}
      </div>
    </fieldset>
  );
}
