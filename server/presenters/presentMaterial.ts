import type { Material as PresentedMaterial, MaterialContent, MaterialSummary } from '../../shared/material.ts';
import { materialCurves } from '../../worker/dispersion/materialCurves.ts';
import { dispersionRangeNm } from '../../worker/dispersion/range.ts';
import type { Material } from '../models/material.ts';

/** @param version the one that `content` is of, not always the newest */
export function presentMaterialSummary(
  material: Material,
  version: number,
  content: MaterialContent,
): MaterialSummary {
  return {
    id: material.id,
    version,
    name: material.name,
    formula: material.formula,
    class: material.class,
    groupId: material.groupId,
    rangeNm: dispersionRangeNm(content.index),
    voigtRangeNm: content.voigt && dispersionRangeNm(content.voigt),
    preferred: material.preferred,
    citation: content.indexSource.citation,
    confidence: content.indexSource.confidence,
    voigtConfidence: content.voigtSource?.confidence ?? null,
  };
}

export function presentMaterial(
  material: Material,
  version: number,
  content: MaterialContent,
): PresentedMaterial {
  return {
    ...presentMaterialSummary(material, version, content),
    content,
    curves: materialCurves(content),
    notes: material.notes,
  };
}
