import { describe, expect, test } from 'vitest';
import type { Complex } from '../../shared/complex.ts';
import { solveRequest } from '../../worker/optics/solveRequest.ts';
import { kerrRatio, voigtOfKerr } from '../../worker/import/bulkKerr.ts';
import { randomNumbers } from './fastRandomStack.ts';

const DEGREE = Math.PI / 180;

/** Rotation and ellipticity, rad, that the solver gives for the bulk at normal incidence, m = +z, p light. */
function solvedAngles(index: Complex, voigt: Complex, incidentIndex: number): [number, number] {
  const { results } = solveRequest({
    cases: [
      {
        wavelengthNm: 632.8,
        angleDeg: 0,
        incident: { index: incidentIndex },
        layers: [],
        substrate: { index, voigt, m: [0, 0, 1] },
      },
    ],
  });
  const { p } = results[0]!.points[0]!.kerr;
  return [p!.rotationDeg * DEGREE, p!.ellipticityDeg * DEGREE];
}

// The angles come from the solver (4x4 waves, another way than the closed formula that is inverted): physics.md sections 2
// and 3. Tolerance of the issue: 1e-9.
describe('Q from the Kerr angles of the bulk', () => {
  const inverted = (index: Complex, voigt: Complex, incidentIndex: number) =>
    voigtOfKerr(kerrRatio(...solvedAngles(index, voigt, incidentIndex)), index, incidentIndex)!;

  test('is the Q of iron: N, Q of Zak, Moog, Liu, Bader, Phys. Rev. B 43, 6423 (1991)', () => {
    const [re, im] = inverted([2.87, 3.36], [0.0376, 0.0066], 1);
    expect(Math.abs(re - 0.0376)).toBeLessThan(1e-9);
    expect(Math.abs(im - 0.0066)).toBeLessThan(1e-9);
  });

  test('is the Q of 1,000 random media, small and large, in air and under glass', () => {
    const next = randomNumbers(4);
    for (let count = 0; count < 1000; count += 1) {
      const index: Complex = [0.1 + 4 * next(), 0.1 + 5 * next()];
      const size = 10 ** (-6 + 5.4 * next());
      const phase = 2 * Math.PI * next();
      const voigt: Complex = [size * Math.cos(phase), size * Math.sin(phase)];
      const incidentIndex = count % 2 === 0 ? 1 : 1.5;
      const [re, im] = inverted(index, voigt, incidentIndex);
      const said = JSON.stringify({ index, voigt, incidentIndex });
      expect(Math.hypot(re - voigt[0], im - voigt[1]), said).toBeLessThan(1e-9);
      // Small constants keep their own digits, as far as the angles in degrees have them.
      expect(Math.hypot(re - voigt[0], im - voigt[1]) / size, said).toBeLessThan(1e-8);
    }
  });

  test('is the first-order Q for small angles, kappa = i N0 N Q / (N^2 - N0^2)', () => {
    // N = 2, N0 = 1: kappa = (2/3) i Q, so that kappa = 1e-6 i belongs to Q = 1.5e-6.
    const [re, im] = voigtOfKerr([0, 1e-6], [2, 0], 1)!;
    expect(Math.abs(re / 1.5e-6 - 1)).toBeLessThan(1e-9);
    expect(Math.abs(im)).toBeLessThan(1e-15);
  });

  test('does not exist for angles that no |Q| < 1 gives', () => {
    expect(voigtOfKerr(kerrRatio(0.7, 0.7), [3, 4], 1)).toBeNull();
  });
});
