import { describe, expect, test } from 'vitest';
import { signChanges } from './signChanges.ts';

const grid = Array.from({ length: 91 }, (_, index) => index);
const never = () => false;
const of = (f: (x: number) => number) => signChanges(f, grid, grid.map(f), never);

// Zeros of elementary functions: exact by their definition.
describe('passages through 0', () => {
  test('are found to 1e-9, with their sense', () => {
    const found = of((x) => Math.cos(x / 10));
    const exact = [1, 3, 5].map((odd) => odd * 5 * Math.PI);
    expect(found.map(({ rising }) => rising)).toEqual([false, true, false]);
    found.forEach(({ at }, index) => expect(Math.abs(at - exact[index]!)).toBeLessThan(1e-9));
  });

  test('of two between neighbouring points of the grid are both found', () => {
    const found = of((x) => (x - 40.3) * (x - 40.6));
    expect(found.map(({ rising }) => rising)).toEqual([false, true]);
    expect(found[0]!.at).toBeCloseTo(40.3, 9);
    expect(found[1]!.at).toBeCloseTo(40.6, 9);
  });

  test('on a point of the grid counts once, one that only touches 0 not at all', () => {
    expect(of((x) => x - 45)).toEqual([{ at: 45, rising: true }]);
    expect(of((x) => (x - 45.5) ** 2)).toEqual([]);
  });

  test('are not the poles and the folds', () => {
    expect(of((x) => 1 / (x - 40.25))).toEqual([]);
    // An angle folded into (-90, 90]: it passes 0 at 18 and 54 and jumps at 36 and 72.
    const folded = of((x) => 5 * x - 180 * Math.round((5 * x) / 180));
    expect(folded.map(({ at }) => Math.round(at * 1e6) / 1e6)).toEqual([36, 72]);
  });

  test('are not sought where a value says nothing', () => {
    const noise = signChanges(
      (x) => (x % 2 === 0 ? 1e-17 : -1e-17),
      grid,
      grid.map((x) => (x % 2 === 0 ? 1e-17 : -1e-17)),
      (value) => Math.abs(value) < 1e-15,
    );
    expect(noise).toEqual([]);
    expect(of((x) => (x < 30 ? NaN : x - 60))).toEqual([{ at: 60, rising: true }]);
  });
});
