import { z } from 'zod';
import { studyItemSchema } from '../../../../shared/study.ts';
import type { Study } from '../../../../shared/study.ts';
import { itemsOf, rowsOf } from './rows.ts';
import type { StudyRow } from './rows.ts';

/** What a person edits before it is saved. */
export type StudyDraft = { title: string; question: string; decision: string; rows: readonly StudyRow[] };

/** Unsaved edits as they survive a reload. An empty title is kept too: it is refused only when it is saved. */
const storedDraftSchema = z.object({
  baseVersion: z.int(),
  draft: z.object({
    title: z.string(),
    question: z.string(),
    decision: z.string(),
    rows: z.array(z.object({ item: studyItemSchema, removed: z.boolean() })),
  }),
});

export type StoredStudyDraft = { baseVersion: number; draft: StudyDraft };

const keyOf = (studyId: string) => `skewlight.study.${studyId}`;

export function draftOf({ title, document }: Pick<Study, 'title' | 'document'>): StudyDraft {
  return { title, question: document.question, decision: document.decision, rows: rowsOf(document.items) };
}

/** What of a draft is saved. */
export function contentOf({
  title,
  question,
  decision,
  rows,
}: StudyDraft): Pick<Study, 'title' | 'document'> {
  return { title, document: { question, items: itemsOf(rows), decision } };
}

export function sameContent(a: StudyDraft, b: StudyDraft): boolean {
  return a === b || JSON.stringify(contentOf(a)) === JSON.stringify(contentOf(b));
}

/** Null when there is none, or when it is of an older build and no longer fits. */
export function loadDraft(storage: Storage, studyId: string): StoredStudyDraft | null {
  const text = storage.getItem(keyOf(studyId));
  if (text === null) return null;
  try {
    return storedDraftSchema.safeParse(JSON.parse(text)).data ?? null;
  } catch {
    return null;
  }
}

/** Keeps the draft for this tab; a full storage only costs the safety net. */
export function storeDraft(storage: Storage, studyId: string, stored: StoredStudyDraft | null): void {
  try {
    if (stored === null) storage.removeItem(keyOf(studyId));
    else storage.setItem(keyOf(studyId), JSON.stringify(stored));
  } catch {
    // QuotaExceededError: the edits are still on the page.
  }
}
