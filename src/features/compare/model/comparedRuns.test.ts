import { describe, expect, it } from 'vitest';
import { axisValues } from '../../../../shared/axisValues.ts';
import type { SweepAxis } from '../../../../shared/run.ts';
import { buildLoadedRun, compare } from '../compareFixtures.ts';
import { curvesCsv, mapsCsv } from './comparedCsv.ts';
import { curveOf, relatedCurves, valueCurves } from './comparedCurves.ts';
import { readRunIds } from './comparedIds.ts';
import { commonReadings } from './comparedRun.ts';
import type { LoadedRun } from './comparedRun.ts';
import { mapRows } from './differenceRows.ts';
import { comparedMaps, relateMaps } from './mapDifference.ts';
import { planComparison } from './planComparison.ts';
import { pairName, unpaired } from './slicePairs.ts';

const angle: SweepAxis = { kind: 'angle', from: 0, to: 40, points: 3, spacing: 'linear' };
const wavelength: SweepAxis = { kind: 'wavelength', from: 400, to: 800, points: 5, spacing: 'linear' };
const cap: SweepAxis = { kind: 'thickness', layerId: 'cap', from: 1, to: 3, points: 3, spacing: 'linear' };

const inMdeg = { reading: 'rotationP', relation: 'difference', unit: 'mdeg', held: [] } as const;
const round = (values: ArrayLike<number>) => Array.from(values, (value) => Math.round(value * 1e9) / 1e9);

// Expected values in this file: linear interpolation and the analytic functions given to `buildLoadedRun`, worked by hand.
describe('compared curves as a plot and as a file', () => {
  const a = buildLoadedRun('A', { axis: angle }, (x) => [0.01, 0.02, 0.04][x / 20]!);
  const b = buildLoadedRun(
    'B',
    { axis: { ...angle, from: 20, to: 60 } },
    (x) => [0.03, NaN, 0.05][x / 20 - 1]!,
    {
      capNm: 3,
    },
  );
  const { slices, pairs, runs } = compare([a, b]);

  it('keep the colour of the reading and differ in dash and name', () => {
    const drawn = valueCurves(slices, 'rotationP', 'mdeg', false);
    expect(drawn?.series.map(({ name, tone, dash }) => [name, tone, dash])).toEqual([
      ['A Pt cap 2 nm, 0–40°', 'rotation', 'solid'],
      ['B Pt cap 3 nm, 20–60°', 'rotation', 'dashed'],
    ]);
    expect([...Array.from(drawn?.series[0]?.y ?? [])]).toEqual([10, 20, 40]);
  });

  it('show the difference over the same range of x as the values, with the gaps of both', () => {
    const drawn = relatedCurves(slices, pairs, 'rotationP', 'difference', 'mdeg');
    const [only] = drawn?.series ?? [];
    expect(drawn?.series).toHaveLength(1);
    expect(only?.name).toBe('B − A');
    expect(Array.from(only?.x ?? [])).toEqual([0, 0, 20, 40, 60]);
    expect(round(only?.y ?? [])).toEqual([NaN, NaN, 10, NaN, NaN]);
  });

  it('go into a file on the axis of the reference, in the unit of the screen, with empty fields for gaps', () => {
    const lines = curvesCsv(runs, pairs, {
      reading: 'rotationP',
      relation: 'ratio',
      unit: 'deg',
      held: ['the angle 3°'],
    });
    expect(lines.trim().split('\n')).toEqual([
      '# maps and families taken at the angle 3°',
      '# B - A: largest difference 0.009999999999999998 deg at angle (deg) 20; root mean square 0.009999999999999998 deg; points with both values: 1',
      'angle (deg),"A Pt cap 2 nm, 0–40°: rotationP (deg)","B Pt cap 3 nm, 20–60°: rotationP (deg), interpolated",B / A',
      '0,0.01,,',
      '20,0.02,0.03,1.5',
      '40,0.04,,',
    ]);
  });

  it('offer the readings that all of them have', () => {
    expect(commonReadings([a.result, b.result])).toEqual(['rotationP']);
    expect(commonReadings([a.result, { ...b.result, columns: {} }])).toEqual([]);
  });
});

