import { evaluate } from 'mathjs';
import type { ResultSet } from 'mathjs';
import { describe, expect, test } from 'vitest';
import { materialKeyOf } from '../../../shared/designPoint.ts';
import type { ToleranceDesign, ToleranceResult } from '../../../shared/toleranceDesign.ts';
import { toleranceDesignSchema } from '../../../shared/toleranceDesign.ts';
import { buildMaterial } from '../../dispersion/materialFixtures.ts';
import { designStep } from '../designTask.ts';
import { DesignThreads } from '../designThreads.ts';
import { FilmSolver } from '../filmSolver.ts';
import { runDesign } from '../runDesign.ts';
import { runBands } from './runTolerance.ts';
import { sensitivities } from './sensitivity.ts';
import { distributionOf, wilsonInterval } from './toleranceOutcome.ts';

const platinum = { index: [2.33, 4.14] as [number, number] };
const cobalt = { index: [2.25, 4.07] as [number, number], voigt: [0.03, 0.01] as [number, number] };

// Constants of the bench workloads, 632.8 nm; what is compared does not depend on them.
function buildDesign(overrides: Partial<ToleranceDesign> = {}): ToleranceDesign {
  return toleranceDesignSchema.parse({
    kind: 'tolerance',
    document: {
      incident: { index: 1 },
      layers: [
        { id: 'cap', medium: platinum, thicknessNm: 3 },
        {
          id: 'block',
          repeat: 4,
          layers: [
            { id: 'co', medium: cobalt, thicknessNm: 0.6, m: [0, 0, 1] },
            { id: 'pt', medium: platinum, thicknessNm: 1 },
          ],
        },
      ],
      substrate: { index: [3.88, 0.02] },
      workingPoint: { wavelengthNm: 632.8, angleDeg: 0, input: 'p', magnetization: { mode: 'drawn' } },
    },
    points: [
      {
        id: 'a',
        label: 'polar',
        workingPoint: { wavelengthNm: 632.8, angleDeg: 0, input: 'p', magnetization: { mode: 'drawn' } },
      },
    ],
    signal: 'rotation',
    demands: {},
    tolerance: { ratePercent: 5, randomPercent: 3, samples: 4000, seed: 11 },
    ...overrides,
  });
}

async function answer(design: ToleranceDesign, threads = 1): Promise<ToleranceResult> {
  const { result } = await runDesign({ design, materials: [] }, threads, (task) =>
    Promise.resolve().then(() => designStep(task)),
  );
  if (result.kind !== 'tolerance') throw new Error(result.kind);
  return result;
}

/** Park and Miller's generator (Commun. ACM 31, 1192 (1988)) and the sum of twelve: nothing in common with ours. */
function otherNormals(seed: number): () => number {
  let state = seed;
  const uniform = () => (state = (16_807 * state) % 2_147_483_647) / 2_147_483_647;
  return () => Array.from({ length: 12 }, uniform).reduce((sum, one) => sum + one, -6);
}

