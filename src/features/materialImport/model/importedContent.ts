import type { MaterialContent } from '../../../../shared/material.ts';
import { materialDraftSchema } from '../../../../shared/materialEdit.ts';
import type { MaterialDraft } from '../../../../shared/materialEdit.ts';
import type { ImportMapping } from '../../../../shared/materialImport.ts';
import { sourceOf } from './naming.ts';
import type { NamingForm } from './naming.ts';

type Parts = {
  importId: string;
  mapping: ImportMapping;
  form: NamingForm;
  /** Those of the material that gets a new version; what the table does not replace stays as it is. */
  target: MaterialContent | null;
  /** Those of the material that gives N where the table gives none. */
  base: MaterialContent | null;
};

/**
 * The constants that an import makes, put together with those that it leaves alone.
 *
 * @throws ZodError when neither the table nor another material gives N
 */
export function importedContent({ importId, mapping, form, target, base }: Parts): MaterialDraft {
  const imported = { kind: 'import', importId, mapping } as const;
  const kept = target ?? base;
  const { indexSource, voigtSource } = form.content;
  const own = mapping.index !== null && !form.apart ? indexSource : voigtSource;
  return materialDraftSchema.parse({
    index: mapping.index ? imported : kept?.index,
    indexSource: mapping.index ? sourceOf(indexSource) : kept?.indexSource,
    voigt: mapping.voigt ? imported : (target?.voigt ?? null),
    voigtSource: mapping.voigt ? sourceOf(own) : (target?.voigtSource ?? null),
    ...further(target),
  });
}

function further(target: MaterialContent | null) {
  if (!target) return {};
  const { anisotropy, anisotropySource, thermal } = target;
  return {
    ...(anisotropy ? { anisotropy } : {}),
    ...(anisotropySource ? { anisotropySource } : {}),
    ...(thermal ? { thermal } : {}),
  };
}