describe('families of curves', () => {
  const rising = (x: number, _up: number, member: number) => x / 1000 + member;
  const a = buildLoadedRun('A', { axis: angle, family: cap }, rising);

  it('draw every member and hold those with the same value against each other', () => {
    const wider = { ...cap, from: 2, to: 4 };
    const b = buildLoadedRun(
      'B',
      { axis: angle, family: wider },
      (x, up, member) => rising(x, up, member) + 0.5,
    );
    const { slices, pairs, runs, reference } = compare([a, b]);
    expect(valueCurves(slices, 'rotationP', 'deg', false)?.series.map(({ name }) => name)).toEqual([
      'A 1 nm',
      'A 2 nm',
      'A 3 nm',
      'B 2 nm',
      'B 3 nm',
      'B 4 nm',
    ]);
    expect(pairs.map((pair) => pairName(pair, 'difference'))).toEqual(['B − A, 2 nm', 'B − A, 3 nm']);
    const drawn = relatedCurves(slices, pairs, 'rotationP', 'difference', 'deg');
    expect(round(drawn?.series[0]?.y ?? []).slice(1, -1)).toEqual([0.5, 0.5, 0.5]);
    expect(unpaired(runs, reference, pairs).map(({ member }) => member)).toEqual(['4 nm']);
  });

  it('at one value take the nearest member of a run that has no equal one, and say so', () => {
    const b = buildLoadedRun('B', { axis: angle, family: { ...cap, from: 1.2, to: 3.2 } }, rising);
    const { runs, slices, pairs } = compare([a, b], 'at-thickness=2');
    expect(runs.map(({ notes }) => notes)).toEqual([[], ['no curve at 2 nm: the nearest, 2.2 nm, is drawn']]);
    expect(slices.map(({ phrases }) => phrases)).toEqual([['Pt cap 2 nm'], ['Pt cap 2.2 nm']]);
    expect(pairs).toHaveLength(1);
    // Equal within the rounding of a grid is equal.
    const same = buildLoadedRun('C', { axis: angle, family: { ...cap, from: 1 + 1e-12 } }, rising);
    expect(compare([a, same], 'at-thickness=1').runs[1]?.notes).toEqual([]);
  });

  it('are compared with a plain curve at every member, and by its own thickness where one is chosen', () => {
    const plain = buildLoadedRun('B', { axis: angle }, rising, { capNm: 3 });
    const all = compare([a, plain]);
    expect(all.pairs.map((pair) => pairName(pair, 'ratio'))).toEqual([
      'B / A 1 nm',
      'B / A 2 nm',
      'B / A 3 nm',
    ]);
    expect(all.slices.map(({ phrases }) => phrases[0])).toEqual([1, 2, 3, 3].map((nm) => `Pt cap ${nm} nm`));
  });

  it('of more curves than a plot can hold are drawn at one value', () => {
    const many = buildLoadedRun('A', { axis: angle, family: { ...cap, points: 12 } }, rising);
    const plain = buildLoadedRun('B', { axis: angle }, rising, { capNm: 3 });
    const { held, slices } = compare([many, plain], 'at-thickness=all');
    expect(held.map(({ value, mayBeAll }) => [value, mayBeAll])).toEqual([[3, false]]);
    // The member with the thickness of the plain curve: nothing differs.
    expect(slices.map(({ phrases }) => phrases)).toEqual([[], []]);
  });
});

