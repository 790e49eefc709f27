import { axisValues } from '../../../shared/axisValues.ts';
import { describeResult } from '../../../shared/resultFormat.ts';
import type { Run, SweepAxes, SweepAxis } from '../../../shared/run.ts';
import { compareSlices } from './model/compareSlices.ts';
import type { LoadedRun } from './model/comparedRun.ts';
import { heldQuantities } from './model/heldQuantities.ts';
import { planComparison } from './model/planComparison.ts';
import { slicePairs } from './model/slicePairs.ts';

type Values = (first: number, second: number, member: number) => number;
type Changes = {
  capNm?: number;
  angleDeg?: number;
  /** A layer of Co under the cap, whose id is that of this run alone. */
  coNm?: number;
};

/** A finished run whose rotation (deg) follows a function of the values on its axes. */
export function buildLoadedRun(
  letter: string,
  axes: SweepAxes,
  value: Values,
  changes: Changes = {},
): LoadedRun {
  const { capNm = 2, angleDeg = 30, coNm } = changes;
  const run: Run = {
    ...{ id: letter, groupId: 'group', name: `run ${letter}`, stackId: null, stackName: null, ...axes },
    document: {
      incident: { index: 1 },
      layers: [
        { id: 'cap', medium: { index: [2.3, 4.1], label: 'Pt' }, thicknessNm: capNm, note: 'cap' },
        ...(coNm === undefined
          ? []
          : [{ id: `co ${letter}`, medium: { index: 2.2, label: 'Co' }, thicknessNm: coNm }]),
      ],
      substrate: { index: 3.88 },
      workingPoint: { wavelengthNm: 600, angleDeg, input: 'p', magnetization: { mode: 'drawn' } },
    },
    progress: { state: 'done', done: 3, total: 3, secondsLeft: null, error: null },
    createdAt: '2026-03-01T10:00:00.000Z',
    ...{ finishedAt: null, createdBy: null, isDemo: false, readings: ['rotationP'], materials: [] },
    ...{ warnings: [], assumptions: [], solverVersion: '1', inputSha256: 'abc', computeSeconds: null },
  };
  const grid = (axis: SweepAxis | undefined) => (axis ? Float64Array.from(axisValues(axis)) : null);
  const [first, second, family] = [grid(axes.axis)!, grid(axes.second), grid(axes.family)];
  const rotationP = Array.from(family ?? [0], (member) =>
    Array.from(second ?? [0], (up) => Array.from(first, (across) => value(across, up, member))),
  );
  const result = {
    header: describeResult(axes, ['rotationP'], { solverVersion: '1', inputSha256: 'abc' }),
    ...{ axis: first, second, family, columns: { rotationP: Float64Array.from(rotationP.flat(2)) } },
  };
  return { run, result, letter };
}

/** What the page draws of these runs at an address. */
export function compare(loaded: readonly LoadedRun[], address = '') {
  const search = new URLSearchParams(address);
  const wanted = { reference: search.get('reference'), view: search.get('view') };
  const comparison = planComparison(
    loaded.map(({ run }) => run),
    wanted,
  );
  const drawn = loaded.filter(({ run }) => comparison.drawn.includes(run));
  const held = heldQuantities(comparison, search);
  const runs = compareSlices(drawn, comparison.axes, comparison.view!, held);
  const reference = runs.find(({ run }) => run === comparison.base)!;
  const pairs = slicePairs(runs, reference, held);
  return { comparison, held, runs, reference, pairs, slices: runs.flatMap((one) => one.slices) };
}
