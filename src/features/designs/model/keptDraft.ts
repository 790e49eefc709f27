import { z } from 'zod';
import { designInputSchema } from '../../../../shared/design.ts';
import type { DesignInput } from '../../../../shared/design.ts';

/**
 * A question while it is being filled in: of the right shape, whether or not its values make sense yet. One of an
 * older build, whose shape has changed, does not pass.
 */
const draftInputSchema = z.custom<DesignInput>((value) => {
  const parsed = designInputSchema.safeParse(value);
  const ofValues = ['too_small', 'too_big', 'custom'];
  return parsed.success || parsed.error.issues.every(({ code }) => ofValues.includes(code));
});

const draftSchema = z.object({ name: z.string(), input: draftInputSchema });
export type DesignDraft = z.infer<typeof draftSchema>;

const keyOf = (subject: string) => `skewlight.designDraft.${subject}`;

/** The question kept for this tab; null when there is none or it no longer fits. */
export function loadDraft(storage: Storage, subject: string): DesignDraft | null {
  const text = storage.getItem(keyOf(subject));
  if (text === null) return null;
  try {
    return draftSchema.safeParse(JSON.parse(text)).data ?? null;
  } catch {
    return null;
  }
}

/** Keeps the question for this tab; a full storage only costs the safety net. */
export function storeDraft(storage: Storage, subject: string, draft: DesignDraft | null): void {
  try {
    if (draft === null) storage.removeItem(keyOf(subject));
    else storage.setItem(keyOf(subject), JSON.stringify(draft));
  } catch {
    // QuotaExceededError: what was filled in is still on the page.
  }
}
