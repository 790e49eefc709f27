import type { Goal } from '../../../../shared/optimiseDesign.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import { formatPlain } from '../../../lib/format.ts';
import { layerWords } from './layerNames.ts';
import type { NamedMaterial } from './layerNames.ts';

/** What is sought, as the form offers it. */
export const goalLabels: Record<Goal['quantity'], string> = {
  rotation: 'greatest |Kerr rotation|',
  ellipticity: 'greatest |Kerr ellipticity|',
  amplitude: 'greatest cross-polarized amplitude',
  contrast: 'greatest |transverse contrast|',
  'zero ellipticity': 'ellipticity as near to zero as it gets',
  insensitivity: 'least change of the rotation with one layer',
  'least reflectance': 'least reflectance',
};

export function goalWords(goal: Goal, document: StackDocument, materials: readonly NamedMaterial[]): string {
  const layer = goal.layerId === undefined ? '' : ` (${layerWords(document, goal.layerId, materials)})`;
  const limit = goal.leastReflectance
    ? `, with a reflectance of at least ${formatPlain(goal.leastReflectance)}`
    : '';
  return goalLabels[goal.quantity] + layer + limit;
}