describe('tolerance bands', () => {
  test('agree with a brute-force calculation by other random numbers, film by film', async () => {
    const design = buildDesign();
    const next = otherNormals(20_261);
    const flat = buildDesign().document;
    flat.layers = [
      { id: 'cap', medium: platinum, thicknessNm: 3 },
      ...[0, 1, 2, 3].flatMap((i) => [
        { id: `co${i}`, medium: cobalt, thicknessNm: 0.6, m: [0, 0, 1] as [number, number, number] },
        { id: `pt${i}`, medium: platinum, thicknessNm: 1 },
      ]),
    ];
    const solver = new FilmSolver(flat, new Map(), { contrast: false, ceiling: false });
    const count = 4000;
    const rotations: number[] = [];
    const reflectances: number[] = [];
    for (let sample = 0; sample < count; sample += 1) {
      const rate = { co: 0.05 * next(), pt: 0.05 * next() };
      const thicknessNm = new Map(
        flat.layers.flatMap((layer) => {
          if ('layers' in layer) return [];
          const material = layer.id.startsWith('co') ? rate.co : rate.pt;
          return [[layer.id, layer.thicknessNm * (1 + material + 0.03 * next())] as const];
        }),
      );
      const readings = solver.readings({ thicknessNm, constants: null });
      rotations.push(readings.rotationDeg!);
      reflectances.push(readings.reflectance);
    }
    const { distributions } = (await answer(design)).points[0]!;
    for (const [ours, theirs] of [
      [distributions.rotationDeg!, rotations],
      [distributions.reflectance!, reflectances],
    ] as const) {
      const mean = theirs.reduce((sum, one) => sum + one, 0) / count;
      const deviation = Math.sqrt(theirs.reduce((sum, one) => sum + (one - mean) ** 2, 0) / (count - 1));
      // Three standard errors of the difference of two means, of two deviations (normal) and of two quantiles.
      const error = deviation * Math.sqrt(2 / count);
      expect(Math.abs(ours.mean - mean)).toBeLessThan(3 * error);
      expect(Math.abs(ours.deviation - deviation)).toBeLessThan((3 * error) / Math.SQRT2);
      const sorted = theirs.toSorted((a, b) => a - b);
      const quantileError = (Math.sqrt(0.1587 * 0.8413) / 0.24197) * error;
      expect(Math.abs(ours.quantiles[1]! - sorted[Math.round(0.1587 * count)]!)).toBeLessThan(
        3 * quantileError,
      );
      expect(Math.abs(ours.quantiles[3]! - sorted[Math.round(0.8413 * count)]!)).toBeLessThan(
        3 * quantileError,
      );
    }
  });

  test('are the same on one and two threads, and narrow with the error', async () => {
    const design = buildDesign({
      tolerance: { ...buildDesign().tolerance, samples: 400 },
    });
    const one = await answer(design, 1);
    expect(await answer(design, 2)).toEqual(one);
    const finer = buildDesign({
      tolerance: { ...design.tolerance, ratePercent: 0.5, randomPercent: 0.3 },
    });
    const wide = one.points[0]!.distributions.rotationDeg!.deviation;
    const narrow = (await answer(finer)).points[0]!.distributions.rotationDeg!.deviation;
    // To first order the deviation is proportional to the errors.
    expect(narrow / wide).toBeCloseTo(0.1, 1);
  });

  test('of a growth card are those of the whole answer, which derivatives are added to', async () => {
    const design = buildDesign({ tolerance: { ...buildDesign().tolerance, samples: 200 } });
    const threads = new DesignThreads({ design, materials: [] }, 2, (task) =>
      Promise.resolve().then(() => designStep(task)),
    );
    expect(await runBands(design, threads)).toEqual((await answer(design)).points);
  });

  test('errors of constants move the readings, and a material of its own can be exact', async () => {
    const tolerance = { ...buildDesign().tolerance, ratePercent: 0, randomPercent: 0, samples: 300 };
    const still = await answer(buildDesign({ tolerance }));
    expect(still.points[0]!.distributions.rotationDeg!.deviation).toBeLessThan(1e-15);
    const moved = await answer(buildDesign({ tolerance: { ...tolerance, voigtPercent: 10 } }));
    const { mean, deviation } = moved.points[0]!.distributions.rotationDeg!;
    // The rotation is proportional to Q.
    expect(deviation / Math.abs(mean)).toBeCloseTo(0.1, 1);
    const exact = [{ material: materialKeyOf(cobalt), voigtPercent: 0 }];
    const kept = await answer(
      buildDesign({ tolerance: { ...tolerance, voigtPercent: 10, materials: exact } }),
    );
    expect(kept.points[0]!.distributions.rotationDeg!.deviation).toBeLessThan(1e-15);
  });

  test('the yield counts the films that meet all demands', async () => {
    const free = await answer(buildDesign({ tolerance: { ...buildDesign().tolerance, samples: 1000 } }));
    expect(free.yield).toBeNull();
    const median = Math.abs(free.points[0]!.distributions.rotationDeg!.quantiles[2]!);
    const half = await answer(
      buildDesign({
        tolerance: { ...buildDesign().tolerance, samples: 1000 },
        demands: { leastRotationDeg: median },
      }),
    );
    expect(half.yield!.share).toBeCloseTo(0.5, 2);
    expect(half.yield!.low).toBeLessThan(0.5);
    expect(half.yield!.high).toBeGreaterThan(0.5);
    expect(half.byDemand).toEqual([{ demand: 'leastRotationDeg', share: half.yield!.share }]);
  });
});

