import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatDepth, layerHeights, profileHeights } from './depthScale.ts';

describe('layerHeights', () => {
  it('shows 0.4 nm and 500 nm on one drawing', () => {
    const [thin, thick] = layerHeights([0.4, 500], 430);
    expect(thin).toBeGreaterThanOrEqual(26);
    expect(thick).toBeGreaterThan(2 * thin!);
    expect(thick).toBeLessThan(200);
  });

  it('never draws a thicker layer lower, for any film', () => {
    const thickness = fc.double({ min: 0, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(fc.array(thickness, { minLength: 2, maxLength: 40 }), (thicknesses) => {
        const heights = layerHeights(thicknesses, 430);
        thicknesses.forEach((a, i) =>
          thicknesses.forEach((b, j) => {
            if (a <= b) expect(heights[i]!).toBeLessThanOrEqual(heights[j]!);
          }),
        );
        expect(Math.min(...heights)).toBeGreaterThanOrEqual(26);
      }),
    );
  });

  it('keeps many layers close and few from filling the room by force', () => {
    expect(layerHeights([3, 1, 5], 430).reduce((sum, height) => sum + height, 0)).toBeLessThan(430);
    const many = layerHeights(Array<number>(60).fill(5), 430);
    expect(many[0]).toBeLessThan(45);
  });
});

describe('formatDepth', () => {
  it('prints what the thicknesses say, without binary noise', () => {
    expect(formatDepth(0.1 + 0.2)).toBe('0.3');
    expect(formatDepth(114)).toBe('114');
    expect(formatDepth(500_000)).toBe('500 µm');
    expect(formatDepth(1e6)).toBe('1 mm');
  });
});

describe('profileHeights', () => {
  it('keeps a thousand layers within the room, on the scale of the drawing', () => {
    const heights = profileHeights(Array<number>(1000).fill(0.4), 210, 0.1);
    expect(heights.reduce((sum, height) => sum + height, 0)).toBeCloseTo(210, 6);
    const [thin, thick, thicker] = profileHeights([0, 2, 6], 30, 5);
    expect((thicker! - thin!) / (thick! - thin!)).toBeCloseTo(2, 9);
  });
});
