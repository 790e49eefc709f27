import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Vector } from '../../../../shared/complex.ts';
import {
  describeM,
  drawnAngleDeg,
  isTransverse,
  lengthOf,
  turnedTo,
  withComponent,
  withLength,
} from './magnetization.ts';

describe('naming m', () => {
  it('uses the geometry along an axis, with its length where it is not saturated', () => {
    expect(describeM([0, 0, 1])).toBe('polar, +z');
    expect(describeM([-1, 0, 0])).toBe('longitudinal, −x');
    expect(describeM([0, 0.5, 0])).toBe('transverse, +y, 0.5');
    expect(describeM([0.48, 0.6, 0.64])).toBe('0.48, 0.6, 0.64');
    expect(describeM([0, 0, 0])).toBe('m = 0');
  });
});

describe('turning the arrow', () => {
  it('lands exactly on the axes', () => {
    expect(turnedTo([0, 0, 1], 0)).toEqual([1, 0, 0]);
    expect(turnedTo([1, 0, 0], -90)).toEqual([0, 0, -1]);
    expect(turnedTo([1, 0, 0], 450)).toEqual([0, 0, 1]);
  });

  it('keeps the part across the drawing, and brings a transverse m into it', () => {
    expect(turnedTo([0.6, 0.8, 0], 90)).toEqual([0, 0.8, 0.6]);
    expect(turnedTo([0, 0.7, 0], 0)).toEqual([0.7, 0, 0]);
    expect(turnedTo([0, 0, 0], 90)).toEqual([0, 0, 1]);
  });

  it('keeps the length, whatever the angle', () => {
    const part = fc.double({ min: -0.57, max: 0.57, noNaN: true });
    fc.assert(
      fc.property(part, part, part, fc.integer({ min: -720, max: 720 }), (x, y, z, angle) => {
        const m: Vector = [x, y, z];
        fc.pre(Math.hypot(x, z) > 1e-3);
        const turned = turnedTo(m, angle);
        expect(lengthOf(turned)).toBeCloseTo(lengthOf(m), 9);
        const difference = ((((drawnAngleDeg(turned) - angle) % 360) + 540) % 360) - 180;
        expect(Math.abs(difference)).toBeLessThan(1e-6);
      }),
    );
  });
});

describe('typing m', () => {
  it('keeps a typed component and shortens the others where m would be longer than 1', () => {
    const m = withComponent([0, 0, 1], 0, 0.6);
    expect(m[0]).toBe(0.6);
    expect(m[2]).toBeCloseTo(0.8, 11);
    expect(withComponent([0, 0, 0.5], 1, 0.5)).toEqual([0, 0.5, 0.5]);
    expect(lengthOf(withComponent([0.6, 0, 0.8], 1, 1))).toBe(1);
  });

  it('scales to a length and gives m = 0 a direction', () => {
    expect(withLength([0, 1, 0], 0.25)).toEqual([0, 0.25, 0]);
    expect(withLength([0, 0, 0], 1)).toEqual([0, 0, 1]);
  });
});

describe('isTransverse', () => {
  it('wants every m along y, and at least one', () => {
    expect(
      isTransverse([
        [0, 1, 0],
        [0, -0.5, 0],
        [0, 0, 0],
      ]),
    ).toBe(true);
    expect(
      isTransverse([
        [0, 1, 0],
        [0, 0, 1],
      ]),
    ).toBe(false);
    expect(isTransverse([[0, 0, 0]])).toBe(false);
    expect(isTransverse([])).toBe(false);
  });
});
