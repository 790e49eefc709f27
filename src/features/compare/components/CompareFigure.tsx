import { useMemo } from 'react';
import type { ReadingName } from '../../../../shared/run.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import { PlotButton } from '../../../components/plot/PlotToolbar.tsx';
import { ScaleControls } from '../../../components/plot/ReadingControls.tsx';
import { ReadingSelect } from '../../../components/plot/ReadingSelect.tsx';
import type { PlotAxis } from '../../../components/plot/plotTypes.ts';
import type { ReadingView } from '../../../components/plot/readingView.ts';
import { fileNameOf, saveFile } from '../../../components/plot/saveFile.ts';
import { comparedCsv } from '../model/comparedCsv.ts';
import { relatedCurves, valueCurves } from '../model/comparedRun.ts';
import type { ComparedRun } from '../model/comparedRun.ts';
import type { Relation } from '../model/curveDifference.ts';

type Props = {
  runs: readonly ComparedRun[];
  reference: ComparedRun;
  readings: readonly ReadingName[];
  reading: ReadingName;
  relation: Relation;
  view: Pick<ReadingView, 'unit' | 'log'>;
  xAxis: PlotAxis;
  height: number;
  onView: (change: Partial<ReadingView>) => void;
  onRelation: (relation: Relation) => void;
  /** The SVG renderer is for tests: jsdom has no canvas. */
  renderer?: 'canvas' | 'svg';
};

/** All runs over each other, and below on the same x axis each against the reference. */
export function CompareFigure(props: Props) {
  const { runs, reference, readings, reading, relation, view, xAxis, height } = props;
  const { onView, onRelation, renderer = 'canvas' } = props;
  const { unit, log } = view;
  const values = useMemo(() => valueCurves(runs, reading, unit, log), [runs, reading, unit, log]);
  const related = useMemo(
    () => relatedCurves(runs, reference, reading, relation, unit),
    [runs, reference, reading, relation, unit],
  );
  const saveCsv = () =>
    saveFile(
      fileNameOf(`compare ${reading} ${relation}`, 'csv'),
      comparedCsv(runs, reference, reading, relation, unit),
      'text/csv',
    );
  if (!values || !related) return null;
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
        controls={
          <>
            <ReadingSelect
              readings={readings}
              value={reading}
              onChange={(next) => onView({ reading: next })}
            />
            <ScaleControls light="p" lights="p" log={log} unit={unit} onChange={onView} />
          </>
        }
      />
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
    </div>
  );
}

type RelationProps = { value: Relation; letter: string; onChange: (relation: Relation) => void };

function RelationSelect({ value, letter, onChange }: RelationProps) {
  return (
    <select
      aria-label="Against the reference"
      value={value}
      onChange={(event) => onChange(event.target.value === 'ratio' ? 'ratio' : 'difference')}
      className="h-7 field-sizing-content rounded-box border border-line bg-panel px-1.5 text-note text-ink"
    >
      <option value="difference">difference to {letter}</option>
      <option value="ratio">ratio to {letter}</option>
    </select>
  );
}
