import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { designTotal } from '../../worker/design/runDesign.ts';
import { buildOvercoat, buildQuadrilayer, optimise, solveQuadrilayer } from './optimisedFilms.ts';

/** Of the film of the quadrilayer: physics.md section 8 (Mansuripur 1986, from memory). */
const CEILING = 0.011126;

describe('a quarter-wave overcoat', () => {
  // H. A. Macleod, Thin-Film Optical Filters: n d = lambda / 4, R = ((n0 ns - n^2) / (n0 ns + n^2))^2 = 0.012601 for 1.38 on 1.52.
  test('of 1.38 on glass is found at its thickness, with its reflectance', async () => {
    const { best, start, ended, pareto } = await optimise(buildOvercoat(1.38));
    expect(Math.abs(best.thicknessesNm[0]! - 550 / 4 / 1.38)).toBeLessThan(1e-3);
    expect(best.value).toBeCloseTo(0.012601, 6);
    expect(best.points[0]!.readings.reflectance).toBeCloseTo(best.value!, 12);
    expect(start.value!).toBeGreaterThan(best.value!);
    expect([best.atBounds, ended, pareto]).toEqual([[], 'converged', null]);
  });

  test('of the root of 1.52 reflects nothing', async () => {
    const { best } = await optimise(buildOvercoat(Math.sqrt(1.52)));
    expect(best.value).toBeLessThan(1e-12);
  });

  test('shared by the repetitions of a block is as thick in all of them together', async () => {
    const layers = [
      {
        id: 'block',
        repeat: 4,
        layers: [{ id: 'coat', medium: { index: 1.38 }, thicknessNm: 10 }],
      },
    ];
    const design = buildOvercoat(1.38);
    const { best } = await optimise({
      ...design,
      document: { ...design.document, layers },
      variables: [{ layerId: 'coat', fromNm: 5, toNm: 45 }],
    });
    expect(Math.abs(4 * best.thicknessesNm[0]! - 550 / 4 / 1.38)).toBeLessThan(1e-3);
  });

  test('stays within any bounds, and says when it ends at one', async () => {
    // Between two quarter waves R has one minimum; outside the nearer bound is best (Macleod, as above).
    const quarter = 550 / 4 / 1.38;
    await fc.assert(
      fc.asyncProperty(
        fc.double({ min: 0, max: 1.8 * quarter, noNaN: true }),
        fc.double({ min: 0.05, max: 1, noNaN: true }),
        fc.nat({ max: 1000 }),
        async (fromNm, share, seed) => {
          const toNm = fromNm + share * (2 * quarter - fromNm);
          const design = buildOvercoat(1.38, { variables: [{ layerId: 'coat', fromNm, toNm }], seed });
          const { best, path } = await optimise(design);
          for (const { thicknessesNm } of [best, ...path]) {
            expect(thicknessesNm[0]).toBeGreaterThanOrEqual(fromNm);
            expect(thicknessesNm[0]).toBeLessThanOrEqual(toNm);
          }
          const wanted = Math.min(toNm, Math.max(fromNm, quarter));
          expect(Math.abs(best.thicknessesNm[0]! - wanted)).toBeLessThan(1e-3);
          const isAtBound = Math.min(wanted - fromNm, toNm - wanted) < 1e-4;
          if (isAtBound) expect(best.atBounds).toEqual(['coat']);
        },
      ),
      { numRuns: 6 },
    );
  });
});

