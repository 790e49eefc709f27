import { describe, expect, test } from 'vitest';
import type { Complex, Vector } from '../../../shared/complex.ts';
import type { SolveCase } from '../../../shared/solve.ts';
import { loadKernel } from '../../kernel/loadKernel.ts';
import { StackSolver } from '../stackSolver.ts';
import { BatchResult, COLUMN } from './batchResult.ts';
import { FastSolver } from './fastSolver.ts';

// What a batch must not change: its order, its length, what was solved before. Agreement with the general solver over
// many stacks is in tests/reference/fastSolver.test.ts.

const WAVELENGTHS = 40;
const samples = (value: (i: number) => Complex) => ({
  samples: Array.from({ length: WAVELENGTHS }, (_, i) => value(i)),
});
const m: Vector = [0.6, 0, 0.8];

/** A film whose constants change with wavelength. */
function dispersiveCase(): SolveCase {
  const cobalt = {
    index: samples((i) => [2.25 + i / 200, 4.07 - i / 100]),
    voigt: samples((i) => [0.03, i / 2000]),
    m,
  };
  return {
    wavelengthNm: Array.from({ length: WAVELENGTHS }, (_, i) => 400 + 10 * i),
    angleDeg: 0,
    incident: { index: samples((i) => [1 + i / 1000, 0]) },
    layers: [
      { index: samples((i) => [2.33 + i / 300, 4.14]), thicknessNm: 3 },
      {
        repeat: 5,
        layers: [
          { ...cobalt, thicknessNm: 0.4 },
          { index: [2.33, 4.14], thicknessNm: 1 },
        ],
      },
      { ...cobalt, thicknessNm: 2 },
      { index: 1.457, thicknessNm: 100 },
    ],
    substrate: { index: [3.88, 0.02] },
  };
}

type Point = { wavelengthIndex: number; angleDeg: number; nm?: number };

function solve(solver: FastSolver, points: Point[], path?: number[]): BatchResult {
  const out = new BatchResult(points.length, true);
  solver.solveBatch(
    {
      wavelengthIndex: Int32Array.from(points, (point) => point.wavelengthIndex),
      anglesDeg: Float64Array.from(points, (point) => point.angleDeg),
      ...(path ? { thickness: { path, nm: Float64Array.from(points, (point) => point.nm ?? 0) } } : {}),
    },
    out,
  );
  return out;
}

function expectGeneral(solveCase: SolveCase, points: Point[], out: BatchResult, path?: number[]): void {
  const general = new StackSolver(solveCase);
  points.forEach(({ wavelengthIndex, angleDeg, nm }, i) => {
    if (path) general.setThickness(path, nm ?? 0);
    const { r, T } = general.solve(wavelengthIndex, angleDeg);
    r.forEach((part, k) => expect(out.columns[COLUMN.r + k]![i]).toBeCloseTo(part, 11));
    expect(out.columns[COLUMN.transmittanceP]![i]).toBeCloseTo(T.p, 11);
  });
}

const grid = (wavelengths: number, angles: number): Point[] =>
  Array.from({ length: wavelengths * angles }, (_, i) => ({
    wavelengthIndex: Math.floor(i / angles),
    angleDeg: (85 * (i % angles)) / Math.max(1, angles - 1),
  }));

