import { describe, expect, test } from 'vitest';
import { compileFormula, FormulaError } from './formula.ts';

describe('a dispersion formula', () => {
  test('takes L in micrometres and c1 ... cN in order', () => {
    expect(compileFormula('c1 + c2/L^2', [1.5, 0.004])(500)).toBeCloseTo(1.516, 15);
    expect(compileFormula('sqrt(1 + (c1*L^2)/(L^2 - c2^2))', [1.25, 0])(800)).toBe(1.5);
  });

  test('follows the usual order of operations', () => {
    expect(compileFormula('1 - -L^2 + 2*3', [])(2000)).toBe(11);
    expect(compileFormula('2^3^2/512', [])(1)).toBe(1);
  });

  test.each([
    ['a function of the parser', 'import({}, {})'],
    ['another function', 'sin(L)'],
    ['the constructor chain', 'sqrt.constructor("return process")()'],
    ['a method call', 'L.toString()'],
    ['an assignment', 'c1 = 2'],
    ['a function definition', 'f(x) = x'],
    ['several statements', 'L; 2'],
    ['a matrix', '[1, 2, 3]'],
    ['an object', '{a: 1}'],
    ['an index', 'L[1]'],
    ['a string', '"2"'],
    ['a range', '1:1000000000'],
    ['a condition', 'L > 1 ? 2 : 3'],
    ['a factorial', '170!'],
    ['a unit', '5 cm'],
    ['another name', 'pi * L'],
    ['a coefficient that does not exist', 'c1 + c3'],
    ['c0', 'c0'],
    ['sqrt of two things', 'sqrt(L, 2)'],
    ['a name hidden in an allowed operation', '1 + sqrt(L + process)'],
    ['nothing', ''],
    ['half a formula', 'sqrt(L'],
    ['a very long text', `1${'+1'.repeat(600)}`],
    ['deep nesting', '('.repeat(490) + 'L'.padEnd(10, ')')],
  ])('refuses %s', (_what, expression) => {
    expect(() => compileFormula(expression, [1, 2])).toThrow(FormulaError);
  });

  test('says what is allowed', () => {
    expect(() => compileFormula('sin(L)', [1, 2])).toThrow(
      'sin(L) is not allowed in a formula: use numbers, + - * / ^, parentheses, sqrt(), L and c1 to c2',
    );
    expect(() => compileFormula('n0', [])).toThrow('n0 is not known here: use L and no coefficients');
  });

  test.each([
    ['a negative root', 'sqrt(1 - L^2)'],
    ['a pole', '1/(L - 2)'],
    ['a negative index', '1 - L'],
    ['no index', 'L - 2'],
  ])('refuses %s where it is met, with the wavelength', (_what, expression) => {
    const formula = compileFormula(expression, []);
    expect(() => formula(2000)).toThrow(/at 2000 nm: n must be a real number > 0/);
  });
});
