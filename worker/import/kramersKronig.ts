import { photonEnergyEv } from '../../shared/units.ts';
import type { TabledIndex } from './convertIndex.ts';

const LEAST_POINTS = 15;
/** Ratio of the last wavelength to the first below which a table is too short to say anything. */
const LEAST_SPAN = 2.5;
const GRID = 400;
/** Outer part of the range at each end that is not compared: there the absorption that was not tabulated counts most. */
const MARGIN = 0.15;
/** Correlation of tabulated and predicted n below which they contradict each other. */
const CONTRADICTION = -0.5;

/**
 * Does the course of n clearly contradict the absorption in the same table? The Kramers-Kronig relation, subtracted once,
 *
 *     n(E) - n(E0) = 2/pi [P int E' k / (E'^2 - E^2) dE' - P int E' k / (E'^2 - E0^2) dE'],
 *
 * taken over the table alone; the second term is a constant, so that only the correlation of n with the first
 * integral is looked at. The integral skips every second point of an even grid: K. Ohta and H. Ishida, Appl. Spectrosc. 42,
 * 952 (1988). A hint: absorption outside of the table is not known.
 */
export function contradictsKramersKronig({ wavelengthsNm, n, k }: TabledIndex): boolean {
  const last = wavelengthsNm.length - 1;
  if (wavelengthsNm.length < LEAST_POINTS || wavelengthsNm[last]! < LEAST_SPAN * wavelengthsNm[0]!)
    return false;
  const energies = Float64Array.from(wavelengthsNm, photonEnergyEv).reverse();
  const onGrid = evenGrid(energies[0]!, energies[last]!);
  const absorption = interpolated(energies, k.toReversed(), onGrid);
  const tabled = interpolated(energies, n.toReversed(), onGrid);
  if (!hasBandInside(absorption)) return false;
  const from = Math.ceil(MARGIN * GRID);
  const predicted = onGrid.map((_, i) => integralAt(i, onGrid, absorption)).subarray(from, GRID - from);
  return correlation(predicted, tabled.subarray(from, GRID - from)) < CONTRADICTION;
}

/** Where k is largest at an end of the table, most of what shapes n lies outside of it. */
function hasBandInside(k: Float64Array): boolean {
  const most = Math.max(...k);
  return most > 0.05 && Math.max(k[0]!, k[k.length - 1]!) < 0.5 * most;
}

function integralAt(i: number, energies: Float64Array, k: Float64Array): number {
  const step = energies[1]! - energies[0]!;
  let sum = 0;
  for (let j = (i + 1) % 2; j < energies.length; j += 2) {
    sum += (energies[j]! * k[j]!) / (energies[j]! ** 2 - energies[i]! ** 2);
  }
  return (2 / Math.PI) * 2 * step * sum;
}

function evenGrid(from: number, to: number): Float64Array {
  return Float64Array.from({ length: GRID }, (_, i) => from + ((to - from) * i) / (GRID - 1));
}

/** Straight lines between the points of a rising x. */
function interpolated(x: Float64Array, y: readonly number[], at: Float64Array): Float64Array {
  let i = 0;
  return at.map((one) => {
    while (i < x.length - 2 && x[i + 1]! < one) i += 1;
    const part = (one - x[i]!) / (x[i + 1]! - x[i]!);
    return y[i]! + part * (y[i + 1]! - y[i]!);
  });
}

function correlation(a: Float64Array, b: Float64Array): number {
  const mean = (values: Float64Array) => values.reduce((sum, value) => sum + value, 0) / values.length;
  const [meanA, meanB] = [mean(a), mean(b)];
  let [ab, aa, bb] = [0, 0, 0];
  a.forEach((value, i) => {
    ab += (value - meanA) * (b[i]! - meanB);
    aa += (value - meanA) ** 2;
    bb += (b[i]! - meanB) ** 2;
  });
  return aa > 0 && bb > 0 ? ab / Math.sqrt(aa * bb) : 0;
}
