import type { Material } from '../../../../shared/material.ts';
import { materialDraftSchema } from '../../../../shared/materialEdit.ts';
import type { MaterialDraft } from '../../../../shared/materialEdit.ts';
import type { ImportMapping } from '../../../../shared/materialImport.ts';
import { sourceOf } from './naming.ts';
import type { NamingForm } from './naming.ts';

type Parts = {
  importId: string;
  mapping: ImportMapping;
  form: NamingForm;
  /** The material that gets a new version; what the table does not replace stays as it is. */
  target: Material | null;
  /** The material that gives N where the table gives none. */
  indexFrom: Material | null;
};

/**
 * The constants that an import makes, put together with those that it leaves alone.
 *
 * @throws ZodError when neither the table nor another material gives N
 */
export function importedContent({ importId, mapping, form, target, indexFrom }: Parts): MaterialDraft {
  const imported = { kind: 'import', importId, mapping } as const;
  const base = (target ?? indexFrom)?.content;
  const { indexSource, voigtSource } = form.content;
  const own = mapping.index !== null && !form.apart ? indexSource : voigtSource;
  return materialDraftSchema.parse({
    index: mapping.index ? imported : base?.index,
    indexSource: mapping.index ? sourceOf(indexSource) : base?.indexSource,
    voigt: mapping.voigt ? imported : (target?.content.voigt ?? null),
    voigtSource: mapping.voigt ? sourceOf(own) : (target?.content.voigtSource ?? null),
    ...kept(target),
  });
}

function kept(target: Material | null) {
  if (!target) return {};
  const { anisotropy, anisotropySource, thermal } = target.content;
  return {
    ...(anisotropy ? { anisotropy } : {}),
    ...(anisotropySource ? { anisotropySource } : {}),
    ...(thermal ? { thermal } : {}),
  };
}
