import { readdirSync, readFileSync } from 'node:fs';
import { compile } from 'mathjs/number';
import { describe, expect, test } from 'vitest';
import { libraryEntrySchema } from '../../shared/material.ts';
import { EV_NM } from '../../shared/units.ts';
import { compileFormula } from './formula.ts';
import { FormulaError } from './formulaTree.ts';
import { DispersionValueError } from './opticalValue.ts';

describe('a dispersion formula', () => {
  test('takes L in micrometres, E in eV and c1 ... cN in order', () => {
    expect(compileFormula('c1 + c2/L^2', [1.5, 0.004])(500)[0]).toBeCloseTo(1.516, 15);
    expect(compileFormula('sqrt(1 + (c1*L^2)/(L^2 - c2^2))', [1.25, 0])(800)).toEqual([1.5, 0]);
    expect(compileFormula('E', [])(EV_NM / 2)).toEqual([2, 0]);
  });

  test('follows the usual order of operations', () => {
    expect(compileFormula('1 - -L^2 + 2*3', [])(2000)).toEqual([11, 0]);
    expect(compileFormula('2^3^2/512', [])(1)).toEqual([1, 0]);
    expect(compileFormula('+L - 1e-3', [])(2000)).toEqual([1.999, 0]);
  });

  // eps = 2.25 + 1 * 4/(4 - E^2 - 0.5 i E) at E = 2 eV is 2.25 + 4i: by hand.
  test('may be complex where the quantity is', () => {
    const lorentz = 'c1 + c2*c3^2/(c3^2 - E^2 - i*c4*E)';
    const [n, k] = compileFormula(lorentz, [2.25, 1, 2, 0.5], 'eps')(EV_NM / 2);
    expect(n * n - k * k).toBeCloseTo(2.25, 14);
    expect(2 * n * k).toBeCloseTo(4, 14);
    expect(compileFormula('2 + 3*i', [], 'N')(500)).toEqual([2, 3]);
    expect(compileFormula('-0.02 - 0.01*i', [], 'Q')(500)).toEqual([-0.02, -0.01]);
    expect(compileFormula('re(i*i) + 4 + im(conj(-i))', [], 'N')(500)).toEqual([4, 0]);
    expect(compileFormula('sqrt(-9)', [], 'N')(500)).toEqual([0, 3]);
  });

  test('gives the shipped formulas as the parser itself evaluates them, to the last bit', () => {
    const library = new URL('../../data/library/', import.meta.url);
    let formulas = 0;
    for (const file of readdirSync(library)) {
      const { index } = libraryEntrySchema.parse(
        JSON.parse(readFileSync(new URL(file, library), 'utf8')),
      ).content;
      if (index.kind !== 'formula') continue;
      formulas += 1;
      const { expression, coefficients, rangeNm } = index;
      const evaluator = compile(expression);
      const scope = Object.fromEntries(coefficients.map((value, i) => [`c${i + 1}`, value]));
      const ours = compileFormula(expression, coefficients);
      for (let i = 0; i <= 50; i++) {
        const wavelengthNm = rangeNm[0] + ((rangeNm[1] - rangeNm[0]) * i) / 50;
        expect(ours(wavelengthNm)[0], file).toBe(evaluator.evaluate({ ...scope, L: wavelengthNm / 1000 }));
      }
    }
    expect(formulas).toBeGreaterThan(10);
  });

  const hostile: [string, string][] = [
    ['a function of the parser', 'import({}, {})'],
    ['parsing and evaluating', 'evaluate("1")'],
    ['a name of the parser', 'parser()'],
    ['a random number', 'random()'],
    ['another function', 'gamma(L)'],
    ['a function that is only a name', 'sin'],
    ['the constructor chain', 'sqrt.constructor("return process")()'],
    ['a constructor as a function', 'constructor(L)'],
    ['a prototype as a name', '__proto__'],
    ['a prototype as a function', '__proto__(L)'],
    ['a method of every object', 'toString(L)'],
    ['another one', 'hasOwnProperty(L)'],
    ['a method call', 'L.toString()'],
    ['a property', 'L.re'],
    ['an assignment', 'c1 = 2'],
    ['i assigned', 'i = 2'],
    ['L assigned and used', 'L = 3; L'],
    ['a function definition', 'f(x) = x'],
    ['sqrt defined anew', 'sqrt(x) = 7'],
    ['several statements', 'L; 2'],
    ['several lines', 'L\n2'],
    ['a matrix', '[1, 2, 3]'],
    ['an object', '{a: 1}'],
    ['an index', 'L[1]'],
    ['the end of a matrix', 'end'],
    ['a string', '"2"'],
    ['another string', "'2'"],
    ['a range', '1:1000000000'],
    ['a condition', 'L > 1 ? 2 : 3'],
    ['a comparison', 'L > 1'],
    ['a truth value', 'true'],
    ['nothing by name', 'null'],
    ['undefined', 'undefined'],
    ['a factorial', '170!'],
    ['a unit', '5 cm'],
    ['a conversion', '5 to 6'],
    ['a percentage', 'L%'],
    ['a remainder', 'L % 2'],
    ['a remainder in words', 'L mod 2'],
    ['bits', 'c1 | 1'],
    ['an elementwise product', 'L .* L'],
    ['a transpose', "L'"],
    ['a product without its sign', '2 L'],
    ['a product of parentheses', '(1)(2)'],
    ['a call of a coefficient', 'c1(L)'],
    ['infinity', 'Infinity'],
    ['infinity in an exponent', '2^(-Infinity)'],
    ['not a number', 'NaN + 1'],
    ['a number past the largest', '1/1e999'],
    ['e', 'e'],
    ['another name', 'pi * L'],
    ['a look-alike of L', '\u216c'],
    ['a look-alike of c1', '\u04411'],
    ['a full-width digit', '\uff12'],
    ['a superscript', 'L\u00b2'],
    ['a minus that is none', '1 \u2212 L'],
    ['a space that is none', '1\u00a0+ L'],
    ['a hidden character', 'c1\u200b'],
    ['text turned round', '\u202eL'],
    ['a comment', 'L # import'],
    ['a comment of another language', 'L // 2'],
    ['an escape', 'L\\u0031'],
    ['a template', '`${L}`'],
    ['a coefficient that does not exist', 'c1 + c3'],
    ['c0', 'c0'],
    ['c1 with a leading nought', 'c01'],
    ['sqrt of two things', 'sqrt(L, 2)'],
    ['sqrt of nothing', 'sqrt()'],
    ['a name hidden in an allowed operation', '1 + sqrt(L + process)'],
    ['nothing', ''],
    ['blanks', '   '],
    ['half a formula', 'sqrt(L'],
    ['a very long text', `1${'+1'.repeat(600)}`],
    ['deep nesting', '('.repeat(490) + 'L'.padEnd(10, ')')],
  ];

  test.each(hostile)('refuses %s', (_what, expression) => {
    for (const quantity of ['n', 'N', 'eps', 'Q'] as const) {
      expect(() => compileFormula(expression, [1, 2], quantity)).toThrow(FormulaError);
    }
  });

  test('a long text within the limits and a long list of coefficients are taken', () => {
    expect(compileFormula(`1${'+1'.repeat(499)}`, [])(500)).toEqual([500, 0]);
    expect(compileFormula(`${'('.repeat(50)}L${')'.repeat(50)}`, [])(500)).toEqual([0.5, 0]);
    const many = Array.from({ length: 10_000 }, (_, i) => i + 1);
    expect(compileFormula('c10000', many)(500)).toEqual([10_000, 0]);
  });

  test('says what is allowed', () => {
    expect(() => compileFormula('gamma(L)', [1, 2])).toThrow(
      'gamma(L) is not allowed in a formula: use numbers, + - * / ^, parentheses, sqrt(), exp(), log(), sin(), cos(), tan(), atan(), sinh(), cosh(), tanh(), abs(), re(), im(), conj(), L in um, E in eV and c1 to c2',
    );
    expect(() => compileFormula('n0', [])).toThrow(
      'n0 is not known here: use L in um, E in eV and no coefficients',
    );
    expect(() => compileFormula('1 + i', [])).toThrow('i needs a complex quantity, N or eps');
    expect(() => compileFormula('2 L', [])).toThrow('2 L needs a * between its factors');
  });

  test.each([
    ['a negative root', 'sqrt(1 - L^2)'],
    ['a pole', '1/(L - 2)'],
    ['a negative index', '1 - L'],
    ['no index', 'L - 2'],
    ['a huge exponent', '10^10^10'],
    ['a fractional power of less than 0', '(-L)^0.5'],
  ])('refuses %s where it is met, with the wavelength', (_what, expression) => {
    const formula = compileFormula(expression, []);
    expect(() => formula(2000)).toThrow(/at 2000 nm: n must be a real number > 0/);
    expect(() => formula(2000)).toThrow(DispersionValueError);
  });

  test.each([
    ['N', '1 - 0.1*i', 'N = 1 - 0.1i at 2000 nm: N = n + ik must be finite and not 0'],
    ['N', '-1 + i', 'N = -1 + 1i at 2000 nm'],
    ['N', '0*L', 'N = 0 + 0i at 2000 nm'],
    ['N', '1/(L - 2)', 'at 2000 nm: N = n + ik must be finite'],
    ['eps', '1 - i', 'eps = 1 - 1i at 2000 nm: eps must be finite and not 0, with an imaginary part >= 0'],
    ['eps', 'exp(L^99)', 'at 2000 nm: eps must be finite'],
    ['Q', 'log(L - 2)', 'at 2000 nm: Q must be finite'],
    ['Q', '0^(-1)', 'at 2000 nm: Q must be finite'],
  ] as const)('as %s refuses %s', (quantity, expression, message) => {
    const formula = compileFormula(expression, [], quantity);
    expect(() => formula(2000)).toThrow(message);
    expect(() => formula(2000)).toThrow(DispersionValueError);
  });
});
