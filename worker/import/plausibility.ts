import type { ImportMapping, ImportWarning, SpectralUnit } from '../../shared/materialImport.ts';
import { spectralUnits } from '../../shared/materialImport.ts';
import { modulus, times } from '../optics/complexNumber.ts';
import type { ConvertedIndex } from './convertIndex.ts';
import type { ConvertedVoigt } from './convertVoigt.ts';
import { findJumps } from './findJumps.ts';
import { contradictsKramersKronig } from './kramersKronig.ts';
import type { ReadTable } from './readTable.ts';
import type { SpectralRows } from './spectralRows.ts';
import { describeLines, firstLines } from './warningLines.ts';
import { wavelengthNm } from './wavelengthNm.ts';

/** From the deep ultraviolet to the far infrared: what optical constants of films are tabulated for. */
const USUAL_NM = { from: 50, to: 50_000 };
const FEW_POINTS = 4;
/** Larger than the constant of any common magnet in the visible. */
const LARGE_VOIGT = 0.2;
/** Rounding of a table with a few digits may bring it this much over the limit of passivity. */
const PASSIVE_SLACK = 1e-3;

/** Doubts about the spectral column: its unit, and how many points there are. */
export function spectralWarnings(
  { columns, lines }: ReadTable,
  { spectral: { column, unit } }: ImportMapping,
  { wavelengthsNm, rows }: SpectralRows,
): ImportWarning[] {
  const warnings: ImportWarning[] = [];
  const values = rows.map((row) => columns[column]![row]!);
  const [from, to] = [wavelengthsNm[0]!, wavelengthsNm[wavelengthsNm.length - 1]!];
  if (!isUsual(values, unit)) {
    const others = spectralUnits.filter((other) => other !== unit && isUsual(values, other));
    const remedy = others.length > 0 ? `does the column hold ${others.join(' or ')}?` : 'check its unit.';
    warnings.push({
      code: 'unit',
      message: `Read in ${unit}, the table reaches from ${shown(from)} to ${shown(to)} nm: ${remedy}`,
      lines: firstLines(rows.slice(0, 1).map((row) => lines[row]!)),
    });
  }
  if (rows.length < FEW_POINTS) {
    warnings.push({
      code: 'few-points',
      message:
        rows.length === 1
          ? 'The table has one wavelength only: it says nothing about others.'
          : `The table has ${rows.length} wavelengths only: what lies between them is interpolated.`,
      lines: rows.map((row) => lines[row]!).sort((a, b) => a - b),
    });
  }
  return warnings;
}

/** Doubts about n and k. */
export function indexWarnings({ table, lines }: ConvertedIndex): ImportWarning[] {
  const warnings = [
    ...jumpWarning('n', table.wavelengthsNm, table.n, lines),
    ...jumpWarning('k', table.wavelengthsNm, table.k, lines),
  ];
  if (contradictsKramersKronig(table)) {
    warnings.push({
      code: 'kramers-kronig',
      message:
        'n changes against what the Kramers-Kronig relation gives from k of the same table: check that the columns are n and k, that they belong to each other, and the spectral unit.',
      lines: [],
    });
  }
  return warnings;
}

/** Doubts about Q; whether the medium is passive only where N is known. */
export function voigtWarnings({ table, lines, index }: ConvertedVoigt): ImportWarning[] {
  const { q, wavelengthsNm } = table;
  const warnings = [
    ...jumpWarning(
      'Re Q',
      wavelengthsNm,
      q.map(([re]) => re),
      lines,
    ),
    ...jumpWarning(
      'Im Q',
      wavelengthsNm,
      q.map(([, im]) => im),
      lines,
    ),
  ];
  const large = lines.filter((_, i) => modulus(q[i]!) > LARGE_VOIGT);
  if (large.length > 0) {
    warnings.push({
      code: 'large-voigt',
      message: `|Q| is above ${LARGE_VOIGT} in ${describeLines(large)}: more than common magnets reach. Is the column Q itself, not eps_xy or a percentage, and are its units right?`,
      lines: firstLines(large),
    });
  }
  const active = lines.filter((_, i) => {
    const n = index[i];
    if (!n) return false;
    const permittivity = times(n, n);
    // physics.md section 2: passive where |Im(Q eps_d)| <= Im eps_d for |m| = 1.
    return (
      Math.abs(times(q[i]!, permittivity)[1]) >
      permittivity[1] + PASSIVE_SLACK * modulus(q[i]!) * modulus(permittivity)
    );
  });
  if (active.length > 0) {
    warnings.push({
      code: 'not-passive',
      message: `In ${describeLines(active)} |Im(Q N^2)| is larger than Im(N^2): one circular polarization would be amplified. Check the signs of the source and that Q and N belong to each other.`,
      lines: firstLines(active),
    });
  }
  return warnings;
}

function jumpWarning(
  name: string,
  wavelengthsNm: readonly number[],
  values: readonly number[],
  lines: readonly number[],
): ImportWarning[] {
  const found = findJumps(wavelengthsNm, values).map((i) => lines[i]!);
  if (found.length === 0) return [];
  return [
    {
      code: 'jump',
      message: `${name} jumps away from its neighbours in ${describeLines(found)}: a slip of a digit or of a sign?`,
      lines: firstLines(found),
    },
  ];
}

function isUsual(values: number[], unit: SpectralUnit): boolean {
  return values.every((value) => {
    const nm = wavelengthNm(value, unit);
    return nm >= USUAL_NM.from && nm <= USUAL_NM.to;
  });
}

function shown(nm: number): string {
  return String(Number(nm.toPrecision(4)));
}
