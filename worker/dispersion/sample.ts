import type { IndexDispersion, VoigtDispersion } from '../../shared/dispersion.ts';
import { photonEnergyEv } from '../../shared/units.ts';
import { compileFormula } from './formula.ts';
import { cubicValue, monotoneSlopes } from './monotoneCubic.ts';
import { DispersionRangeError, dispersionRangeNm, isSameWavelength } from './range.ts';

export type SampleOptions = {
  /** Use a constant known at one wavelength at every other one too. */
  assumeConstant?: boolean;
};

/** Refractive index N = n + ik, one entry per wavelength. */
export type SampledIndex = { n: Float64Array; k: Float64Array };

/** Voigt constant Q in the canonical sign (physics.md section 2), one entry per wavelength. */
export type SampledVoigt = { re: Float64Array; im: Float64Array };

/**
 * Samples a refractive index.
 *
 * @param name what an error calls the material, such as "Cobalt (co-johnson-1974)"
 * @param wavelengthsNm vacuum wavelengths in nm, in any order
 * @throws DispersionRangeError where the index is not known; FormulaError where a formula fails
 */
export function sampleIndex(
  name: string,
  dispersion: IndexDispersion,
  wavelengthsNm: ArrayLike<number>,
  options: SampleOptions = {},
): SampledIndex {
  if (dispersion.kind === 'table') {
    const [n, k] = sampleTable(
      name,
      dispersion.wavelengthsNm,
      [dispersion.n, dispersion.k],
      wavelengthsNm,
      options,
    );
    return { n: n!, k: k! };
  }
  const [fromNm, toNm] = dispersionRangeNm(dispersion);
  const formula = compileFormula(dispersion.expression, dispersion.coefficients);
  const n = new Float64Array(wavelengthsNm.length);
  for (let i = 0; i < n.length; i++) {
    n[i] = formula(inRange(name, fromNm, toNm, wavelengthsNm[i]!));
  }
  return { n, k: new Float64Array(n.length) };
}

/** Samples a Voigt constant; arguments and errors as for `sampleIndex`. */
export function sampleVoigt(
  name: string,
  dispersion: VoigtDispersion,
  wavelengthsNm: ArrayLike<number>,
  options: SampleOptions = {},
): SampledVoigt {
  const columns = [dispersion.q.map((q) => q[0]), dispersion.q.map((q) => q[1])];
  const subject = `the Voigt constant of ${name}`;
  const [re, im] = sampleTable(subject, dispersion.wavelengthsNm, columns, wavelengthsNm, options);
  return { re: re!, im: im! };
}

/** The wavelength itself, or the end of the range it equals but for rounding. */
function inRange(subject: string, fromNm: number, toNm: number, wavelengthNm: number): number {
  if (wavelengthNm >= fromNm && wavelengthNm <= toNm) return wavelengthNm;
  if (isSameWavelength(wavelengthNm, fromNm)) return fromNm;
  if (isSameWavelength(wavelengthNm, toNm)) return toNm;
  throw new DispersionRangeError(subject, [fromNm, toNm], wavelengthNm);
}

/**
 * Columns of a table at the asked wavelengths, interpolated over photon energy: there the structures of a
 * spectrum have about equal widths and most tables are measured in about equal steps, whereas over wavelength
 * the steps at the red end are many times those at the blue end. Table points come back to the last bit.
 */
function sampleTable(
  subject: string,
  tableNm: readonly number[],
  columns: readonly (readonly number[])[],
  wavelengthsNm: ArrayLike<number>,
  options: SampleOptions,
): Float64Array[] {
  if (tableNm.length === 1) return sampleConstant(subject, tableNm[0]!, columns, wavelengthsNm, options);
  const energies = Float64Array.from(tableNm, photonEnergyEv);
  const values = columns.map((column) => Float64Array.from(column));
  const slopes = values.map((column) => monotoneSlopes(energies, column));
  const sampled = columns.map(() => new Float64Array(wavelengthsNm.length));
  const last = tableNm.length - 1;
  let interval = 0;
  for (let i = 0; i < wavelengthsNm.length; i++) {
    const wavelengthNm = inRange(subject, tableNm[0]!, tableNm[last]!, wavelengthsNm[i]!);
    if (wavelengthNm === tableNm[last]) {
      for (let column = 0; column < values.length; column++) sampled[column]![i] = values[column]![last]!;
      continue;
    }
    interval = findInterval(tableNm, wavelengthNm, interval);
    const energy = energies[interval]!;
    const t = (photonEnergyEv(wavelengthNm) - energy) / (energies[interval + 1]! - energy);
    for (let column = 0; column < values.length; column++) {
      sampled[column]![i] = cubicValue(energies, values[column]!, slopes[column]!, interval, t);
    }
  }
  return sampled;
}

function sampleConstant(
  subject: string,
  knownAtNm: number,
  columns: readonly (readonly number[])[],
  wavelengthsNm: ArrayLike<number>,
  options: SampleOptions,
): Float64Array[] {
  for (let i = 0; i < wavelengthsNm.length && options.assumeConstant !== true; i++) {
    inRange(subject, knownAtNm, knownAtNm, wavelengthsNm[i]!);
  }
  return columns.map((column) => new Float64Array(wavelengthsNm.length).fill(column[0]!));
}

/** i with table[i] <= wavelength < table[i + 1]. A sweep mostly stays in the interval of the point before. */
function findInterval(table: readonly number[], wavelengthNm: number, hint: number): number {
  if (table[hint]! <= wavelengthNm && wavelengthNm < table[hint + 1]!) return hint;
  let low = 0;
  let high = table.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (table[middle]! <= wavelengthNm) low = middle;
    else high = middle;
  }
  return low;
}
