import type { ReadingName, SweepAxis } from '../../../../shared/run.ts';
import { readingDefinitions } from '../../../../shared/readings.ts';
import { axisUnitOf } from '../../../../shared/resultFormat.ts';
import { toCsv } from '../../../components/plot/saveFile.ts';
import { fromDegrees } from '../../../lib/format.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import { curveOf } from './comparedRun.ts';
import type { ComparedRun } from './comparedRun.ts';
import { relate, resample } from './curveDifference.ts';
import type { Relation } from './curveDifference.ts';

/**
 * What the page shows as a table: on the reference's axis every run (interpolated where its points are others), and each
 * against the reference. Angles in the unit of the screen, everything else as stored.
 */
export function comparedCsv(
  runs: readonly ComparedRun[],
  reference: ComparedRun,
  reading: ReadingName,
  relation: Relation,
  unit: AngleUnit,
): string {
  const base = curveOf(reference, reading);
  const angle = readingDefinitions[reading].unit === 'deg';
  const factor = angle ? fromDegrees(1, unit) : 1;
  const scaled = (values: ArrayLike<number>) => Float64Array.from(values, (value) => value * factor);
  const unitText = angle ? ` (${unit})` : '';
  const sign = relation === 'ratio' ? '/' : '-';
  return toCsv([
    { header: axisHeader(reference.run.axis), values: base.x },
    ...runs.map((one) => ({
      header: `${titleOf(one)}: ${reading}${unitText}${one === reference ? '' : ', interpolated'}`,
      values: scaled(resample(curveOf(one, reading), base.x)),
    })),
    ...runs
      .filter((one) => one !== reference)
      .map((one) => {
        const values = relate(reading, relation, base, curveOf(one, reading));
        return {
          header: `${one.letter} ${sign} ${reference.letter}${relation === 'ratio' ? '' : unitText}`,
          values: relation === 'ratio' ? values : scaled(values),
        };
      }),
  ]);
}

function titleOf({ letter, phrases, run }: ComparedRun): string {
  return `${letter} ${phrases.join(', ') || run.name}`;
}

function axisHeader(axis: SweepAxis): string {
  const unit = axisUnitOf(axis);
  return unit === '1' ? axis.kind : `${axis.kind} (${unit})`;
}
