import type { Issue } from '../../shared/error.ts';
import type { MaterialContent } from '../../shared/material.ts';
import type { IndexDispersion } from '../../shared/dispersion.ts';
import { compileFormula, FormulaError } from './formula.ts';

/** What the schema of a material cannot say: columns of one length, rising wavelengths, a formula that works. */
export function checkContent(content: MaterialContent): Issue[] {
  const issues = checkIndex(content.index);
  const { voigt } = content;
  if (voigt !== null) {
    issues.push(...checkColumns('voigt', voigt.wavelengthsNm, { q: voigt.q.length }));
  }
  if ((voigt === null) !== (content.voigtSource === null)) {
    issues.push({
      path: 'voigtSource',
      message: 'must be given with voigt, and only then: every constant has a source',
    });
  }
  return issues;
}

function checkIndex(index: IndexDispersion): Issue[] {
  if (index.kind === 'table') {
    const issues = checkColumns('index', index.wavelengthsNm, { n: index.n.length, k: index.k.length });
    index.n.forEach((n, i) => {
      if (n === 0 && index.k[i] === 0) {
        issues.push({ path: `index.n[${i}]`, message: 'n and k must not both be 0' });
      }
    });
    return issues;
  }
  const [fromNm, toNm] = index.rangeNm;
  if (fromNm >= toNm) {
    return [{ path: 'index.rangeNm', message: `must rise, got ${fromNm} to ${toNm} nm` }];
  }
  try {
    const formula = compileFormula(index.expression, index.coefficients);
    for (let i = 0; i <= 1000; i++) formula(fromNm * (toNm / fromNm) ** (i / 1000));
    return [];
  } catch (error) {
    if (!(error instanceof FormulaError)) throw error;
    return [{ path: 'index.expression', message: error.message }];
  }
}

function checkColumns(
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
