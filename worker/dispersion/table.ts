import { photonEnergyEv } from '../../shared/units.ts';
import { cubicValue, monotoneSlopes } from './monotoneCubic.ts';
import { DispersionRangeError, isSameWavelength } from './range.ts';

export type SampleOptions = {
  /** Use a constant known at one wavelength at every other one too. */
  assumeConstant?: boolean;
};

/** The wavelength itself, or the end of the range it equals but for rounding. */
export function inRange(subject: string, fromNm: number, toNm: number, wavelengthNm: number): number {
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
export function sampleTable(
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
