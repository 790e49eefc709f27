import type { ImportPreview, ImportTable, SpectralUnit } from '../../../../shared/materialImport.ts';
import { photonEnergyEv } from '../../../../shared/units.ts';

/** Speed of light in nm THz: exactly 299 792 458 m/s. */
const LIGHT_NM_THZ = 299_792.458;

/** Vacuum wavelength in nm of a value as it stands in the spectral column. */
export function wavelengthNmOf(value: number, unit: SpectralUnit): number {
  switch (unit) {
    case 'nm':
      return value;
    case 'um':
      return value * 1000;
    case 'A':
      return value / 10;
    case 'eV':
      return photonEnergyEv(value);
    case 'cm-1':
      return 1e7 / value;
    case 'THz':
      return LIGHT_NM_THZ / value;
  }
}

type Row = ImportTable['firstRows'][number];

export type RowBeside = Row & {
  wavelengthNm: number;
  /** Null where the table gives none, or where the preview, which is thinned, skips this row. */
  index: { n: number; k: number } | null;
  q: readonly [re: number, im: number] | null;
};

/** Relative distance within which two wavelengths are the same row. */
const SAME = 1e-9;

/** Rows of the table with the converted values that belong to them. */
export function rowsBeside(
  rows: readonly Row[],
  spectral: { column: number; unit: SpectralUnit },
  { index, voigt }: Pick<ImportPreview, 'index' | 'voigt'>,
): RowBeside[] {
  return rows.flatMap((row) => {
    const entered = row.cells[spectral.column] ?? null;
    if (entered === null) return [];
    const wavelengthNm = wavelengthNmOf(entered, spectral.unit);
    const place = (wavelengths: readonly number[]) =>
      wavelengths.findIndex((one) => Math.abs(one - wavelengthNm) <= SAME * wavelengthNm);
    const at = index ? place(index.wavelengthsNm) : -1;
    const [n, k] = [index?.n[at], index?.k[at]];
    return {
      ...row,
      wavelengthNm,
      index: n === undefined || k === undefined ? null : { n, k },
      q: (voigt && voigt.q[place(voigt.wavelengthsNm)]) ?? null,
    };
  });
}
