import { describe, expect, test } from 'vitest';
import type { MaterialContent } from '../../shared/material.ts';
import type { MaterialSource } from '../../shared/materialSource.ts';
import { solveCaseSchema } from '../../shared/solve.ts';
import type { LibrarySolveCase } from '../../shared/solve.ts';
import { ResolutionError, resolveCase } from './resolveCase.ts';
import type { ResolvableMaterial } from './resolveCase.ts';

const source: MaterialSource = {
  citation: 'made up for this test',
  doi: null,
  licence: null,
  sample: null,
  method: null,
  confidence: 'invented for the demo',
  caution: null,
};

function buildMaterial(
  overrides: Partial<ResolvableMaterial> & { content?: MaterialContent },
): ResolvableMaterial {
  return { id: 'co', version: 1, name: 'Cobalt', content: magnetic([632.8]), ...overrides };
}

function magnetic(qWavelengthsNm: number[]): MaterialContent {
  return {
    index: { kind: 'table', wavelengthsNm: [400, 632.8, 800], n: [1, 2, 3], k: [4, 5, 6] },
    indexSource: source,
    voigt: { kind: 'table', wavelengthsNm: qWavelengthsNm, q: qWavelengthsNm.map(() => [0.03, 0.01]) },
    voigtSource: source,
  };
}

const glass: MaterialContent = {
  index: { kind: 'formula', expression: 'c1', coefficients: [1.5], rangeNm: [300, 2000] },
  indexSource: source,
  voigt: null,
  voigtSource: null,
};

function library(...materials: ResolvableMaterial[]): Map<string, ResolvableMaterial> {
  return new Map(materials.map((material) => [`${material.id}@${material.version}`, material]));
}

const materials = library(
  buildMaterial({}),
  buildMaterial({ id: 'glass', name: 'Glass', content: glass }),
  buildMaterial({
    id: 'glass',
    version: 2,
    name: 'Glass',
    content: { ...glass, index: { ...glass.index, coefficients: [1.6] } as MaterialContent['index'] },
  }),
);

function buildCase(overrides: Partial<LibrarySolveCase>): LibrarySolveCase {
  return {
    wavelengthNm: 632.8,
    angleDeg: 0,
    incident: { index: 1 },
    layers: [],
    substrate: { material: 'glass', version: 1 },
    ...overrides,
  };
}

function issuesOf(given: LibrarySolveCase) {
  try {
    resolveCase(given, materials);
  } catch (error) {
    if (error instanceof ResolutionError) return error.issues;
    throw error;
  }
  throw new Error('nothing was refused');
}

describe('resolving library media', () => {
  test('puts in plain pairs for one wavelength and keeps everything else', () => {
    const resolved = resolveCase(
      buildCase({
        layers: [
          { thicknessNm: 2, index: [0.1, 3] },
          { repeat: 3, layers: [{ thicknessNm: 1, material: 'co', version: 1, m: [0, 0.6, 0.8] }] },
        ],
      }),
      materials,
    );
    expect(resolved).toEqual({
      wavelengthNm: 632.8,
      angleDeg: 0,
      incident: { index: 1 },
      layers: [
        { thicknessNm: 2, index: [0.1, 3] },
        { repeat: 3, layers: [{ thicknessNm: 1, index: [2, 5], voigt: [0.03, 0.01], m: [0, 0.6, 0.8] }] },
      ],
      substrate: { index: [1.5, 0] },
    });
    expect(solveCaseSchema.safeParse(resolved).success).toBe(true);
  });

  test('puts in one sample per wavelength for several, even for a list of one', () => {
    const layers = [
      {
        thicknessNm: 1,
        material: 'co',
        version: 1,
        m: [0, 0, 1] as [number, number, number],
        assumeConstant: true,
      },
    ];
    const resolved = resolveCase(buildCase({ wavelengthNm: [400, 800], layers }), materials);
    expect(resolved.layers).toEqual([
      {
        thicknessNm: 1,
        index: {
          samples: [
            [1, 4],
            [3, 6],
          ],
        },
        voigt: {
          samples: [
            [0.03, 0.01],
            [0.03, 0.01],
          ],
        },
        m: [0, 0, 1],
      },
    ]);
    expect(resolved.substrate).toEqual({
      index: {
        samples: [
          [1.5, 0],
          [1.5, 0],
        ],
      },
    });
    expect(solveCaseSchema.safeParse(resolved).success).toBe(true);
    expect(resolveCase(buildCase({ wavelengthNm: [500] }), materials).substrate).toEqual({
      index: { samples: [[1.5, 0]] },
    });
  });

  test('takes the version asked for, and the newest when none is', () => {
    expect(resolveCase(buildCase({}), materials).substrate.index).toEqual([1.5, 0]);
    expect(resolveCase(buildCase({ substrate: { material: 'glass' } }), materials).substrate.index).toEqual([
      1.6, 0,
    ]);
  });

  test('needs no Voigt constant where nothing is magnetized', () => {
    for (const m of [undefined, [0, 0, 0] as [number, number, number]]) {
      const layer = { thicknessNm: 1, material: 'co', ...(m && { m }) };
      const [resolved] = resolveCase(buildCase({ wavelengthNm: 700, layers: [layer] }), materials).layers;
      expect(resolved).not.toHaveProperty('voigt');
      expect(resolved).toHaveProperty('index');
    }
  });

  test('keeps m of a material without magneto-optic data', () => {
    const layers = [
      { thicknessNm: 1, material: 'glass', version: 1, m: [0, 0, 1] as [number, number, number] },
    ];
    expect(resolveCase(buildCase({ layers }), materials).layers).toEqual([
      { thicknessNm: 1, index: [1.5, 0], m: [0, 0, 1] },
    ]);
  });
});

describe('what cannot be resolved', () => {
  test('is listed at once, each with its path', () => {
    const issues = issuesOf(
      buildCase({
        wavelengthNm: [500, 2500],
        incident: { material: 'ether' },
        layers: [
          { thicknessNm: 1, material: 'co', m: [0, 0, 1] },
          {
            repeat: 2,
            layers: [
              { thicknessNm: 1, index: 2 },
              { thicknessNm: 1, material: 'glass', version: 7 },
            ],
          },
        ],
      }),
    );
    expect(issues.map((issue) => issue.path)).toEqual([
      'incident.material',
      'layers[0].material',
      'layers[0].material',
      'layers[1].layers[1].material',
      'substrate.material',
    ]);
    expect(issues[0]!.message).toContain('there is no material ether');
    expect(issues[1]!.message).toContain('Cobalt (co) is known from 400 to 800 nm; 2500 nm was asked');
    expect(issues[2]!.message).toContain(
      'the Voigt constant of Cobalt (co) is known at 632.8 nm only; 500 nm was asked',
    );
    expect(issues[3]!.message).toContain('there is no material glass in version 7');
    expect(issues[4]!.message).toContain('Glass (glass) is known from 300 to 2000 nm; 2500 nm was asked');
  });

  test('names every layer that uses the same material', () => {
    const layer = { thicknessNm: 1, material: 'nothing' };
    expect(issuesOf(buildCase({ layers: [layer, layer] })).map((issue) => issue.path)).toEqual([
      'layers[0].material',
      'layers[1].material',
    ]);
  });
});
