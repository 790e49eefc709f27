import { describe, expect, test } from 'vitest';
import type { Complex } from '../../shared/complex.ts';
import type { LayerInput, SolveCase } from '../../shared/solve.ts';
import { FastSolver } from '../../worker/optics/fast/fastSolver.ts';
import { compare } from './fastComparison.ts';
import { RandomStacks } from './fastRandomStack.ts';

// The fast path against the general solver, which the reference cases and the published values vouch for: two ways to
// solve the 4x4 problem of the conventions page that share no formula but the wave equation itself.

const LIMIT = 1e-9;

function expectAgreement(solveCase: SolveCase, limit = LIMIT): void {
  expect(FastSolver.canSolve(solveCase)).toBe(true);
  const difference = compare(solveCase);
  const worst = Math.max(difference.amplitude, difference.angleDeg, difference.signal);
  expect(worst <= limit, `${JSON.stringify(difference)} for ${JSON.stringify(solveCase)}`).toBe(true);
}

const co = (thicknessNm: number, voigt: Complex = [0.03, 0.01]): LayerInput => ({
  thicknessNm,
  index: [2.25, 4.07],
  voigt,
  m: [0.6, 0, 0.8],
});
const pt = (thicknessNm: number): LayerInput => ({ thicknessNm, index: [2.33, 4.14] });
const silicon = { index: [3.88, 0.02] as Complex };

const ANGLES = [0, 1e-6, 30, 60, 85, 89.9, 89.9999];

function caseOf(layers: SolveCase['layers'], overrides: Partial<SolveCase> = {}): SolveCase {
  return {
    wavelengthNm: 632.8,
    angleDeg: ANGLES,
    incident: { index: 1 },
    layers,
    substrate: silicon,
    ...overrides,
  };
}

describe('the fast path agrees with the general solver', () => {
  test.each([1, 2, 3, 4])('random stacks, seed %i', (seed) => {
    const stacks = new RandomStacks(seed);
    for (let i = 0; i < 1000; i++) expectAgreement(stacks.solveCase());
  });

  test('normal and grazing incidence', () => {
    const stacks = new RandomStacks(5);
    for (let i = 0; i < 200; i++) expectAgreement(stacks.solveCase(ANGLES));
  });

  test('a Voigt constant from 1e-15 to 0.3', () => {
    for (const size of [1e-15, 1e-12, 1e-6, 1e-2, 0.1, 0.3]) {
      expectAgreement(caseOf([pt(2), co(1, [size, size / 3]), pt(5)]));
    }
  });

  test('metals from thin to opaque, magnetic and not', () => {
    for (const thicknessNm of [1e-3, 0.1, 3, 30, 100, 300, 1e3, 1e6]) {
      expectAgreement(caseOf([pt(2), co(thicknessNm), pt(5)]));
      expectAgreement(caseOf([pt(Math.min(thicknessNm, 1e3)), co(1), pt(thicknessNm)]));
    }
  });

  test('clear layers up to a millimetre', () => {
    for (const thicknessNm of [10, 500, 3e4, 1e6]) {
      expectAgreement(caseOf([co(1), { thicknessNm, index: 1.457 }, co(1)]));
    }
  });

  test('blocks of 1,000 repeats, also inside blocks', () => {
    expectAgreement(caseOf([pt(2), { repeat: 1000, layers: [co(0.4), pt(1)] }]));
    expectAgreement(
      caseOf([
        {
          repeat: 1000,
          layers: [
            { ...co(0.4), index: 2.2, voigt: 1e-3 },
            { thicknessNm: 1, index: 1.5 },
          ],
        },
      ]),
    );
    expectAgreement(caseOf([{ repeat: 9, layers: [{ repeat: 7, layers: [pt(0.4), co(0.3)] }, pt(1)] }]));
    expectAgreement(caseOf([{ repeat: 50, layers: [co(20), pt(30)] }]));
    expectAgreement(caseOf([{ repeat: 0, layers: [co(20)] }, pt(0), co(1)]));
  });

  test('300 different layers', () => {
    const stacks = new RandomStacks(6);
    const layers = Array.from({ length: 300 }, (): LayerInput => ({
      ...stacks.medium(),
      thicknessNm: stacks.decades(0.1, 5),
    }));
    expectAgreement(caseOf(layers));
  });

  test('total reflection and a surface plasmon', () => {
    const angleDeg = Array.from({ length: 140 }, (_, i) => 20 + i / 2);
    const silver: LayerInput = { thicknessNm: 50, index: [0.06, 4.2] };
    const prism = { incident: { index: 1.515 }, substrate: { index: 1 }, angleDeg };
    expectAgreement(caseOf([silver, co(2), pt(1)], prism));
    expectAgreement(caseOf([{ ...co(200), index: 2.2, voigt: [1e-3, 0] }], prism));
  });

  // The general solver itself promises 1e-7 within 1e-6 deg of a critical angle.
  test('critical angles', () => {
    const critical = (Math.asin(1 / 1.515) * 180) / Math.PI;
    const angleDeg = [-1e-3, -1e-5, -1e-7, 0, 1e-7, 1e-5, 1e-3].map((step) => critical + step);
    const substrate = { index: 1, voigt: [1e-3, 0] as Complex, m: [0.6, 0, 0.8] as [number, number, number] };
    const beyond = { incident: { index: 1.515 }, angleDeg };
    expectAgreement(caseOf([co(2), pt(3)], { ...beyond, substrate: { index: 1 } }), 1e-7);
    expectAgreement(caseOf([co(2), { thicknessNm: 300, index: 1 }, co(2)], beyond), 1e-7);
    expectAgreement(caseOf([co(2)], { ...beyond, substrate }), 1e-7);
  });

  test('magnetic substrates', () => {
    for (const voigt of [1e-15, 1e-3, 0.1, 0.5]) {
      for (const m of [
        [0, 0, 1],
        [1, 0, 0],
        [0, 1, 0],
        [0.48, 0.6, 0.64],
      ] as [number, number, number][]) {
        expectAgreement(caseOf([pt(2)], { substrate: { index: [2.87, 3.36], voigt, m } }));
      }
    }
  });
});
