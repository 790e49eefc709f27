import type { ReadingName } from './run.ts';
import type { SolveOutput, SolvePoint } from './solve.ts';
import { ellipseAt } from './stokes.ts';
import { foldDegrees } from './units.ts';

/** What a reader needs to know of a reading: its name on screen, symbol, unit and place on the conventions page. */
export type ReadingDefinition = {
  label: string;
  symbol: string;
  unit: 'deg' | '1';
  /** Of the incident light; null for a reading that belongs to both, or to light of another polarization. */
  polarization: 'p' | 's' | null;
  family: ReadingFamily;
  /** Anchor on /conventions. */
  anchor: string;
};

export type ReadingFamily =
  | 'rotation'
  | 'ellipticity'
  | 'reflectance'
  | 'cross'
  | 'contrast'
  | 'transmittance'
  | 'absorptance'
  | 'ceiling'
  | 'odd'
  | 'even'
  | 'faraday'
  | 'part'
  | 'circular'
  | 'azimuth';

const define = (
  label: string,
  symbol: string,
  unit: 'deg' | '1',
  polarization: ReadingDefinition['polarization'],
  family: ReadingFamily,
  anchor: string,
): ReadingDefinition => ({ label, symbol, unit, polarization, family, anchor });

export const readingDefinitions: Record<ReadingName, ReadingDefinition> = {
  rotationP: define('Kerr rotation, p light', 'φ_p', 'deg', 'p', 'rotation', 'kerr-rotation'),
  ellipticityP: define('Kerr ellipticity, p light', 'χ_p', 'deg', 'p', 'ellipticity', 'kerr-ellipticity'),
  rotationS: define('Kerr rotation, s light', 'φ_s', 'deg', 's', 'rotation', 'kerr-rotation'),
  ellipticityS: define('Kerr ellipticity, s light', 'χ_s', 'deg', 's', 'ellipticity', 'kerr-ellipticity'),
  reflectanceP: define('Reflectance, p light', 'R_p', '1', 'p', 'reflectance', 'reflectance'),
  reflectanceS: define('Reflectance, s light', 'R_s', '1', 's', 'reflectance', 'reflectance'),
  crossSp: define('Cross-polarized amplitude, p in, s out', '|r_sp|', '1', 'p', 'cross', 'cross-polarized'),
  crossPs: define('Cross-polarized amplitude, s in, p out', '|r_ps|', '1', 's', 'cross', 'cross-polarized'),
  contrastP: define('Transverse contrast, p light', 'C_p', '1', 'p', 'contrast', 'transverse-contrast'),
  contrastS: define('Transverse contrast, s light', 'C_s', '1', 's', 'contrast', 'transverse-contrast'),
  transmittanceP: define('Transmittance, p light', 'T_p', '1', 'p', 'transmittance', 'transmittance'),
  transmittanceS: define('Transmittance, s light', 'T_s', '1', 's', 'transmittance', 'transmittance'),
  absorptanceP: define('Absorptance, p light', 'A_p', '1', 'p', 'absorptance', 'absorptance'),
  absorptanceS: define('Absorptance, s light', 'A_s', '1', 's', 'absorptance', 'absorptance'),
  ceilingShare: define(
    'Share of the ceiling reached, first order',
    '|r_sp|/C',
    '1',
    null,
    'ceiling',
    'ceiling',
  ),
  stackCeiling: define(
    'Ceiling of |r_sp| in this stack, first order',
    'C_stack',
    '1',
    null,
    'ceiling',
    'ceiling',
  ),
  oddRotationP: define('Kerr rotation odd in m, p light', 'φ_p odd', 'deg', 'p', 'odd', 'odd-even'),
  oddEllipticityP: define('Kerr ellipticity odd in m, p light', 'χ_p odd', 'deg', 'p', 'odd', 'odd-even'),
  oddRotationS: define('Kerr rotation odd in m, s light', 'φ_s odd', 'deg', 's', 'odd', 'odd-even'),
  oddEllipticityS: define('Kerr ellipticity odd in m, s light', 'χ_s odd', 'deg', 's', 'odd', 'odd-even'),
  evenRotationP: define('Kerr rotation even in m, p light', 'φ_p even', 'deg', 'p', 'even', 'odd-even'),
  evenEllipticityP: define('Kerr ellipticity even in m, p light', 'χ_p even', 'deg', 'p', 'even', 'odd-even'),
  evenRotationS: define('Kerr rotation even in m, s light', 'φ_s even', 'deg', 's', 'even', 'odd-even'),
  evenEllipticityS: define('Kerr ellipticity even in m, s light', 'χ_s even', 'deg', 's', 'even', 'odd-even'),
  faradayRotationP: define('Faraday rotation, p light', 'φ_F,p', 'deg', 'p', 'faraday', 'faraday'),
  faradayEllipticityP: define('Faraday ellipticity, p light', 'χ_F,p', 'deg', 'p', 'faraday', 'faraday'),
  faradayRotationS: define('Faraday rotation, s light', 'φ_F,s', 'deg', 's', 'faraday', 'faraday'),
  faradayEllipticityS: define('Faraday ellipticity, s light', 'χ_F,s', 'deg', 's', 'faraday', 'faraday'),
  polarPart: define('Polar-like part of the cross amplitudes', '|r_sp + r_ps|/2', '1', null, 'part', 'parts'),
  longitudinalPart: define(
    'Longitudinal-like part of the cross amplitudes',
    '|r_sp − r_ps|/2',
    '1',
    null,
    'part',
    'parts',
  ),
  circularContrast: define(
    'Contrast of circular light',
    'C_circ',
    '1',
    null,
    'circular',
    'circular-contrast',
  ),
  rotationAtAzimuth: define(
    'Kerr rotation at the input azimuth',
    'φ_α',
    'deg',
    null,
    'azimuth',
    'input-azimuth',
  ),
  ellipticityAtAzimuth: define(
    'Kerr ellipticity at the input azimuth',
    'χ_α',
    'deg',
    null,
    'azimuth',
    'input-azimuth',
  ),
};

