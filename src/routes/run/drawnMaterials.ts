import { materialClasses } from '../../../shared/material.ts';
import type { UsedMaterial } from '../../../shared/run.ts';
import { versionKey } from '../../features/stacks/model/media.ts';
import type { DrawnMaterial, Materials } from '../../features/stacks/model/media.ts';

/** The materials of a run as the drawing takes them, each as it was in the version that was used. */
export function drawnMaterials(used: readonly UsedMaterial[]): Materials {
  return new Map(
    used.flatMap((material) => {
      const drawn: DrawnMaterial = {
        version: material.version,
        formula: material.formula,
        class: materialClasses.find((one) => one === material.class) ?? 'refractory',
        rangeNm: material.rangeNm,
        voigtRangeNm: material.voigtRangeNm,
        voigtConfidence: material.voigtSource?.confidence ?? null,
        // The drawing of a stored run shows each m as it was given; it does not ask what could be magnetic.
        anisotropy: null,
      };
      return [[material.id, drawn] as const, [versionKey(material.id, material.version), drawn] as const];
    }),
  );
}
