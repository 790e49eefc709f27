import { useMemo } from 'react';
import { ScaleControls } from '../../components/plot/ReadingControls.tsx';
import { ReadingSelect } from '../../components/plot/ReadingSelect.tsx';
import { usePlotHeight } from '../../components/plot/usePlotHeight.ts';
import { CompareMaps } from '../../features/compare/components/CompareMaps.tsx';
import { DifferenceTable } from '../../features/compare/components/DifferenceTable.tsx';
import { mapRows } from '../../features/compare/model/differenceRows.ts';
import { heldWords } from '../../features/compare/model/heldQuantities.ts';
import { comparedMaps } from '../../features/compare/model/mapDifference.ts';
import { sharedXAxis } from '../../features/compare/model/sharedAxis.ts';
import type { ComparedProps } from './ComparedCurves.tsx';
import { useCompareAddress } from './useCompareAddress.ts';

/** The reference's map and one of the others, the one against the other, and all of them in numbers. */
export function ComparedMaps({ runs, reference, held, readings, reading }: ComparedProps) {
  const { view, relation, beside, change, changeView, changeRelation } = useCompareAddress();
  const height = usePlotHeight(560);
  const maps = useMemo(() => comparedMaps(runs, reference, reading), [runs, reference, reading]);
  const rows = useMemo(() => (maps ? mapRows(maps.base, maps.others, reading) : []), [maps, reading]);
  const axes = useMemo(() => {
    const along = (index: number) =>
      sharedXAxis([reference, ...runs].flatMap(({ slices }) => slices[0]?.axes[index] ?? []));
    const [x, y] = [along(0), along(1)];
    return x && y ? { x, y } : null;
  }, [runs, reference]);
  const shown = maps?.others.find(({ slice }) => slice.of.run.id === beside) ?? maps?.others[0];
  if (!maps || !shown || !axes) {
    return <p className="py-6 text-muted">No map is drawn at this value: choose another.</p>;
  }
  const { data } = maps.base;
  return (
    <>
      <CompareMaps
        base={maps.base}
        others={maps.others}
        shown={shown}
        onShown={(id) => change('beside', id)}
        axes={axes}
        reading={reading}
        relation={relation}
        held={heldWords(held)}
        unit={view.unit}
        height={height}
        onRelation={changeRelation}
        controls={
          <>
            <ReadingSelect
              readings={readings}
              value={reading}
              onChange={(next) => changeView({ reading: next })}
            />
            <ScaleControls light="p" lights="p" log={null} unit={view.unit} onChange={changeView} />
          </>
        }
      />
      <DifferenceTable
        rows={rows}
        letter={reference.letter}
        points={data.x.length * data.y.length}
        reading={reading}
        unit={view.unit}
        axes={[axes.x, axes.y]}
        unpaired={[]}
      />
    </>
  );
}
