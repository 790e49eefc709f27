import type { Complex as MathComplex } from 'mathjs';
import { complex, evaluate } from 'mathjs';
import { expect, test } from 'vitest';
import { formulaFunctions } from './formulaAlgebra.ts';
import { compileFormula } from './formula.ts';

const arguments_ = [
  [0.3, 0.4],
  [-1.2, 2.5],
  [-3, -0.7],
  [2, -4],
  [0.1, 1e-9],
  [1.5, 0],
  [0, 3],
] as const;

const expressions = [
  ...formulaFunctions.map((name) => `${name}(c1 + c2*i)`),
  '(c1 + c2*i)^3',
  '(c1 + c2*i)^(-2)',
  '(c1 + c2*i)^0.37',
  '(c1 + c2*i)^(0.5 + 1.2*i)',
  '(c1 + c2*i)/(c2 - c1*i + 0.2)',
  '-(c1 + c2*i)*(2 - i) - c1',
];

// Source: mathjs, the general library, with its own complex type.
test.each(expressions)('%s is what mathjs gives', (expression) => {
  for (const [c1, c2] of arguments_) {
    const [re, im] = compileFormula(expression, [c1, c2], 'Q')(500);
    const value = evaluate(expression, { c1, c2 }) as number | MathComplex;
    const expected = complex(typeof value === 'number' ? value : value.toString());
    const size = Math.hypot(expected.re, expected.im);
    expect(Math.hypot(re - expected.re, im - expected.im)).toBeLessThan(1e-13 * (1 + size));
  }
});

test('the tangents stay finite where sine and cosine overflow', () => {
  // tan(x + iy) -> i and tanh(x + iy) -> 1 for large y and x: Abramowitz and Stegun 4.3.57, 4.5.51, limits.
  expect(compileFormula('tan(1 + 900*i)', [], 'Q')(500)).toEqual([
    expect.closeTo(0, 15),
    expect.closeTo(1, 15),
  ]);
  expect(compileFormula('tanh(900 + i)', [], 'Q')(500)).toEqual([
    expect.closeTo(1, 15),
    expect.closeTo(0, 15),
  ]);
});
