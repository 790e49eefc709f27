import type { CapCandidate } from '../../../../shared/capDesign.ts';
import type { MaterialSummary } from '../../../../shared/material.ts';
import { formatFormula } from '../../../lib/format.ts';
import { PRACTICE, leastThicknessStart } from './leastThickness.ts';

/** What the first question begins with besides the present cap, as far as the library has it. */
const usualCaps = ['Pt', 'Au', 'Ta', 'SiO2'];

/**
 * A cap of one material, or of two in the order in which light meets them; the upper one is swept and the lower one
 * starts at its least thickness.
 */
export function newCandidate(materials: readonly MaterialSummary[]): CapCandidate {
  return {
    id: crypto.randomUUID().slice(0, 13),
    label: materials.map(({ formula }) => formatFormula(formula)).join(' / '),
    layers: materials.map((material, position) => ({
      medium: { material: material.id, version: material.version },
      leastNm: leastThicknessStart(material),
      leastSource: PRACTICE,
      fixedNm: position === 0 ? null : leastThicknessStart(material),
    })),
  };
}

/** Caps to begin with: the usual ones whose constants are known at the wavelength, the preferred source of each. */
export function startCandidates(library: readonly MaterialSummary[], wavelengthNm: number): CapCandidate[] {
  return usualCaps.flatMap((formula) => {
    const known = library.filter(
      (material) =>
        material.formula === formula &&
        material.voigtRangeNm === null &&
        material.rangeNm[0] <= wavelengthNm &&
        wavelengthNm <= material.rangeNm[1],
    );
    const chosen = known.find(({ preferred }) => preferred) ?? known[0];
    return chosen ? [newCandidate([chosen])] : [];
  });
}