describe('the quadrilayer', () => {
  test('reaches 98 % of the ceiling on any number of threads, from any seed', async () => {
    const one = await optimise(buildQuadrilayer());
    expect(one.best.value).toBeGreaterThan(0.98 * CEILING);
    // To first order in Q nothing gets past the ceiling; |Q eps_d| / Im eps_d is 0.02 here.
    expect(one.best.value).toBeLessThan(1.001 * CEILING);
    expect(solveQuadrilayer(one.best.thicknessesNm).amplitude).toBeCloseTo(one.best.value!, 12);
    expect(one.best.points[0]!.readings.ceilingShare).toBeCloseTo(one.best.value! / CEILING, 4);
    expect(one.ended).toBe('converged');

    const { path } = one;
    path.slice(1).forEach(({ value, evaluations }, i) => {
      expect(value).toBeGreaterThanOrEqual(path[i]!.value!);
      expect(evaluations).toBeGreaterThan(path[i]!.evaluations);
    });
    const { value, thicknessesNm } = path.at(-1)!;
    expect({ value, thicknessesNm }).toEqual({
      value: one.best.value,
      thicknessesNm: one.best.thicknessesNm,
    });
    expect(new Set(path.map(({ phase }) => phase))).toEqual(new Set(['global', 'local']));
    expect(one.evaluations).toBeLessThanOrEqual(designTotal(buildQuadrilayer()));

    expect(await optimise(buildQuadrilayer(), 2)).toEqual(one);
    const other = await optimise(buildQuadrilayer({ seed: 2 }));
    expect(other.path).not.toEqual(path);
    expect(other.best.value).toBeCloseTo(one.best.value!, 10);
    other.best.thicknessesNm.forEach((nm, i) => expect(nm).toBeCloseTo(one.best.thicknessesNm[i]!, 3));
  });

  test('gives up reflectance for amplitude along a front whose ends are the best of each goal', async () => {
    const goals = [{ quantity: 'amplitude' }, { quantity: 'least reflectance' }] as const;
    const [amplitude, dark] = [
      await optimise(buildQuadrilayer({ goal: goals[0] })),
      await optimise(buildQuadrilayer({ goal: goals[1] })),
    ];
    const { pareto, best } = await optimise(buildQuadrilayer({ goal: goals[0], second: goals[1] }), 2);
    expect(pareto!.length).toBeGreaterThan(10);
    pareto!.slice(1).forEach(({ first, second }, i) => {
      expect(first).toBeLessThan(pareto![i]!.first);
      expect(second).toBeLessThan(pareto![i]!.second);
    });
    // Every film has its own readings: those of the solve contract, whose numbers are checked elsewhere.
    for (const { thicknessesNm, first, second, points } of pareto!) {
      const solved = solveQuadrilayer(thicknessesNm);
      expect(first).toBeCloseTo(solved.amplitude, 12);
      expect(second).toBeCloseTo(solved.reflectance, 12);
      const { readings } = points![0]!;
      expect(Math.abs(Math.abs(readings.rotationDeg!) - solved.rotation)).toBeLessThan(1e-12);
      expect(Math.abs(Math.abs(readings.ellipticityDeg!) - solved.ellipticity)).toBeLessThan(1e-12);
      expect(Math.abs(readings.amplitude! - solved.amplitude)).toBeLessThan(1e-12);
      expect(Math.abs(readings.reflectance - solved.reflectance)).toBeLessThan(1e-12);
    }
    expect(pareto![0]!.points).toEqual(best.points);
    expect(pareto![0]!.first).toBeCloseTo(amplitude.best.value!, 8);
    expect(pareto!.at(-1)!.second).toBeCloseTo(dark.best.value!, 8);
    expect(best.value).toBe(pareto![0]!.first);
  });

  test('with the most rotation that leaves 20 % of the light beats every film of a grid', async () => {
    // Brute force by the solve contract, whose numbers are checked elsewhere.
    const { best } = await optimise(
      buildQuadrilayer({ goal: { quantity: 'rotation', leastReflectance: 0.2 } }),
    );
    let greatest = 0;
    for (let over = 0; over <= 160; over += 16) {
      for (let magnet = 2; magnet <= 32; magnet += 3) {
        for (let under = 0; under <= 160; under += 16) {
          const { rotation, reflectance } = solveQuadrilayer([over, magnet, under]);
          if (reflectance >= 0.2) greatest = Math.max(greatest, rotation);
        }
      }
    }
    expect(greatest).toBeGreaterThan(0.9);
    expect(best.value).toBeGreaterThanOrEqual(greatest);
    const solved = solveQuadrilayer(best.thicknessesNm);
    expect(solved.reflectance).toBeGreaterThanOrEqual(0.2);
    expect(solved.rotation).toBeCloseTo(best.value!, 10);
  });
});
