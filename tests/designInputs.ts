import type { CapDesign } from '../shared/capDesign.ts';
import type { DesignPoint } from '../shared/designPoint.ts';
import type { OptimiseDesign } from '../shared/optimiseDesign.ts';
import type { ToleranceDesign } from '../shared/toleranceDesign.ts';
import { buildDocument } from './factories.ts';

/** Small design questions about Pt 3 / Co 1 / Pt 5 on silicon, answered in a fraction of a second. */

export const polarPoint: DesignPoint = {
  id: 'polar',
  label: 'Polar 632.8',
  workingPoint: { wavelengthNm: 632.8, angleDeg: 10, input: 'p', magnetization: { mode: 'drawn' } },
};

const tolerance: ToleranceDesign['tolerance'] = {
  ratePercent: 3,
  randomPercent: 2,
  indexPercent: 0,
  voigtPercent: 0,
  materials: [],
  samples: 100,
  seed: 7,
};

/** Pt itself or a transparent cap on a Ti seed, in place of the Pt that is drawn. */
export function buildCapInput(overrides: Partial<CapDesign> = {}): CapDesign {
  return {
    kind: 'cap',
    document: buildDocument(),
    replaces: ['cap'],
    candidates: [
      {
        id: 'pt',
        label: 'Pt',
        layers: [
          {
            medium: { index: [2.33, 4.14], label: 'Pt' },
            leastNm: 2,
            leastSource: 'common practice',
            fixedNm: null,
          },
        ],
      },
      {
        id: 'oxide',
        label: 'Oxide on Ti',
        layers: [
          { medium: { index: 2.2, label: 'oxide' }, leastNm: 3, leastSource: '', fixedNm: null },
          { medium: { index: [2.7, 3.6], label: 'Ti' }, leastNm: 0, leastSource: '', fixedNm: 1 },
        ],
      },
    ],
    range: { fromNm: 1, toNm: 9, points: 9 },
    points: [polarPoint],
    signal: 'rotation',
    demands: { leastReflectance: 0.2 },
    tolerance,
    leastYield: 0.9,
    ...overrides,
  };
}

export function buildOptimiseInput(overrides: Partial<OptimiseDesign> = {}): OptimiseDesign {
  return {
    kind: 'optimise',
    document: buildDocument(),
    variables: [{ layerId: 'cap', fromNm: 0, toNm: 10 }],
    points: [polarPoint],
    goal: { quantity: 'rotation' },
    effort: 'quick',
    seed: 3,
    ...overrides,
  };
}

export function buildToleranceInput(overrides: Partial<ToleranceDesign> = {}): ToleranceDesign {
  return {
    kind: 'tolerance',
    document: buildDocument(),
    points: [polarPoint],
    signal: 'rotation',
    demands: { leastReflectance: 0.2 },
    tolerance,
    ...overrides,
  };
}
