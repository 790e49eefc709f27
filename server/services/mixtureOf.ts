import type { Issue } from '../../shared/error.ts';
import type { IndexDispersion } from '../../shared/dispersion.ts';
import type { MaterialContent } from '../../shared/material.ts';
import type { MaterialDraft } from '../../shared/materialEdit.ts';
import type { Dependencies } from '../dependencies.ts';
import { invalid } from '../errors.ts';
import { findMaterial } from './findMaterial.ts';

type Wanted = Extract<MaterialDraft['index'], { kind: 'mixture of' }>;
type Mixture = Extract<IndexDispersion, { kind: 'mixture' }>;
type Part = Mixture['parts'][number];

/**
 * A mixture with its parts whole, as they are now: later versions of them change nothing.
 *
 * @param path of the index in the request
 * @throws Refusal 422 for a part that is out of reach or not plain
 */
export async function mixtureOf(
  dependencies: Pick<Dependencies, 'models' | 'materials'>,
  groupId: string,
  { model, fraction, parts }: Wanted,
  path: string,
): Promise<Mixture> {
  const issues: Issue[] = [];
  const found: Part[] = [];
  for (const [position, named] of parts.entries()) {
    const refuse = (message: string) => issues.push({ path: `${path}.parts[${position}].material`, message });
    const part = await findMaterial(dependencies, groupId, named);
    if (!part) {
      refuse('there is no such version of a material in this group: choose one that is listed');
      continue;
    }
    const plain = plainPart(part.content);
    if (typeof plain === 'string') refuse(`${part.material.name} ${plain}`);
    else found.push({ ...named, name: part.material.name, ...plain });
  }
  if (issues.length > 0) throw invalid(issues);
  return { kind: 'mixture', model, fraction, parts: found };
}

/** The constants of a part, or why it cannot be one and what to do. */
function plainPart({ index, voigt, anisotropy }: MaterialContent): Pick<Part, 'index' | 'voigt'> | string {
  if (index.kind === 'mixture' || voigt?.kind === 'mixture') {
    return 'is a mixture itself: choose the materials that it is mixed from, or keep it as a table first';
  }
  if (index.kind === 'tensor') {
    return 'is a free tensor, which has no single index to mix: choose a material with n and k';
  }
  if (anisotropy) {
    return `is a ${anisotropy.kind} crystal, whose directions a mixture does not keep: choose one without anisotropy`;
  }
  return { index, voigt };
}
