import type { z } from 'zod';
import type { Issue } from '../../../../shared/error.ts';
import { describeIssues } from '../../../../shared/issues.ts';
import { renameMaterialSchema } from '../../../../shared/materialEdit.ts';
import type { MaterialDraft } from '../../../../shared/materialEdit.ts';
import { readContent } from './draftOfForm.ts';
import type { MaterialForm } from './form.ts';

const namingSchema = renameMaterialSchema.required();

type Body = z.output<typeof namingSchema> & { versionNote: string; content: MaterialDraft };

/** A whole form as it is saved, or everything that keeps it from being saved. */
export function readForm(form: MaterialForm): { body: Body } | { body: null; issues: Issue[] } {
  const { name, formula, class: materialClass, versionNote } = form;
  const notes = form.notes.split('\n').filter((line) => line.trim() !== '');
  const { draft, issues } = readContent(form.content, { sourcesLater: false });
  // The naming is looked at also where the constants cannot be sent yet, so that everything is said at once.
  const input = { name, formula, class: materialClass, notes };
  const naming = namingSchema.safeParse(input);
  if (naming.success && draft) {
    return { body: { ...naming.data, versionNote: versionNote.trim(), content: draft } };
  }
  return {
    body: null,
    issues: [...(naming.success ? [] : describeIssues(naming.error, input)), ...issues],
  };
}
