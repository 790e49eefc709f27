import { describe, expect, it } from 'vitest';
import { relationColours } from './relationColours.ts';

// Expected values: the definitions in relationColours.ts, worked by hand.
describe('colours of what is against the reference', () => {
  it('of a difference reach to the largest on either side of 0', () => {
    expect(relationColours('difference', [1, -3, NaN], [10, 20, 5])).toEqual({
      ...{ low: -3, high: 3, signed: true, beyond: 0 },
    });
  });

  it('of a ratio are about 1 and leave out the few that are large, with their number', () => {
    const ratios = Float64Array.from({ length: 100 }, (_, index) => (index === 7 ? 1e6 : 1 + index / 1000));
    const { low, high, beyond } = relationColours('ratio', ratios, ratios);
    expect(low).toBeCloseTo(0.902, 9);
    expect(high).toBeCloseTo(1.098, 9);
    expect(beyond).toBe(2);
  });

  it('do not draw the rounding of doubles', () => {
    expect(relationColours('difference', [1e-15, -2e-15], [4, -8])).toMatchObject({ low: -8, high: 8 });
    expect(relationColours('ratio', [1, 1], [4, 8])).toMatchObject({ low: 0, high: 2 });
  });
});
