import { describe, expect, it } from 'vitest';
import { nearestIndex, rangeWithin, valueAt } from './curveValues.ts';

describe('values along a curve', () => {
  it('finds the nearest sample in either direction', () => {
    expect(nearestIndex([0, 10, 20], 14)).toBe(1);
    expect(nearestIndex([0, 10, 20], 16)).toBe(2);
    expect(nearestIndex([20, 10, 0], 16)).toBe(0);
    expect(nearestIndex([20, 10, 0], -5)).toBe(2);
    expect(nearestIndex([], 1)).toBe(-1);
  });

  it('interpolates between samples and says nothing outside or beside a gap', () => {
    const curve = { x: [0, 10, 20], y: [1, 3, NaN] };
    expect(valueAt(curve, 10)).toBe(3);
    expect(valueAt(curve, 2.5)).toBe(1.5);
    expect(valueAt({ x: [20, 10, 0], y: [5, 3, 1] }, 2.5)).toBe(1.5);
    expect(valueAt(curve, 15)).toBeNaN();
    expect(valueAt(curve, -1)).toBeNaN();
    expect(valueAt(curve, 21)).toBeNaN();
  });

  it('takes the range of a window, of absolute values where the axis is logarithmic', () => {
    const curve = { x: [0, 1, 2, 3], y: [-8, 0, 2, 100] };
    expect(rangeWithin(curve, 0, 2, false)).toEqual([-8, 2]);
    expect(rangeWithin(curve, 0, 2, true)).toEqual([2, 8]);
    expect(rangeWithin(curve, 5, 6, false)).toBeNull();
  });
});
