import { formatPlain } from '../../../lib/format.ts';
import type { Description } from './describeModel.ts';

type Formula = { expression: string; coefficients: readonly number[] };

/** What a formula gives, by its quantity. */
const leftSides = { n: 'n', N: 'N = n + ik', eps: 'ε = N²', Q: 'Q' } as const;

/** A formula as it is stored, with what its letters mean. */
export function describeFormula(
  { expression, coefficients }: Formula,
  quantity: keyof typeof leftSides,
): Description {
  const letters = [
    /\bL\b/.test(expression) ? 'L is the vacuum wavelength in µm' : null,
    /\bE\b/.test(expression) ? 'E is the photon energy in eV' : null,
    quantity === 'n' ? 'k = 0' : null,
  ].filter((one) => one !== null);
  const meaning = letters.length > 0 ? `; ${letters.join(', ')}` : '';
  return {
    law: `${leftSides[quantity]} = ${expression}${meaning}.`,
    parameters: coefficients.map((value, position) => ({
      name: `c${position + 1}`,
      value: formatPlain(value),
    })),
  };
}
