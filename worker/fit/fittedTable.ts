import type { Issue } from '../../shared/error.ts';
import type { MaterialContent } from '../../shared/material.ts';
import type { FitMaterial } from '../../shared/materialFit.ts';
import type { RangeNm } from '../dispersion/range.ts';
import { isSameWavelength } from '../dispersion/range.ts';
import { FitRefusal } from './fitRefusal.ts';

/** The tabulated points within a range: n and k, or Re Q and Im Q. */
export type FittedTable = { wavelengthsNm: number[]; first: number[]; second: number[] };

/** @throws FitRefusal where the constant is no table, or has no point in the range */
export function fittedTable({
  target,
  start,
  rangeNm,
  content: { index, voigt },
}: Pick<FitMaterial, 'target' | 'start' | 'rangeNm'> & { content: MaterialContent }): FittedTable {
  const table = target === 'index' ? indexColumns(index) : voigtColumns(voigt);
  const [fromNm, toNm] = rangeNm ?? startRangeNm(start);
  const rows = table.wavelengthsNm.flatMap((wavelengthNm, row) => {
    const inside =
      (wavelengthNm >= fromNm && wavelengthNm <= toNm) ||
      isSameWavelength(wavelengthNm, fromNm) ||
      isSameWavelength(wavelengthNm, toNm);
    return fromNm <= toNm && inside ? [row] : [];
  });
  if (rows.length === 0) {
    const message = `must hold points of the table (${table.wavelengthsNm[0]!} to ${table.wavelengthsNm.at(-1)!} nm), shortest wavelength first; got ${fromNm} to ${toNm} nm`;
    throw new FitRefusal([{ path: 'rangeNm', message }]);
  }
  const chosen = (column: number[]) => rows.map((row) => column[row]!);
  return {
    wavelengthsNm: chosen(table.wavelengthsNm),
    first: chosen(table.first),
    second: chosen(table.second),
  };
}

function startRangeNm(start: FitMaterial['start']): RangeNm {
  if (start.kind !== 'table') return start.rangeNm;
  throw new FitRefusal([{ path: 'start.kind', message: 'must be a model, lines or a formula, got table' }]);
}

function indexColumns(index: MaterialContent['index']): FittedTable {
  if (index.kind !== 'table') throw new FitRefusal([noTable(`n and k are given as a ${index.kind}`)]);
  return { wavelengthsNm: index.wavelengthsNm, first: index.n, second: index.k };
}

function voigtColumns(voigt: MaterialContent['voigt']): FittedTable {
  if (voigt === null) throw new FitRefusal([noTable('this material has no Q')]);
  if (voigt.kind !== 'table') throw new FitRefusal([noTable(`Q is given as ${voigt.kind}`)]);
  const [first, second] = [voigt.q.map((q) => q[0]), voigt.q.map((q) => q[1])];
  return { wavelengthsNm: voigt.wavelengthsNm, first, second };
}

function noTable(what: string): Issue {
  return {
    path: 'target',
    message: `must be a table to be fitted, but ${what}: choose a material with a table`,
  };
}
