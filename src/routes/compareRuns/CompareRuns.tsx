import { useQueries } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { RunResult } from '../../../shared/resultFormat.ts';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { CompareChoices } from '../../features/compare/components/CompareChoices.tsx';
import { CompareLegend } from '../../features/compare/components/CompareLegend.tsx';
import { compareSlices } from '../../features/compare/model/compareSlices.ts';
import { commonReadings } from '../../features/compare/model/comparedRun.ts';
import type { LoadedRun } from '../../features/compare/model/comparedRun.ts';
import { heldField, heldQuantities } from '../../features/compare/model/heldQuantities.ts';
import type { Comparison } from '../../features/compare/model/planComparison.ts';
import { readReadingView } from '../../components/plot/readingView.ts';
import { runDataQuery } from '../../features/runs/api/runData.ts';
import { ComparedCurves } from './ComparedCurves.tsx';
import { ComparedMaps } from './ComparedMaps.tsx';
import { useCompareAddress } from './useCompareAddress.ts';

type Props = {
  comparison: Comparison;
  letters: ReadonlyMap<string, string>;
  onRemove: (id: string) => void;
};

/** Runs that can be laid over each other: fetches their values, then draws. */
export function CompareRuns({ comparison, letters, onRemove }: Props) {
  const { drawn } = comparison;
  const data = useQueries({
    queries: drawn.map(({ id }) => runDataQuery(`/runs/${id}`)),
    combine: (all) => ({
      results: all.flatMap(({ data: result }) => result ?? []),
      error: all.find(({ error }) => error !== null)?.error ?? null,
      retry: () => void Promise.all(all.map((one) => one.refetch())),
    }),
  });
  const loaded = useMemo(
    () =>
      drawn.flatMap((run, index): LoadedRun[] => {
        const result: RunResult | undefined = data.results[index];
        return result ? [{ run, result, letter: letters.get(run.id) ?? '' }] : [];
      }),
    [drawn, letters, data.results],
  );
  if (data.error) {
    return <ErrorState title="The values could not be loaded" error={data.error} onRetry={data.retry} />;
  }
  if (data.results.length < drawn.length) return <LoadingState label="Loading the values" rows={8} />;
  return <Compared comparison={comparison} loaded={loaded} onRemove={onRemove} />;
}

type ComparedProps = Omit<Props, 'letters'> & { loaded: readonly LoadedRun[] };

function Compared({ comparison, loaded, onRemove }: ComparedProps) {
  const { base, axes, view, views } = comparison;
  const [search] = useSearchParams();
  const { change } = useCompareAddress();
  const held = useMemo(() => heldQuantities(comparison, search), [comparison, search]);
  const runs = useMemo(
    () => (view ? compareSlices(loaded, axes, view, held) : []),
    [loaded, axes, view, held],
  );
  const readings = useMemo(() => commonReadings(runs.map(({ result }) => result)), [runs]);
  const wanted = readReadingView(search).reading;
  const reading = readings.find((name) => name === wanted) ?? readings[0];
  const reference = runs.find(({ run }) => run.id === base?.id) ?? runs[0];
  if (!reading || !reference || !view) {
    return <p className="py-6 text-muted">These runs have no reading in common that can be drawn.</p>;
  }
  const maps = view.keys.length > 1;
  const parts = { runs, reference, held, readings, reading };
  return (
    <>
      <CompareLegend
        runs={runs}
        reference={reference}
        reading={maps ? null : reading}
        onReference={(id) => change('reference', id)}
        onRemove={onRemove}
      />
      <CompareChoices
        views={views}
        view={view}
        onView={(id) => change('view', id)}
        held={held}
        onHeld={(key, value) => change(heldField(key), String(value))}
      />
      {maps ? <ComparedMaps {...parts} /> : <ComparedCurves {...parts} />}
    </>
  );
}
