import { describe, expect, test } from 'vitest';
import type { StackDocument } from '../../shared/stack.ts';
import { toSolveCase } from '../../shared/stackCase.ts';
import { resolveCase } from '../dispersion/resolveCase.ts';
import { solveRequest } from '../optics/solveRequest.ts';
import { FilmSolver, UNCHANGED } from './filmSolver.ts';

// Constants of physics section 8 (632.8 nm); what the solver gives for them is checked elsewhere against published values.
function buildFilm(overrides: Partial<StackDocument> = {}): StackDocument {
  return {
    incident: { index: 1 },
    layers: [
      { id: 'cap', medium: { index: [2.33, 4.14] }, thicknessNm: 3 },
      { id: 'co', medium: { index: [2.25, 4.07], voigt: [0.03, 0.01] }, thicknessNm: 1, m: [0, 0, 1] },
      { id: 'pt', medium: { index: [2.33, 4.14] }, thicknessNm: 5 },
    ],
    substrate: { index: [3.88, 0.02] },
    workingPoint: { wavelengthNm: 632.8, angleDeg: 30, input: 'p', magnetization: { mode: 'drawn' } },
    ...overrides,
  };
}

function expected(document: StackDocument) {
  const { wavelengthNm, angleDeg, input } = document.workingPoint;
  const given = resolveCase(toSolveCase(document, wavelengthNm, angleDeg), new Map());
  const zero = resolveCase(
    toSolveCase(document, wavelengthNm, angleDeg, { mode: 'direction', m: [0, 0, 0] }),
    new Map(),
  );
  const [a, b] = solveRequest({ cases: [given, zero] }).results.map(({ points }) => points[0]!);
  const change = (key: 'rotationDeg' | 'ellipticityDeg') => a!.kerr[input]![key] - b!.kerr[input]![key];
  return {
    rotationDeg: change('rotationDeg'),
    ellipticityDeg: change('ellipticityDeg'),
    reflectance: a!.R[input],
    ...(a!.r && { amplitude: Math.hypot(...(input === 'p' ? a!.r.sp : a!.r.ps)) }),
  };
}

const plain = { contrast: false, ceiling: false };

function expectClose(actual: object, wanted: object) {
  for (const [key, value] of Object.entries(wanted)) {
    expect(Reflect.get(actual, key), key).toBeCloseTo(value as number, 10);
  }
}