/** The parts of a solved point that not every reading needs; `outputs` of the solve contract asks for them. */
type Explained = Pick<SolvePoint, 'faraday' | 'ceiling' | 'mueller'>;

/** The part of a solved point that the readings are made of; the worker and the client both hold it. */
export type ReadingSource = Pick<SolvePoint, 'R' | 'T' | 'A' | 'kerr'> &
  Explained & {
    /** Null where intensities add and there is no amplitude. */
    r: Pick<NonNullable<SolvePoint['r']>, 'sp' | 'ps'> | null;
  };

/** What a case must name in `outputs` for a reading, in each state that the reading uses. */
export function outputFor(name: ReadingName): Exclude<SolveOutput, 'contributions' | 'depth'> | null {
  switch (readingDefinitions[name].family) {
    case 'ceiling':
      return 'ceiling';
    case 'faraday':
      return 'faraday';
    case 'circular':
    case 'azimuth':
      return 'mueller';
    default:
      return null;
  }
}

/** Which states beside the given one a reading compares with. */
export function comparedStates(name: ReadingName): { zero: boolean; reversed: boolean } {
  switch (readingDefinitions[name].family) {
    case 'rotation':
    case 'ellipticity':
    case 'faraday':
    case 'azimuth':
      return { zero: true, reversed: false };
    case 'contrast':
    case 'odd':
      return { zero: false, reversed: true };
    case 'even':
      return { zero: true, reversed: true };
    default:
      return { zero: false, reversed: false };
  }
}

/**
 * One reading from the three states of one point (physics.md section 4). A state that the reading does not compare
 * with may be any.
 *
 * Kerr rotation and ellipticity are the change that magnetization makes, against the same stack with m = 0; the
 * contrast and the odd part compare m with -m. Null where the beam is too weak to have a polarization, where there
 * is no such beam, and where the part of the point that it needs was not solved for.
 *
 * @param azimuthDeg of the input, for the readings at the input azimuth: `inputAzimuthOf(workingPoint)`
 */
