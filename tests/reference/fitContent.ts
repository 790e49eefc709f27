import type { MaterialContent } from '../../shared/material.ts';
import type { MaterialSource } from '../../shared/materialSource.ts';

const source: MaterialSource = {
  citation: 'made in a test',
  doi: null,
  licence: null,
  sample: null,
  method: null,
  confidence: 'invented for the demo',
  caution: null,
};

/** Content of a material for a fit, which looks at index and Q only. */
export function buildContent(
  overrides: Pick<MaterialContent, 'index'> & Partial<MaterialContent>,
): MaterialContent {
  return { indexSource: source, voigt: null, voigtSource: overrides.voigt ? source : null, ...overrides };
}