describe('batches', () => {
  test.each([
    ['a map of long runs', grid(3, 250)],
    ['a map of short runs', grid(40, 5)],
    ['a spectrum', grid(40, 1)],
    ['one point', grid(1, 1)],
    ['an odd count', grid(1, 13)],
    [
      'wavelengths in no order',
      grid(40, 5).map((point, i) => ({ ...point, wavelengthIndex: (i * 17) % 40 })),
    ],
  ])('%s', (_, points) => {
    const solveCase = dispersiveCase();
    expectGeneral(solveCase, points, solve(new FastSolver(solveCase, loadKernel()), points));
  });

  test('thickness per point, of a plain layer, a magnetic one, and one inside a block', () => {
    const points = Array.from({ length: 150 }, (_, i) => ({
      wavelengthIndex: i % 3,
      angleDeg: 60,
      nm: (i * i) / 100,
    }));
    for (const path of [[0], [2], [1, 0], [3]]) {
      const solveCase = dispersiveCase();
      const solver = new FastSolver(solveCase, loadKernel());
      expectGeneral(solveCase, points, solve(solver, points, path), path);
      // The written thickness is back afterwards.
      expectGeneral(solveCase, grid(2, 3), solve(solver, grid(2, 3)));
    }
  });

  test('a thickness that is set stays', () => {
    const solveCase = dispersiveCase();
    const solver = new FastSolver(solveCase, loadKernel());
    solver.setThickness([1, 1], 2.5);
    const points = grid(2, 20).map((point) => ({ ...point, nm: 2.5 }));
    expectGeneral(solveCase, points, solve(solver, points), [1, 1]);
  });

  test('two solvers in turn on one thread do not disturb each other', () => {
    const small = dispersiveCase();
    const large: SolveCase = {
      ...small,
      layers: Array.from({ length: 200 }, (_, i) => ({ index: [2 + i / 100, 1] as Complex, thicknessNm: 1 })),
    };
    const solvers = [small, large].map((solveCase) => ({
      solveCase,
      solver: new FastSolver(solveCase, loadKernel()),
    }));
    for (const { solveCase, solver } of [...solvers, ...solvers]) {
      expectGeneral(solveCase, grid(1, 30), solve(solver, grid(1, 30)));
    }
  });

  test('a batch starts where it is told to', () => {
    const solver = new FastSolver(dispersiveCase(), loadKernel());
    const out = new BatchResult(5);
    out.columns[0]!.fill(7);
    solver.solveBatch({ wavelengthIndex: new Int32Array(2), anglesDeg: Float64Array.of(10, 20) }, out, 3);
    expect([...out.columns[0]!.subarray(0, 3)]).toEqual([7, 7, 7]);
    expect(out.columns[0]![3]).not.toBe(7);
  });

  test('no beam has no angles', () => {
    const solver = new FastSolver(
      { ...dispersiveCase(), incident: { index: 1 }, layers: [], substrate: { index: 1 } },
      loadKernel(),
    );
    const { columns } = solve(solver, grid(1, 3));
    for (let column: number = COLUMN.rotationP; column <= COLUMN.ellipticityS; column++) {
      expect([...columns[column]!]).toEqual([NaN, NaN, NaN]);
    }
  });
});

describe('what the fast path takes', () => {
  test('scalar media only', () => {
    const base = dispersiveCase();
    expect(FastSolver.canSolve(base)).toBe(true);
    const uniaxial = { index: 1.5, extraordinary: 1.6, axis: m, thicknessNm: 5 };
    expect(FastSolver.canSolve({ ...base, layers: [{ repeat: 2, layers: [uniaxial] }] })).toBe(false);
    expect(
      FastSolver.canSolve({
        ...base,
        substrate: {
          epsilon: [
            [2, 0, 0],
            [0, 2, 0],
            [0, 0, 3],
          ],
        },
      }),
    ).toBe(false);
  });

  test('a batch that does not fit is refused with its numbers', () => {
    const solver = new FastSolver(dispersiveCase(), loadKernel());
    const two = { wavelengthIndex: new Int32Array(2), anglesDeg: new Float64Array(2) };
    expect(() => solver.solveBatch(two, new BatchResult(2), 1)).toThrow(
      '2 points from 1 do not fit a result of 2',
    );
    expect(() => solver.solveBatch({ ...two, anglesDeg: new Float64Array(3) }, new BatchResult(3))).toThrow(
      'a batch of 3 angles has 2 wavelengths',
    );
    expect(() => solver.setThickness([9], 1)).toThrow('no layer at layers[9]');
  });
});
