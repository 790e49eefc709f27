import type { MediumInput } from '../../shared/medium.ts';
import type { SolveRequest, SolveWarning } from '../../shared/solve.ts';
import { forEachMedium } from '../../shared/solveRules.ts';
import { Medium } from './medium.ts';
import { isPassive } from './tensor.ts';

/**
 * What is allowed but probably not meant: a medium that gives energy, and a Voigt constant without magnetization.
 *
 * @param request a request of numbers only, valid
 */
export function solveWarnings(request: SolveRequest): SolveWarning[] {
  const warnings: SolveWarning[] = [];
  request.cases.forEach((one, index) => {
    const wavelengths = [one.wavelengthNm].flat();
    forEachMedium(one, (medium, path) => {
      const where = `cases[${index}].${path}`;
      const gaining = firstGain(medium, wavelengths.length);
      if (gaining !== null) {
        const at = wavelengths.length > 1 ? ` at ${wavelengths[gaining]} nm` : '';
        warnings.push({
          case: index,
          path: where,
          message: `is not passive${at}: this tensor gives energy to the light; check the signs of k and Q`,
        });
      }
      if (medium.voigt !== undefined && medium.m === undefined) {
        warnings.push({
          case: index,
          path: `${where}.voigt`,
          message: 'has no effect without m: give the magnetization, such as "m": [0, 0, 1]',
        });
      }
    });
  });
  return warnings;
}

/** Position of the first wavelength at which the medium is not passive, or null. */
function firstGain(input: MediumInput, wavelengths: number): number | null {
  const medium = new Medium(input);
  for (let index = 0; index < (medium.isSampled ? wavelengths : 1); index++) {
    medium.load(index);
    if (!isPassive(medium.tensor)) return index;
  }
  return null;
}
