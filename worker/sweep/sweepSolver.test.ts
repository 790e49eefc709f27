import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { applyAxis } from '../../shared/applyAxis.ts';
import { outputFor, readingOf } from '../../shared/readings.ts';
import { readingNames } from '../../shared/run.ts';
import type { ReadingName, SweepAxis } from '../../shared/run.ts';
import { pointCountOf } from '../../shared/runAxes.ts';
import type { SolveCase } from '../../shared/solve.ts';
import { inMagnetizationState, toSolveCase } from '../../shared/stackCase.ts';
import { inputAzimuthOf } from '../../shared/stack.ts';
import type { StackDocument, StackLayer } from '../../shared/stack.ts';
import { resolveCase } from '../dispersion/resolveCase.ts';
import { solveRequest } from '../optics/solveRequest.ts';
import { axisValues } from '../../shared/axisValues.ts';
import { planChunks } from './planChunks.ts';
import { SharedResult } from './sharedResult.ts';
import type { SweepInput } from './sweepInput.ts';
import { SweepSolver } from './sweepSolver.ts';

const film: StackLayer = {
  id: 'film',
  medium: { index: [2.25, 4.07], voigt: [0.03, 0.01] },
  thicknessNm: 3,
  m: [0.3, 0.4, 0.8],
};

const stack = (layers: StackLayer[] = [film], overrides: Partial<StackDocument> = {}): StackDocument => ({
  incident: { index: 1 },
  layers: [
    { id: 'cap', medium: { index: [2.33, 4.14] }, thicknessNm: 2 },
    {
      id: 'block',
      repeat: 3,
      layers: [...layers, { id: 'spacer', medium: { index: [2.1, 3] }, thicknessNm: 1 }],
    },
  ],
  substrate: { index: 1.5 },
  workingPoint: { wavelengthNm: 633, angleDeg: 50, input: 'p', magnetization: { mode: 'drawn' } },
  ...overrides,
});

const alone = { start: 0, stride: 1, count: 1 };

/** The sweep in two chunks, as two threads would do it, the later one first. */
function sweep(document: StackDocument, axis: SweepAxis, readings: ReadingName[] = [...readingNames]) {
  const result = SharedResult.allocate(axis.points, readings.length);
  const solver = new SweepSolver({ document, axis, readings, materials: [] });
  const half = Math.floor(axis.points / 2);
  solver.solve({ first: { start: half, count: axis.points - half }, second: alone, family: 0 }, result);
  solver.solve({ first: { start: 0, count: half }, second: alone, family: 0 }, result);
  expect(result.done).toBe(axis.points);
  return result.columns;
}

/** The same readings point by point, each from three cases of its own; no state is skipped. */
function pointByPoint(document: StackDocument, axis: SweepAxis, readings: ReadingName[] = [...readingNames]) {
  return axisValues(axis).map((value) => readingsAt(applyAxis(document, axis, value), readings));
}

function readingsAt(document: StackDocument, readings: ReadingName[]): (number | null)[] {
  const { wavelengthNm, angleDeg } = document.workingPoint;
  const given = resolveCase(toSolveCase(document, wavelengthNm, angleDeg), new Map());
  const addsIntensities = given.average !== undefined || given.backside !== undefined;
  const outputs = readings.flatMap((name) => outputFor(name) ?? []);
  const asked = outputs.filter((output) => !addsIntensities || output === 'mueller');
  const at = (one: SolveCase) => solveRequest({ cases: [{ ...one, outputs: asked }] }).results[0]!.points[0]!;
  const states = [given, inMagnetizationState(given, 'zero'), inMagnetizationState(given, 'reversed')].map(
    at,
  );
  return readings.map((name) =>
    readingOf(name, states[0]!, states[1]!, states[2]!, inputAzimuthOf(document.workingPoint)),
  );
}

