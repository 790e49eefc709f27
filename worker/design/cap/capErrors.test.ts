import { describe, expect, test } from 'vitest';
import type { CapDesign } from '../../../shared/capDesign.ts';
import { capDesignSchema } from '../../../shared/capDesign.ts';
import { toSolveCase } from '../../../shared/stackCase.ts';
import type { StackDocument } from '../../../shared/stack.ts';
import { resolveCase } from '../../dispersion/resolveCase.ts';
import { solveRequest } from '../../optics/solveRequest.ts';
import { CapCurves } from './capCurves.ts';
import { capOutcome } from './capOutcome.ts';
import { CapSamples } from './capSamples.ts';
import { weakestPoint } from './weakestPoint.ts';

const gold = { index: [0.18, 3.43] as [number, number] };
const platinum = { index: [2.33, 4.14] as [number, number] };
const cobalt = { index: [2.25, 4.07] as [number, number], voigt: [0.03, 0.01] as [number, number] };
const workingPoint: StackDocument['workingPoint'] = {
  wavelengthNm: 632.8,
  angleDeg: 0,
  input: 'p',
  magnetization: { mode: 'drawn' },
};

/** Round constants at 632.8 nm; what is compared does not depend on them. */
function buildDesign(overrides: Partial<CapDesign> = {}): CapDesign {
  return capDesignSchema.parse({
    kind: 'cap',
    document: {
      incident: { index: 1 },
      layers: [
        { id: 'co', medium: cobalt, thicknessNm: 3, m: [0, 0, 1] },
        { id: 'pt', medium: platinum, thicknessNm: 4 },
      ],
      substrate: { index: [3.88, 0.02] },
      workingPoint,
    },
    replaces: [],
    candidates: [
      {
        id: 'pair',
        label: 'Au on Pt',
        layers: [
          { medium: gold, leastNm: 1.9, leastSource: 'made up', fixedNm: null },
          { medium: platinum, leastNm: 0.9, leastSource: 'made up', fixedNm: 1 },
        ],
      },
    ],
    range: { fromNm: 2, toNm: 6, points: 3 },
    points: [{ id: 'a', label: 'polar', workingPoint }],
    signal: 'rotation',
    demands: {},
    tolerance: { ratePercent: 6, randomPercent: 3, samples: 1500, seed: 5 },
    leastYield: 0.5,
    ...overrides,
  });
}

function outcomeOf(design: CapDesign, nm: number[], bare: (number | null)[]) {
  const curves = new CapCurves(design, design.candidates[0]!.id, []);
  const { samples: count } = design.tolerance;
  const samples = new CapSamples({ points: design.points.length, thicknesses: nm.length, samples: count });
  for (let sample = 0; sample < count; sample += 1) samples.fill(sample, nm, curves);
  return capOutcome(design, curves, nm, samples, bare);
}

/** The rotation of a film as the solve contract gives it: against the same film without magnetization. */
function rotationOf(layers: StackDocument['layers']): number {
  const document = { ...buildDesign().document, layers };
  const cases = [undefined, { mode: 'direction' as const, m: [0, 0, 0] as [number, number, number] }].map(
    (magnetization) => resolveCase(toSolveCase(document, 632.8, 0, magnetization), new Map()),
  );
  const [given, zero] = solveRequest({ cases }).results.map(({ points }) => points[0]!.kerr.p!.rotationDeg);
  return given! - zero!;
}

/** Park and Miller's generator (Commun. ACM 31, 1192 (1988)) and the sum of twelve: nothing in common with ours. */
function otherNormals(seed: number): () => number {
  let state = seed;
  const uniform = () => (state = (16_807 * state) % 2_147_483_647) / 2_147_483_647;
  return () => Array.from({ length: 12 }, uniform).reduce((sum, one) => sum + one, -6);
}

const layersOf = (au: number, cap: number, co: number, pt: number): StackDocument['layers'] => [
  { id: 'au', medium: gold, thicknessNm: Math.max(0, au) },
  { id: 'cap', medium: platinum, thicknessNm: cap },
  { id: 'co', medium: cobalt, thicknessNm: co, m: [0, 0, 1] },
  { id: 'pt', medium: platinum, thicknessNm: pt },
];

