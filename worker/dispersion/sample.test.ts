import { describe, expect, test } from 'vitest';
import { EV_NM } from '../../shared/units.ts';
import { DispersionRangeError } from './range.ts';
import { sampleIndex, sampleVoigt } from './sample.ts';

const cobalt = {
  kind: 'table' as const,
  wavelengthsNm: [199, 632.8, 1937],
  n: [1.29, 2.2, 3.87],
  k: [1.71, 4.2, 7.79],
};
const oneQ = { kind: 'table' as const, wavelengthsNm: [632.8], q: [[0.03, 0.007]] as [number, number][] };
const magnetic = { index: cobalt, voigt: oneQ };

function errorOf(action: () => unknown): DispersionRangeError {
  try {
    action();
  } catch (error) {
    if (error instanceof DispersionRangeError) return error;
    throw error;
  }
  throw new Error('nothing was thrown');
}

describe('outside the range', () => {
  test('names material, range and the wavelength asked', () => {
    const error = errorOf(() => sampleIndex('Cobalt (co-johnson-1974)', cobalt, [500, 2000, 3000]));
    expect(error.message).toContain(
      'Cobalt (co-johnson-1974) is known from 199 to 1937 nm; 2000 nm was asked',
    );
    expect(error.rangeNm).toEqual([199, 1937]);
    expect(error.wavelengthNm).toBe(2000);
  });

  test('refuses formulas and Voigt tables in the same way', () => {
    const formula = {
      kind: 'formula' as const,
      expression: '1.5',
      coefficients: [],
      rangeNm: [210, 6700] as [number, number],
    };
    expect(errorOf(() => sampleIndex('Silica', formula, [209])).message).toContain(
      'Silica is known from 210 to 6700 nm; 209 nm was asked',
    );
    const q = { ...oneQ, wavelengthsNm: [400, 800], q: [...oneQ.q, ...oneQ.q] };
    expect(
      errorOf(() => sampleVoigt('Cobalt', { ...magnetic, voigt: q }, [900], { assumeConstant: true }))
        .message,
    ).toContain('the Voigt constant of Cobalt is known from 400 to 800 nm; 900 nm was asked');
  });

  test('takes the rounding of a converted unit for the end itself', () => {
    const asked = [199 * (1 - 1e-12), EV_NM / (EV_NM / 1937) + 1e-10];
    expect(Array.from(sampleIndex('Cobalt', cobalt, asked).n)).toEqual([1.29, 3.87]);
    expect(() => sampleIndex('Cobalt', cobalt, [199 * (1 - 1e-8)])).toThrow(DispersionRangeError);
  });

  test('refuses what is not a number', () => {
    expect(() => sampleIndex('Cobalt', cobalt, [Number.NaN])).toThrow(DispersionRangeError);
  });
});

describe('a constant known at one wavelength', () => {
  test('is used there without asking', () => {
    const { re, im } = sampleVoigt('Cobalt', magnetic, [632.8, 632.8 * (1 + 1e-12)]);
    expect(Array.from(re)).toEqual([0.03, 0.03]);
    expect(Array.from(im)).toEqual([0.007, 0.007]);
  });

  test('is refused elsewhere with the two remedies', () => {
    const error = errorOf(() => sampleVoigt('Cobalt (co-johnson-1974)', magnetic, [632.8, 700]));
    expect(error.message).toBe(
      'the Voigt constant of Cobalt (co-johnson-1974) is known at 632.8 nm only; 700 nm was asked: allow this constant at other wavelengths in the stack, or work at 632.8 nm',
    );
  });

  test('is used elsewhere when that is allowed', () => {
    const { re } = sampleVoigt('Cobalt', magnetic, [400, 700], { assumeConstant: true });
    expect(Array.from(re)).toEqual([0.03, 0.03]);
  });
});

test('a million wavelengths of a table take a fraction of a second', () => {
  const wavelengthsNm = Float64Array.from({ length: 1_000_000 }, (_, i) => 200 + i * 1.7e-3);
  const start = performance.now();
  const { n } = sampleIndex('Cobalt', cobalt, wavelengthsNm);
  expect(n).toHaveLength(1_000_000);
  // About 0.07 s on the machine this was written on; the bound only catches a search that is not one.
  expect(performance.now() - start).toBeLessThan(3_000);
});
