import { readingDefinitions } from '../../../../shared/readings.ts';
import type { RunResult } from '../../../../shared/resultFormat.ts';
import { readingNames } from '../../../../shared/run.ts';
import type { ReadingName, Run } from '../../../../shared/run.ts';
import { familyLooks, oneReading } from '../../../components/plot/readingSeries.ts';
import { families } from '../../../components/plot/readingView.ts';
import type { PlotAxis, PlotSeries } from '../../../components/plot/plotTypes.ts';
import { formatNumber } from '../../../lib/format.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import { relate } from './curveDifference.ts';
import type { ComparedCurve, Relation } from './curveDifference.ts';

/** A run that can be laid over the others, with its letter on this page and what sets it apart. */
export type ComparedRun = { run: Run; result: RunResult; letter: string; phrases: readonly string[] };

/** Phrases up to this length stand at the curve; longer ones in the legend alone. */
const SHORT = 26;
const dashes = ['solid', 'dashed', 'dotted'] as const;

/** The readings that every compared run has and that a plot can draw. */
export function commonReadings(results: readonly RunResult[]): ReadingName[] {
  return readingNames.filter((name) => {
    const { family } = readingDefinitions[name];
    const drawn = families.some((one) => one === family) && name !== 'stackCeiling';
    return drawn && results.length > 0 && results.every(({ columns }) => columns[name] !== undefined);
  });
}

/** A reading along the axis of a run, in degrees or plain numbers. */
export function curveOf({ result }: Pick<ComparedRun, 'result'>, reading: ReadingName): ComparedCurve {
  return { x: result.axis, y: result.columns[reading] ?? [] };
}

/**
 * How the curve of a run is told from the others: the colour is that of the reading everywhere in the program, so
 * dash, width and the name at the curve tell the runs apart.
 */
export function lookOf(
  { letter, phrases }: Pick<ComparedRun, 'letter' | 'phrases'>,
  position: number,
  reading: ReadingName,
): Pick<PlotSeries, 'name' | 'tone' | 'dash' | 'width'> {
  const family = families.find((one) => one === readingDefinitions[reading].family) ?? 'rotation';
  const said = phrases.join(', ');
  return {
    name: said.length > 0 && said.length <= SHORT ? `${letter} ${said}` : letter,
    tone: familyLooks[family].tone,
    dash: dashes[position % dashes.length] ?? 'solid',
    width: position < dashes.length ? 2.4 : 1.3,
  };
}

export type Drawn = { series: PlotSeries[]; axis: PlotAxis };

/** The values of all runs on one scale. */
export function valueCurves(
  runs: readonly ComparedRun[],
  reading: ReadingName,
  unit: AngleUnit,
  log: boolean,
): Drawn | null {
  const drawn = runs.flatMap((one, position) => {
    const { x, y } = curveOf(one, reading);
    const scaled = oneReading(reading, y, unit, log);
    return scaled
      ? [{ series: { ...lookOf(one, position, reading), x, y: scaled.values }, axis: scaled.axis }]
      : [];
  });
  const [first] = drawn;
  return first ? { series: drawn.map(({ series }) => series), axis: first.axis } : null;
}

/**
 * Each run against the reference. The reference's grid is led to the ends of all curves without values there, so that
 * this plot and that of the values have the same x axis.
 */
export function relatedCurves(
  runs: readonly ComparedRun[],
  reference: ComparedRun,
  reading: ReadingName,
  relation: Relation,
  unit: AngleUnit,
): Drawn | null {
  const base = curveOf(reference, reading);
  const ends = runs.flatMap(({ result: { axis } }) => [axis[0] ?? NaN, axis[axis.length - 1] ?? NaN]);
  const [low, high] = [Math.min(...ends), Math.max(...ends)];
  const rising = (base.x[base.x.length - 1] ?? 0) >= (base.x[0] ?? 0);
  const x = Float64Array.from([rising ? low : high, ...Array.from(base.x), rising ? high : low]);
  const scale = oneReading(reading, [], unit, false);
  if (!scale) return null;
  const series = runs.flatMap((one, position): PlotSeries[] => {
    if (one === reference) return [];
    const values = relate(reading, relation, base, curveOf(one, reading));
    const scaled =
      relation === 'ratio' ? values : (oneReading(reading, values, unit, false)?.values ?? values);
    const y = Float64Array.from([NaN, ...Array.from(scaled), NaN]);
    const name =
      relation === 'ratio' ? `${one.letter} / ${reference.letter}` : `${one.letter} − ${reference.letter}`;
    return [{ ...lookOf(one, position, reading), name, x, y }];
  });
  const axis: PlotAxis =
    relation === 'ratio'
      ? { label: 'ratio', include: [1], format: (value) => formatNumber(value) }
      : { ...scale.axis, most: Infinity };
  return { series, axis };
}
