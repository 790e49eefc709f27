import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { sampleIndex } from './sample.ts';

// Properties of the method itself: F. N. Fritsch and R. E. Carlson, SIAM J. Numer. Anal. 17, 238 (1980).
const table = (wavelengthsNm: number[], k: number[]) => ({
  kind: 'table' as const,
  wavelengthsNm,
  n: k.map(() => 1),
  k,
});

const rising = fc
  .uniqueArray(fc.double({ min: 100, max: 5000, noNaN: true }), { minLength: 2, maxLength: 30 })
  .map((values) => Array.from(values).sort((a, b) => a - b))
  .filter((values) => values.every((value, i) => i === 0 || value - values[i - 1]! > 1e-3));

const curve = rising.chain((wavelengthsNm) =>
  fc.record({
    wavelengthsNm: fc.constant(wavelengthsNm),
    k: fc.array(fc.oneof(fc.double({ min: 0, max: 10, noNaN: true }), fc.constant(0)), {
      minLength: wavelengthsNm.length,
      maxLength: wavelengthsNm.length,
    }),
  }),
);

function between(wavelengthsNm: number[], stepsPerInterval: number): number[] {
  const steps: number[] = [];
  for (let i = 0; i + 1 < wavelengthsNm.length; i++) {
    const from = wavelengthsNm[i]!;
    const to = wavelengthsNm[i + 1]!;
    for (let step = 0; step < stepsPerInterval; step++)
      steps.push(from + ((to - from) * step) / stepsPerInterval);
  }
  return [...steps, wavelengthsNm[wavelengthsNm.length - 1]!];
}

describe('interpolation of a table', () => {
  test('gives the table points back to the last bit', () => {
    fc.assert(
      fc.property(curve, ({ wavelengthsNm, k }) => {
        expect(Array.from(sampleIndex('x', table(wavelengthsNm, k), wavelengthsNm).k)).toEqual(
          k.map((value) => value + 0),
        );
      }),
    );
  });

  test('stays between neighbouring points and is monotone between them', () => {
    fc.assert(
      fc.property(curve, ({ wavelengthsNm, k }) => {
        const steps = 25;
        const sampled = sampleIndex('x', table(wavelengthsNm, k), between(wavelengthsNm, steps)).k;
        for (let i = 0; i + 1 < k.length; i++) {
          const inside = Array.from(sampled.slice(i * steps, (i + 1) * steps + 1));
          const direction = Math.sign(k[i + 1]! - k[i]!);
          for (const value of inside) {
            expect(value).toBeGreaterThanOrEqual(Math.min(k[i]!, k[i + 1]!));
            expect(value).toBeLessThanOrEqual(Math.max(k[i]!, k[i + 1]!));
          }
          for (let j = 1; j < inside.length; j++) {
            // Rounding of one step of the cubic is all that may go backwards.
            expect((inside[j]! - inside[j - 1]!) * direction).toBeGreaterThanOrEqual(-1e-13);
          }
        }
      }),
    );
  });

  test('follows a straight line over photon energy exactly, and a smooth curve closely', () => {
    const wavelengthsNm = [300, 340, 410, 480, 560, 650, 800, 1000];
    const asked = between(wavelengthsNm, 20);
    const line = sampleIndex(
      'x',
      table(
        wavelengthsNm,
        wavelengthsNm.map((w) => 1000 / w),
      ),
      asked,
    ).k;
    asked.forEach((wavelength, i) => expect(line[i]).toBeCloseTo(1000 / wavelength, 12));
    const bend = (w: number) => Math.exp(300 / w);
    const bent = sampleIndex('x', table(wavelengthsNm, wavelengthsNm.map(bend)), asked).k;
    asked.forEach((wavelength, i) => expect(Math.abs(bent[i]! / bend(wavelength) - 1)).toBeLessThan(1e-3));
  });

  test('has no jump in slope at a table point', () => {
    const steps = table([300, 400, 500, 600, 700], [1, 1.5, 3, 3.2, 5]);
    const d = 1e-3;
    for (const at of [400, 500, 600]) {
      const [before, here, after] = sampleIndex('x', steps, [at - d, at, at + d]).k;
      expect((here! - before!) / d).toBeCloseTo((after! - here!) / d, 4);
    }
  });

  test('does not depend on the order in which wavelengths are asked', () => {
    const data = table([300, 400, 500, 600, 700], [1, 1.5, 0, 3.2, 5]);
    const asked = [699, 301, 555, 300, 700, 450, 451];
    const together = sampleIndex('x', data, asked).k;
    asked.forEach((wavelength, i) => expect(sampleIndex('x', data, [wavelength]).k[0]).toBe(together[i]));
  });
});
