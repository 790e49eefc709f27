import { useWatch } from 'react-hook-form';
import type { Control } from 'react-hook-form';
import { useKeptInTab } from '../../../lib/useKeptInTab.ts';
import type { CardForm } from '../model/cardDraft.ts';
import { storeKeptCard } from '../model/keptCard.ts';

type Props = { control: Control<CardForm>; blank: CardForm; keptUnder: string; isMade: boolean };

/** Keeps what is filled in over a reload. Of its own, so that the form is not drawn anew at every keystroke. */
export function KeptCard({ control, blank, keptUnder, isMade }: Props) {
  const values = useWatch({ control, compute: (form: CardForm) => JSON.stringify(form) });
  const changed = !isMade && values !== JSON.stringify(blank);
  useKeptInTab(storeKeptCard, keptUnder, changed ? values : null);
  return null;
}
