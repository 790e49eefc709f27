import type { CapPointCurves, CapResult } from '../../../../shared/capDesign.ts';
import type { PointReadingName, SignalName } from '../../../../shared/designPoint.ts';
import type { GoalQuantity } from '../../../../shared/optimiseDesign.ts';
import type { PlotTone } from '../../../components/plot/plotTypes.ts';
import { formatNumber } from '../../../lib/format.ts';

/** How a quantity of a design is called, scaled and printed. `scale` takes a value of the API to the unit on screen. */
export type Quantity = {
  label: string;
  unit: string;
  scale: number;
  tone: PlotTone;
  signed?: boolean;
  /** Stands over the axis of what has no unit. */
  symbol?: string;
};

const rotation = {
  label: 'Kerr rotation',
  unit: 'mdeg',
  scale: 1000,
  tone: 'rotation',
  signed: true,
} as const;
const ellipticity = {
  label: 'Kerr ellipticity',
  unit: 'mdeg',
  scale: 1000,
  tone: 'ellipticity',
  signed: true,
} as const;
const amplitude = {
  label: 'cross-polarized amplitude',
  unit: '',
  scale: 1,
  tone: 'ink',
  symbol: '|r|',
} as const;
const contrast = {
  label: 'transverse contrast',
  unit: '',
  scale: 1,
  tone: 'ink',
  signed: true,
  symbol: 'C',
} as const;
const reflectance = { label: 'reflectance', unit: '', scale: 1, tone: 'reflectance', symbol: 'R' } as const;
const ceilingShare = { label: 'share of the ceiling', unit: '%', scale: 100, tone: 'ink' } as const;

export const readingQuantities: Record<PointReadingName, Quantity> = {
  rotationDeg: rotation,
  ellipticityDeg: ellipticity,
  amplitude,
  contrast,
  reflectance,
  ceilingShare,
};

/** The signal counts by its size, whatever its sign. */
export const signalQuantities: Record<SignalName, Quantity> = {
  rotation: { ...rotation, label: '|Kerr rotation|', signed: false },
  ellipticity: { ...ellipticity, label: '|Kerr ellipticity|', signed: false },
  amplitude,
  contrast: { ...contrast, label: '|transverse contrast|', signed: false },
};

export const goalQuantityLooks: Record<GoalQuantity, Quantity & { better: 'greater' | 'less' }> = {
  rotation: { ...signalQuantities.rotation, better: 'greater' },
  ellipticity: { ...signalQuantities.ellipticity, better: 'greater' },
  amplitude: { ...amplitude, better: 'greater' },
  contrast: { ...signalQuantities.contrast, better: 'greater' },
  'zero ellipticity': { ...signalQuantities.ellipticity, better: 'less' },
  insensitivity: {
    label: 'change of rotation per nm, relative',
    unit: '% per nm',
    scale: 100,
    tone: 'ink',
    better: 'less',
  },
  'least reflectance': { ...reflectance, better: 'less' },
};

export const capQuantityNames = [
  'signal',
  'rotationDeg',
  'ellipticityDeg',
  'amplitude',
  'contrast',
  'reflectance',
  'slopePercentPerNm',
  'costPercent',
  'ceilingShare',
  'yield',
] as const;
export type CapQuantityName = (typeof capQuantityNames)[number];

export function capQuantity(name: CapQuantityName, signal: SignalName): Quantity {
  switch (name) {
    case 'signal':
      return signalQuantities[signal];
    case 'slopePercentPerNm':
      return { label: 'change of the signal', unit: '% per nm', scale: 1, tone: 'ink', signed: true };
    case 'costPercent':
      return { label: 'cost against no cap', unit: '%', scale: 1, tone: 'ink', signed: true };
    case 'yield':
      return { label: 'films that meet all demands', unit: '%', scale: 100, tone: 'ink' };
    default:
      return readingQuantities[name];
  }
}

/** The curve of a quantity as the API gives it; the yield belongs to all working points at once. */
export function capCurve(
  candidate: CapResult['candidates'][number],
  point: CapPointCurves,
  name: CapQuantityName,
): (number | null)[] {
  return name === 'yield' ? candidate.yield : point[name];
}

/** The value without a cap, null for quantities that are told of a cap only. */
export function bareValue(bare: CapResult['bare'][number] | undefined, name: CapQuantityName): number | null {
  if (!bare) return null;
  switch (name) {
    case 'signal':
      return bare.signal;
    case 'slopePercentPerNm':
    case 'costPercent':
    case 'yield':
      return null;
    default:
      return bare.readings[name];
  }
}

/** Over a y axis, where the quantity is named by the heading or its control. */
export function unitLabel({ unit, symbol }: Quantity): string {
  return unit || (symbol ?? '1');
}

export function axisLabel({ label, unit }: Quantity): string {
  return unit ? `${label} (${unit})` : label;
}

/** A value of the API as printed, unit included; a dash where there is none. */
export function printQuantity({ scale, unit, signed }: Quantity, value: number | null, digits = 4): string {
  if (value === null) return '–';
  const number = formatNumber(value * scale, { digits, signed: signed ?? false });
  return unit ? `${number}\u00a0${unit}` : number;
}