describe('errors of a film with a cap', () => {
  test('give the band and the yield that a brute-force calculation by other random numbers gives', () => {
    const limit = 0.85 * Math.abs(rotationOf(layersOf(2, 1, 3, 4)));
    const design = buildDesign({ demands: { leastRotationDeg: limit } });
    const nm = [2, 4];
    const ours = outcomeOf(design, nm, [1]);
    const count = 1500;
    const next = otherNormals(4_711);
    for (const [position, nominal] of nm.entries()) {
      const signals: number[] = [];
      let met = 0;
      for (let sample = 0; sample < count; sample += 1) {
        // Platinum of the cap and of the buffer is grown at one rate.
        const [au, pt, co] = [0.06 * next(), 0.06 * next(), 0.06 * next()];
        const grown = (thickness: number, rate: number) => thickness * (1 + rate + 0.03 * next());
        const [top, below] = [grown(nominal, au), grown(1, pt)];
        const signal = Math.abs(rotationOf(layersOf(top, below, grown(3, co), grown(4, pt))));
        signals.push(signal);
        if (signal >= limit && top >= 1.9 && below >= 0.9) met += 1;
      }
      const mean = signals.reduce((sum, one) => sum + one, 0) / count;
      const deviation = Math.sqrt(signals.reduce((sum, one) => sum + (one - mean) ** 2, 0) / (count - 1));
      // Three standard errors of the difference of two quantiles of a normal distribution, and of two shares.
      const error = 3 * (Math.sqrt(0.1587 * 0.8413) / 0.24197) * deviation * Math.sqrt(2 / count);
      const sorted = signals.toSorted((a, b) => a - b);
      const { signalLow, signalHigh } = ours.points[0]!;
      expect(Math.abs(signalLow[position]! - sorted[Math.round(0.1587 * count)]!)).toBeLessThan(error);
      expect(Math.abs(signalHigh[position]! - sorted[Math.round(0.8413 * count)]!)).toBeLessThan(error);
      const share = met / count;
      expect(Math.abs(ours.yield[position]! - share)).toBeLessThanOrEqual(
        3 * Math.sqrt((2 * share * (1 - share)) / count),
      );
    }
    // Neither all nor none, so that the comparison of shares says something.
    expect(ours.yield[0]).toBeGreaterThan(0.3);
    expect(ours.yield[0]).toBeLessThan(0.9);
  });

  test('a film without the signal keeps its demands: a best thickness, no cost, no slope', () => {
    const quick = { ...buildDesign().tolerance, samples: 100 };
    const none = buildDesign({
      points: [
        {
          id: 'a',
          label: 'off',
          workingPoint: { ...workingPoint, magnetization: { mode: 'direction', m: [0, 0, 0] } },
        },
      ],
      tolerance: quick,
    });
    const { best, obstacle, points } = outcomeOf(none, [3, 6], [0]);
    expect(obstacle).toBeNull();
    expect(best!.thicknessNm).toBe(3);
    expect(points[0]!.costPercent).toEqual([null, null]);
    expect(points[0]!.slopePercentPerNm).toEqual([null, null]);
  });

  test('a film that reflects nothing has no best cap, and the reason says so', () => {
    // Nothing differs from the surroundings, so that Fresnel's equations give 0.
    const nothing = { index: 1 };
    const design = buildDesign({
      document: { ...buildDesign().document, layers: [], substrate: nothing },
      candidates: [
        {
          id: 'air',
          label: 'air',
          layers: [{ medium: nothing, leastNm: 0, leastSource: 'made up', fixedNm: null }],
        },
      ],
      tolerance: { ...buildDesign().tolerance, samples: 100 },
    });
    const { best, obstacle } = outcomeOf(design, [3, 6], [null]);
    expect(best).toBeNull();
    expect(obstacle).toBe(
      'There is no Kerr rotation for any thickness that protects: the film reflects nothing.',
    );
  });

  test('a working point at which the bare film shows nothing does not decide', () => {
    expect(weakestPoint([1e-15, 0.03, 0.02], [1e-15, 0.04, 0.04])).toEqual({ point: 2, worth: 0.5 });
    expect(weakestPoint([0.03, 0.02], [0, null])).toEqual({ point: 1, worth: 0.02 });
  });

  test('the slope at a change of sign is that of the signed signal', () => {
    // The rotation of this film passes 0 several times under a thick dielectric; found by bisection.
    const design = buildDesign({
      signal: 'rotation',
      candidates: [
        {
          id: 'dielectric',
          label: 'dielectric',
          layers: [{ medium: { index: 2 }, leastNm: 0, leastSource: 'made up', fixedNm: null }],
        },
      ],
    });
    const curves = new CapCurves(design, 'dielectric', []);
    const at = (nm: number) => curves.nominal([nm])[0]![0]!.rotationDeg!;
    const grid = Array.from({ length: 60 }, (_, i) => 5 * i);
    const from = grid.findIndex((nm, i) => i > 0 && at(nm) * at(grid[i - 1]!) < 0);
    expect(from).toBeGreaterThan(0);
    let [low, high] = [grid[from - 1]!, grid[from]!];
    while (high - low > 1e-4) {
      const middle = (low + high) / 2;
      if (at(low) * at(middle) <= 0) high = middle;
      else low = middle;
    }
    const near = high + 1e-3;
    const expected = (100 * (at(near + 1e-4) - at(near - 1e-4))) / 2e-4 / at(near);
    expect(curves.slopes([near])[0]![0]! / expected).toBeCloseTo(1, 3);
    expect(Math.abs(expected)).toBeGreaterThan(10_000);
  });
});
