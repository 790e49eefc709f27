import type { Material } from '../../../../shared/material.ts';
import { createMaterialSchema, createMaterialVersionSchema } from '../../../../shared/materialEdit.ts';
import type { ImportMapping } from '../../../../shared/materialImport.ts';
import type { KeepImported } from '../api/keepImported.ts';
import { importedContent } from './importedContent.ts';
import { namesOf } from './naming.ts';
import type { NamingForm } from './naming.ts';

type Kept = {
  groupId: string;
  importId: string;
  mapping: ImportMapping;
  form: NamingForm;
  target: Material | null;
  indexFrom: Material | null;
};

/** What is sent to keep an import: a version of the target where there is one, else a material of its own. */
export function keepRequest({ groupId, form, target, indexFrom, ...rest }: Kept): KeepImported {
  const content = importedContent({
    ...rest,
    form,
    target: target?.content ?? null,
    base: indexFrom?.content ?? null,
  });
  if (target) {
    const body = { version: target.version, note: form.versionNote.trim(), content };
    return { kind: 'version', materialId: target.id, body: createMaterialVersionSchema.parse(body) };
  }
  return { kind: 'material', groupId, body: createMaterialSchema.parse({ ...namesOf(form), content }) };
}

/** What is sent for a file that Skewlight exported: its constants and sources are in it. */
export function keepExportedRequest(groupId: string, importId: string, form: NamingForm): KeepImported {
  const body = createMaterialSchema.parse({ ...namesOf(form), exportedBy: importId });
  return { kind: 'material', groupId, body };
}
