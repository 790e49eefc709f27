import { useMemo } from 'react';
import type { ReactNode } from 'react';
import type { ReadingName } from '../../../../shared/run.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import { PlotButton } from '../../../components/plot/PlotToolbar.tsx';
import type { PlotAxis } from '../../../components/plot/plotTypes.ts';
import { fileNameOf, saveFile } from '../../../components/plot/saveFile.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import { relatedCurves, valueCurves } from '../model/comparedCurves.ts';
import { curvesCsv } from '../model/comparedCsv.ts';
import type { ComparedRun } from '../model/comparedRun.ts';
import type { Relation } from '../model/curveDifference.ts';
import type { SlicePair } from '../model/slicePairs.ts';
import { RelationSelect } from './RelationSelect.tsx';

type Props = {
  runs: readonly ComparedRun[];
  reference: ComparedRun;
  pairs: readonly SlicePair[];
  reading: ReadingName;
  relation: Relation;
  /** At what the maps and families are taken, in words. */
  held: readonly string[];
  unit: AngleUnit;
  log: boolean;
  xAxis: PlotAxis;
  height: number;
  onRelation: (relation: Relation) => void;
  /** Reading and scale. */
  controls: ReactNode;
  /** The SVG renderer is for tests: jsdom has no canvas. */
  renderer?: 'canvas' | 'svg';
};

/** All curves over each other, and below on the same x axis each against the reference. */
export function CompareFigure(props: Props) {
  const { runs, reference, pairs, reading, relation, held, unit, log, xAxis, height } = props;
  const { onRelation, controls, renderer = 'canvas' } = props;
  const slices = useMemo(() => runs.flatMap((one) => one.slices), [runs]);
  const values = useMemo(() => valueCurves(slices, reading, unit, log), [slices, reading, unit, log]);
  const related = useMemo(
    () => relatedCurves(slices, pairs, reading, relation, unit),
    [slices, pairs, reading, relation, unit],
  );
  const saveCsv = () =>
    saveFile(
      fileNameOf(`compare ${reading} ${relation}`, 'csv'),
      curvesCsv(runs, pairs, { reading, relation, unit, held }),
      'text/csv',
    );
  if (!values || !related) return <p className="py-6 text-muted">Nothing is drawn at these values.</p>;
  return (
    <div className="card px-4 pt-2 pb-2">
      <LinePlot
        series={values.series}
        yAxes={[values.axis]}
        xAxis={xAxis}
        height={height}
        renderer={renderer}
        ariaLabel={`Compared runs against ${xAxis.label}`}
        fileName={`compare ${reading}`}
        downloads={
          <PlotButton label="Download the compared values as CSV" onClick={saveCsv}>
            CSV
          </PlotButton>
        }
        controls={controls}
      />
      {related.series.length > 0 ? (
        <LinePlot
          series={related.series}
          yAxes={[related.axis]}
          xAxis={xAxis}
          height={Math.round(height * 0.6)}
          renderer={renderer}
          ariaLabel={`${relation === 'ratio' ? 'Ratio' : 'Difference'} to ${reference.letter} against ${xAxis.label}`}
          fileName={`compare ${reading} ${relation}`}
          controls={<RelationSelect value={relation} onChange={onRelation} letter={reference.letter} />}
        />
      ) : (
        <p className="py-4 text-muted">
          {reference.letter} has no curve that one of the others can be held against: choose another value or
          another reference.
        </p>
      )}
    </div>
  );
}
