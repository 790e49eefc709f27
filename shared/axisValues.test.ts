import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { SweepAxis } from './run.ts';
import { axisValueAt, axisValues } from './axisValues.ts';

const axis = (overrides: Partial<SweepAxis> = {}): SweepAxis =>
  ({ kind: 'wavelength', from: 400, to: 800, points: 5, spacing: 'linear', ...overrides }) as SweepAxis;

describe('axisValues', () => {
  it('spaces linearly with both ends', () => {
    expect(axisValues(axis())).toEqual([400, 500, 600, 700, 800]);
  });

  it('runs downward when from exceeds to', () => {
    expect(axisValues(axis({ from: 800, to: 400 }))).toEqual([800, 700, 600, 500, 400]);
  });

  it('spaces by equal ratios on a log axis', () => {
    const values = axisValues(axis({ from: 1, to: 10_000, spacing: 'log' }));
    expect(values[0]).toBe(1);
    expect(values[4]).toBe(10_000);
    expect(values[1]).toBeCloseTo(10, 12);
    expect(values[2]).toBeCloseTo(100, 11);
  });

  it('stands at from when there is one point', () => {
    expect(axisValues(axis({ points: 1 }))).toEqual([400]);
  });

  it('gives the same values in pieces as in one go', () => {
    const whole = axisValues(axis({ points: 101, from: 0.3, to: 0.7 }));
    expect([
      ...axisValues(axis({ points: 101, from: 0.3, to: 0.7 }), 0, 40),
      ...axisValues(axis({ points: 101, from: 0.3, to: 0.7 }), 40, 61),
    ]).toEqual(whole);
  });

  it('has exact ends and never leaves them, for any axis', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-3, max: 1e6, noNaN: true }),
        fc.double({ min: 1e-3, max: 1e6, noNaN: true }),
        fc.integer({ min: 2, max: 1_000_000 }),
        fc.constantFrom('linear' as const, 'log' as const),
        fc.nat(),
        (from, to, points, spacing, seed) => {
          const swept = axis({ from, to, points, spacing });
          expect(axisValueAt(swept, 0)).toBe(from);
          expect(axisValueAt(swept, points - 1)).toBe(to);
          const value = axisValueAt(swept, seed % points);
          expect(value).toBeGreaterThanOrEqual(Math.min(from, to));
          expect(value).toBeLessThanOrEqual(Math.max(from, to));
        },
      ),
    );
  });
});