describe('repeats of a block', () => {
  const repeats: SweepAxis = {
    kind: 'repeat',
    blockId: 'block',
    from: 1,
    to: 5,
    points: 5,
    spacing: 'linear',
  };
  const every2 = { ...repeats, points: 3 };

  it('are compared where both have them, with nothing in between', () => {
    const [a, b] = [
      buildLoadedRun('A', { axis: repeats }, (count) => count / 100),
      buildLoadedRun('B', { axis: every2 }, (count) => count / 50),
    ];
    const { slices, pairs, runs } = compare([a, b]);
    const drawn = relatedCurves(slices, pairs, 'rotationP', 'difference', 'deg');
    expect(round(drawn?.series[0]?.y ?? []).slice(1, -1)).toEqual([0.01, NaN, 0.03, NaN, 0.05]);
    expect(curvesCsv(runs, pairs, inMdeg)).not.toContain('interpolated');
  });

  it('across or up a map are no place to interpolate, the other axis is', () => {
    const half: SweepAxis = { ...angle, points: 2 };
    const a = buildLoadedRun('A', { axis: angle, second: repeats }, (deg, count) => (deg * count) / 1000);
    const b = buildLoadedRun('B', { axis: every2, second: half }, (count, deg) => (deg * count) / 1000);
    const { runs, reference } = compare([a, b]);
    const [other] = comparedMaps(runs, reference, 'rotationP')!.others;
    // The rows are 1 to 5 repeats of 0, 20 and 40 deg; B has 20 deg between two of its points and 1, 3, 5 repeats.
    expect(round(other!.data.values)).toEqual([
      ...[0, 0.02, 0.04],
      ...[NaN, NaN, NaN],
      ...[0, 0.06, 0.12],
      ...[NaN, NaN, NaN],
      ...[0, 0.1, 0.2],
    ]);
    // The same with the repeats of B up.
    const up = buildLoadedRun('C', { axis: half, second: every2 }, (deg, count) => (deg * count) / 1000);
    const turned = compare([a, up]);
    const [same] = comparedMaps(turned.runs, turned.reference, 'rotationP')!.others;
    expect(round(same!.data.values)).toEqual(round(other!.data.values));
  });
});

describe('maps', () => {
  // Bilinear interpolation reproduces this function exactly, on any grid.
  const bilinear = (deg: number, nm: number) => 0.1 + 0.002 * deg - 0.0003 * nm + 0.00001 * deg * nm;
  const a = buildLoadedRun('A', { axis: angle, second: wavelength }, bilinear);
  const fine: SweepAxis = { ...angle, from: 30, to: 5, points: 7, spacing: 'log' };
  const swapped = buildLoadedRun(
    'B',
    { axis: { ...wavelength, from: 900, to: 450, points: 4 }, second: fine },
    (nm, deg) => bilinear(deg, nm) + 0.25,
  );

  it('with exchanged axes and another grid are laid on the grid of the reference, within what both have', () => {
    const { runs, reference, comparison } = compare([a, swapped]);
    expect(comparison.view?.id).toBe('map');
    const maps = comparedMaps(runs, reference, 'rotationP')!;
    const { values } = relateMaps(maps.base, maps.others[0]!, 'rotationP', 'difference');
    const inside = axisValues(wavelength).flatMap((nm) =>
      axisValues(angle).map((deg) => (deg === 20 && nm >= 450 ? 0.25 : NaN)),
    );
    expect(round(values)).toEqual(inside);
    const ratio = relateMaps(maps.base, maps.others[0]!, 'rotationP', 'ratio').values;
    expect(ratio[4]).toBeCloseTo((bilinear(20, 500) + 0.25) / bilinear(20, 500), 9);
    const [row] = mapRows(maps.base, maps.others, 'rotationP');
    expect([row?.name, row?.count]).toEqual(['B − A', 4]);
    expect(row?.rms).toBeCloseTo(0.25, 12);
    const lines = mapsCsv(maps.base, maps.others, inMdeg).trim().split('\n');
    expect(lines[0]).toMatch(
      /^# B - A: largest difference 250\S* mdeg at angle \(deg\) 20, wavelength \(nm\) \d00;/,
    );
    expect(lines[1]).toMatch(/^angle \(deg\),wavelength \(nm\),.*B - A \(mdeg\)$/);
    expect(lines).toHaveLength(2 + 15);
    expect(lines[2]).toMatch(/^0,400,-(20|19\.9{9}\d*),,$/);
  });

  it('against a curve are cut where the curve was computed, linear between rows, and say how', () => {
    const curve = buildLoadedRun('B', { axis: wavelength }, (nm) => bilinear(30, nm), { angleDeg: 30 });
    const { slices, runs, held, pairs } = compare([curve, a]);
    expect(held.map(({ key, value, choices }) => [key, value, choices])).toEqual([['angle', 30, null]]);
    expect(runs[1]?.notes).toEqual(['cut at 30°, linear between its rows at 20° and 40°']);
    expect(slices.map(({ phrases }) => phrases)).toEqual([[], []]);
    expect(pairs).toHaveLength(1);
    expect(round(curveOf(slices[1]!, 'rotationP').y)).toEqual(
      round(axisValues(wavelength).map((nm) => bilinear(30, nm))),
    );
    const exact = compare([curve, a], 'at-angle=20');
    expect(exact.runs[1]?.notes).toEqual(['cut at 20°, a row of its grid']);
    expect(exact.slices.map(({ phrases }) => phrases)).toEqual([['30°'], ['20°']]);
  });

  it('against a family are cut at its members, where they reach', () => {
    const family: SweepAxis = { ...wavelength, from: 500, to: 900, points: 3 };
    const { slices, runs } = compare([buildLoadedRun('F', { axis: angle, family }, bilinear), a]);
    expect(slices.map(({ of, member }) => `${of.letter} ${member}`)).toEqual([
      ...['F 500 nm', 'F 700 nm', 'F 900 nm', 'A 500 nm', 'A 700 nm'],
    ]);
    expect(runs[1]?.notes).toEqual(['cut at 500 nm, a row of its grid', 'cut at 700 nm, a row of its grid']);
  });
});

