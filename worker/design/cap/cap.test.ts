import { describe, expect, test } from 'vitest';
import type { CapDesign, CapResult } from '../../../shared/capDesign.ts';
import { capDesignSchema } from '../../../shared/capDesign.ts';
import { designStep } from '../designTask.ts';
import type { DesignTask } from '../designInput.ts';
import { runDesign } from '../runDesign.ts';
import { bareFilm } from './candidateFilm.ts';
import { FilmSolver, UNCHANGED } from '../filmSolver.ts';
import { windowsOf } from './capWindows.ts';

const gold = { index: [0.18, 3.43] as [number, number] };
const platinum = { index: [2.33, 4.14] as [number, number] };
const cobalt = { index: [2.25, 4.07] as [number, number], voigt: [0.03, 0.01] as [number, number] };

// Constants of the bench workloads, 632.8 nm; none of them matters for what is compared here.
function buildDesign(overrides: Partial<CapDesign> = {}): CapDesign {
  return capDesignSchema.parse({
    kind: 'cap',
    document: {
      incident: { index: 1 },
      layers: [
        { id: 'old', medium: gold, thicknessNm: 2 },
        {
          id: 'block',
          repeat: 3,
          layers: [
            { id: 'co', medium: cobalt, thicknessNm: 0.6, m: [0, 0, 1] },
            { id: 'pt', medium: platinum, thicknessNm: 1 },
          ],
        },
      ],
      substrate: { index: [3.88, 0.02] },
      workingPoint: { wavelengthNm: 632.8, angleDeg: 0, input: 'p', magnetization: { mode: 'drawn' } },
    },
    replaces: ['old'],
    candidates: [
      {
        id: 'pt',
        label: 'Pt',
        layers: [{ medium: platinum, leastNm: 1.2, leastSource: 'made up', fixedNm: null }],
      },
      {
        id: 'au-ru',
        label: 'Au on Pt',
        layers: [
          { medium: gold, leastNm: 1, leastSource: 'made up', fixedNm: null },
          { medium: platinum, leastNm: 0, leastSource: 'made up', fixedNm: 0.5 },
        ],
      },
    ],
    range: { fromNm: 0, toNm: 6, points: 25 },
    points: [
      {
        id: 'a',
        label: 'normal',
        workingPoint: { wavelengthNm: 632.8, angleDeg: 0, input: 'p', magnetization: { mode: 'drawn' } },
      },
      {
        id: 'b',
        label: 'oblique s',
        workingPoint: { wavelengthNm: 632.8, angleDeg: 50, input: 's', magnetization: { mode: 'drawn' } },
      },
    ],
    signal: 'rotation',
    demands: {},
    tolerance: { ratePercent: 5, randomPercent: 2, samples: 400, seed: 7 },
    leastYield: 0.9,
    ...overrides,
  });
}

/** Threads of this process; steps settle out of order, as those of real threads do. */
function inline(design: CapDesign, threads: number): Promise<CapResult> {
  const submit = async (task: DesignTask) => {
    await new Promise((resolve) =>
      setTimeout(resolve, task.step.kind === 'cap samples' ? 3 - (task.step.from % 2) : 0),
    );
    return designStep(task);
  };
  return runDesign({ design, materials: [] }, threads, submit).then(({ result }) => result as CapResult);
}

describe('the cap chooser', () => {
  test('computes each candidate as the film with that cap in place of the old one', async () => {
    const design = buildDesign();
    const { candidates, thicknessNm, bare } = await inline(design, 1);
    const film = bareFilm(design);
    expect(film.layers.map(({ id }) => id)).toEqual(['block']);
    for (const [point, { workingPoint }] of design.points.entries()) {
      const solve = (layers: typeof film.layers) =>
        new FilmSolver({ ...film, layers: [...layers, ...film.layers], workingPoint }, new Map(), {
          contrast: false,
          ceiling: true,
        }).readings(UNCHANGED);
      const without = solve([]);
      expect(bare[point]!.readings.rotationDeg).toBeCloseTo(without.rotationDeg!, 12);
      for (const at of [0, 7, 24]) {
        const wanted = solve([
          { id: 'x', medium: gold, thicknessNm: thicknessNm[at]! },
          { id: 'y', medium: platinum, thicknessNm: 0.5 },
        ]);
        const curves = candidates[1]!.points[point]!;
        expect(curves.rotationDeg[at]).toBeCloseTo(wanted.rotationDeg!, 10);
        expect(curves.reflectance[at]).toBeCloseTo(wanted.reflectance, 10);
        expect(curves.ceilingShare[at]).toBeCloseTo(wanted.ceilingShare!, 10);
        const cost = 100 * (1 - Math.abs(wanted.rotationDeg! / without.rotationDeg!));
        expect(curves.costPercent[at]).toBeCloseTo(cost, 8);
      }
    }
  });

  test('gives the same numbers on one and two threads, and others for another seed', async () => {
    const design = buildDesign();
    const [one, two] = [await inline(design, 1), await inline(design, 2)];
    expect(two).toEqual(one);
    const other = await inline(buildDesign({ tolerance: { ...design.tolerance, seed: 8 } }), 1);
    expect(other.candidates[0]!.points[0]!.signalLow).not.toEqual(one.candidates[0]!.points[0]!.signalLow);
  });

  test('finds windows, a best thickness inside them and an order', async () => {
    const free = await inline(buildDesign(), 1);
    const pt = free.candidates[0]!;
    // With no other demand the film begins to protect at the least thickness and never stops.
    expect(pt.windows).toHaveLength(1);
    expect(pt.windows[0]!.fromNm).toBeCloseTo(1.2, 3);
    expect(pt.windows[0]!.toNm).toBe(6);
    expect(pt.best!.thicknessNm).toBeGreaterThan(1.2);
    expect(pt.best!.yield).toBeGreaterThanOrEqual(0.9);
    expect(pt.best!.reason).toMatch(/% of the films protect and meet all demands \(90 % were asked\)/);
    expect([...free.ranking].sort()).toEqual(['au-ru', 'pt']);

    const bareRotation = free.bare[0]!.signal!;
    const demanding = await inline(buildDesign({ demands: { leastRotationDeg: 0.8 * bareRotation } }), 1);
    for (const candidate of demanding.candidates) {
      for (const { fromNm, toNm } of candidate.windows) {
        demanding.thicknessNm.forEach((nm, at) => {
          if (nm <= fromNm || nm >= toNm) return;
          for (const { rotationDeg } of candidate.points) {
            expect(Math.abs(rotationDeg[at]!)).toBeGreaterThanOrEqual(0.8 * bareRotation);
          }
        });
      }
    }
    const impossible = await inline(buildDesign({ demands: { leastRotationDeg: 40 } }), 1);
    expect(impossible.candidates[0]!.best).toBeNull();
    expect(impossible.candidates[0]!.obstacle).toMatch(/Kerr rotation never reaches 40000 mdeg at normal/);
  });
});

test('windows are refined between the points of the grid', () => {
  const nm = [0, 1, 2, 3, 4];
  const holdsAt = (x: number) => x >= 0.37 && x < 2.8;
  const windows = windowsOf(nm, nm.map(holdsAt), holdsAt);
  expect(windows).toHaveLength(1);
  expect(windows[0]!.fromNm).toBeCloseTo(0.37, 2);
  expect(windows[0]!.toNm).toBeCloseTo(2.8, 2);
  expect(windowsOf(nm, [true, false, true, true, false])).toEqual([
    { fromNm: 0, toNm: 0 },
    { fromNm: 2, toNm: 3 },
  ]);
});
