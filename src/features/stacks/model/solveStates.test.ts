import { describe, expect, it } from 'vitest';
import type { SolvePoint } from '../../../../shared/solve.ts';
import { curveRequest, sweepPoints, readSweepResponse, statesFor, sweepRequest } from './solveStates.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import type { Sweep } from './solveStates.ts';
import { buildDocument } from './stackFixtures.ts';

/** A point with the numbers that the readings look at; the rest does not matter here. */
function buildPoint(rotationDeg: number, reflectance = 0.5): SolvePoint {
  const zero: [number, number] = [0, 0];
  const jones = { pp: zero, ps: zero, sp: [3e-4, 4e-4] as [number, number], ss: zero };
  const angles = { rotationDeg, ellipticityDeg: 2 * rotationDeg };
  return {
    wavelengthNm: 632.8,
    angleDeg: 60,
    r: jones,
    t: null,
    R: { p: reflectance, s: reflectance },
    T: { p: 0, s: 0 },
    A: { p: 0, s: 0 },
    kerr: { p: angles, s: null },
  };
}

describe('a sweep', () => {
  const document = buildDocument();
  const grid = [1, 2, 4];
  const axis = { kind: 'thickness', layerId: 'co', from: 1, to: 4, points: 3, spacing: 'log' } as const;
  const sweep: Sweep = { axis, grid, readings: ['rotationP', 'reflectanceP'] };

  it('asks only for the states that its readings are made of', () => {
    expect(statesFor(['reflectanceP', 'crossSp'])).toEqual(['given']);
    expect(statesFor(['rotationS'])).toEqual(['given', 'zero']);
    expect(statesFor(['contrastP'])).toEqual(['given', 'reversed']);
  });

  it('has one case a thickness and state, and one case a state for an angle', () => {
    const request = sweepRequest(document, document.workingPoint, sweep);
    expect(request.cases.map(({ layers }) => layers[1])).toMatchObject([
      { thicknessNm: 1, m: [0, 0, 1] },
      { thicknessNm: 2, m: [0, 0, 1] },
      { thicknessNm: 4, m: [0, 0, 1] },
      { thicknessNm: 1, m: [0, 0, 0] },
      { thicknessNm: 2, m: [0, 0, 0] },
      { thicknessNm: 4, m: [0, 0, 0] },
    ]);
    const angle: Sweep = { ...sweep, axis: { ...axis, kind: 'angle' } as never, grid: [0, 45] };
    expect(sweepRequest(document, document.workingPoint, angle).cases).toMatchObject([
      { angleDeg: [0, 45], wavelengthNm: 632.8 },
      { angleDeg: [0, 45] },
    ]);
  });

  it('runs over the family outermost and the first axis innermost', () => {
    const map: Sweep = {
      ...sweep,
      readings: ['reflectanceP'],
      second: { axis: { kind: 'voigtScale', from: 0, to: 1, points: 2, spacing: 'linear' }, grid: [0, 1] },
      family: { axis: { ...axis, kind: 'angle', from: 10, to: 20 } as never, grid: [10, 20] },
    };
    const { cases } = sweepRequest(document, document.workingPoint, map);
    expect(sweepPoints(map)).toBe(12);
    expect(cases.map(({ angleDeg }) => angleDeg)).toEqual([
      ...Array<number>(6).fill(10),
      ...Array<number>(6).fill(20),
    ]);
    expect(cases.slice(0, 6).map(({ layers }) => layers[1])).toMatchObject([
      { thicknessNm: 1, voigtScale: 0 },
      { thicknessNm: 2, voigtScale: 0 },
      { thicknessNm: 4, voigtScale: 0 },
      { thicknessNm: 1, voigtScale: 1 },
      { thicknessNm: 2, voigtScale: 1 },
      { thicknessNm: 4, voigtScale: 1 },
    ]);
  });

  it('asks for the ceiling only in the state that is read', () => {
    const { cases } = sweepRequest(document, document.workingPoint, {
      ...sweep,
      readings: ['ceilingShare', 'rotationP'],
    });
    expect(cases.map(({ outputs }) => outputs)).toEqual([
      ...Array<string[]>(3).fill(['ceiling']),
      ...Array<undefined>(3).fill(undefined),
    ]);
  });

  it('reads the answer into columns, the same whether points come in one result or in many', () => {
    const points = [0.1, 0.2, 0.4, 0.01, 0.02, 0.04].map((angle) => buildPoint(angle));
    const many = readSweepResponse({ results: points.map((point) => ({ points: [point] })) }, sweep);
    const few = readSweepResponse(
      { results: [{ points: points.slice(0, 3) }, { points: points.slice(3) }] },
      sweep,
    );
    expect(many).toEqual(few);
    expect(Array.from(many.rotationP!)).toEqual([0.1 - 0.01, 0.2 - 0.02, 0.4 - 0.04]);
    expect(Array.from(many.reflectanceP!)).toEqual([0.5, 0.5, 0.5]);
  });
});

describe('a curve', () => {
  const document = buildDocument();
  const asked = (change: Partial<StackDocument>, wavelengthNm = 632.8) => {
    const axis = { kind: 'wavelength', from: 400, to: 800, points: 2, spacing: 'linear' } as const;
    const point = { ...document.workingPoint, wavelengthNm };
    const sweep: Sweep = { axis, grid: [400, 800], readings: ['rotationP'] };
    return curveRequest({ ...document, ...change }, point, sweep, new Map()).strip;
  };

  it('brings the strip along where the strip need not go ahead of it', () => {
    expect(asked({})).toBe(true);
    expect(asked({ spread: { shape: 'normal', divergenceDeg: 1 } })).toBeUndefined();
    expect(asked({ substrateGradedNm: 1 })).toBeUndefined();
    expect(asked({ substrate: { index: 1.6, extraordinary: 1.5 } })).toBeUndefined();
  });

  it('does not fail by a working point outside of it', () => {
    expect(asked({}, 900)).toBeUndefined();
  });
});
