import { useMemo } from 'react';
import type { RunResult } from '../../../../shared/resultFormat.ts';
import type { SharedRun } from '../../../../shared/run.ts';
import { FamilyControls, ScaleControls } from '../../../components/plot/ReadingControls.tsx';
import { ReadingPlot } from '../../../components/plot/ReadingPlot.tsx';
import { familiesOf, lightsOf, readingsOf } from '../../../components/plot/readingView.ts';
import type { Family, ReadingView } from '../../../components/plot/readingView.ts';
import { workingPlace } from '../model/sweepPlace.ts';

type Props = {
  run: Pick<SharedRun, 'name' | 'axis' | 'document'>;
  result: RunResult;
  view: ReadingView;
  /** What is drawn until somebody chooses. */
  usual: readonly Family[];
  onView: (change: Partial<ReadingView>) => void;
  onCursorX: (x: number | null) => void;
  layerName: string | null;
  height: number;
};

/** The curves of a stored run. */
export function RunPlot({ run, result, view, usual, onView, onCursorX, layerName, height }: Props) {
  const stored = useMemo(() => result.header.readings.map(({ name }) => name), [result]);
  const families = familiesOf(stored);
  const lights = lightsOf(stored);
  const light = view.light ?? (lights === 'ps' ? run.document.workingPoint.input : lights);
  const wanted = (view.shown ?? usual).filter((family) => families.includes(family));
  const shown = wanted.length > 0 ? wanted : families;
  const key = `${shown.join()} ${light}`;
  // The curves are made anew when the choice changes, not whenever its array does.
  const readings = useMemo(() => {
    const [chosen = '', lit = ''] = key.split(' ');
    const picked = families.filter((family) => chosen.split(',').includes(family));
    return readingsOf(picked, lit === 's' || lit === 'ps' ? lit : 'p');
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [key]);
  return (
    <div className="card px-4 pt-2 pb-2">
      <div className="flex justify-end">
        <ScaleControls light={light} lights={lights} log={view.log} unit={view.unit} onChange={onView} />
      </div>
      <ReadingPlot
        axis={run.axis}
        layerName={layerName ?? undefined}
        grid={result.axis}
        columns={result.columns}
        readings={readings}
        unit={view.unit}
        log={view.log}
        height={height}
        marker={workingPlace(run.axis, run.document) ?? undefined}
        onCursorX={onCursorX}
        fileName={run.name}
        controls={<FamilyControls families={families} shown={shown} onChange={onView} />}
      />
    </div>
  );
}
