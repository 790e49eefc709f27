import type { Complex } from '../../shared/complex.ts';
import type { formulaQuantities } from '../../shared/dispersion.ts';
import { photonEnergyEv } from '../../shared/units.ts';
import type { FormulaAlgebra } from './formulaAlgebra.ts';
import { complexAlgebra, realAlgebra } from './formulaAlgebra.ts';
import type { FormulaEvaluator, FormulaVariables } from './formulaTree.ts';
import { FormulaError, translateFormula } from './formulaTree.ts';
import { finiteVoigt, passiveIndex, passiveRoot } from './opticalValue.ts';

/** What the value of a formula is; `n` is a real index > 0, the others may be complex. */
export type FormulaQuantity = (typeof formulaQuantities)[number] | 'Q';

/**
 * A formula as a function of the vacuum wavelength in nm; inside the expression L is the wavelength in micrometres,
 * E the photon energy in eV, c1 ... cN the coefficients, and i the imaginary unit unless the quantity is n.
 * The value is N = n + ik, for `eps` its root with n >= 0 and k >= 0, or Q.
 *
 * Expressions reach us from people. They are parsed by mathjs and evaluated here, never by it: whatever is not
 * arithmetic or one of `formulaFunctions` is refused before anything is evaluated.
 *
 * @throws FormulaError on a refused expression, DispersionValueError from the function where the value is unusable
 */
export function compileFormula(
  expression: string,
  coefficients: readonly number[],
  quantity: FormulaQuantity = 'n',
): (wavelengthNm: number) => Complex {
  const subject = `the formula ${expression}`;
  if (quantity === 'n') {
    const evaluate = evaluatorOf(expression, coefficients, realAlgebra, {});
    return (wavelengthNm) => {
      const n = evaluate(wavelengthNm);
      if (n > 0 && n < Infinity) return [n, 0];
      throw new FormulaError(`${subject} gives n = ${n} at ${wavelengthNm} nm: n must be a real number > 0`);
    };
  }
  const evaluate = evaluatorOf<Complex>(expression, coefficients, complexAlgebra, { i: [0, 1] });
  const toValue = { N: passiveIndex, eps: passiveRoot, Q: finiteVoigt }[quantity];
  return (wavelengthNm) => toValue(subject, evaluate(wavelengthNm), wavelengthNm);
}

function evaluatorOf<Value>(
  expression: string,
  coefficients: readonly number[],
  algebra: FormulaAlgebra<Value>,
  constants: Record<string, Value>,
): (wavelengthNm: number) => Value {
  const values = new Map(Object.entries(constants));
  coefficients.forEach((value, position) => values.set(`c${position + 1}`, algebra.fromNumber(value)));
  const evaluate: FormulaEvaluator<Value> = translateFormula(
    expression,
    algebra,
    values,
    coefficients.length,
  );
  return (wavelengthNm) => {
    const variables: FormulaVariables<Value> = {
      L: algebra.fromNumber(wavelengthNm / 1000),
      E: algebra.fromNumber(photonEnergyEv(wavelengthNm)),
    };
    return evaluate(variables);
  };
}
