import { describe, expect, it } from 'vitest';
import { relate, resample, sizeOf } from './curveDifference.ts';

const reference = { x: [0, 1, 2, 3], y: [1, 2, 4, 0] };

// Expected values: linear interpolation and the definition of the root mean square, worked by hand.
describe('a curve against a reference', () => {
  it('is read on the axis of the reference, between its own points and not beyond them', () => {
    const coarse = { x: [0.5, 2.5], y: [10, 30] };
    expect([...resample(coarse, reference.x, false)]).toEqual([NaN, 15, 25, NaN]);
    expect([...relate('reflectanceP', 'difference', reference, coarse)]).toEqual([NaN, 13, 21, NaN]);
    expect([...relate('reflectanceP', 'ratio', reference, coarse)]).toEqual([NaN, 7.5, 6.25, NaN]);
  });

  it('keeps the gaps of both', () => {
    const gap = { x: [0, 1, 2, 3], y: [1, NaN, 4, 1] };
    expect([...relate('reflectanceP', 'difference', reference, gap)]).toEqual([0, NaN, 0, 1]);
    expect([...relate('reflectanceP', 'difference', gap, reference)]).toEqual([0, NaN, 0, -1]);
    const between = { x: [0, 1.5, 3], y: [1, NaN, 1] };
    expect([...resample(between, [0, 1, 2, 3], false)]).toEqual([1, NaN, NaN, 1]);
  });

  it('takes the shorter way between two rotations, and lets no other reading turn', () => {
    const jump = { x: [0, 2], y: [88, -88] };
    expect([...resample(jump, [0, 1, 2], true)]).toEqual([88, 90, -88]);
    expect([...resample(jump, [1], false)]).toEqual([0]);
  });

  it('has nothing between the points of an axis that counts', () => {
    const counted = { x: [1, 3, 5], y: [10, 30, 50], discrete: true };
    expect([...resample(counted, [1, 2, 3, 5, 6], false)]).toEqual([10, NaN, 30, 50, NaN]);
  });

  it('has no ratio to 0', () => {
    expect(relate('reflectanceP', 'ratio', reference, reference)[3]).toBeNaN();
  });

  it('follows an axis that runs down', () => {
    const down = { x: [3, 2, 1, 0], y: [0, 4, 2, 1] };
    expect([...relate('reflectanceP', 'difference', reference, down)]).toEqual([0, 0, 0, 0]);
    expect([...relate('reflectanceP', 'difference', down, reference)]).toEqual([0, 0, 0, 0]);
  });

  it('folds a rotation, since an ellipse turned by 180 deg is the same, and no other reading', () => {
    const at = (y: number) => ({ x: [0], y: [y] });
    expect(relate('rotationP', 'difference', at(89), at(-89))[0]).toBe(2);
    expect(relate('ellipticityP', 'difference', at(44), at(-44))[0]).toBe(-88);
    expect(relate('crossSp', 'difference', at(100), at(-100))[0]).toBe(-200);
  });
});

describe('the size of differences', () => {
  it('is the largest of either sign with its place, and the root mean square of what is there', () => {
    const size = sizeOf([3, NaN, -4, 0]);
    expect(size).toEqual({ count: 3, largest: 4, at: 2, rms: Math.sqrt(25 / 3) });
  });

  it('is none where no point has both values', () => {
    expect(sizeOf([NaN])).toEqual({ count: 0, largest: null, at: null, rms: null });
  });
});
