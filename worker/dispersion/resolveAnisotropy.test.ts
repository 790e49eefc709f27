import { describe, expect, test } from 'vitest';
import type { Vector } from '../../shared/complex.ts';
import type { LibraryMediumInput } from '../../shared/medium.ts';
import type { LibrarySolveCase } from '../../shared/solve.ts';
import { solveCaseSchema } from '../../shared/solve.ts';
import { photonEnergyEv } from '../../shared/units.ts';
import { buildLibrary, buildMaterial, givenTensor, madeUpSource } from './materialFixtures.ts';
import { ResolutionError, resolveCase } from './resolveCase.ts';

const scaledTensor = givenTensor.map((row) => row.map(([re, im]) => [2 * re, 2 * im])) as typeof givenTensor;

const materials = buildLibrary(
  buildMaterial('plain'),
  buildMaterial('tensor', {
    index: { kind: 'tensor', wavelengthsNm: [400, 800], epsilon: [givenTensor, scaledTensor] },
  }),
  buildMaterial('tensor-once', {
    index: { kind: 'tensor', wavelengthsNm: [600], epsilon: [givenTensor] },
  }),
  buildMaterial('uniaxial', {
    anisotropy: {
      kind: 'uniaxial',
      extraordinary: { kind: 'table', wavelengthsNm: [400, 700], n: [1.5, 1.6], k: [0, 0] },
      axis: [0, 0, 2],
    },
    anisotropySource: madeUpSource,
  }),
  buildMaterial('cubic', {
    voigt: { kind: 'table', wavelengthsNm: [632.8], q: [[0.03, 0.01]] },
    voigtSource: madeUpSource,
    anisotropy: {
      kind: 'cubic',
      wavelengthNm: 632.8,
      g11: [0.1, 0],
      g12: [0.02, 0.01],
      g44: [0.03, 0],
      azimuthDeg: 45,
    },
    anisotropySource: madeUpSource,
  }),
);

const up: Vector = [0, 0, 1];
const none: Vector = [0, 0, 0];

function buildCase(medium: LibraryMediumInput, wavelengthNm: number | number[] = 632.8): LibrarySolveCase {
  return { wavelengthNm, angleDeg: 0, incident: { index: 1 }, layers: [], substrate: medium };
}

function resolved(medium: LibraryMediumInput, wavelengthNm?: number | number[]) {
  const { substrate, ...rest } = resolveCase(buildCase(medium, wavelengthNm), materials);
  expect(solveCaseSchema.safeParse({ ...rest, substrate }).error).toBeUndefined();
  return substrate;
}

function issuesOf(medium: LibraryMediumInput, wavelengthNm?: number | number[]) {
  try {
    resolveCase(buildCase(medium, wavelengthNm), materials);
  } catch (error) {
    if (error instanceof ResolutionError) return error.issues;
    throw error;
  }
  throw new Error('nothing was refused');
}

describe('a free tensor', () => {
  test('is put in whole at its points, with its orientation', () => {
    expect(resolved({ material: 'tensor' }, [400, 800])).toEqual({
      epsilon: { samples: [givenTensor, scaledTensor] },
    });
    expect(resolved({ material: 'tensor', orientationDeg: [0, 90, 0] }, 800)).toEqual({
      epsilon: scaledTensor,
      orientationDeg: [0, 90, 0],
    });
  });

  test('is interpolated element by element over photon energy', () => {
    // Two points: the line between them, at the middle energy 1.5 times the first.
    const middleNm = photonEnergyEv((photonEnergyEv(400) + photonEnergyEv(800)) / 2);
    const { epsilon } = resolved({ material: 'tensor' }, middleNm);
    givenTensor.forEach((row, i) =>
      row.forEach(([re, im], j) => {
        expect(epsilon).toHaveProperty([i, j, 0], expect.closeTo(1.5 * re, 12));
        expect(epsilon).toHaveProperty([i, j, 1], expect.closeTo(1.5 * im, 12));
      }),
    );
  });

  test('reversed is the transpose, unmagnetized the symmetric part (physics.md section 2)', () => {
    const { epsilon: reversed } = resolved({ material: 'tensor', tensorState: 'reversed' }, 400);
    expect(reversed).toHaveProperty([0, 1], [0.1, -0.2]);
    expect(reversed).toHaveProperty([1, 0], [0.5, 0.2]);
    const { epsilon: symmetric } = resolved({ material: 'tensor', tensorState: 'unmagnetized' }, 400);
    expect(symmetric).toEqual([
      [
        [4, 1],
        [0.3, 0],
        [0, 0],
      ],
      [
        [0.3, 0],
        [5, 1],
        [0, 0],
      ],
      [
        [0, 0],
        [0, 0],
        [6, 1],
      ],
    ]);
  });

  test('drops m = 0 and a scale of 1, and refuses others with what to do', () => {
    expect(resolved({ material: 'tensor', m: none, voigtScale: 1 }, 400)).toEqual({ epsilon: givenTensor });
    const issues = issuesOf({ material: 'tensor', m: up, voigtScale: 0.5 }, 400);
    expect(issues.map(({ path }) => path)).toEqual(['substrate.m', 'substrate.voigtScale']);
    expect(issues[0]!.message).toContain('carries its own magnetization: leave m out');
    expect(issues[1]!.message).toContain('leave the scale (and the temperature) out');
  });

  test('known at one wavelength is a constant only where that is allowed', () => {
    expect(issuesOf({ material: 'tensor-once' }, 500)[0]!.message).toContain('is known at 600 nm only');
    expect(resolved({ material: 'tensor-once', assumeConstant: true }, 500)).toEqual({
      epsilon: givenTensor,
    });
  });
});