describe('a film solved over and over', () => {
  test('never makes a layer thinner than what its graded interfaces take of it, in a block either', () => {
    // Half of an interface lies in either layer, and a slice of negative thickness would amplify: the definition.
    const { layers } = buildFilm();
    const co = { ...layers[1]!, thicknessNm: 2, gradedNm: 0.6 };
    const pt = { ...layers[2]!, gradedNm: 1 };
    const flat = buildFilm({ layers: [layers[0]!, co, pt] });
    const block = buildFilm({ layers: [layers[0]!, { id: 'pair', repeat: 2, layers: [pt, co] }] });
    const nmOf = (id: string, nm: number) => ({ thicknessNm: new Map([[id, nm]]), constants: null });
    const read = (film: StackDocument, id: string, nm: number) =>
      new FilmSolver(film, new Map(), plain).readings(nmOf(id, nm));
    expect(read(flat, 'co', 0.1)).toEqual(read(flat, 'co', 0.8));
    expect(read(flat, 'co', 0.81)).not.toEqual(read(flat, 'co', 0.8));
    expect(read(flat, 'cap', -1)).toEqual(read(flat, 'cap', 0.3));
    // The Co between Pt needs 0.3 and 0.5 nm, the last one 0.3 alone; in a block they are as thick as each other.
    expect(read(block, 'co', 0)).toEqual(read(block, 'co', 0.8));
    expect(read(block, 'pt', 0)).toEqual(read(block, 'pt', 0.8));
    expectClose(
      read(flat, 'co', 0),
      expected(buildFilm({ layers: [layers[0]!, { ...co, thicknessNm: 0.8 }, pt] })),
    );
  });

  test('gives what a solve request gives, whatever was set before', () => {
    const solver = new FilmSolver(buildFilm(), new Map(), plain);
    expectClose(solver.readings(UNCHANGED), expected(buildFilm()));
    const thicker = {
      thicknessNm: new Map([
        ['cap', 7.5],
        ['co', 2],
      ]),
      constants: null,
    };
    const changed = buildFilm();
    changed.layers = changed.layers.map((layer) =>
      'layers' in layer
        ? layer
        : { ...layer, thicknessNm: thicker.thicknessNm.get(layer.id) ?? layer.thicknessNm },
    );
    expectClose(solver.readings(thicker), expected(changed));
    expectClose(solver.readings(UNCHANGED), expected(buildFilm()));
  });

  test('gives the same on the fast path, one by one, and rebuilt', () => {
    const nm = Array.from({ length: 30 }, (_, i) => i / 3);
    const change = { thicknessNm: new Map([['pt', 8]]), constants: null };
    const solver = new FilmSolver(buildFilm(), new Map(), { contrast: true, ceiling: true });
    const fast = solver.curve(change, { layerId: 'cap', nm });
    const key = JSON.stringify({ index: [2.25, 4.07], voigt: [0.03, 0.01] });
    const rebuilt = solver.curve(
      { ...change, constants: new Map([[key, { n: 1, k: 1, q: [1, 1] }]]) },
      { layerId: 'cap', nm },
    );
    nm.forEach((thickness, i) => {
      const one = solver.readings({
        thicknessNm: new Map([
          ['pt', 8],
          ['cap', thickness],
        ]),
        constants: null,
      });
      expectClose(fast[i]!, one);
      expectClose(rebuilt[i]!, one);
    });
  });

  test('scales n, k and Q of one material only', () => {
    const key = JSON.stringify({ index: [2.25, 4.07], voigt: [0.03, 0.01] });
    const solver = new FilmSolver(buildFilm(), new Map(), plain);
    const scaled = solver.readings({
      thicknessNm: new Map(),
      constants: new Map([[key, { n: 1.1, k: 0.9, q: [2, 2] }]]),
    });
    const film = buildFilm();
    film.layers[1] = {
      id: 'co',
      medium: { index: [2.25 * 1.1, 4.07 * 0.9], voigt: [0.06, 0.02] },
      thicknessNm: 1,
      m: [0, 0, 1],
    };
    expectClose(scaled, expected(film));
  });

  test.each([
    ['a graded interface', { substrateGradedNm: 1 }],
    ['a thick slab', { substrate: { index: 1.5 }, backside: { thicknessNm: 500_000, exit: { index: 1 } } }],
    ['a bandwidth', { spread: { shape: 'normal' as const, bandwidthNm: 5 } }],
  ])('takes a film with %s', (_what, overrides) => {
    const film = buildFilm(overrides);
    const solver = new FilmSolver(film, new Map(), plain);
    const { rotationDeg, reflectance } = solver.readings(UNCHANGED);
    const wanted = expected(film);
    expect(rotationDeg).toBeCloseTo(wanted.rotationDeg, 9);
    expect(reflectance).toBeCloseTo(wanted.reflectance, 10);
  });

  test('a layer is never thinner than its dead parts', () => {
    const film = buildFilm();
    film.layers[1] = {
      ...film.layers[1]!,
      dead: { topNm: 0.3, bottomNm: 0.2 },
    };
    const solver = new FilmSolver(film, new Map(), plain);
    const at = (nm: number) => solver.readings({ thicknessNm: new Map([['co', nm]]), constants: null });
    expect(at(-1)).toEqual(at(0.5));
    expect(Math.abs(at(0.5).rotationDeg!)).toBeLessThan(1e-12);
    expect(Math.abs(at(1).rotationDeg!)).toBeGreaterThan(1e-4);
  });

  test('says which layer does not exist', () => {
    const solver = new FilmSolver(buildFilm(), new Map(), plain);
    expect(() => solver.readings({ thicknessNm: new Map([['au', 1]]), constants: null })).toThrow(
      'the film has no layer au',
    );
  });
});
