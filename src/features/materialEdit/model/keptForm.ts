import { z } from 'zod';
import { materialFormSchema } from './form.ts';

/** Unsaved edits as they survive a reload, with the version they began with; null for a new material. */
const keptFormSchema = z.object({ baseVersion: z.int().nullable(), form: materialFormSchema });

export type KeptForm = z.infer<typeof keptFormSchema>;

const keyOf = (subject: string) => `skewlight.materialDraft.${subject}`;

/** Null when there is none, or when it is of an older build and no longer fits. */
export function loadForm(storage: Storage, subject: string): KeptForm | null {
  const text = storage.getItem(keyOf(subject));
  if (text === null) return null;
  try {
    return keptFormSchema.safeParse(JSON.parse(text)).data ?? null;
  } catch {
    return null;
  }
}

/** Keeps the form for this tab; a full storage only costs the safety net. */
export function storeForm(storage: Storage, subject: string, kept: KeptForm | null): void {
  try {
    if (kept === null) storage.removeItem(keyOf(subject));
    else storage.setItem(keyOf(subject), JSON.stringify(kept));
  } catch {
    // QuotaExceededError: the edits are still on the page.
  }
}
