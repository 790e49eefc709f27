import type { Issue } from '../../shared/error.ts';
import type { MaterialContent } from '../../shared/material.ts';
import type { LibraryMediumInput } from '../../shared/medium.ts';

/**
 * What of a medium does not fit the material it names: an m beside a free tensor, a direction for a crystal without
 * axes, a mixture with a part that is no scalar medium.
 *
 * @param name what a message calls the material
 * @param path where the medium stands in the case
 * @param isPart the medium is a part of a mixture
 */
export function checkMaterialUse(
  name: string,
  { index, anisotropy }: Pick<MaterialContent, 'index' | 'anisotropy'>,
  { m, voigtScale, orientationDeg }: Pick<LibraryMediumInput, 'm' | 'voigtScale' | 'orientationDeg'>,
  path: string,
  isPart: boolean,
): Issue[] {
  const isTensor = index.kind === 'tensor';
  const magnetized = m !== undefined && m.some((component) => component !== 0);
  if (isPart) {
    const isScalar = !isTensor && (anisotropy === undefined || (anisotropy.kind === 'cubic' && !magnetized));
    if (isScalar) return [];
    const what = isTensor ? 'is a free tensor' : `is ${anisotropy!.kind}`;
    const message = `${name} ${what}, and a mixture takes isotropic media only: choose a material with one index`;
    return [{ path: `${path}.material`, message }];
  }
  const issues: Issue[] = [];
  if (isTensor && magnetized) {
    issues.push({
      path: `${path}.m`,
      message: `cannot stand beside ${name}, a free tensor that carries its own magnetization: leave m out, or choose a material with a Voigt constant`,
    });
  }
  if (isTensor && voigtScale !== undefined && voigtScale !== 1) {
    issues.push({
      path: `${path}.voigtScale`,
      message: `cannot scale ${name}, a free tensor without a Voigt constant: leave the scale (and the temperature) out, or choose a material with a Voigt constant`,
    });
  }
  if (orientationDeg !== undefined && !isTensor && anisotropy === undefined) {
    issues.push({
      path: `${path}.orientationDeg`,
      message: `needs axes to turn, and ${name} has none: leave it out, or choose a crystal`,
    });
  }
  return issues;
}
