import { describe, expect, it } from 'vitest';
import { differencesOf, farthestApart, overlapOf } from './compareCurves.ts';

// Straight lines made for the test, so that every value in between is known: a(x) = x / 100, b(x) = x / 50.
const a = { x: [400, 600, 800], y: [4, 6, 8] };
const b = { x: [500, 700, 900], y: [10, 14, 18] };

describe('overlapOf', () => {
  it('joins the samples of both where both are known', () => {
    expect(overlapOf(a, b)).toEqual({ x: [500, 600, 700, 800], a: [5, 6, 7, 8], b: [10, 12, 14, 16] });
  });

  it('takes a single sample of one at its wavelength, and samples that agree but for rounding once', () => {
    expect(overlapOf(a, { x: [632.8], y: [1] })?.a[0]).toBeCloseTo(6.328, 12);
    expect(overlapOf(a, { x: [600 * (1 + 1e-13), 900], y: [1, 2] })?.x).toHaveLength(2);
  });

  it('says when there is nothing in common', () => {
    expect(overlapOf(a, { x: [900, 1000], y: [1, 2] })).toBeNull();
  });
});

describe('differencesOf', () => {
  const pair = { a: [2, -2, 1e-6], b: [3, -3, 5] };

  it('gives percent of the size of the first, so that more is plus whatever the sign', () => {
    expect(differencesOf(pair, 'percent').slice(0, 2)).toEqual([50, -50]);
    expect(differencesOf(pair, 'ratio').slice(0, 2)).toEqual([1.5, 1.5]);
    expect(differencesOf(pair, 'difference')).toEqual([1, -1, 5 - 1e-6]);
  });

  it('gives no ratio to what is next to nothing', () => {
    expect(differencesOf(pair, 'percent')[2]).toBeNaN();
    expect(differencesOf({ a: [0, 0], b: [1, 1] }, 'ratio')).toEqual([NaN, NaN]);
  });
});

describe('farthestApart', () => {
  it('finds the largest distance and passes over gaps', () => {
    expect(farthestApart({ a: [1, 1, NaN, 1], b: [2, -3, 99, 1] })).toBe(1);
    expect(farthestApart({ a: [NaN], b: [1] })).toBeNull();
  });
});
