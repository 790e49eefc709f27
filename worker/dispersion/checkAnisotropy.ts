import type { Issue } from '../../shared/error.ts';
import type { MaterialContent } from '../../shared/material.ts';
import { checkIndex } from './checkIndex.ts';
import { dispersionRangeNm, indexRangeNm, isEmptyRange } from './range.ts';

/** @param isIndexUsable the (ordinary) index has passed its own checks */
export function checkAnisotropy(content: MaterialContent, isIndexUsable: boolean): Issue[] {
  const { index, anisotropy } = content;
  if (anisotropy === undefined) return [];
  if (index.kind === 'tensor') {
    return [{ path: 'anisotropy', message: 'must be absent beside a free tensor, which has its own axes' }];
  }
  if (anisotropy.kind === 'cubic') return [];
  const { axis, extraordinary } = anisotropy;
  const issues = checkIndex('anisotropy.extraordinary', extraordinary);
  if (isIndexUsable && issues.length === 0 && isEmptyRange(indexRangeNm(content))) {
    const [ordinary, other] = [index, extraordinary].map((one) => dispersionRangeNm(one).join(' to '));
    issues.push({
      path: 'anisotropy.extraordinary',
      message: `is known from ${other} nm, the ordinary index from ${ordinary} nm: the ranges must overlap`,
    });
  }
  if (axis.every((component) => component === 0)) {
    issues.push({ path: 'anisotropy.axis', message: 'must not be the zero vector' });
  }
  return issues;
}
