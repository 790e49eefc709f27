import { describe, expect, test } from 'vitest';
import type { LibrarySolveCase } from './solve.ts';
import { librarySolveCaseSchema } from './solve.ts';
import type { StackDocument } from './stack.ts';
import { stackDocumentSchema } from './stack.ts';
import { countLayers, findLayerPath, inMagnetizationState, toSolveCase } from './stackCase.ts';

const tensor = [
  [4, [0, 0.2], 0.5],
  [
    [0.1, -0.2],
    [5, 1],
    [0, 0.4],
  ],
  [0.5, [0, -0.4], 6],
] satisfies NonNullable<LibrarySolveCase['substrate']['epsilon']>;

const transposed = [
  [4, [0.1, -0.2], 0.5],
  [
    [0, 0.2],
    [5, 1],
    [0, -0.4],
  ],
  [0.5, [0, 0.4], 6],
];

const document: StackDocument = stackDocumentSchema.parse({
  incident: { index: 1, label: 'air' },
  layers: [
    { id: 'cap', medium: { material: 'pt', version: 2, label: 'Pt' }, thicknessNm: 3, note: 'cap' },
    {
      id: 'block',
      repeat: 4,
      layers: [
        { id: 'free', medium: { material: 'co' }, thicknessNm: 1, m: [0.6, 0, 0.8] },
        { id: 'pinned', medium: { material: 'co' }, thicknessNm: 2, m: [0, 0, 1], fixed: true },
      ],
    },
    { id: 'odd', medium: { epsilon: tensor }, thicknessNm: 7 },
    { id: 'kept', medium: { epsilon: tensor }, thicknessNm: 8, fixed: true },
  ],
  substrate: { index: [2.87, 3.36], voigt: [0.03, 0] },
  substrateM: [0, 1, 0],
  workingPoint: { wavelengthNm: 633, angleDeg: 30, input: 'p', magnetization: { mode: 'drawn' } },
});

const caseOf = (magnetization: StackDocument['workingPoint']['magnetization']) =>
  toSolveCase(document, 633, 30, magnetization);

describe('a document as a case', () => {
  test('as drawn: media and thicknesses, without what is only for people', () => {
    const drawn = toSolveCase(document, [500, 633], [0, 30]);
    expect(drawn).toEqual({
      wavelengthNm: [500, 633],
      angleDeg: [0, 30],
      incident: { index: 1 },
      layers: [
        { material: 'pt', version: 2, thicknessNm: 3 },
        {
          repeat: 4,
          layers: [
            { material: 'co', thicknessNm: 1, m: [0.6, 0, 0.8] },
            { material: 'co', thicknessNm: 2, m: [0, 0, 1] },
          ],
        },
        { epsilon: tensor, thicknessNm: 7 },
        { epsilon: tensor, thicknessNm: 8 },
      ],
      substrate: { index: [2.87, 3.36], voigt: [0.03, 0], m: [0, 1, 0] },
    });
    expect(librarySolveCaseSchema.safeParse(drawn).success).toBe(true);
  });

  test('reversed: every m but the fixed one, and free tensors transposed', () => {
    expect(caseOf({ mode: 'reversed' })).toMatchObject({
      layers: [
        { material: 'pt' },
        { layers: [{ m: [-0.6, 0, -0.8] }, { m: [0, 0, 1] }] },
        { epsilon: transposed },
        { epsilon: tensor },
      ],
      substrate: { m: [0, -1, 0] },
    });
  });

  test('one direction: in every magnetic layer that is not fixed, and nowhere else', () => {
    const turned = caseOf({ mode: 'direction', m: [1, 0, 0] });
    expect(turned).toMatchObject({
      layers: [
        { material: 'pt' },
        { layers: [{ m: [1, 0, 0] }, { m: [0, 0, 1] }] },
        { epsilon: tensor },
        { epsilon: tensor },
      ],
      substrate: { m: [1, 0, 0] },
    });
    expect(turned.layers[0]).not.toHaveProperty('m');
  });

  test('no negative zero: a file of the case reads as it looks', () => {
    const { substrate } = caseOf({ mode: 'reversed' });
    expect(Object.is(substrate.m?.[0], 0)).toBe(true);
  });
});

describe('magnetization states', () => {
  const given = caseOf({ mode: 'drawn' });

  test('given is the case itself', () => expect(inMagnetizationState(given, 'given')).toBe(given));

  test('zero: m = 0 everywhere and the symmetric part of a tensor', () => {
    const zero = inMagnetizationState(given, 'zero');
    const symmetric = [
      [
        [4, 0],
        [0.05, 0],
        [0.5, 0],
      ],
      [
        [0.05, 0],
        [5, 1],
        [0, 0],
      ],
      [
        [0.5, 0],
        [0, 0],
        [6, 0],
      ],
    ];
    expect(zero).toMatchObject({
      layers: [
        {},
        { layers: [{ m: [0, 0, 0] }, { m: [0, 0, 0] }] },
        { epsilon: symmetric },
        { epsilon: symmetric },
      ],
      substrate: { voigt: [0.03, 0], m: [0, 0, 0] },
    });
    expect(zero.layers[0]).not.toHaveProperty('m');
  });

  test('reversed: -m everywhere and the transposed tensor; twice is the case again', () => {
    const reversed = inMagnetizationState(given, 'reversed');
    expect(reversed).toMatchObject({
      layers: [{}, { layers: [{ m: [-0.6, 0, -0.8] }, { m: [0, 0, -1] }] }, { epsilon: transposed }, {}],
      substrate: { m: [0, -1, 0] },
    });
    expect(inMagnetizationState(reversed, 'reversed')).toEqual(given);
  });

  test('each sample of a tensor is transposed', () => {
    const sampled = { ...given, layers: [], substrate: { epsilon: { samples: [tensor, tensor] } } };
    expect(inMagnetizationState(sampled, 'reversed').substrate.epsilon).toEqual({
      samples: [transposed, transposed],
    });
  });

  test('the given case is left as it was', () => {
    const before = structuredClone(given);
    inMagnetizationState(given, 'zero');
    inMagnetizationState(given, 'reversed');
    expect(given).toEqual(before);
  });
});

describe('layers of a document', () => {
  test('are counted as often as they stand in the stack', () => {
    expect(countLayers(document.layers)).toBe(1 + 4 * 2 + 1 + 1);
    expect(countLayers([{ id: 'b', repeat: 0, layers: document.layers }])).toBe(0);
  });

  test.each<[string, number[] | null]>([
    ['cap', [0]],
    ['pinned', [1, 1]],
    ['kept', [3]],
    ['block', null],
    ['nothing', null],
  ])('%s is found at %j', (id, at) => {
    expect(findLayerPath(document.layers, id)).toEqual(at);
  });
});
