import { angleUnits, conductivityUnits, ownHabits, spectralUnits } from '../../shared/materialImport.ts';
import type { ImportMapping, SpectralUnit } from '../../shared/materialImport.ts';
import { guessSpectralUnit } from './guessSpectralUnit.ts';
import { recogniseHeader } from './recogniseHeader.ts';
import type { Meaning, Tabled } from './recogniseHeader.ts';

/** Units of columns whose header names the quantity but no unit. */
const unitOfQuantity: Partial<Record<Meaning['quantity'], SpectralUnit>> = {
  energy: 'eV',
  wavenumber: 'cm-1',
  frequency: 'THz',
};

/**
 * What the columns seem to mean, from their headers, or from their values where no header is known. The habits are
 * always those of this program: they are never guessed.
 *
 * @param columns NaN where a cell is empty
 */
export function suggestMapping(
  headers: readonly (string | null)[],
  columns: readonly Float64Array[],
): ImportMapping | null {
  const meanings = headers.map((header) => (header === null ? null : recogniseHeader(header)));
  const isUnnamed = meanings.every((meaning) => meaning === null);
  const spectral = spectralOf(meanings, columns);
  if (!spectral) return null;
  return {
    spectral,
    ...(isUnnamed ? fromValues(columns, spectral.column) : fromHeaders(meanings)),
    indexOf: null,
    habits: ownHabits,
  };
}

function spectralOf(
  meanings: (Meaning | null)[],
  columns: readonly Float64Array[],
): ImportMapping['spectral'] | null {
  const named = meanings.findIndex((meaning) => meaning !== null && isSpectral(meaning.quantity));
  const column = named >= 0 ? named : columns.findIndex(isMonotone);
  // Only an unnamed column may be taken for the wavelength because of its values.
  if (column < 0 || (named < 0 && meanings[column] !== null)) return null;
  const meaning = meanings[column];
  const written = spectralUnits.find((unit) => unit === meaning?.unit);
  const unit =
    written ?? (meaning && unitOfQuantity[meaning.quantity]) ?? guessSpectralUnit(columns[column]!);
  return unit === null ? null : { column, unit };
}

function isSpectral(quantity: Meaning['quantity']): boolean {
  return ['wavelength', 'energy', 'wavenumber', 'frequency'].includes(quantity);
}

function isMonotone(column: Float64Array): boolean {
  const values = column.filter((value) => !Number.isNaN(value));
  if (values.length === 0 || !values.every((value) => value > 0)) return false;
  const rising = values.every((value, i) => i === 0 || value >= values[i - 1]!);
  return rising || values.every((value, i) => i === 0 || value <= values[i - 1]!);
}

function fromHeaders(meanings: (Meaning | null)[]): Pick<ImportMapping, 'index' | 'voigt'> {
  const at = (quantity: Tabled): number | null => {
    const column = meanings.findIndex((meaning) => meaning?.quantity === quantity);
    return column < 0 ? null : column;
  };
  const [n, eps1] = [at('n'), at('eps1')];
  const index: ImportMapping['index'] =
    n !== null
      ? { from: 'n, k', n, k: at('k') }
      : eps1 !== null
        ? { from: 'eps1, eps2', eps1, eps2: at('eps2') }
        : null;
  return { index, voigt: voigtFrom(at, meanings) };
}

function voigtFrom(
  at: (quantity: Tabled) => number | null,
  meanings: (Meaning | null)[],
): ImportMapping['voigt'] {
  const q = at('Q re');
  if (q !== null) return { from: 'Q', re: q, im: at('Q im') };
  const epsXy = at('eps_xy re');
  if (epsXy !== null) return { from: 'eps_xy', re: epsXy, im: at('eps_xy im') };
  const sigma = at('sigma_xy re');
  if (sigma !== null) {
    const unit = conductivityUnits.find((one) => one === meanings[sigma]?.unit) ?? 's^-1';
    return { from: 'sigma_xy', re: sigma, im: at('sigma_xy im'), unit };
  }
  const [rotation, ellipticity] = [at('rotation'), at('ellipticity')];
  if (rotation === null || ellipticity === null) return null;
  const unit = angleUnits.find((one) => one === meanings[rotation]?.unit) ?? 'deg';
  return { from: 'Kerr angles', rotation, ellipticity, unit, incidentIndex: 1 };
}

/** The usual order: n, k (or eps1, eps2, when the first is negative somewhere), then Q when it is small. */
function fromValues(
  columns: readonly Float64Array[],
  spectral: number,
): Pick<ImportMapping, 'index' | 'voigt'> {
  const [first, second, third, fourth] = columns.map((_, i) => i).filter((i) => i !== spectral);
  if (first === undefined) return { index: null, voigt: null };
  const isEps = columns[first]!.some((value) => value < 0);
  const imaginary = second ?? null;
  const isSmall = (column: number | undefined) =>
    column !== undefined && columns[column]!.every((value) => !(Math.abs(value) > 0.5));
  return {
    index: isEps
      ? { from: 'eps1, eps2', eps1: first, eps2: imaginary }
      : { from: 'n, k', n: first, k: imaginary },
    voigt:
      third !== undefined && fourth !== undefined && isSmall(third) && isSmall(fourth)
        ? { from: 'Q', re: third, im: fourth }
        : null,
  };
}
