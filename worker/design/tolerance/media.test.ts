import { expect, test } from 'vitest';
import { materialKeyOf, toleranceSchema } from '../../../shared/designPoint.ts';
import { toSolveCase } from '../../../shared/stackCase.ts';
import type { StackDocument, StackMedium } from '../../../shared/stack.ts';
import { resolveCase } from '../../dispersion/resolveCase.ts';
import { solveRequest } from '../../optics/solveRequest.ts';
import { FilmErrors } from '../filmErrors.ts';
import { FilmSolver } from '../filmSolver.ts';
import { mediaBeside } from '../mediaBeside.ts';
import { sensitivities } from './sensitivity.ts';

const glass: StackMedium = { index: 1.52 };
const oxide: StackMedium = { index: [2.1, 0.2] };
const crystal: StackMedium = { index: 1.77, extraordinary: 1.7, axis: [0, 0, 1] };
const air: StackMedium = { index: 1 };

/** Round constants; what is compared does not depend on them. The capping metal has oxidized as far as it can. */
function buildFilm(media: { glass?: StackMedium; oxide?: StackMedium; crystal?: StackMedium } = {}) {
  const film: StackDocument = {
    incident: media.glass ?? glass,
    layers: [
      { id: 'gap', medium: air, thicknessNm: 30 },
      {
        id: 'al',
        medium: { index: [1.4, 7.5] },
        thicknessNm: 2,
        oxide: { medium: media.oxide ?? oxide, consumedNm: 2, expansion: 1.3 },
      },
      { id: 'co', medium: { index: [2.25, 4.07], voigt: [0.03, 0.01] }, thicknessNm: 5, m: [0, 0, 1] },
      { id: 'crystal', medium: media.crystal ?? crystal, thicknessNm: 60 },
    ],
    substrate: { index: [3.88, 0.02] },
    workingPoint: { wavelengthNm: 632.8, angleDeg: 35, input: 'p', magnetization: { mode: 'drawn' } },
  };
  return film;
}

function solved(film: StackDocument) {
  const cases = [undefined, { mode: 'direction' as const, m: [0, 0, 0] as [number, number, number] }].map(
    (magnetization) => resolveCase(toSolveCase(film, 632.8, 35, magnetization), new Map()),
  );
  const [given, zero] = solveRequest({ cases }).results.map(({ points }) => points[0]!);
  return {
    rotationDeg: given!.kerr.p!.rotationDeg - zero!.kerr.p!.rotationDeg,
    reflectance: given!.R.p,
  };
}

const found = sensitivities(
  buildFilm(),
  [{ id: 'a', label: 'oblique', workingPoint: buildFilm().workingPoint }],
  [],
).sensitivities;

test.each([
  ['glass', glass, (n: number) => ({ index: n })],
  ['oxide', oxide, (n: number): StackMedium => ({ index: [n, 0.2] })],
  // Both indices change by the same factor.
  [
    'crystal',
    crystal,
    (n: number): StackMedium => ({ ...crystal, index: n, extraordinary: (1.7 * n) / 1.77 }),
  ],
] as const)('the derivative by n of %s is the difference of two solve requests', (name, medium, changed) => {
  const { derivative, value } = found.find(
    ({ parameter, of }) => parameter === 'n' && of === materialKeyOf(medium),
  )!;
  const h = 1e-3;
  const [low, high] = [value - h, value + h].map((n) => solved(buildFilm({ [name]: changed(n) })));
  for (const reading of ['rotationDeg', 'reflectance'] as const) {
    expect(derivative[reading]! / ((high![reading] - low![reading]) / (2 * h)), reading).toBeCloseTo(1, 4);
  }
});

test('a layer that has oxidized through has a derivative to one side only', () => {
  const { derivative } = found.find(({ of }) => of === 'al')!;
  const thicker = buildFilm();
  const at = (shift: number) => {
    thicker.layers[1] = { ...buildFilm().layers[1]!, thicknessNm: 2 + shift };
    return solved(thicker).reflectance;
  };
  const h = 1e-3;
  expect(derivative.reflectance! / ((-3 * at(0) + 4 * at(h) - at(2 * h)) / (2 * h))).toBeCloseTo(1, 6);
});

test('what is around a film can be off, air cannot', () => {
  expect(found.some(({ parameter, of }) => parameter === 'n' && of === materialKeyOf(air))).toBe(false);
  const tolerance = toleranceSchema.parse({
    ratePercent: 0,
    randomPercent: 0,
    indexPercent: 3,
    samples: 100,
    seed: 1,
  });
  const layers = buildFilm().layers.flatMap((item) => ('layers' in item ? [] : [item]));
  const { constants } = new FilmErrors(tolerance, layers, mediaBeside(buildFilm())).draw(0);
  for (const medium of [glass, oxide, crystal]) expect(constants!.get(materialKeyOf(medium))!.n).not.toBe(1);

  const solver = new FilmSolver(buildFilm(), new Map(), { contrast: false, ceiling: false });
  const with10Percent = (medium: StackMedium) =>
    solver.readings({
      thicknessNm: new Map(),
      constants: new Map([[materialKeyOf(medium), { n: 1.1, k: 1, q: [1, 1] }]]),
    }).reflectance;
  expect(with10Percent(air)).toBeCloseTo(solved(buildFilm()).reflectance, 12);
  expect(with10Percent(glass)).toBeCloseTo(
    solved(buildFilm({ glass: { index: 1.52 * 1.1 } })).reflectance,
    12,
  );
  expect(with10Percent(crystal)).toBeCloseTo(
    solved(buildFilm({ crystal: { ...crystal, index: 1.77 * 1.1, extraordinary: 1.7 * 1.1 } })).reflectance,
    12,
  );
});

test('candidates are compared on films of the same constants', () => {
  const tolerance = toleranceSchema.parse({
    ratePercent: 5,
    randomPercent: 2,
    indexPercent: 3,
    samples: 100,
    seed: 1,
  });
  const film = buildFilm();
  const layers = film.layers.flatMap((item) => ('layers' in item ? [] : [item]));
  const capped = [
    ...layers,
    { id: 'cap', medium: { index: [0.18, 3.43] as [number, number] }, thicknessNm: 2 },
  ];
  const [bare, with1] = [layers, capped].map((list) =>
    new FilmErrors(tolerance, list, mediaBeside(film)).draw(4),
  );
  for (const [key, factors] of bare!.constants!) expect(with1!.constants!.get(key)).toEqual(factors);
  for (const [id, factor] of bare!.thickness) expect(with1!.thickness.get(id)).toBe(factor);
});
