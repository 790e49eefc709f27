import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatTick, linearTicks, logScale, logTicks, niceScale } from './niceScale.ts';

describe('niceScale', () => {
  it('encloses the values with round ticks', () => {
    expect(niceScale(-13, 74)).toEqual({ min: -20, max: 80, ticks: [-20, 0, 20, 40, 60, 80] });
    expect(niceScale(0.1, 0.62)).toEqual({ min: 0.1, max: 0.7, ticks: [0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7] });
  });

  it('puts a flat curve in the middle, not on the frame', () => {
    const scale = niceScale(0.195, 0.195);
    expect(scale.min).toBeLessThan(0.195);
    expect(scale.max).toBeGreaterThan(0.195);
    expect(niceScale(0, 0)).toMatchObject({ min: -1, max: 1 });
  });

  it('encloses any values and always has at least two ticks', () => {
    const value = fc.double({ min: -1e9, max: 1e9, noNaN: true });
    fc.assert(
      fc.property(value, value, (a, b) => {
        const [low, high] = [Math.min(a, b), Math.max(a, b)];
        const scale = niceScale(low, high);
        const slack = 1e-6 * (scale.max - scale.min);
        expect(scale.min).toBeLessThanOrEqual(low + slack);
        expect(scale.max).toBeGreaterThanOrEqual(high - slack);
        expect(scale.ticks.length).toBeGreaterThanOrEqual(2);
        expect(scale.ticks.length).toBeLessThan(14);
      }),
    );
  });

  it('has an axis to show when there are no values', () => {
    expect(niceScale(Infinity, -Infinity)).toEqual({ min: 0, max: 1, ticks: [0, 0.5, 1] });
  });
});

describe('ticks', () => {
  it('stay inside a range the user has chosen', () => {
    expect(linearTicks(0, 89)).toEqual([0, 10, 20, 30, 40, 50, 60, 70, 80]);
    expect(linearTicks(412, 788, 4)).toEqual([500, 600, 700]);
    expect(logTicks(1, 100)).toEqual([1, 2, 5, 10, 20, 50, 100]);
    expect(logTicks(1e-8, 1)).toHaveLength(9);
  });

  it('stop fourteen decades below the highest value on a log scale', () => {
    expect(logScale(1e-40, 1).min).toBeCloseTo(1e-14, 20);
    expect(logScale(0.02, 3)).toMatchObject({ min: 0.01, max: 10 });
    expect(logScale(Infinity, -Infinity).ticks.length).toBeGreaterThan(1);
  });

  it('are printed with the digits that tell them apart and a true minus', () => {
    expect(formatTick(-20, [-20, 0, 20])).toBe('−20');
    expect(formatTick(0.5, [0, 0.5, 1])).toBe('0.5');
    expect(formatTick(1, [0, 0.5, 1])).toBe('1.0');
    expect(formatTick(2e-5, [0, 1e-5, 2e-5])).toBe('2e−5');
    expect(formatTick(0, [0, 1e-5])).toBe('0');
  });
});
