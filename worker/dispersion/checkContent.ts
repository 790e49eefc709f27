import type { Issue } from '../../shared/error.ts';
import type { MaterialContent } from '../../shared/material.ts';
import { checkAnisotropy } from './checkAnisotropy.ts';
import { checkIndex } from './checkIndex.ts';
import { checkVoigt } from './checkVoigt.ts';

/**
 * What the schema of a material cannot say: columns of one length, rising wavelengths, formulas and models with a
 * value throughout their range, parts that can be mixed, a source with every constant and no source without one.
 */
export function checkContent(content: MaterialContent): Issue[] {
  const issues = [...checkIndex('index', content.index), ...checkSources(content)];
  // What builds on the index is looked at only once the index can be used.
  const isIndexUsable = !issues.some(({ path }) => path.startsWith('index.'));
  issues.push(...checkVoigt(content, isIndexUsable), ...checkAnisotropy(content, isIndexUsable));
  return issues;
}

function checkSources({ voigt, voigtSource, anisotropy, anisotropySource }: MaterialContent): Issue[] {
  const issues: Issue[] = [];
  if ((voigt === null) !== (voigtSource === null)) {
    issues.push({
      path: 'voigtSource',
      message: 'must be given with voigt, and only then: every constant has a source',
    });
  }
  if ((anisotropy === undefined) !== (anisotropySource === undefined)) {
    issues.push({
      path: 'anisotropySource',
      message: 'must be given with anisotropy, and only then: every constant has a source',
    });
  }
  return issues;
}