describe('a uniaxial crystal', () => {
  test('has both indices and its axis, and can be turned', () => {
    expect(resolved({ material: 'uniaxial', orientationDeg: [10, 20, 30] }, 400)).toEqual({
      index: [1, 4],
      extraordinary: [1.5, 0],
      axis: [0, 0, 2],
      orientationDeg: [10, 20, 30],
    });
    expect(resolved({ material: 'uniaxial' }, [400, 700]).extraordinary).toEqual({
      samples: [
        [1.5, 0],
        [1.6, 0],
      ],
    });
  });

  test('is refused where only one of its indices is known', () => {
    expect(issuesOf({ material: 'uniaxial' }, 750)).toEqual([
      {
        path: 'substrate.material',
        message: expect.stringContaining(
          'the extraordinary index of uniaxial (uniaxial) is known from 400 to 700 nm; 750 nm was asked',
        ) as string,
      },
    ]);
  });
});

describe('a cubic crystal', () => {
  const quadratic = { g11: [0.1, 0], g12: [0.02, 0.01], g44: [0.03, 0], azimuthDeg: 45 };

  test('has its second order where it is magnetized', () => {
    expect(resolved({ material: 'cubic', m: up, orientationDeg: [0, 0, 30] })).toEqual({
      index: [2, 5],
      voigt: [0.03, 0.01],
      m: up,
      quadratic,
      orientationDeg: [0, 0, 30],
    });
  });

  test('is a plain medium without m, at any wavelength, however it is turned', () => {
    expect(resolved({ material: 'cubic', m: none, orientationDeg: [0, 0, 30] }, 400)).toEqual({
      index: [1, 4],
      m: none,
    });
  });

  test('keeps to the wavelength of its constants unless they may be used elsewhere', () => {
    expect(issuesOf({ material: 'cubic', m: up }, 700).map(({ message }) => message)).toEqual([
      expect.stringContaining('the second order in m of cubic (cubic) is known at 632.8 nm only; 700 nm'),
      expect.stringContaining('the Voigt constant of cubic (cubic) is known at 632.8 nm only'),
    ]);
    expect(resolved({ material: 'cubic', m: up, assumeConstant: true }, [400, 800]).quadratic).toEqual(
      quadratic,
    );
  });
});

describe('what does not fit the material', () => {
  test('a direction without axes', () => {
    expect(issuesOf({ material: 'plain', orientationDeg: [1, 2, 3] })).toEqual([
      {
        path: 'substrate.orientationDeg',
        message: 'needs axes to turn, and plain (plain) has none: leave it out, or choose a crystal',
      },
    ]);
  });

  test.each([
    ['tensor', none, 'is a free tensor'],
    ['uniaxial', none, 'is uniaxial'],
    ['cubic', up, 'is cubic'],
  ] as const)('%s as a part of a mixture', (material, m, what) => {
    const mixed = (part: NonNullable<LibraryMediumInput['mixture']>['parts'][0]): LibraryMediumInput => ({
      mixture: { model: 'bruggeman', fraction: 0.5, parts: [{ index: 1 }, part] },
    });
    expect(issuesOf(mixed({ material, m: [...m] }))).toEqual([
      { path: 'substrate.mixture.parts[1].material', message: expect.stringContaining(what) as string },
    ]);
    expect(resolved(mixed({ material: 'cubic', m: none })).mixture?.parts[1]).toEqual({
      index: [2, 5],
      m: none,
    });
  });

  test('a tensor state means nothing to other materials', () => {
    for (const tensorState of ['reversed', 'unmagnetized'] as const) {
      expect(resolved({ material: 'cubic', m: up, tensorState })).toEqual(
        resolved({ material: 'cubic', m: up }),
      );
    }
  });
});