export function readingOf(
  name: ReadingName,
  given: ReadingSource,
  zero: ReadingSource,
  reversed: ReadingSource,
  azimuthDeg = 0,
): number | null {
  switch (name) {
    case 'rotationP':
      return change(given.kerr.p?.rotationDeg, zero.kerr.p?.rotationDeg, true);
    case 'rotationS':
      return change(given.kerr.s?.rotationDeg, zero.kerr.s?.rotationDeg, true);
    case 'ellipticityP':
      return change(given.kerr.p?.ellipticityDeg, zero.kerr.p?.ellipticityDeg, false);
    case 'ellipticityS':
      return change(given.kerr.s?.ellipticityDeg, zero.kerr.s?.ellipticityDeg, false);
    case 'reflectanceP':
      return given.R.p;
    case 'reflectanceS':
      return given.R.s;
    case 'crossSp':
      return given.r && Math.hypot(...given.r.sp);
    case 'crossPs':
      return given.r && Math.hypot(...given.r.ps);
    case 'contrastP':
      return contrast(given.R.p, reversed.R.p);
    case 'contrastS':
      return contrast(given.R.s, reversed.R.s);
    case 'transmittanceP':
      return given.T.p;
    case 'transmittanceS':
      return given.T.s;
    case 'absorptanceP':
      return given.A.p;
    case 'absorptanceS':
      return given.A.s;
    case 'ceilingShare':
      return given.ceiling?.shareReached ?? null;
    case 'stackCeiling':
      return given.ceiling?.stack ?? null;
    case 'oddRotationP':
      return half(change(given.kerr.p?.rotationDeg, reversed.kerr.p?.rotationDeg, true));
    case 'oddEllipticityP':
      return half(change(given.kerr.p?.ellipticityDeg, reversed.kerr.p?.ellipticityDeg, false));
    case 'oddRotationS':
      return half(change(given.kerr.s?.rotationDeg, reversed.kerr.s?.rotationDeg, true));
    case 'oddEllipticityS':
      return half(change(given.kerr.s?.ellipticityDeg, reversed.kerr.s?.ellipticityDeg, false));
    case 'evenRotationP':
    case 'evenEllipticityP':
    case 'evenRotationS':
    case 'evenEllipticityS':
      return evenPart(name, given, zero, reversed);
    case 'faradayRotationP':
      return change(given.faraday?.p?.rotationDeg, zero.faraday?.p?.rotationDeg, true);
    case 'faradayEllipticityP':
      return change(given.faraday?.p?.ellipticityDeg, zero.faraday?.p?.ellipticityDeg, false);
    case 'faradayRotationS':
      return change(given.faraday?.s?.rotationDeg, zero.faraday?.s?.rotationDeg, true);
    case 'faradayEllipticityS':
      return change(given.faraday?.s?.ellipticityDeg, zero.faraday?.s?.ellipticityDeg, false);
    case 'polarPart':
      return crossPart(given, 1);
    case 'longitudinalPart':
      return crossPart(given, -1);
    case 'circularContrast':
      return circularContrast(given.mueller);
    case 'rotationAtAzimuth':
      return changeAtAzimuth('rotationDeg', given, zero, azimuthDeg);
    case 'ellipticityAtAzimuth':
      return changeAtAzimuth('ellipticityDeg', given, zero, azimuthDeg);
  }
}

function change(angle: number | undefined, reference: number | undefined, fold: boolean): number | null {
  if (angle === undefined || reference === undefined) return null;
  return fold ? foldDegrees(angle - reference) : angle - reference;
}

function contrast(given: number, reversed: number): number | null {
  const sum = given + reversed;
  return sum > 0 ? (given - reversed) / sum : null;
}

function half(value: number | null): number | null {
  return value === null ? null : value / 2;
}

const changeNames = {
  evenRotationP: 'rotationP',
  evenEllipticityP: 'ellipticityP',
  evenRotationS: 'rotationS',
  evenEllipticityS: 'ellipticityS',
} as const;

/** Half the sum of the changes that m and -m make. */
function evenPart(
  name: keyof typeof changeNames,
  given: ReadingSource,
  zero: ReadingSource,
  reversed: ReadingSource,
): number | null {
  const byGiven = readingOf(changeNames[name], given, zero, reversed);
  const byReversed = readingOf(changeNames[name], reversed, zero, given);
  return byGiven === null || byReversed === null ? null : (byGiven + byReversed) / 2;
}

/** |r_sp + r_ps| / 2, or of the difference. */
function crossPart({ r }: ReadingSource, sign: 1 | -1): number | null {
  return r && Math.hypot(r.sp[0] + sign * r.ps[0], r.sp[1] + sign * r.ps[1]) / 2;
}

/** (R+ - R-) / (R+ + R-): with S = (1, 0, 0, +-1) coming in, the intensities are M00 +- M03. */
function circularContrast(mueller: ReadingSource['mueller']): number | null {
  const [even, , , odd] = mueller?.[0] ?? [];
  return even === undefined || odd === undefined || even <= 0 ? null : odd / even;
}

function changeAtAzimuth(
  angle: 'rotationDeg' | 'ellipticityDeg',
  given: ReadingSource,
  zero: ReadingSource,
  azimuthDeg: number,
): number | null {
  if (!given.mueller || !zero.mueller) return null;
  const magnetized = ellipseAt(given.mueller, azimuthDeg);
  const unmagnetized = ellipseAt(zero.mueller, azimuthDeg);
  return change(magnetized?.[angle], unmagnetized?.[angle], angle === 'rotationDeg');
}
