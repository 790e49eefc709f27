import { useMemo } from 'react';
import type { ReadingName } from '../../../shared/run.ts';
import { ScaleControls } from '../../components/plot/ReadingControls.tsx';
import { ReadingSelect } from '../../components/plot/ReadingSelect.tsx';
import { usePlotHeight } from '../../components/plot/usePlotHeight.ts';
import { CompareFigure } from '../../features/compare/components/CompareFigure.tsx';
import { DifferenceTable } from '../../features/compare/components/DifferenceTable.tsx';
import { curveRows } from '../../features/compare/model/differenceRows.ts';
import type { ComparedRun } from '../../features/compare/model/comparedRun.ts';
import { heldWords } from '../../features/compare/model/heldQuantities.ts';
import type { HeldQuantity } from '../../features/compare/model/heldQuantities.ts';
import { sharedXAxis } from '../../features/compare/model/sharedAxis.ts';
import { slicePairs, unpaired } from '../../features/compare/model/slicePairs.ts';
import { useCompareAddress } from './useCompareAddress.ts';

export type ComparedProps = {
  runs: readonly ComparedRun[];
  reference: ComparedRun;
  held: readonly HeldQuantity[];
  readings: readonly ReadingName[];
  reading: ReadingName;
};

/** Curves on one plot, each against the reference, and in numbers. */
export function ComparedCurves({ runs, reference, held, readings, reading }: ComparedProps) {
  const { view, relation, changeView, changeRelation } = useCompareAddress();
  const height = usePlotHeight(520);
  const pairs = useMemo(() => slicePairs(runs, reference, held), [runs, reference, held]);
  const rows = useMemo(() => curveRows(pairs, reading), [pairs, reading]);
  const xAxis = useMemo(
    () => sharedXAxis([reference, ...runs].flatMap(({ slices }) => slices[0]?.axes[0] ?? [])),
    [runs, reference],
  );
  if (!xAxis) return <p className="py-6 text-muted">None of the runs reaches this value: choose another.</p>;
  const { unit, log } = view;
  const alone = unpaired(runs, reference, pairs);
  return (
    <>
      <CompareFigure
        runs={runs}
        reference={reference}
        pairs={pairs}
        reading={reading}
        relation={relation}
        held={heldWords(held)}
        unit={unit}
        log={log}
        xAxis={xAxis}
        height={height}
        onRelation={changeRelation}
        controls={
          <>
            <ReadingSelect
              readings={readings}
              value={reading}
              onChange={(next) => changeView({ reading: next })}
            />
            <ScaleControls light="p" lights="p" log={log} unit={unit} onChange={changeView} />
          </>
        }
      />
      <DifferenceTable
        rows={rows}
        letter={reference.letter}
        points={reference.slices[0]?.axes[0]?.axis.points ?? 0}
        reading={reading}
        unit={unit}
        axes={[xAxis]}
        unpaired={alone.map(({ of, member }) => `${of.letter} ${member}`.trim())}
      />
    </>
  );
}
