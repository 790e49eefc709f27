import { z } from 'zod';
import { stackDocumentSchema } from '../../../../shared/stack.ts';
import type { Stack, StackDocument } from '../../../../shared/stack.ts';

/** What a person edits before it is saved. */
export type Draft = { name: string; description: string; document: StackDocument };

/** Unsaved edits as they survive a reload, with the version they began with. */
const storedDraftSchema = z.object({
  baseVersion: z.int(),
  draft: z.object({ name: z.string(), description: z.string(), document: stackDocumentSchema }),
});

export type StoredDraft = z.infer<typeof storedDraftSchema>;

const keyOf = (stackId: string) => `skewlight.draft.${stackId}`;

export function draftOf(stack: Pick<Stack, 'name' | 'description' | 'document'>): Draft {
  return { name: stack.name, description: stack.description, document: stack.document };
}

export function sameDraft(a: Draft, b: Draft): boolean {
  if (a === b) return true;
  if (a.name !== b.name || a.description !== b.description) return false;
  return a.document === b.document || JSON.stringify(a.document) === JSON.stringify(b.document);
}

/** Null when there is none, or when it is of an older build and no longer fits. */
export function loadDraft(storage: Storage, stackId: string): StoredDraft | null {
  const text = storage.getItem(keyOf(stackId));
  if (text === null) return null;
  try {
    return storedDraftSchema.safeParse(JSON.parse(text)).data ?? null;
  } catch {
    return null;
  }
}

/** Keeps the draft for this tab; a full storage only costs the safety net. */
export function storeDraft(storage: Storage, stackId: string, stored: StoredDraft | null): void {
  try {
    if (stored === null) storage.removeItem(keyOf(stackId));
    else storage.setItem(keyOf(stackId), JSON.stringify(stored));
  } catch {
    // QuotaExceededError: the edits are still on the page.
  }
}
