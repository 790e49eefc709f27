import type { MaterialSummary } from '../../../../shared/material.ts';

/**
 * Thicknesses from which a cap is commonly taken to close and to stop oxidation, nm. Rules of the trade that no source
 * is known for; the form says so and lets people put in their own with its source.
 */
const byFormula: Record<string, number> = {
  Pt: 1.5,
  Pd: 1.5,
  Au: 2,
  Ag: 3,
  Cu: 3,
  Al: 2,
  Ta: 2,
  Ti: 2,
  Cr: 2,
  Rh: 1.5,
  Ir: 1.5,
  TiN: 3,
  MgO: 2,
  Al2O3: 2,
  SiO2: 3,
  Si3N4: 3,
  AlN: 3,
};
const byClass: Record<MaterialSummary['class'], number> = {
  magnet: 2,
  noble: 2,
  refractory: 2,
  dielectric: 3,
  semiconductor: 3,
};

export const PRACTICE = 'common practice, no source';

/** A starting value for the least thickness that protects, nm. */
export function leastThicknessStart({
  formula,
  class: material,
}: Pick<MaterialSummary, 'formula' | 'class'>) {
  return byFormula[formula] ?? byClass[material];
}