describe('statistics', () => {
  test('Wilson interval of 10 in 100', () => {
    // From memory: 0.0552 to 0.1744, as general statistics programs give it.
    const { low, high } = wilsonInterval(10, 100);
    expect(low).toBeCloseTo(0.0552, 4);
    expect(high).toBeCloseTo(0.1744, 4);
    expect(wilsonInterval(0, 50).low).toBe(0);
    expect(wilsonInterval(50, 50).high).toBeCloseTo(1, 12);
  });

  test('a reading that never exists has no distribution; a constant one has no width', () => {
    expect(distributionOf(Float64Array.of(NaN, NaN))).toBeNull();
    const constant = distributionOf(Float64Array.of(2, NaN, 2))!;
    expect(constant).toMatchObject({ mean: 2, deviation: 0, samples: 2 });
  });
});

describe('sensitivity', () => {
  const { document, points } = buildDesign();
  const found = sensitivities(document, points, []).sensitivities;
  const of = (parameter: string, key: string) =>
    found.find((one) => one.parameter === parameter && one.of === key)!;
  const rotationWith = (medium: typeof cobalt, capNm: number) => {
    const changed = structuredClone(document);
    changed.layers[0] = { id: 'cap', medium: platinum, thicknessNm: capNm };
    const block = changed.layers[1]!;
    if ('layers' in block) {
      block.layers[0] = { id: 'co', medium, thicknessNm: 0.6, m: [0, 0, 1] };
    }
    return new FilmSolver(changed, new Map(), { contrast: false, ceiling: false }).readings({
      thicknessNm: new Map(),
      constants: null,
    }).rotationDeg!;
  };

  test('agrees with a plain difference of two films', () => {
    const h = 1e-3;
    const slope = (rotationWith(cobalt, 3 + h) - rotationWith(cobalt, 3 - h)) / (2 * h);
    expect(of('thickness', 'cap').derivative.rotationDeg! / slope).toBeCloseTo(1, 5);
    const key = materialKeyOf(cobalt);
    const inK = (k: number) => rotationWith({ ...cobalt, index: [2.25, k] }, 3);
    expect(of('k', key).derivative.rotationDeg! / ((inK(4.07 + h) - inK(4.07 - h)) / (2 * h))).toBeCloseTo(
      1,
      5,
    );
    const inQ = (im: number) => rotationWith({ ...cobalt, voigt: [0.03, im] }, 3);
    const slopeQ = (inQ(0.01 + h) - inQ(0.01 - h)) / (2 * h);
    expect(of('Im Q', key).derivative.rotationDeg! / slopeQ).toBeCloseTo(1, 5);
    expect(of('n', key).value).toBe(2.25);
  });

  test('parameters are called by formula and note, layers that would be called alike by their place too', () => {
    const library = [
      { ...buildMaterial('tantalum'), formula: 'Ta' },
      { ...buildMaterial('platinum'), formula: 'Pt' },
    ];
    const film = structuredClone(document);
    film.layers = [
      { id: 'cap', medium: { material: 'platinum' }, thicknessNm: 2 },
      { id: 'co', medium: cobalt, thicknessNm: 1, m: [0, 0, 1] },
      { id: 'seed', medium: { material: 'platinum' }, thicknessNm: 2 },
      { id: 'below', medium: { material: 'tantalum' }, thicknessNm: 2, note: 'adhesion' },
    ];
    const labels = sensitivities(film, points, library).sensitivities.map(({ label }) => label);
    expect(labels).toContain('thickness of Ta (adhesion)');
    expect(labels).toContain('k of Ta');
    expect(labels).toContain('thickness of Pt, layer 1');
    expect(labels).toContain('thickness of Pt, layer 3');
  });

  // Airy's sum for one layer at normal incidence (Born and Wolf, Principles of Optics, 7th ed., section 1.6, in our sign of k).
  test('to the k of a lossless layer and of a slab are those of formulas', () => {
    const airy = [
      'N = 1.457 + i * k',
      'top = (1 - N) / (1 + N)',
      'bottom = (N - (3.88 + 0.02i)) / (N + (3.88 + 0.02i))',
      'passage = exp(4 * pi * i * N * 100 / 632.8)',
      'abs((top + bottom * passage) / (1 + top * bottom * passage))^2',
    ].join('\n');
    const at = (k: number) => Number((evaluate(airy, { k }) as ResultSet).valueOf().at(-1));
    const silica = { index: 1.457 };
    const coated = {
      ...document,
      layers: [{ id: 'silica', medium: silica, thicknessNm: 100 }],
      substrate: { index: [3.88, 0.02] as [number, number] },
    };
    const h = 1e-4;
    const k = sensitivities(coated, points, []).sensitivities.find(
      (one) => one.parameter === 'k' && one.of === materialKeyOf(silica),
    )!;
    expect(k.value).toBe(0);
    expect(k.derivative.reflectance! / ((at(h) - at(-h)) / (2 * h))).toBeCloseTo(1, 4);

    // A slab that adds intensities: R + T^2 R a^2 / (1 - R^2 a^2), a = exp(-4 pi k d / wavelength) for one passage (Heavens,
    // Optical Properties of Thin Solid Films, section 4.3), its R and T of the faces at n = 1.5.
    const slab = { ...document, layers: [], substrate: { index: 1.5 } };
    const nm = 500_000;
    const thick = { ...slab, backside: { thicknessNm: nm, exit: { index: 1 } } };
    const face = 0.04;
    const ofPassage = (a: number) => face + ((1 - face) ** 2 * face * a * a) / (1 - (face * a) ** 2);
    const perK = ((-4 * Math.PI * nm) / 632.8) * ((ofPassage(1 + h) - ofPassage(1 - h)) / (2 * h));
    const ofSlab = sensitivities(thick, points, []).sensitivities.find(({ parameter }) => parameter === 'k')!;
    expect(ofSlab.derivative.reflectance! / perK).toBeCloseTo(1, 4);
  });

  test('to a k or Q next to nothing are those to a k or Q of nothing', () => {
    const by = (k: number, im: number) => {
      const film = {
        ...document,
        layers: [
          { id: 'cover', medium: { index: [2, k] as [number, number] }, thicknessNm: 80 },
          {
            id: 'magnet',
            medium: { index: [2.25, 4.07] as [number, number], voigt: [0.03, im] as [number, number] },
            thicknessNm: 15,
            m: [0, 0, 1] as [number, number, number],
          },
        ],
      };
      return sensitivities(film, points, [])
        .sensitivities.filter((one) => ['k', 'Im Q'].includes(one.parameter) && Math.abs(one.value) < 1e-3)
        .map(({ derivative }) => [derivative.rotationDeg!, derivative.reflectance!]);
    };
    const [none, tiny] = [by(0, 0), by(1e-18, 1e-18)];
    expect(none).toHaveLength(2);
    tiny.flat().forEach((value, index) => expect(value).toBeCloseTo(none.flat()[index]!, 6));
  });

  // Q enters the Kerr angles of a thick magnet linearly, as Q itself (physics.md section 4): the Cauchy-Riemann equations hold.
  test('to the Im Q of a real Q turns what that to Re Q is by 90 degrees', () => {
    const magnet = { index: [2.25, 4.07] as [number, number], voigt: 1e-5 };
    const bulk = {
      ...document,
      layers: [],
      substrate: magnet,
      substrateM: [0, 0, 1] as [number, number, number],
    };
    const [re, im] = (['Re Q', 'Im Q'] as const).map((name) =>
      sensitivities(bulk, points, []).sensitivities.find(({ parameter }) => parameter === name)!,
    );
    const [byRe, byIm] = [re!, im!].map(({ derivative }) => [
      derivative.rotationDeg!,
      derivative.ellipticityDeg!,
    ]);
    expect(Math.hypot(...byIm!) / Math.hypot(...byRe!)).toBeCloseTo(1, 6);
    expect((byRe![0]! * byIm![0]! + byRe![1]! * byIm![1]!) / (byRe![0]! ** 2 + byRe![1]! ** 2)).toBeCloseTo(
      0,
      6,
    );
  });

  test('light sees no thickness of a layer that is the medium around it, which cannot absorb', () => {
    const glass = structuredClone(document);
    glass.layers.unshift({ id: 'air', medium: { index: 1 }, thicknessNm: 5 });
    const { sensitivities: all } = sensitivities(glass, points, []);
    expect(all.some(({ parameter, value }) => parameter === 'k' && value === 0)).toBe(false);
    const air = all.find(({ of: id }) => id === 'air')!;
    expect(Math.abs(air.derivative.rotationDeg!)).toBeLessThan(1e-10);
    expect(Math.abs(air.derivative.reflectance!)).toBeLessThan(1e-10);
  });
});
