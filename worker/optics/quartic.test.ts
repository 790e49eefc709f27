import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Complex } from '../../shared/complex.ts';
import { minus, modulus, plus, scaled, times } from './complexNumber.ts';
import type { Quartic } from './quartic.ts';
import { quarticRoots, refinePair } from './quartic.ts';

// Polynomials are made from known roots (Vieta), so the answer is known to rounding.

type Roots = [Complex, Complex, Complex, Complex];

function fromRoots([a, b, c, d]: Roots): Quartic {
  const [s1, p1] = [plus(a, b), times(a, b)];
  const [s2, p2] = [plus(c, d), times(c, d)];
  return {
    c3: scaled(plus(s1, s2), -1),
    c2: plus(plus(p1, p2), times(s1, s2)),
    c1: scaled(plus(times(p1, s2), times(p2, s1)), -1),
    c0: times(p1, p2),
  };
}

// On a fine grid, so that few roots fall together by the generator's love of edges.
const part = fc.integer({ min: -5000, max: 5000 }).map((n) => n / 1000);
const root = fc.tuple(part, part) as fc.Arbitrary<Complex>;
const apart = (roots: readonly Complex[], gap: number) =>
  roots.every((a, i) => roots.every((b, j) => j <= i || modulus(minus(a, b)) > gap));

/** Largest distance from a wanted root to the nearest one found that is not taken yet. */
function worstMiss(wanted: readonly Complex[], found: readonly Complex[]): number {
  const left = [...found];
  return Math.max(
    ...wanted.map((one) => {
      left.sort((a, b) => modulus(minus(b, one)) - modulus(minus(a, one)));
      return modulus(minus(left.pop() ?? [Infinity, 0], one));
    }),
  );
}

describe('quarticRoots', () => {
  test('finds four separate roots', () => {
    let tried = 0;
    fc.assert(
      fc.property(fc.tuple(root, root, root, root), (roots) => {
        if (!apart(roots, 0.1)) return;
        tried++;
        expect(worstMiss(roots, quarticRoots(fromRoots(roots)))).toBeLessThan(1e-9);
      }),
      { numRuns: 300, seed: 5 },
    );
    expect(tried).toBeGreaterThan(100);
  });

  test.each<[string, Roots, number]>([
    [
      'two double roots',
      [
        [2, 1],
        [2, 1],
        [-2, -1],
        [-2, -1],
      ],
      1e-6,
    ],
    [
      'a threefold root',
      [
        [1, 0],
        [1, 0],
        [1, 0],
        [-3, 1],
      ],
      1e-4,
    ],
    [
      'roots on both axes',
      [
        [3, 0],
        [-3, 0],
        [0, 2],
        [0, -2],
      ],
      1e-12,
    ],
    [
      'large and small',
      [
        [1e3, 1],
        [-1e3, -1],
        [1e-3, 0],
        [-1e-3, 0],
      ],
      1e-6,
    ],
    [
      'four zeros',
      [
        [0, 0],
        [0, 0],
        [0, 0],
        [0, 0],
      ],
      1e-30,
    ],
  ])('%s', (_name, roots, tolerance) => {
    expect(worstMiss(roots, quarticRoots(fromRoots(roots)))).toBeLessThan(tolerance);
  });
});

describe('refinePair', () => {
  test('takes a rough pair to full accuracy, also where its two roots coincide', () => {
    let tried = 0;
    fc.assert(
      fc.property(root, root, root, fc.boolean(), part, (a, c, d, isDouble, wobble) => {
        const b: Complex = isDouble ? a : [a[0] + 1, a[1] - 0.5];
        if (![a, b].every((x) => [c, d].every((y) => modulus(minus(x, y)) > 1))) return;
        tried++;
        const start = {
          sum: plus(plus(a, b), [1e-5 * wobble, -1e-5]),
          product: plus(times(a, b), [1e-5, 1e-5 * wobble]),
        };
        const { sum, product } = refinePair(fromRoots([a, b, c, d]), start);
        expect(modulus(minus(sum, plus(a, b)))).toBeLessThan(1e-11);
        expect(modulus(minus(product, times(a, b)))).toBeLessThan(1e-10);
      }),
      { numRuns: 300, seed: 6 },
    );
    expect(tried).toBeGreaterThan(100);
  });

  test('an exact start stays', () => {
    const quartic = fromRoots([
      [2, 1],
      [3, 0.5],
      [-2, -1],
      [-3, -0.5],
    ]);
    const { sum, product } = refinePair(quartic, { sum: [5, 1.5], product: [5.5, 4] });
    expect(modulus(minus(sum, [5, 1.5]))).toBeLessThan(1e-14);
    expect(modulus(minus(product, [5.5, 4]))).toBeLessThan(1e-14);
  });
});
