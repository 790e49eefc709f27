import type { Complex } from '../../shared/complex.ts';
import type { IndexDispersion } from '../../shared/dispersion.ts';
import type { ImportWarning } from '../../shared/materialImport.ts';
import { dispersionRangeNm, isSameWavelength } from '../dispersion/range.ts';
import { sampleIndex } from '../dispersion/sample.ts';
import { describeLines, firstLines } from './warningLines.ts';

/** N at wavelengths, null where it is not known; nothing is extrapolated. */
export function indexAt(index: IndexDispersion, wavelengthsNm: readonly number[]): (Complex | null)[] {
  const [from, to] = dispersionRangeNm(index);
  const isKnown = (nm: number) =>
    (nm >= from && nm <= to) || isSameWavelength(nm, from) || isSameWavelength(nm, to);
  const known = wavelengthsNm.filter(isKnown);
  if (known.length === 0) return wavelengthsNm.map(() => null);
  const { n, k } = sampleIndex('the index', index, known);
  let next = 0;
  return wavelengthsNm.map((nm): Complex | null => {
    if (!isKnown(nm)) return null;
    next += 1;
    return [n[next - 1]!, k[next - 1]!];
  });
}

export function outsideIndexWarning(lines: number[], index: IndexDispersion): ImportWarning {
  const [from, to] = dispersionRangeNm(index);
  return {
    code: 'outside-index',
    message: `N is known from ${from} to ${to} nm only: the magneto-optic constant was left out in ${describeLines(lines)}.`,
    lines: firstLines(lines),
  };
}
