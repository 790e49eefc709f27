import { useQueries } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { Run } from '../../../shared/run.ts';
import type { RunResult } from '../../../shared/resultFormat.ts';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { sweepXAxis } from '../../components/plot/readingSeries.ts';
import { readReadingView, writeReadingView } from '../../components/plot/readingView.ts';
import type { ReadingView } from '../../components/plot/readingView.ts';
import { usePlotHeight } from '../../components/plot/usePlotHeight.ts';
import { CompareFigure } from '../../features/compare/components/CompareFigure.tsx';
import { CompareLegend } from '../../features/compare/components/CompareLegend.tsx';
import { DifferenceTable } from '../../features/compare/components/DifferenceTable.tsx';
import { commonReadings } from '../../features/compare/model/comparedRun.ts';
import type { ComparedRun } from '../../features/compare/model/comparedRun.ts';
import { relations } from '../../features/compare/model/curveDifference.ts';
import { describeDifferences, sweptWord } from '../../features/compare/model/describeDifferences.ts';
import { runDataQuery } from '../../features/runs/api/runData.ts';

type Props = {
  runs: readonly Run[];
  letters: ReadonlyMap<string, string>;
  baseId: string;
  onRemove: (id: string) => void;
};

/** Runs that can be laid over each other: fetches their values, then draws. */
export function CompareRuns({ runs, letters, baseId, onRemove }: Props) {
  const data = useQueries({
    queries: runs.map(({ id }) => runDataQuery(`/runs/${id}`)),
    combine: (all) => ({
      results: all.flatMap(({ data: result }) => result ?? []),
      error: all.find(({ error }) => error !== null)?.error ?? null,
      retry: () => void Promise.all(all.map((one) => one.refetch())),
    }),
  });
  const compared = useMemo(() => {
    const phrases = describeDifferences(runs);
    return runs.flatMap((run, index): ComparedRun[] => {
      const result: RunResult | undefined = data.results[index];
      return result
        ? [{ run, result, letter: letters.get(run.id) ?? '', phrases: phrases[index] ?? [] }]
        : [];
    });
  }, [runs, letters, data.results]);
  if (data.error) {
    return <ErrorState title="The values could not be loaded" error={data.error} onRetry={data.retry} />;
  }
  if (data.results.length < runs.length) return <LoadingState label="Loading the values" rows={8} />;
  return <Compared runs={compared} baseId={baseId} onRemove={onRemove} />;
}

function Compared({ runs, baseId, onRemove }: Pick<Props, 'baseId' | 'onRemove'> & { runs: ComparedRun[] }) {
  const [search, setSearch] = useSearchParams();
  const view = useMemo(() => readReadingView(search), [search]);
  const relation = relations.find((one) => one === search.get('against')) ?? 'difference';
  const readings = useMemo(() => commonReadings(runs.map(({ result }) => result)), [runs]);
  const reading = readings.find((name) => name === view.reading) ?? readings[0];
  const reference = runs.find(({ run }) => run.id === baseId) ?? runs[0];
  const height = usePlotHeight(520);
  const xAxis = useMemo(() => {
    const words = new Set(runs.map(({ run }) => sweptWord(run)));
    const axis = reference?.run.axis;
    return axis && sweepXAxis(axis, words.size === 1 ? [...words][0] : 'the swept layer');
  }, [runs, reference]);
  if (!reading || !reference || !xAxis) {
    return <p className="py-6 text-muted">These runs have no reading in common that can be drawn.</p>;
  }
  const change = (key: string, value: string | null) => {
    const next = new URLSearchParams(search);
    if (value === null) next.delete(key);
    else next.set(key, value);
    setSearch(next, { replace: true, preventScrollReset: true });
  };
  const changeView = (part: Partial<ReadingView>) => {
    const next = new URLSearchParams(search);
    writeReadingView({ ...view, ...part }, next);
    setSearch(next, { replace: true, preventScrollReset: true });
  };
  return (
    <>
      <CompareLegend
        runs={runs}
        reference={reference}
        reading={reading}
        onReference={(id) => change('reference', id)}
        onRemove={onRemove}
      />
      <CompareFigure
        runs={runs}
        reference={reference}
        readings={readings}
        reading={reading}
        relation={relation}
        view={view}
        xAxis={xAxis}
        height={height}
        onView={changeView}
        onRelation={(next) => change('against', next === 'ratio' ? next : null)}
      />
      <DifferenceTable runs={runs} reference={reference} reading={reading} unit={view.unit} xAxis={xAxis} />
    </>
  );
}
