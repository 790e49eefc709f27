import type { ReadingName } from './run.ts';
import type { SolvePoint } from './solve.ts';
import { foldDegrees } from './units.ts';

/** What a reader needs to know of a reading: its name on screen, symbol, unit and place on the conventions page. */
export type ReadingDefinition = {
  label: string;
  symbol: string;
  unit: 'deg' | '1';
  polarization: 'p' | 's';
  family: 'rotation' | 'ellipticity' | 'reflectance' | 'cross' | 'contrast' | 'transmittance' | 'absorptance';
  /** Anchor on /conventions. */
  anchor: string;
};

const define = (
  label: string,
  symbol: string,
  unit: 'deg' | '1',
  polarization: 'p' | 's',
  family: ReadingDefinition['family'],
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
};

/** The part of a solved point that the readings are made of; the worker and the client both hold it. */
export type ReadingSource = Pick<SolvePoint, 'R' | 'T' | 'A' | 'kerr'> & {
  /** Null where intensities add and there is no amplitude. */
  r: Pick<NonNullable<SolvePoint['r']>, 'sp' | 'ps'> | null;
};

/**
 * One reading from the three states of one point (physics.md section 4).
 *
 * Kerr rotation and ellipticity are the change that magnetization makes, against the same stack with m = 0;
 * the contrast compares m with -m. Null where the reflected beam is too weak to have a polarization.
 */
export function readingOf(
  name: ReadingName,
  given: ReadingSource,
  zero: ReadingSource,
  reversed: ReadingSource,
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
  }
}

function change(angle: number | undefined, unmagnetized: number | undefined, fold: boolean): number | null {
  if (angle === undefined || unmagnetized === undefined) return null;
  return fold ? foldDegrees(angle - unmagnetized) : angle - unmagnetized;
}

function contrast(given: number, reversed: number): number | null {
  const sum = given + reversed;
  return sum > 0 ? (given - reversed) / sum : null;
}
