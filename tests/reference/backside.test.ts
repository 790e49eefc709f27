import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { SolveCase, SolvePoint } from '../../shared/solve.ts';
import { muellerOf, stokesForAzimuth } from '../../worker/optics/mueller.ts';
import { solveCasePoints } from '../../worker/optics/solveRequest.ts';
import { StackSolver } from '../../worker/optics/stackSolver.ts';

// Source: 20 cases computed at 80+ digits from the formulas of physics.md section 6 by an independent solver.
type BacksideCase = { case: SolveCase; expectedPoints: SolvePoint[] };
const { cases } = JSON.parse(readFileSync(new URL('./backside-cases.json', import.meta.url), 'utf8')) as {
  cases: BacksideCase[];
};

describe('incoherent backside', () => {
  it.each(cases.map((one, index) => [index, one] as const))(
    'agrees with reference case %i to 1e-9',
    (_, one) => {
      const points = [...solveCasePoints(one.case)];
      expect(points).toHaveLength(one.expectedPoints.length);
      points.forEach((point, index) => {
        const expected = one.expectedPoints[index]!;
        expect(point.r).toBeNull();
        expect(point.t).toBeNull();
        for (const polarization of ['p', 's'] as const) {
          for (const key of ['R', 'T', 'A'] as const) {
            expect(Math.abs(point[key][polarization] - expected[key][polarization])).toBeLessThan(1e-9);
          }
          const [kerr, kerrExpected] = [point.kerr[polarization]!, expected.kerr[polarization]!];
          expect(Math.abs(kerr.rotationDeg - kerrExpected.rotationDeg)).toBeLessThan(1e-9);
          expect(Math.abs(kerr.ellipticityDeg - kerrExpected.ellipticityDeg)).toBeLessThan(1e-9);
        }
      });
    },
  );

  // Source: the incoherent sum is the coherent one averaged over the slab's phase (physics.md section 6).
  it.each([
    [0, [0, 0, 1]],
    [50, [0, 0, 1]],
    [50, [1, 0, 0]],
    [65, [0.48, 0.6, 0.64]],
  ] as [number, [number, number, number]][])(
    'is the phase average of coherent answers at %d deg, m = %j',
    (angleDeg, m) => {
      const slab = 1.52;
      const front = {
        wavelengthNm: 632.8,
        angleDeg,
        incident: { index: 1 },
        layers: [
          { thicknessNm: 2, index: [0.18, 3.43] as [number, number] },
          {
            thicknessNm: 10,
            index: [2.3, 1.1] as [number, number],
            voigt: [0.2, 0.1] as [number, number],
            m,
          },
        ],
        substrate: { index: slab },
      };
      const exit = { index: 1.33 };
      const [point] = [
        ...solveCasePoints({
          ...front,
          outputs: ['mueller'],
          backside: { incoherent: true, thicknessNm: 1e6, exit },
        }),
      ];
      const period = 632.8 / (2 * Math.sqrt(slab ** 2 - Math.sin((angleDeg * Math.PI) / 180) ** 2));
      const phases = 64;
      const mean = new Float64Array(16);
      for (let i = 0; i < phases; i++) {
        const coherent = new StackSolver({
          ...front,
          layers: [...front.layers, { thicknessNm: 1000 + (period * i) / phases, index: slab }],
          substrate: exit,
        });
        const mueller = muellerOf(coherent.solve(0, angleDeg).r);
        for (let k = 0; k < 16; k++) mean[k] = mean[k]! + mueller[k]! / phases;
      }
      point!.mueller!.flat().forEach((value, k) => expect(value).toBeCloseTo(mean[k]!, 12));
      expect(point!.R.p).toBeCloseTo(stokesForAzimuth(mean, 0)[0]!, 12);
      expect(point!.degreeOfPolarization!.p).toBeLessThan(1);
    },
  );

  it('keeps the energy of a lossless stack: R + T = 1', () => {
    const [point] = [
      ...solveCasePoints({
        wavelengthNm: 550,
        angleDeg: 40,
        incident: { index: 1 },
        layers: [{ thicknessNm: 95, index: 1.38, voigt: 0.01, m: [0, 0, 1] }],
        substrate: { index: 1.52 },
        backside: { incoherent: true, thicknessNm: 1e6, exit: { index: 1 } },
      }),
    ];
    expect(point!.R.p + point!.T.p).toBeCloseTo(1, 12);
    expect(point!.A.s).toBeCloseTo(0, 12);
  });
});