/** Single points and batches differ by rounding: 1e-9 of the value, or of what angles and amplitudes count in. */
function expectClose(column: ArrayLike<number>, values: (number | null)[]): void {
  expect(column.length).toBe(values.length);
  values.forEach((value, point) => {
    const got = column[point]!;
    if (value === null) expect(got).toBeNaN();
    else expect(Math.abs(got - value)).toBeLessThanOrEqual(1e-9 * Math.max(1e-3, Math.abs(value)));
  });
}

/** What makes a stack more than sharp layers in coherent light, each alone. */
const general: [string, StackDocument][] = [
  [
    'an average over thickness, angle and bandwidth',
    { ...stack(), spread: { shape: 'normal', thicknessPercent: 3, divergenceDeg: 0.5, bandwidthNm: 4 } },
  ],
  ['a thick slab', { ...stack(), backside: { thicknessNm: 500_000, exit: { index: 1 } } }],
  ['dead parts', stack([{ ...film, thicknessNm: 3, dead: { topNm: 0.3, bottomNm: 0.2 } }])],
  [
    'an oxide',
    stack([{ ...film, oxide: { medium: { index: [2.2, 0.5] }, consumedNm: 0.4, expansion: 1.8 } }]),
  ],
];

const axes: SweepAxis[] = [
  { kind: 'wavelength', from: 400, to: 800, points: 9, spacing: 'linear' },
  { kind: 'angle', from: 0, to: 89, points: 9, spacing: 'linear' },
  { kind: 'thickness', layerId: 'film', from: 0, to: 40, points: 9, spacing: 'linear' },
];

describe.each(axes)('a sweep over $kind', (axis) => {
  it('gives what single cases give, by the fast path and below its size', () => {
    for (const points of [9, 61]) {
      const swept = { ...axis, points };
      const columns = sweep(stack(), swept);
      const rows = pointByPoint(stack(), swept);
      readingNames.forEach((_, column) =>
        expectClose(
          columns[column]!,
          rows.map((row) => row[column]!),
        ),
      );
    }
  });

  it('solves the unmagnetized stack where it turns light by itself', () => {
    const uniaxial: StackLayer = {
      ...film,
      medium: { ...film.medium, extraordinary: [2.6, 3.5], axis: [1, 1, 0] },
    };
    const columns = sweep(stack([uniaxial]), axis, ['rotationP', 'ellipticityS']);
    pointByPoint(stack([uniaxial]), axis, ['rotationP', 'ellipticityS']).forEach((row, point) => {
      expect([columns[0]![point], columns[1]![point]]).toEqual(row);
    });
  });
});

describe.each(general)('a stack with %s', (_what, document) => {
  it.each(axes.map((axis) => (axis.kind === 'thickness' ? { ...axis, from: 0.5 } : axis)))(
    'is swept over $kind as single cases give it',
    (axis) => {
      const readings: ReadingName[] = ['rotationP', 'ellipticityS', 'contrastP', 'reflectanceS', 'crossSp'];
      const columns = sweep(document, axis, readings);
      pointByPoint(document, axis, readings).forEach((row, point) => {
        expect(columns.map((column) => column[point])).toEqual(row.map((value) => value ?? NaN));
      });
    },
  );
});

/** All of a sweep of several axes, chunk by chunk as the threads get them. */
function sweepAll(input: SweepInput): Float64Array[] {
  const points = pointCountOf(input);
  const result = SharedResult.allocate(points, input.readings.length);
  const solver = new SweepSolver(input);
  for (const chunk of planChunks(input, 2)) solver.solve(chunk, result);
  expect(result.done).toBe(points);
  return result.columns;
}

/** Expects every point to be what a document with the values of all axes put in gives, first axis innermost. */
function expectPointByPoint(input: SweepInput): void {
  const columns = sweepAll(input);
  const along = (documents: StackDocument[], axis: SweepAxis | undefined) =>
    axis
      ? documents.flatMap((one) => axisValues(axis).map((value) => applyAxis(one, axis, value)))
      : documents;
  const documents = along(along(along([input.document], input.family), input.second), input.axis);
  const rows = documents.map((one) => readingsAt(one, input.readings));
  columns.forEach((column, position) =>
    expectClose(
      column,
      rows.map((row) => row[position]!),
    ),
  );
}

