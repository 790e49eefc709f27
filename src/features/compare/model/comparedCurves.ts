import { readingDefinitions } from '../../../../shared/readings.ts';
import type { ReadingName } from '../../../../shared/run.ts';
import { familyLooks, oneReading } from '../../../components/plot/readingSeries.ts';
import { families } from '../../../components/plot/readingView.ts';
import type { PlotAxis, PlotSeries } from '../../../components/plot/plotTypes.ts';
import { formatNumber } from '../../../lib/format.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import type { ComparedSlice } from './comparedRun.ts';
import { relate } from './curveDifference.ts';
import type { ComparedCurve, Relation } from './curveDifference.ts';
import { isDiscrete } from './heldQuantities.ts';
import { curveIn } from './runSlice.ts';
import { pairName } from './slicePairs.ts';
import type { SlicePair } from './slicePairs.ts';

/** Phrases up to this length stand at the curve; longer ones in the legend alone. */
const SHORT = 26;
const dashes = ['solid', 'dashed', 'dotted'] as const;

/** A reading along the drawn axis of a slice, in degrees or plain numbers. */
export function curveOf(slice: ComparedSlice, reading: ReadingName): ComparedCurve {
  const [drawn] = slice.axes;
  return {
    ...curveIn(slice.of.result, slice, reading),
    discrete: drawn !== undefined && isDiscrete(drawn),
  };
}

/**
 * How the curves of a run are told from those of the others: the colour is that of the reading everywhere in the
 * program, so dash, width and the name at the curve tell them apart.
 */
export function lookOf(
  { of, position, member, phrases }: Pick<ComparedSlice, 'of' | 'position' | 'member' | 'phrases'>,
  reading: ReadingName,
): Pick<PlotSeries, 'name' | 'tone' | 'dash' | 'width'> {
  const family = families.find((one) => one === readingDefinitions[reading].family) ?? 'rotation';
  const said = member || phrases.join(', ');
  return {
    name: said.length > 0 && said.length <= SHORT ? `${of.letter} ${said}` : of.letter,
    tone: familyLooks[family].tone,
    dash: dashes[position % dashes.length] ?? 'solid',
    width: position < dashes.length ? 2.4 : 1.3,
  };
}

export type Drawn = { series: PlotSeries[]; axis: PlotAxis };

/** The values of all slices on one scale. */
export function valueCurves(
  slices: readonly ComparedSlice[],
  reading: ReadingName,
  unit: AngleUnit,
  log: boolean,
): Drawn | null {
  const drawn = slices.flatMap((slice) => {
    const { x, y } = curveOf(slice, reading);
    const scaled = oneReading(reading, y, unit, log);
    return scaled ? [{ series: { ...lookOf(slice, reading), x, y: scaled.values }, axis: scaled.axis }] : [];
  });
  const [first] = drawn;
  return first ? { series: drawn.map(({ series }) => series), axis: first.axis } : null;
}

/**
 * Each curve against the reference's. The reference's grid is led to the ends of all curves without values there, so
 * that this plot and that of the values have the same x axis.
 */
export function relatedCurves(
  slices: readonly ComparedSlice[],
  pairs: readonly SlicePair[],
  reading: ReadingName,
  relation: Relation,
  unit: AngleUnit,
): Drawn | null {
  const ends = slices.flatMap(({ axes: [drawn] }) => (drawn ? [drawn.axis.from, drawn.axis.to] : []));
  const [low, high] = [Math.min(...ends), Math.max(...ends)];
  const scale = oneReading(reading, [], unit, false);
  if (!scale) return null;
  const series = pairs.map((pair): PlotSeries => {
    const base = curveOf(pair.base, reading);
    const rising = (base.x[base.x.length - 1] ?? 0) >= (base.x[0] ?? 0);
    const x = Float64Array.from([rising ? low : high, ...Array.from(base.x), rising ? high : low]);
    const values = relate(reading, relation, base, curveOf(pair.other, reading));
    const scaled =
      relation === 'ratio' ? values : (oneReading(reading, values, unit, false)?.values ?? values);
    const y = Float64Array.from([NaN, ...Array.from(scaled), NaN]);
    return { ...lookOf(pair.other, reading), name: pairName(pair, relation), x, y };
  });
  const axis: PlotAxis =
    relation === 'ratio'
      ? { label: 'ratio', include: [1], format: (value) => formatNumber(value) }
      : { ...scale.axis, most: Infinity };
  return { series, axis };
}
