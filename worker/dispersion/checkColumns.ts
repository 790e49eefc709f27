import type { Issue } from '../../shared/error.ts';
import { DispersionValueError } from './opticalValue.ts';
import { logarithmicGrid, TRIAL_POINTS } from './wavelengthGrid.ts';

/** Every column as long as the wavelengths, and these rising. */
export function checkColumns(
  path: string,
  wavelengthsNm: readonly number[],
  lengths: Record<string, number>,
): Issue[] {
  const issues: Issue[] = [];
  for (const [column, length] of Object.entries(lengths)) {
    if (length !== wavelengthsNm.length) {
      issues.push({
        path: `${path}.${column}`,
        message: `must have ${wavelengthsNm.length} entries, one per wavelength, got ${length}`,
      });
    }
  }
  wavelengthsNm.forEach((wavelength, i) => {
    const before = wavelengthsNm[i - 1];
    if (before !== undefined && wavelength <= before) {
      issues.push({
        path: `${path}.wavelengthsNm[${i}]`,
        message: `must be greater than the one before, got ${wavelength} after ${before}`,
      });
    }
  });
  return issues;
}

export function checkRange(path: string, [fromNm, toNm]: readonly [number, number]): Issue[] {
  if (fromNm < toNm) return [];
  return [{ path: `${path}.rangeNm`, message: `must rise, got ${fromNm} to ${toNm} nm` }];
}

/** Tries a formula or model throughout its range; the first wavelength without a value is the issue. */
export function checkValues(
  path: string,
  rangeNm: readonly [number, number],
  sample: (wavelengthsNm: number[]) => unknown,
): Issue[] {
  try {
    sample(logarithmicGrid(rangeNm, TRIAL_POINTS));
    return [];
  } catch (error) {
    if (!(error instanceof DispersionValueError)) throw error;
    return [{ path, message: error.message }];
  }
}
