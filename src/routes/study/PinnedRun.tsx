import { useQuery } from '@tanstack/react-query';
import { useCallback, useMemo, useState } from 'react';
import { Link } from 'react-router-dom';
import type { SharedRun, SweepAxis } from '../../../shared/run.ts';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { readReadingView } from '../../components/plot/readingView.ts';
import { usePlotHeight } from '../../components/plot/usePlotHeight.ts';
import { runDataQuery } from '../../features/runs/api/runData.ts';
import { RunPlot } from '../../features/runs/components/RunPlot.tsx';
import { ValueTable } from '../../features/runs/components/ValueTable.tsx';
import { describeGridPlace, homePlace, valuesAt } from '../../features/runs/model/sweepPlace.ts';
import type { GridPlace } from '../../features/runs/model/sweepPlace.ts';
import { targetName } from '../../features/stacks/model/axisTargets.ts';
import { isTransverse, workingVectors } from '../../features/stacks/model/magnetization.ts';
import { usualFamilies } from '../../features/stacks/model/viewState.ts';
import { useInView } from '../../lib/useInView.ts';
import { drawnMaterials } from '../run/drawnMaterials.ts';
import { markedPlaceIn, readMarkedPlace } from '../run/markedPlace.ts';

type Props = {
  run: SharedRun;
  /** Where its numbers are: `/runs/…` or below `/shared/…`. */
  dataPath: string;
  /** The part of the run page's address after `?` when it was pinned. */
  view: string;
  /** The run's page with that view; null where the reader cannot open it. */
  href: string | null;
};

/**
 * The plot of a run as it was pinned: its axes, readings, unit and marked value. Readers may look at it in another way;
 * what is pinned stays.
 */
export function PinnedRun({ run, dataPath, view: pinned, href }: Props) {
  const search = useMemo(() => new URLSearchParams(pinned), [pinned]);
  const [view, setView] = useState(() => readReadingView(search));
  const [marked, setMarked] = useState(() => readMarkedPlace(search));
  const [cursor, setCursor] = useState<Pick<GridPlace, 'ix' | 'iy'> | null>(null);
  const [target, seen] = useInView<HTMLDivElement>();
  const data = useQuery({ ...runDataQuery(dataPath), enabled: seen });
  const materials = useMemo(() => drawnMaterials(run.materials), [run.materials]);
  const { document } = run;
  const nameOf = useCallback((one: SweepAxis) => targetName(one, document, materials), [document, materials]);
  const height = Math.min(360, usePlotHeight(430));
  const result = data.data ?? null;
  const place = result && {
    ...homePlace(run, result, document),
    ...markedPlaceIn(marked, result),
    ...cursor,
  };
  const transverse = isTransverse(workingVectors(document, document.workingPoint.magnetization));
  return (
    <div ref={target}>
      <h3 className="mb-2 font-semibold">
        {href === null ? (
          run.name
        ) : (
          <Link className="text-ink no-underline hover:text-accent hover:underline" to={href}>
            {run.name}
          </Link>
        )}
      </h3>
      {result && place ? (
        <>
          <RunPlot
            run={run}
            result={result}
            view={view}
            usual={usualFamilies(transverse)}
            onView={(change) => setView((now) => ({ ...now, ...change }))}
            onPlace={setCursor}
            member={place.member}
            onMember={(member) => setMarked((now) => ({ ...now, member }))}
            mark={marked.at}
            onMark={(at) => setMarked((now) => ({ ...now, at }))}
            nameOf={nameOf}
            height={height}
          />
          <details className="mt-2" open={marked.at !== null}>
            <summary className="text-note text-muted">Values at the mark</summary>
            <ValueTable
              place={describeGridPlace(run, result, place, nameOf)}
              values={valuesAt(result, place)}
              unit={view.unit}
            />
          </details>
        </>
      ) : data.error ? (
        <ErrorState
          title="The values could not be loaded"
          error={data.error}
          onRetry={() => void data.refetch()}
        />
      ) : (
        <LoadingState label="Loading the values" rows={6} />
      )}
    </div>
  );
}
