import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { offDiagonalOf, permittivityOf } from './permittivity.ts';

const part = fc.double({ min: -9, max: 9, noNaN: true });
const pair = fc.tuple(part, part);

describe('permittivity', () => {
  // By hand: (2.87 + 3.36i)^2 = 8.2369 - 11.2896 + 2 * 2.87 * 3.36i.
  it('squares the index', () => {
    const [re, im] = permittivityOf([2.87, 3.36]);
    expect(re).toBeCloseTo(-3.0527, 10);
    expect(im).toBeCloseTo(19.2864, 10);
  });

  // The definition eps_xy = i Q eps_d of the conventions page, in polar form: moduli multiply, angles add.
  it('gives eps_xy = i Q N^2', () => {
    fc.assert(
      fc.property(pair, pair, (voigt, index) => {
        const modulus = Math.hypot(...voigt) * Math.hypot(...index) ** 2;
        const angle = Math.PI / 2 + Math.atan2(voigt[1], voigt[0]) + 2 * Math.atan2(index[1], index[0]);
        const [re, im] = offDiagonalOf(voigt, index);
        const error = Math.hypot(re - modulus * Math.cos(angle), im - modulus * Math.sin(angle));
        expect(error).toBeLessThanOrEqual(1e-12 * modulus + 1e-300);
      }),
    );
  });

  // A real Q on a lossless index gives an imaginary eps_xy: the tensor is hermitian, nothing is absorbed.
  it('keeps a lossless magnet lossless', () => {
    expect(offDiagonalOf([0.02, 0], [2, 0])).toEqual([0, 0.08]);
  });
});
