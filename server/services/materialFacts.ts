import type { MaterialContent, MaterialSummary } from '../../shared/material.ts';
import { indexRangeNm, voigtRangeNm } from '../../worker/dispersion/range.ts';

/** What a list says of one version of a material: follows from its content alone, and never changes. */
export type MaterialFacts = Omit<
  MaterialSummary,
  'id' | 'version' | 'name' | 'formula' | 'class' | 'groupId' | 'preferred' | 'updatedAt'
>;

export function materialFacts(content: MaterialContent): MaterialFacts {
  const { index, indexSource, voigt, voigtSource, anisotropy } = content;
  return {
    rangeNm: indexRangeNm(content),
    voigtRangeNm: voigtRangeNm(content),
    citation: indexSource.citation,
    confidence: indexSource.confidence,
    voigtConfidence: voigtSource?.confidence ?? null,
    indexKind: index.kind,
    voigtKind: voigt?.kind ?? null,
    anisotropy: index.kind === 'tensor' ? 'tensor' : (anisotropy?.kind ?? null),
  };
}
