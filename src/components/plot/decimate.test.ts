import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decimateMinMax } from './decimate.ts';

describe('decimateMinMax', () => {
  it('keeps a short curve as it is, gaps included', () => {
    const curve = { x: [0, 1, 2, 3], y: [5, NaN, 7, 8] };
    expect(decimateMinMax(curve, 0, 3, 100)).toEqual({ x: [0, 1, 2, 3], y: [5, NaN, 7, 8] });
  });

  it('keeps a one-sample peak and a one-sample gap among a million samples', () => {
    const count = 1_000_000;
    const x = Float64Array.from({ length: count }, (_, index) => index);
    const y = new Float64Array(count);
    y[417_331] = 9;
    y[800_000] = NaN;
    const thin = decimateMinMax({ x, y }, 0, count, 800);
    expect(thin.x.length).toBeLessThanOrEqual(5 * 801);
    expect(Math.max(...thin.y.filter((value) => !Number.isNaN(value)))).toBe(9);
    expect(thin.x[thin.y.indexOf(9)]).toBe(417_331);
    expect(thin.y.filter(Number.isNaN)).toHaveLength(1);
  });

  it('has a line that reaches both edges of a window between samples', () => {
    const x = Array.from({ length: 101 }, (_, index) => index);
    const thin = decimateMinMax({ x, y: x }, 10.5, 20.5, 100);
    expect(thin.x[0]).toBe(10);
    expect(thin.x.at(-1)).toBe(21);
  });

  it('works on a grid that runs downward', () => {
    const x = [4, 3, 2, 1, 0];
    expect(decimateMinMax({ x, y: x }, 1, 2, 50).x).toEqual([3, 2, 1, 0]);
  });

  it('keeps lowest and highest value and the order of samples, for any curve', () => {
    const values = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), {
      minLength: 2,
      maxLength: 3000,
    });
    fc.assert(
      fc.property(values, fc.integer({ min: 1, max: 60 }), (y, buckets) => {
        const x = y.map((_, index) => index);
        const thin = decimateMinMax({ x, y }, 0, y.length - 1, buckets);
        expect(Math.min(...thin.y)).toBe(Math.min(...y));
        expect(Math.max(...thin.y)).toBe(Math.max(...y));
        expect(thin.x).toEqual([...thin.x].sort((a, b) => a - b));
        expect(new Set(thin.x).size).toBe(thin.x.length);
      }),
      { numRuns: 60 },
    );
  });
});
