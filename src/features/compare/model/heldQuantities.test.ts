import { describe, expect, it } from 'vitest';
import type { SweepAxis } from '../../../../shared/run.ts';
import { buildLoadedRun, compare } from '../compareFixtures.ts';
import { heldWords } from './heldQuantities.ts';
import { quantityWords } from './runAxes.ts';
import { sharedXAxis } from './sharedAxis.ts';

const angle: SweepAxis = { kind: 'angle', from: 0, to: 40, points: 3, spacing: 'linear' };
const cap: SweepAxis = { kind: 'thickness', layerId: 'cap', from: 1, to: 3, points: 3, spacing: 'linear' };

// What is expected follows from the films of `buildLoadedRun`: a layer is the same one by its id, else by its name.
describe('the same of different layers', () => {
  const flat = () => 1;
  const co = (letter: string): SweepAxis => ({ ...cap, layerId: `co ${letter}` });
  const ofPt = buildLoadedRun('A', { axis: angle, family: cap }, flat, { coNm: 5 });

  it('is held apart: 2 nm of Pt are no pair of 2 nm of Co', () => {
    const ofCo = buildLoadedRun('B', { axis: angle, family: co('B') }, flat, { coNm: 5 });
    const { held, slices, pairs } = compare([ofPt, ofCo], 'at-thickness layer 1=1&at-thickness layer 2=3');
    expect(held.map(({ value, mayBeAll }) => [value, mayBeAll])).toEqual([
      [1, false],
      [3, false],
    ]);
    expect(heldWords(held)).toEqual([
      'the thickness of Pt cap 1 nm in runs that sweep it',
      'the thickness of Co 3 nm in runs that sweep it',
    ]);
    expect(slices.map(({ phrases }) => phrases)).toEqual([
      ['Pt cap 1 nm', 'Co 5 nm'],
      ['Pt cap 2 nm', 'Co 3 nm'],
    ]);
    expect(pairs).toHaveLength(1);
    // A map is cut at a value of its own layer too.
    const map = buildLoadedRun('B', { axis: angle, second: co('B') }, flat, { coNm: 2.5 });
    const cut = compare([ofPt, map]);
    expect(heldWords(cut.held)[1]).toBe('the thickness of Co 2.5 nm in runs that sweep it');
    expect(cut.runs[1]?.notes).toEqual(['cut at 2.5 nm, linear between its rows at 2 nm and 3 nm']);
  });

  it('is one quantity where the layer is the same by its name, and for m only in the same plane', () => {
    const scale = (letter: string): SweepAxis => ({ ...co(letter), kind: 'voigtScale' });
    const runs = ['A', 'B'].map((letter) =>
      buildLoadedRun(letter, { axis: angle, family: scale(letter) }, flat, { coNm: 5 }),
    );
    const same = compare(runs);
    expect(same.held.map(({ key, value, apart }) => [key, value, apart])).toEqual([
      ['voigtScale', 'all', false],
    ]);
    expect(same.pairs).toHaveLength(3);
    const planes = (['xz', 'yz'] as const).map((plane) =>
      buildLoadedRun(plane, { axis: angle, family: { ...cap, kind: 'direction', plane } }, flat),
    );
    const every = (['xz', 'xy'] as const).map((plane) => {
      const family: SweepAxis = { kind: 'direction', plane, from: 0, to: 90, points: 3, spacing: 'linear' };
      return buildLoadedRun(plane, { axis: angle, family }, flat);
    });
    expect(compare(every).held).toHaveLength(2);
    expect(compare(planes).held.map(({ source, value }) => [quantityWords(source), value])).toEqual([
      ['the direction of m of Pt cap from +z toward +x', 2],
      ['the direction of m of Pt cap from +z toward +y', 2],
    ]);
  });

  it('can be laid over each other on one axis, which names no single layer', () => {
    const over = (letter: string, axis: SweepAxis) => buildLoadedRun(letter, { axis }, flat, { coNm: 5 });
    const { comparison, slices } = compare([over('A', cap), over('B', co('B'))]);
    expect(comparison.view?.label).toBe('curves over the thickness of Pt cap or Co');
    const axes = slices.flatMap((slice) => slice.axes);
    expect(sharedXAxis(axes)?.label).toBe('thickness of Pt cap or Co (nm)');
    expect(sharedXAxis(axes.slice(1))?.label).toBe('thickness of Co (nm)');
  });
});

it('repeats of two blocks of one run are two quantities', () => {
  const repeats: SweepAxis = {
    kind: 'repeat',
    blockId: 'block',
    from: 1,
    to: 3,
    points: 3,
    spacing: 'linear',
  };
  const family: SweepAxis = { ...repeats, blockId: 'other' };
  const two = buildLoadedRun('A', { axis: angle, second: repeats, family }, () => 1);
  const { held } = compare([two, buildLoadedRun('B', { axis: angle }, () => 1)]);
  expect(held.map(({ key }) => key)).toEqual(['repeat block', 'repeat other']);
});
