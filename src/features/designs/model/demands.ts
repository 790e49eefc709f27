import type { Demands } from '../../../../shared/designPoint.ts';

export const demandNames = [
  'leastRotationDeg',
  'leastAmplitude',
  'leastContrast',
  'leastReflectance',
  'mostEllipticityDeg',
  'mostSlopePercentPerNm',
] as const satisfies readonly (keyof Demands)[];
export type DemandName = (typeof demandNames)[number];

type Look = {
  label: string;
  bound: 'at least' | 'at most';
  /** On screen; `scale` takes the value of the API to it. */
  unit: string;
  scale: number;
  /** In the unit on screen, for a demand that is switched on. */
  start: number;
  step: number;
};

/** How demands are worded and entered. The starting values are common practice without a source, to be edited. */
export const demandLooks: Record<DemandName, Look> = {
  leastRotationDeg: {
    label: '|Kerr rotation|',
    bound: 'at least',
    unit: 'mdeg',
    scale: 1000,
    start: 10,
    step: 1,
  },
  leastAmplitude: {
    label: 'cross-polarized amplitude',
    bound: 'at least',
    unit: '',
    scale: 1,
    start: 1e-4,
    step: 1e-5,
  },
  leastContrast: {
    label: '|transverse contrast|',
    bound: 'at least',
    unit: '',
    scale: 1,
    start: 1e-3,
    step: 1e-4,
  },
  leastReflectance: { label: 'reflectance', bound: 'at least', unit: '', scale: 1, start: 0.1, step: 0.01 },
  mostEllipticityDeg: {
    label: '|Kerr ellipticity|',
    bound: 'at most',
    unit: 'mdeg',
    scale: 1000,
    start: 20,
    step: 1,
  },
  mostSlopePercentPerNm: {
    label: 'change of the signal',
    bound: 'at most',
    unit: '% per nm',
    scale: 1,
    start: 10,
    step: 1,
  },
};
