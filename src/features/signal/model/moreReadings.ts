import { readingDefinitions, readingOf } from '../../../../shared/readings.ts';
import type { ReadingName } from '../../../../shared/run.ts';
import type { SolvePoint, SolveResponse } from '../../../../shared/solve.ts';
import { formatAngle, formatNumber } from '../../../lib/format.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import { modulus } from './shares.ts';

/** One line of the table: its name leads to its definition; printed values, null where there is none. */
export type MoreRow = { label: string; anchor: string; p: string | null; s: string | null };

/** The given, unmagnetized and reversed film at the working point. */
export type ThreeStates = { given: SolvePoint; zero: SolvePoint; reversed: SolvePoint };

export function threeStates(response: SolveResponse | null): ThreeStates | null {
  const [given, zero, reversed] = (response?.results ?? []).map(({ points }) => points[0]);
  return given && zero && reversed ? { given, zero, reversed } : null;
}

const pairs: readonly (readonly [label: string, p: ReadingName, s: ReadingName])[] = [
  ['Rotation, odd in m', 'oddRotationP', 'oddRotationS'],
  ['Ellipticity, odd in m', 'oddEllipticityP', 'oddEllipticityS'],
  ['Rotation, even in m', 'evenRotationP', 'evenRotationS'],
  ['Ellipticity, even in m', 'evenEllipticityP', 'evenEllipticityS'],
  ['Transverse contrast', 'contrastP', 'contrastS'],
  ['Faraday rotation', 'faradayRotationP', 'faradayRotationS'],
  ['Faraday ellipticity', 'faradayEllipticityP', 'faradayEllipticityS'],
  ['Transmittance', 'transmittanceP', 'transmittanceS'],
  ['Absorptance', 'absorptanceP', 'absorptanceS'],
];

/** Readings that p and s light have each. */
export function pairRows(states: ThreeStates, unit: AngleUnit): MoreRow[] {
  const rows = pairs.map(([label, p, s]): MoreRow => {
    const print = (name: ReadingName) => printReading(name, valueOf(name, states), unit);
    return { label, anchor: readingDefinitions[p].anchor, p: print(p), s: print(s) };
  });
  const { degreeOfPolarization } = states.given;
  if (!degreeOfPolarization) return rows;
  const { p, s } = degreeOfPolarization;
  const print = (value: number) => formatNumber(value, { digits: 5 });
  return [
    { label: 'Degree of polarization', anchor: 'degree-of-polarization', p: print(p), s: print(s) },
    ...rows,
  ];
}

/** Readings of the film as a whole. */
export function singleRows(
  states: ThreeStates,
  unit: AngleUnit,
): { label: string; anchor: string; value: string | null }[] {
  const { contributions, ceiling } = states.given;
  const row = (label: string, name: ReadingName) => ({
    label,
    anchor: readingDefinitions[name].anchor,
    value: printReading(name, valueOf(name, states), unit),
  });
  const difference = contributions
    ? Math.hypot(
        contributions.exact.sp[0] - contributions.total.sp[0],
        contributions.exact.sp[1] - contributions.total.sp[1],
      )
    : null;
  return [
    {
      label: '|r_sp| to first order',
      anchor: 'layer-shares',
      value: contributions ? thousandths(modulus(contributions.total.sp)) : null,
    },
    {
      label: 'what first order leaves out',
      anchor: 'layer-shares',
      value: difference === null ? null : thousandths(difference, 3),
    },
    row('Polar-like part', 'polarPart'),
    row('Longitudinal-like part', 'longitudinalPart'),
    row('Ceiling in this film', 'stackCeiling'),
    {
      label: 'Ceiling of its material',
      anchor: 'ceiling',
      value: ceiling?.material == null ? null : thousandths(ceiling.material),
    },
    row('Circular contrast', 'circularContrast'),
  ];
}

/** Rotation and ellipticity for linear input of any azimuth. */
export function azimuthReadings(states: ThreeStates, azimuthDeg: number, unit: AngleUnit) {
  const print = (name: 'rotationAtAzimuth' | 'ellipticityAtAzimuth') =>
    printReading(name, valueOf(name, states, azimuthDeg), unit);
  return { rotation: print('rotationAtAzimuth'), ellipticity: print('ellipticityAtAzimuth') };
}

function valueOf(name: ReadingName, states: ThreeStates, azimuthDeg = 0): number | null {
  return readingOf(name, states.given, states.zero, states.reversed, azimuthDeg);
}

/** Below this an angle in degrees, or a contrast, is the rounding of doubles and not a signal. */
const ROUNDING = 1e-12;

/** A reading with its unit; null where it does not exist. */
export function printReading(name: ReadingName, value: number | null, unit: AngleUnit): string | null {
  if (value === null) return null;
  const { unit: stored, family } = readingDefinitions[name];
  if (stored === 'deg')
    return Math.abs(value) < ROUNDING ? `0 ${unit}` : `${formatAngle(value, unit)} ${unit}`;
  if (family === 'transmittance' || family === 'absorptance' || family === 'reflectance') {
    return Math.abs(value) < ROUNDING ? '0' : formatNumber(value);
  }
  if (Math.abs(value) < ROUNDING) return '0';
  return thousandths(value, 4, family === 'contrast' || family === 'circular');
}

/** A small number without unit in thousandths. */
export function thousandths(value: number, digits = 4, signed = false): string {
  if (value === 0) return '0';
  // Its own power of ten where thousandths would need another one.
  if (Math.abs(value) < 1e-6) return formatNumber(value, { digits, signed });
  return `${formatNumber(value * 1000, { digits, signed })} × 10⁻³`;
}
