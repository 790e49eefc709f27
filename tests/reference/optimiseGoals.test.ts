import { describe, expect, test } from 'vitest';
import type { OptimiseResult } from '../../shared/optimiseDesign.ts';
import { optimiseResultSchema } from '../../shared/optimiseDesign.ts';
import { at, buildOvercoat, buildQuadrilayer, optimise, solveQuadrilayer } from './optimisedFilms.ts';

describe('goals', () => {
  const oneVariable = { variables: [{ layerId: 'film', fromNm: 10, toNm: 12 }] };
  const drawn = [50, 20, 50];
  // Both by the solve contract, whose signs and sizes are checked elsewhere.
  const points = [at(632.8, 20), at(632.8, 60, 's', [0.6, 0, 0.8])].map((workingPoint, i) => ({
    id: `${i}`,
    label: `${i}`,
    workingPoint,
  }));

  test.each([
    ['rotation', 'rotation', Math.min],
    ['ellipticity', 'ellipticity', Math.min],
    ['zero ellipticity', 'ellipticity', Math.max],
    ['amplitude', 'amplitude', Math.min],
    ['least reflectance', 'reflectance', Math.max],
  ] as const)('%s is that of the worst working point', async (quantity, reading, worst) => {
    const { start, best } = await optimise(buildQuadrilayer({ ...oneVariable, points, goal: { quantity } }));
    const all = points.map(({ workingPoint }) => solveQuadrilayer(drawn, workingPoint)[reading]);
    expect(start.value).toBeCloseTo(worst(...all), 10);
    const [film10] = best.thicknessesNm;
    const there = points.map(
      ({ workingPoint }) => solveQuadrilayer([50, film10!, 50], workingPoint)[reading],
    );
    expect(best.value).toBeCloseTo(worst(...there), 10);
  });

  test('contrast is that of m and -m across the plane of incidence', async () => {
    const workingPoint = at(632.8, 65, 'p', [0, 1, 0]);
    const design = buildQuadrilayer({
      ...oneVariable,
      points: [{ id: 'a', label: 'a', workingPoint }],
      goal: { quantity: 'contrast' },
    });
    const { start } = await optimise(design);
    expect(start.value).toBeCloseTo(solveQuadrilayer(drawn, workingPoint).contrast, 10);
  });

  test('insensitivity is the relative change of the rotation per nm of its layer', async () => {
    const goal = { quantity: 'insensitivity', layerId: 'over' } as const;
    const { start, best } = await optimise(buildQuadrilayer({ ...oneVariable, goal }));
    const relativeSlope = (over: number, magnet: number) => {
      const rotation = (nm: number) => solveQuadrilayer([nm, magnet, 50]).rotation;
      // Richardson's extrapolation of two central differences: good to the fourth order of the step.
      const slope = (step: number) => (rotation(over + step) - rotation(over - step)) / (2 * step);
      return Math.abs((4 * slope(0.05) - slope(0.1)) / 3 / rotation(over));
    };
    expect(start.value).toBeCloseTo(relativeSlope(50, 20), 7);
    expect(best.value).toBeCloseTo(relativeSlope(50, best.thicknessesNm[0]!), 7);
    expect(best.value).toBeLessThanOrEqual(relativeSlope(50, 10) + 1e-7);
    expect(best.value).toBeLessThanOrEqual(relativeSlope(50, 12) + 1e-7);
  });

  test('that no film meets end with the nearest film and no value', async () => {
    const goal = { quantity: 'least reflectance', leastReflectance: 0.5 } as const;
    const { best, start, path, ended, pareto } = await optimise(
      buildOvercoat(1.38, { goal, second: { quantity: 'rotation' } }),
    );
    expect([best.value, start.value, ended, pareto]).toEqual([null, null, 'budget', []]);
    expect(path.every(({ value }) => value === null)).toBe(true);
    // The most that this film reflects is what the bare glass does: Fresnel, ((1.52 - 1) / (1.52 + 1))^2; here the
    // thinnest film within the bounds, or the thickest.
    expect(best.atBounds).toEqual(['coat']);
    expect(best.points[0]!.readings.reflectance).toBeLessThan((0.52 / 2.52) ** 2);
  });
});

describe('an optimisation', () => {
  test('that does not fit its film is refused with every reason', async () => {
    const design = buildQuadrilayer({
      variables: [
        { layerId: 'nothing', fromNm: 0, toNm: 1 },
        { layerId: 'over', fromNm: 0, toNm: 1 },
        { layerId: 'over', fromNm: 0, toNm: 1 },
      ],
      second: { quantity: 'insensitivity', layerId: 'none' },
    });
    design.document.backside = { thicknessNm: 1e6, exit: { index: 1 } };
    await expect(optimise(design)).rejects.toMatchObject({
      failure: 'refused',
      issues: [
        { path: 'variables[0].layerId', message: 'names no layer of the film: nothing' },
        { path: 'variables[2].layerId', message: 'is used twice: over' },
        { path: 'goal.quantity' },
        { path: 'second.layerId', message: 'names no layer of the film: none' },
      ],
    });
  });

  test('tells how far it is, and ends when it is cancelled', async () => {
    const design = buildQuadrilayer({ effort: 'thorough', second: { quantity: 'rotation' } });
    const controller = new AbortController();
    const partial: OptimiseResult[] = [];
    const progress: number[] = [];
    const calculation = optimise(design, 2, {
      signal: controller.signal,
      onProgress: (done, total) => progress.push(done / total),
      onPartial: (soFar) => {
        partial.push(optimiseResultSchema.parse(soFar));
        if (partial.length === 3) controller.abort();
      },
    });
    await expect(calculation).rejects.toMatchObject({ failure: 'cancelled' });
    expect(progress.length).toBeGreaterThan(0);
    progress.slice(1).forEach((share, i) => expect(share).toBeGreaterThan(progress[i]!));
    const [first, , third] = partial;
    // The last entry may give way to a better one soon after it.
    const lasting = first!.path.slice(0, -1);
    expect(third!.path.slice(0, lasting.length)).toEqual(lasting);
    expect(third!.evaluations).toBeGreaterThan(first!.evaluations);
    expect(third!.pareto!.length).toBeGreaterThan(0);
    expect(third!.pareto![0]!.first).toBe(third!.best.value);
    expect([third!.ended, third!.best.points]).toEqual(['unfinished', []]);
    await new Promise((resolve) => setTimeout(resolve, 300));
    expect(partial).toHaveLength(3);
  });
});
