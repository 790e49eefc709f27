import type { Material, MaterialContent } from '../../shared/material.ts';
import type { IndexDispersion } from '../../shared/dispersion.ts';
import { photonEnergyEv } from '../../shared/units.ts';
import { dispersionRangeNm } from './range.ts';
import { sampleIndex, sampleVoigt } from './sample.ts';

/** More than a plot can show. */
const mostPoints = 400;

/** Curves for the plot of a material, within the wavelengths for which it is known. */
export function materialCurves(content: MaterialContent): Material['curves'] {
  const wavelengthsNm = indexGrid(content.index);
  const { n, k } = sampleIndex('the material', content.index, wavelengthsNm);
  return { wavelengthsNm, n: Array.from(n), k: Array.from(k), voigt: voigtCurve(content) };
}

function voigtCurve({ voigt }: MaterialContent): Material['curves']['voigt'] {
  if (voigt === null) return null;
  const wavelengthsNm = tableGrid(voigt.wavelengthsNm);
  const { re, im } = sampleVoigt('the material', voigt, wavelengthsNm);
  return { wavelengthsNm, q: Array.from(re, (value, i): [number, number] => [value, im[i]!]) };
}

function indexGrid(dispersion: IndexDispersion): number[] {
  if (dispersion.kind === 'table') return tableGrid(dispersion.wavelengthsNm);
  const [fromNm, toNm] = dispersionRangeNm(dispersion);
  // Even in log wavelength: a formula bends most at its blue end and may reach far into the infrared.
  const grid = Array.from(
    { length: mostPoints },
    (_, i) => fromNm * (toNm / fromNm) ** (i / (mostPoints - 1)),
  );
  grid[mostPoints - 1] = toNm;
  return grid;
}

/** The table's own points with even steps of photon energy between them; a longer table is thinned evenly. */
function tableGrid(tableNm: readonly number[]): number[] {
  const intervals = tableNm.length - 1;
  if (tableNm.length > mostPoints) {
    return Array.from(
      { length: mostPoints },
      (_, i) => tableNm[Math.round((i * intervals) / (mostPoints - 1))]!,
    );
  }
  const steps = intervals === 0 ? 1 : Math.max(1, Math.floor((mostPoints - 1) / intervals));
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
