import type { MaterialSummary } from '../../../shared/material.ts';
import type { StackDocument, StackLayer, StackMedium, WorkingPoint } from '../../../shared/stack.ts';

export const stackTemplates = ['pt-co-pt', 'blank'] as const;
export type StackTemplate = (typeof stackTemplates)[number];

export const templateTexts: Record<StackTemplate, { label: string; hint: string }> = {
  'pt-co-pt': {
    label: 'Pt/Co/Pt on oxidised silicon',
    hint: 'Pt 3, Co 1 (polar), Pt 5, Ta 5, SiO₂ 100 nm on Si; change any of it.',
  },
  blank: { label: 'Blank', hint: 'Air on silicon, no layers yet.' },
};

/** The laser line at which the shipped magneto-optic constants are known. */
const workingPoint: WorkingPoint = {
  wavelengthNm: 632.8,
  angleDeg: 60,
  input: 'p',
  magnetization: { mode: 'drawn' },
};

const air: StackMedium = { index: 1, label: 'air' };

/** Where sweeps over wavelength usually go; a source that covers it is of more use than one that does not. */
const visibleNm = [400, 800] as const;

/**
 * The document a new stack starts with. Materials are chosen from the library by formula, among those known at the
 * working point: for a magnet one with a Voigt constant there, then sources that cover the visible range, then the
 * preferred one.
 *
 * @throws Error that names the formula which the library lacks
 */
export function documentOf(template: StackTemplate, materials: readonly MaterialSummary[]): StackDocument {
  const medium = (formula: string): StackMedium => {
    const known = materials.filter(
      (material) => material.formula === formula && covers(material.rangeNm, workingPoint.wavelengthNm),
    );
    const chosen = known.reduce<MaterialSummary | undefined>(
      (best, one) => (best === undefined || worth(one) > worth(best) ? one : best),
      undefined,
    );
    if (!chosen) {
      throw new Error(
        `The library has no ${formula} at ${workingPoint.wavelengthNm} nm; start with a blank stack.`,
      );
    }
    return { material: chosen.id, version: chosen.version };
  };
  const layer = (id: string, formula: string, thicknessNm: number, rest: Partial<StackLayer> = {}) => ({
    id,
    medium: medium(formula),
    thicknessNm,
    ...rest,
  });
  const layers =
    template === 'blank'
      ? []
      : [
          layer('cap', 'Pt', 3, { note: 'cap' }),
          layer('film', 'Co', 1, { m: [0, 0, 1] }),
          layer('seed', 'Pt', 5),
          layer('buffer', 'Ta', 5, { note: 'buffer' }),
          layer('oxide', 'SiO2', 100),
        ];
  return { incident: air, layers, substrate: medium('Si'), workingPoint };
}

function covers([from, to]: readonly [number, number], wavelengthNm: number): boolean {
  return from <= wavelengthNm && wavelengthNm <= to;
}

function worth({ voigtRangeNm, rangeNm, preferred }: MaterialSummary): number {
  const magnetic = voigtRangeNm !== null && covers(voigtRangeNm, workingPoint.wavelengthNm);
  const visible = visibleNm.every((end) => covers(rangeNm, end));
  return (magnetic ? 4 : 0) + (visible ? 2 : 0) + (preferred ? 1 : 0);
}
