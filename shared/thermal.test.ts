import { describe, expect, test } from 'vitest';
import { layerThermalSchema, magnetizationAt, thermalVoigtScale } from './thermal.ts';

// The law m(T) = (1 - (T/Tc)^a)^b with its limits by hand; Bloch's a = 3/2 and the mean-field b = 1/2 are textbook
// (Ashcroft and Mermin, Solid State Physics, ch. 33).
const nickel = { curieK: 627, a: 1.5, b: 0.5, citation: 'made up for this test' };
const build = (temperatureK: number, referenceK: number) => ({ ...nickel, temperatureK, referenceK });

describe('magnetization against temperature', () => {
  test('is 1 at 0 K and 0 from the Curie temperature on', () => {
    expect(magnetizationAt(0, nickel)).toBe(1);
    expect(magnetizationAt(627, nickel)).toBe(0);
    expect(magnetizationAt(5000, nickel)).toBe(0);
    expect(magnetizationAt(626.999, nickel)).toBeGreaterThan(0);
  });

  test('falls all the way', () => {
    for (let t = 1; t <= 627; t++) {
      expect(magnetizationAt(t, nickel)).toBeLessThan(magnetizationAt(t - 1, nickel));
    }
  });

  test('has the value of the law between', () => {
    expect(magnetizationAt(627 / 4, nickel)).toBeCloseTo(Math.sqrt(1 - 1 / 8), 14);
  });

  test('goes over into the law of Bloch at low temperature', () => {
    const t = 5;
    expect(1 - magnetizationAt(t, nickel)).toBeCloseTo(0.5 * (t / 627) ** 1.5, 6);
  });
});

describe('the scale of Q', () => {
  test('is 1 at the temperature at which Q is known, 0 above the Curie temperature, more than 1 below', () => {
    expect(thermalVoigtScale(build(295, 295))).toBe(1);
    expect(thermalVoigtScale(build(700, 295))).toBe(0);
    expect(thermalVoigtScale(build(0, 295))).toBeCloseTo(1 / magnetizationAt(295, nickel), 14);
  });
});

describe('the temperatures of a layer', () => {
  const pathsOf = (thermal: object) =>
    layerThermalSchema.safeParse(thermal).error?.issues.map(({ path }) => path.join('.')) ?? [];

  test('may be any, but Q must have been known of a magnetized sample', () => {
    expect(pathsOf(build(0, 0))).toEqual([]);
    expect(pathsOf(build(2000, 626))).toEqual([]);
    expect(pathsOf(build(295, 627))).toEqual(['referenceK']);
    // So close below that the law rounds to 0.
    expect(pathsOf({ ...build(295, 627 * (1 - 1.2e-16)), a: 0.1 })).toEqual(['referenceK']);
    expect(pathsOf(build(-1, 295))).toEqual(['temperatureK']);
  });
});