describe('what can be laid over what', () => {
  const a = buildLoadedRun('A', { axis: angle }, () => 1);
  const runsOf = (...loaded: LoadedRun[]) => loaded.map(({ run }) => run);
  const none = { reference: null, view: null };

  it('is refused without a common axis, with the remedy', () => {
    const { refused } = planComparison(
      runsOf(
        a,
        buildLoadedRun('B', { axis: wavelength }, () => 1),
      ),
      none,
    );
    expect(refused.map(({ why }) => why)).toEqual([
      'It is swept over the wavelength, the reference over the angle of incidence: they have no axis in common. ' +
        'Start its film as a run over the angle of incidence, or take one of the two out.',
    ]);
    const failed = { ...a.run, progress: { ...a.run.progress, state: 'failed' as const } };
    expect(planComparison([failed], none).refused[0]?.why).toContain('no values (failed)');
  });

  it('takes the way that draws most runs, and the other where it is asked for', () => {
    const map = buildLoadedRun('M', { axis: angle, second: wavelength }, () => 1);
    const other = buildLoadedRun('N', { axis: wavelength, second: angle }, () => 1);
    const runs = runsOf(map, other, a);
    expect(planComparison(runs, none).view?.label).toBe('curves over the angle of incidence');
    const asked = planComparison(runs, { reference: null, view: 'map' });
    expect(asked.drawn.map(({ id }) => id)).toEqual(['M', 'N']);
    expect(asked.refused[0]?.why).toContain('choose “curves over the angle of incidence” to see it');
    // The first run that has a partner is the reference.
    expect(
      planComparison(
        runsOf(
          buildLoadedRun('T', { axis: cap }, () => 1),
          a,
          map,
        ),
        none,
      ).base?.id,
    ).toBe('A');
  });

  it('tells two thicknesses of one map by their layers', () => {
    const thickness: SweepAxis = { ...cap, layerId: 'other' };
    const { view } = planComparison(
      runsOf(
        buildLoadedRun('M', { axis: cap, second: thickness }, () => 1),
        buildLoadedRun('P', { axis: cap }, () => 1),
      ),
      none,
    );
    expect(view).toMatchObject({ id: 'thickness Pt cap', label: 'curves over the thickness of Pt cap' });
  });

  it('is six runs at the most, each once', () => {
    expect(readRunIds(new URLSearchParams('runs=a,b,,a,c,d,e,f,g'))).toEqual(['a', 'b', 'c', 'd', 'e', 'f']);
  });
});
