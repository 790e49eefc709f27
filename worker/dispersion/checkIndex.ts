import type { IndexDispersion, PlainIndex } from '../../shared/dispersion.ts';
import type { Issue } from '../../shared/error.ts';
import { checkColumns, checkRange, checkValues } from './checkColumns.ts';
import { checkPlainVoigt } from './checkVoigt.ts';
import { isUsable, unusableIndex } from './opticalValue.ts';
import { dispersionRangeNm, isEmptyRange } from './range.ts';
import { sampleIndex } from './sample.ts';

/** @param path where the index stands in the content, such as `index` or `anisotropy.extraordinary` */
export function checkIndex(path: string, index: IndexDispersion): Issue[] {
  switch (index.kind) {
    case 'tensor':
      return checkTensor(path, index);
    case 'mixture':
      return checkMixture(path, index);
    default:
      return checkPlainIndex(path, index);
  }
}

function checkPlainIndex(path: string, index: PlainIndex): Issue[] {
  if (index.kind === 'table') {
    const issues = checkColumns(path, index.wavelengthsNm, { n: index.n.length, k: index.k.length });
    index.n.forEach((n, i) => {
      const k = index.k[i] ?? 0;
      if (n === 0 && k === 0) {
        issues.push({ path: `${path}.n[${i}]`, message: 'n and k must not both be 0' });
      } else if (!isUsable([n, k])) {
        issues.push({ path: `${path}.n[${i}]`, message: unusableIndex });
      }
    });
    return issues;
  }
  const issues = checkRange(path, index.rangeNm);
  if (issues.length > 0) return issues;
  const at = `${path}.${index.kind === 'formula' ? 'expression' : 'model'}`;
  return checkValues(at, index.rangeNm, (wavelengthsNm) => sampleIndex('it', index, wavelengthsNm));
}

function checkTensor(path: string, index: Extract<IndexDispersion, { kind: 'tensor' }>): Issue[] {
  const issues = checkColumns(path, index.wavelengthsNm, { epsilon: index.epsilon.length });
  index.epsilon.forEach((tensor, i) => {
    const [re, im] = tensor[2][2];
    if (re === 0 && im === 0) {
      issues.push({ path: `${path}.epsilon[${i}][2][2]`, message: 'eps_zz must not be 0' });
    } else if (!isUsable([re, im])) {
      const message = '|eps_zz| must lie between 1e-20 and 1e20';
      issues.push({ path: `${path}.epsilon[${i}][2][2]`, message });
    }
  });
  return issues;
}

function checkMixture(path: string, index: Extract<IndexDispersion, { kind: 'mixture' }>): Issue[] {
  const issues = index.parts.flatMap((part, position) => {
    const at = `${path}.parts[${position}]`;
    const own = checkPlainIndex(`${at}.index`, part.index);
    const { voigt } = part;
    if (voigt === null) return own;
    return [...own, ...checkPlainVoigt(`${at}.voigt`, { index: part.index, voigt }, own.length === 0)];
  });
  if (index.model === 'maxwell-garnett' && index.parts[0]?.voigt) {
    issues.push({
      path: `${path}.parts[0].voigt`,
      message:
        'the host of a maxwell-garnett mixture must not be magnetic; put the magnet second, or use bruggeman',
    });
  }
  if (issues.length > 0) return issues;
  const rangeNm = dispersionRangeNm(index);
  if (isEmptyRange(rangeNm)) {
    const ranges = index.parts.map((part) => `${part.name} ${dispersionRangeNm(part.index).join(' to ')} nm`);
    const message = `the parts are known at no common wavelength (${ranges.join(', ')}): choose sources that overlap`;
    return [{ path: `${path}.parts`, message }];
  }
  return checkValues(`${path}.parts`, rangeNm, (wavelengthsNm) => sampleIndex('it', index, wavelengthsNm));
}
