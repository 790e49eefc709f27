import { z } from 'zod';
import { signHabitsSchema } from '../../../../shared/materialImport.ts';
import type { ImportTable } from '../../../../shared/materialImport.ts';
import { columnPlanSchema, planOf } from './columnPlan.ts';
import { emptyNaming, namingFormSchema } from './naming.ts';

/** Everything a person said about one import, as it survives a reload of the tab. */
const importDraftSchema = z.object({
  plan: columnPlanSchema,
  answers: signHabitsSchema.partial(),
  naming: namingFormSchema,
});

export type ImportDraft = z.infer<typeof importDraftSchema>;

const keyOf = (importId: string) => `skewlight.import.${importId}`;

/** What was kept for this table, or a fresh start from what the server suggests; habits are never suggested. */
export function loadImportDraft(storage: Storage, importId: string, table: ImportTable): ImportDraft {
  const fresh = { plan: planOf(table), answers: {}, naming: emptyNaming };
  try {
    const kept = importDraftSchema.safeParse(JSON.parse(storage.getItem(keyOf(importId)) ?? 'null')).data;
    return kept?.plan.roles.length === table.columns.length ? kept : fresh;
  } catch {
    return fresh;
  }
}

/** Keeps the draft for this tab; a full storage only costs the safety net. */
export function storeImportDraft(storage: Storage, importId: string, draft: ImportDraft | null): void {
  try {
    if (draft === null) storage.removeItem(keyOf(importId));
    else storage.setItem(keyOf(importId), JSON.stringify(draft));
  } catch {
    // QuotaExceededError: the answers are still on the page.
  }
}
