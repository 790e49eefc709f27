import type { IndexDispersion } from '../../shared/dispersion.ts';
import type { Material, MaterialContent } from '../../shared/material.ts';
import { photonEnergyEv } from '../../shared/units.ts';
import type { RangeNm } from './range.ts';
import { dispersionRangeNm, isSameWavelength, voigtRangeNm } from './range.ts';
import { sampleIndex, sampleVoigt } from './sample.ts';
import { CURVE_POINTS, logarithmicGrid } from './wavelengthGrid.ts';

const subject = 'the material';

/**
 * Curves for the plot of a material, each within the wavelengths for which it is known.
 *
 * @throws DispersionValueError for a content that `checkContent` refuses, or whose index has no value at one of the
 *   wavelengths at which Q is tabled
 */
export function materialCurves(content: MaterialContent): Material['curves'] {
  const { index, anisotropy } = content;
  return {
    ...indexCurve(index),
    voigt: voigtCurve(content),
    extraordinary: anisotropy?.kind === 'uniaxial' ? indexCurve(anisotropy.extraordinary) : null,
  };
}

function indexCurve(index: IndexDispersion): { wavelengthsNm: number[]; n: number[]; k: number[] } {
  const wavelengthsNm = gridOf(index, dispersionRangeNm(index));
  const { n, k } = sampleIndex(subject, index, wavelengthsNm);
  return { wavelengthsNm, n: Array.from(n), k: Array.from(k) };
}

function voigtCurve(content: MaterialContent): Material['curves']['voigt'] {
  const { index, voigt } = content;
  const rangeNm = voigtRangeNm(content);
  if (voigt === null || rangeNm === null) return null;
  const wavelengthsNm = gridOf(voigt, rangeNm);
  const { re, im } = sampleVoigt(subject, { index, voigt }, wavelengthsNm);
  const q = Array.from(re, (value, i): [number, number] => [value, im[i]!]);
  return { wavelengthsNm, q, index: indexWhereKnown(index, wavelengthsNm) };
}

function indexWhereKnown(index: IndexDispersion, wavelengthsNm: number[]): ([number, number] | null)[] {
  const [fromNm, toNm] = dispersionRangeNm(index);
  const isKnown = (wavelengthNm: number) =>
    (wavelengthNm >= fromNm && wavelengthNm <= toNm) ||
    isSameWavelength(wavelengthNm, fromNm) ||
    isSameWavelength(wavelengthNm, toNm);
  const { n, k } = sampleIndex(subject, index, wavelengthsNm.filter(isKnown));
  let next = 0;
  return wavelengthsNm.map((wavelengthNm) => {
    if (!isKnown(wavelengthNm)) return null;
    const value: [number, number] = [n[next]!, k[next]!];
    next += 1;
    return value;
  });
}

function gridOf(dispersion: { kind: string; wavelengthsNm?: number[] }, rangeNm: RangeNm): number[] {
  const { wavelengthsNm } = dispersion;
  return wavelengthsNm ? tableGrid(wavelengthsNm) : logarithmicGrid(rangeNm, CURVE_POINTS);
}

/** The table's own points with even steps of photon energy between them; a longer table is thinned evenly. */
function tableGrid(tableNm: readonly number[]): number[] {
  const intervals = tableNm.length - 1;
  if (tableNm.length > CURVE_POINTS) {
    return Array.from(
      { length: CURVE_POINTS },
      (_, i) => tableNm[Math.round((i * intervals) / (CURVE_POINTS - 1))]!,
    );
  }
  const steps = intervals === 0 ? 1 : Math.max(1, Math.floor((CURVE_POINTS - 1) / intervals));
  const grid: number[] = [];
  for (let i = 0; i < intervals; i++) {
    grid.push(tableNm[i]!);
    const from = photonEnergyEv(tableNm[i]!);
    const to = photonEnergyEv(tableNm[i + 1]!);
    for (let step = 1; step < steps; step++) grid.push(photonEnergyEv(from + ((to - from) * step) / steps));
  }
  grid.push(tableNm[intervals]!);
  return grid;
}