const span = (points: number) => ({ points, spacing: 'linear' }) as const;
const byKind = {
  wavelength: { kind: 'wavelength', from: 400, to: 800, ...span(5) },
  angle: { kind: 'angle', from: 0, to: 85, ...span(6) },
  thickness: { kind: 'thickness', layerId: 'film', from: 0, to: 12, ...span(4) },
  spacer: { kind: 'thickness', layerId: 'spacer', from: 0.5, to: 4, ...span(3) },
  direction: { kind: 'direction', plane: 'xz', from: 0, to: 90, ...span(4) },
  oneDirection: { kind: 'direction', plane: 'xy', layerId: 'film', from: -45, to: 135, ...span(5) },
  voigtScale: { kind: 'voigtScale', from: 0, to: 2, ...span(3) },
  repeat: { kind: 'repeat', blockId: 'block', from: 0, to: 6, ...span(4) },
  graded: { kind: 'graded', layerId: 'film', from: 0, to: 0.4, ...span(2) },
} as const satisfies Record<string, SweepAxis>;

describe('a sweep of several axes', () => {
  const readings: ReadingName[] = ['rotationP', 'ellipticityS', 'oddRotationS', 'reflectanceP', 'polarPart'];
  it.each([
    ['wavelength', 'angle', null],
    ['angle', 'wavelength', 'voigtScale'],
    ['wavelength', 'thickness', null],
    ['thickness', 'angle', 'repeat'],
    ['thickness', 'spacer', 'angle'],
    ['direction', 'wavelength', null],
    ['angle', 'direction', 'thickness'],
    ['direction', 'repeat', 'wavelength'],
    ['voigtScale', 'angle', 'oneDirection'],
  ] as const)('%s, %s, %s: every point is what its own document gives', (first, second, family) => {
    const axes = {
      axis: byKind[first],
      second: byKind[second],
      ...(family ? { family: byKind[family] } : {}),
    };
    expectPointByPoint({ document: stack(), ...axes, readings, materials: [] });
  });

  it('sweeps an interface width, which makes the stack a graded one on the way', () => {
    const input: SweepInput = {
      document: stack(),
      axis: byKind.graded,
      readings: ['reflectanceP', 'crossSp'],
      materials: [],
    };
    expectPointByPoint(input);
  });

  it('turns m as light sees it, where the working point reverses or replaces it', () => {
    for (const magnetization of [
      { mode: 'reversed' as const },
      { mode: 'direction' as const, m: [0, 0.6, 0] as [number, number, number] },
    ]) {
      const workingPoint = { ...stack().workingPoint, magnetization };
      const columns = sweepAll({
        document: stack([film], { workingPoint }),
        axis: { kind: 'direction', plane: 'xz', from: 0, to: 180, points: 2, spacing: 'linear' },
        readings: ['rotationP'],
        materials: [],
      });
      const length = magnetization.mode === 'direction' ? 0.6 : Math.hypot(0.3, 0.4, 0.8);
      const polar = stack([{ ...film, m: [0, 0, length] }]);
      expectClose([columns[0]![0]!], readingsAt(polar, ['rotationP']));
      // In polar geometry the rotation is odd in m.
      expect(columns[0]![1]).toBeCloseTo(-columns[0]![0]!, 6);
      expect(Math.abs(columns[0]![0]!)).toBeGreaterThan(1e-3);
    }
  });
});

