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

describe('a layer at a temperature', () => {
  const law = { curieK: 600, a: 2, b: 0.5, citation: 'made up for this test' };
  const layersAt = (temperatureK: number, more: object = {}) =>
    toSolveCase(
      stackDocumentSchema.parse({
        ...document,
        layers: [
          {
            id: 'warm',
            medium: { material: 'co' },
            thicknessNm: 10,
            m: [0, 0, 1],
            thermal: { ...law, temperatureK, referenceK: 300 },
            ...more,
          },
        ],
      }),
      633,
      0,
    ).layers;

  // By hand: m(T) = sqrt(1 - (T/600)^2) is 0.8 at 360 K and sqrt(3)/2 at 300 K.
  test('has its Q scaled by the magnetization, and by hand besides', () => {
    const scale = 0.8 / (Math.sqrt(3) / 2);
    expect(layersAt(360)).toMatchObject([
      { material: 'co', voigtScale: expect.closeTo(scale, 14) as number },
    ]);
    expect(layersAt(360, { voigtScale: 0.5 })).toMatchObject([
      { voigtScale: expect.closeTo(scale / 2, 14) as number },
    ]);
    expect(layersAt(300)).toMatchObject([{ voigtScale: 1 }]);
  });

  test('has no Q from the Curie temperature on', () => {
    expect(layersAt(600)).toMatchObject([{ voigtScale: 0 }]);
    expect(layersAt(2000)).toMatchObject([{ voigtScale: 0 }]);
  });

  test('keeps its dead parts dead', () => {
    expect(layersAt(0, { dead: { topNm: 1, bottomNm: 2 } })).toMatchObject([
      { thicknessNm: 1, m: [0, 0, 0] },
      { thicknessNm: 7, m: [0, 0, 1] },
      { thicknessNm: 2, m: [0, 0, 0] },
    ]);
  });

  test('scales Q typed in and every part of a mixture, and nothing that has no Q', () => {
    expect(layersAt(600, { medium: { index: 2, voigt: 0.1 } })).toMatchObject([
      { voigt: 0.1, voigtScale: 0 },
    ]);
    const parts = [{ index: 2 }, { material: 'co' }];
    const medium = { mixture: { model: 'bruggeman', fraction: 0.5, parts } };
    expect(layersAt(600, { medium })).toMatchObject([
      { mixture: { parts: [{ index: 2 }, { material: 'co', voigtScale: 0 }] } },
    ]);
    expect(layersAt(600, { medium: { index: 2 } })[0]).not.toHaveProperty('voigtScale');
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

  test('a medium by material is told its state in case it is a free tensor', () => {
    const zero = inMagnetizationState(given, 'zero');
    const reversed = inMagnetizationState(given, 'reversed');
    expect(zero.layers[0]).toMatchObject({ material: 'pt', tensorState: 'unmagnetized' });
    expect(reversed.layers[0]).toMatchObject({ material: 'pt', tensorState: 'reversed' });
    expect(given.layers[0]).not.toHaveProperty('tensorState');
    expect(zero.substrate).not.toHaveProperty('tensorState');
    expect(inMagnetizationState(reversed, 'zero').layers[0]).toMatchObject({ tensorState: 'unmagnetized' });
    expect(inMagnetizationState(zero, 'reversed').layers[0]).toMatchObject({ tensorState: 'unmagnetized' });
    for (const one of [zero, reversed]) expect(librarySolveCaseSchema.safeParse(one).success).toBe(true);
  });

  test('of a reversed working point: what is drawn, unless the layer is fixed', () => {
    const working = caseOf({ mode: 'reversed' });
    const block = { layers: [{ tensorState: 'reversed' }, {}] };
    expect(working).toMatchObject({ layers: [{ tensorState: 'reversed' }, block, {}, {}] });
    const [, inBlock] = working.layers;
    if (!inBlock || !('layers' in inBlock)) throw new Error('a block was expected');
    expect(inBlock.layers[1]).not.toHaveProperty('tensorState');
    const back = inMagnetizationState(working, 'reversed');
    expect(back.layers[0]).not.toHaveProperty('tensorState');
    expect(back.layers[1]).toMatchObject({ layers: [{}, { tensorState: 'reversed' }] });
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
