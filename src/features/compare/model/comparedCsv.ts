import type { ReadingName } from '../../../../shared/run.ts';
import { readingDefinitions } from '../../../../shared/readings.ts';
import { toCsv } from '../../../components/plot/saveFile.ts';
import { fromDegrees } from '../../../lib/format.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import { curveOf } from './comparedCurves.ts';
import type { ComparedRun, ComparedSlice } from './comparedRun.ts';
import { isRotation, relate, resample } from './curveDifference.ts';
import type { Relation } from './curveDifference.ts';
import { axisHeader, curveRows, differenceLines, mapRows } from './differenceRows.ts';
import { isDiscrete } from './heldQuantities.ts';
import { relateMaps } from './mapDifference.ts';
import type { ComparedMap } from './mapDifference.ts';
import { pairName } from './slicePairs.ts';
import type { SlicePair } from './slicePairs.ts';

type Shown = {
  reading: ReadingName;
  relation: Relation;
  unit: AngleUnit;
  /** At what the maps and families are taken, in words. */
  held: readonly string[];
};

/**
 * What the page shows as a table: on the reference's axis every curve (interpolated where its points are others), and
 * each against the reference; in front of it how large the differences are. Angles in the unit of the screen,
 * everything else as stored.
 */
export function curvesCsv(runs: readonly ComparedRun[], pairs: readonly SlicePair[], shown: Shown): string {
  const { reading, relation, unit, held } = shown;
  const slices = runs.flatMap((one) => one.slices);
  const first = pairs[0]?.base ?? slices[0];
  const axis = first?.axes[0]?.axis;
  if (!first || !axis) return '';
  const grid = curveOf(first, reading).x;
  const { scaled, unitText } = scaleOf(reading, unit);
  const table = toCsv([
    { header: axisHeader(axis), values: grid },
    ...slices.map((one) => ({
      header: `${titleOf(one)}: ${reading}${unitText}${one.of === first.of ? '' : howResampled(one)}`,
      values: scaled(resample(curveOf(one, reading), grid, isRotation(reading))),
    })),
    ...pairs.map((pair) => {
      const values = relate(reading, relation, curveOf(pair.base, reading), curveOf(pair.other, reading));
      return relatedColumn(pairName(pair, relation), values, shown);
    }),
  ]);
  return heldLines(held) + differenceLines(curveRows(pairs, reading), [axis], reading, unit) + table;
}

/** The maps on the reference's grid as one line for each of its points: both places, every map, each against it. */
export function mapsCsv(base: ComparedMap, others: readonly ComparedMap[], shown: Shown): string {
  const { reading, relation, unit, held } = shown;
  const { x, y } = base.data;
  const axes = base.slice.axes.map(({ axis }) => axis);
  const { scaled, unitText } = scaleOf(reading, unit);
  const count = x.length * y.length;
  const places = [(at: number) => x[at % x.length], (at: number) => y[Math.floor(at / x.length)]];
  const table = toCsv([
    ...axes.map((axis, index) => ({
      header: axisHeader(axis),
      values: Float64Array.from({ length: count }, (_, at) => places[index]?.(at) ?? NaN),
    })),
    ...[base, ...others].map(({ slice, data }) => ({
      header: `${titleOf(slice)}: ${reading}${unitText}${slice === base.slice ? '' : howResampled(slice)}`,
      values: scaled(data.values),
    })),
    ...others.map((other) => {
      const name = pairName({ base: base.slice, other: other.slice }, relation);
      return relatedColumn(name, relateMaps(base, other, reading, relation).values, shown);
    }),
  ]);
  return heldLines(held) + differenceLines(mapRows(base, others, reading), axes, reading, unit) + table;
}

function heldLines(held: readonly string[]): string {
  return held.map((words) => `# maps and families taken at ${words}\n`).join('');
}

function relatedColumn(name: string, values: ArrayLike<number>, { reading, relation, unit }: Shown) {
  const { scaled, unitText } = scaleOf(reading, unit);
  return relation === 'ratio'
    ? { header: name, values }
    : { header: name.replace('−', '-') + unitText, values: scaled(values) };
}

function scaleOf(reading: ReadingName, unit: AngleUnit) {
  const angle = readingDefinitions[reading].unit === 'deg';
  const factor = angle ? fromDegrees(1, unit) : 1;
  return {
    unitText: angle ? ` (${unit})` : '',
    scaled: (values: ArrayLike<number>) => Float64Array.from(values, (value) => value * factor),
  };
}

/** Along an axis that counts no value is made up between two points. */
function howResampled({ axes }: ComparedSlice): string {
  return axes.every(isDiscrete) ? '' : ', interpolated';
}

function titleOf({ of: { letter, run }, member, phrases }: ComparedSlice): string {
  return `${letter} ${phrases.join(', ') || member || run.name}`;
}