describe('the fast path of a sweep', () => {
  it('agrees with the general one on random stacks to 1e-9', () => {
    const layer = fc.record({
      n: fc.double({ min: 0.2, max: 4, noNaN: true }),
      k: fc.double({ min: 0, max: 5, noNaN: true }),
      thicknessNm: fc.double({ min: 0, max: 60, noNaN: true }),
      q: fc.tuple(
        fc.double({ min: -0.05, max: 0.05, noNaN: true }),
        fc.double({ min: 0, max: 0.02, noNaN: true }),
      ),
      m: fc.tuple(...[0, 1, 2].map(() => fc.double({ min: -0.57, max: 0.57, noNaN: true }))),
    });
    fc.assert(
      fc.property(
        fc.array(layer, { minLength: 1, maxLength: 6 }),
        fc.integer({ min: 0, max: 3 }),
        (layers, repeat) => {
          const items = layers.map(({ n, k, thicknessNm, q, m }, position): StackLayer => {
            const [x, y, z] = m as [number, number, number];
            const medium = { index: [n, k] as [number, number], voigt: q };
            return { id: `l${position}`, medium, thicknessNm, m: [x, y, z] };
          });
          const document: StackDocument = {
            ...stack(),
            layers: [...items.slice(1), { id: 'block', repeat, layers: items.slice(0, 1) }],
            substrate: { index: [3.88, 0.02] },
          };
          expectPointByPoint({
            document,
            axis: byKind.angle,
            second: { ...byKind.wavelength, points: 3 },
            readings: [
              'rotationP',
              'ellipticityS',
              'reflectanceS',
              'contrastP',
              'absorptanceP',
              'evenRotationS',
            ],
            materials: [],
          });
        },
      ),
      { numRuns: 40 },
    );
  });
});

describe('a sweep', () => {
  it('over a graded stack stays within the refinement of its interfaces', () => {
    const document = stack([{ ...film, gradedNm: 0.6 }]);
    const columns = sweep(document, axes[1]!, ['reflectanceP', 'crossSp']);
    const sharp = sweep(stack(), axes[1]!, ['reflectanceP', 'crossSp']);
    pointByPoint(document, axes[1]!, ['reflectanceP', 'crossSp']).forEach((row, point) => {
      expect(columns[0]![point]).toBeCloseTo(row[0]!, 5);
      expect(columns[1]![point]).toBeCloseTo(row[1]!, 5);
    });
    expect(Math.abs(columns[0]![0]! - sharp[0]![0]!)).toBeGreaterThan(1e-4);
  });

  it('has no Kerr angle where the unmagnetized stack reflects nothing, though the magnetized one does', () => {
    // A film with the index of its surroundings: at m = 0 it is not there.
    const ghost: StackLayer = { ...film, medium: { index: 1.5, voigt: [0.01, 0] }, m: [0, 0, 1] };
    const document: StackDocument = {
      ...stack(),
      incident: { index: 1.5 },
      layers: [ghost],
    };
    const axis: SweepAxis = { kind: 'angle', from: 0, to: 60, points: 4, spacing: 'linear' };
    const [rotation, cross] = sweep(document, axis, ['rotationP', 'crossSp']);
    expect(rotation!.every(Number.isNaN)).toBe(true);
    expect(Math.min(...cross!)).toBeGreaterThan(1e-6);
  });

  it('solves no point after it is cancelled', () => {
    const axis = axes[1]!;
    const result = SharedResult.allocate(axis.points, 1);
    result.cancel();
    new SweepSolver({ document: stack(), axis, readings: ['reflectanceP'], materials: [] }).solve(
      { first: { start: 0, count: axis.points }, second: alone, family: 0 },
      result,
    );
    expect(result.done).toBe(0);
  });

  it('refuses a layer that the stack does not have', () => {
    const axis: SweepAxis = {
      kind: 'thickness',
      layerId: 'nope',
      from: 0,
      to: 1,
      points: 2,
      spacing: 'linear',
    };
    expect(
      () => new SweepSolver({ document: stack(), axis, readings: ['reflectanceP'], materials: [] }),
    ).toThrow(/no layer nope/);
  });

  it('does not lay columns over memory of another size', () => {
    expect(() => new SharedResult(new SharedArrayBuffer(64), 10, 2)).toThrow(
      /10 points and 2 readings has 176 bytes, got 64/,
    );
  });
});
