import { describe, expect, it } from 'vitest';
import { effectInWords } from './effectInWords.ts';

// Numbers made for the test.
const effect = {
  reading: 'rotationP' as const,
  grid: [400, 632.8, 800],
  values: [
    [-0.02, -0.01, 0],
    [-0.025, -0.012, 0],
  ] as const,
  names: ['pt-one', 'pt-two'] as const,
  workingNm: 632.8,
};

describe('effectInWords', () => {
  it('names the wavelength of the largest difference and the working point', () => {
    expect(effectInWords(effect)).toBe(
      'Largest difference at 400 nm: −20.00 mdeg with pt-one, −25.00 mdeg with pt-two, that is −5.000 mdeg (−25 %). ' +
        'At the working point, 632.8 nm: −10.00 mdeg and −12.00 mdeg (−20 %).',
    );
  });

  it('says when nothing changes, and when there is nothing to read', () => {
    expect(
      effectInWords({
        ...effect,
        values: [
          [1, 2, 3],
          [1, 2, 3],
        ],
      }),
    ).toBe('The exchange changes nothing.');
    expect(effectInWords({ ...effect, values: [[NaN], [NaN]] })).toMatch(/^No reading exists/);
  });

  it('leaves out a percentage of nothing', () => {
    expect(effectInWords({ ...effect, grid: [632.8], values: [[0], [0.001]] })).toBe(
      'Largest difference at 632.8 nm: 0 mdeg with pt-one, +1.000 mdeg with pt-two, that is +1.000 mdeg.',
    );
  });
});
