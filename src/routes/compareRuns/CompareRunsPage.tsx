import { useQueries } from '@tanstack/react-query';
import { useMemo } from 'react';
import { generatePath, useParams, useSearchParams } from 'react-router-dom';
import { ButtonLink } from '../../components/Button.tsx';
import { EmptyState } from '../../components/EmptyState.tsx';
import { ErrorState } from '../../components/ErrorState.tsx';
import { LoadingState } from '../../components/LoadingState.tsx';
import { Page } from '../../components/Page.tsx';
import { readRunIds } from '../../features/compare/model/comparedIds.ts';
import { planComparison } from '../../features/compare/model/planComparison.ts';
import { runQuery } from '../../features/runs/api/run.ts';
import { paths } from '../../lib/paths.ts';
import { CompareRuns } from './CompareRuns.tsx';
import { LeftOutRuns } from './LeftOutRuns.tsx';

/** `/groups/:groupId/compare?runs=a,b`: up to six runs against each other; the address holds the whole choice. */
export function CompareRunsPage() {
  const { groupId = '' } = useParams();
  const [search, setSearch] = useSearchParams();
  const ids = useMemo(() => readRunIds(search), [search]);
  const { runs, loaded } = useQueries({
    queries: ids.map((id) => runQuery(id)),
    combine: (all) => ({ runs: all, loaded: all.flatMap(({ data }) => data ?? []) }),
  });
  const letters = useMemo(() => lettersOf(ids), [ids]);
  const remove = (id: string) => {
    const next = new URLSearchParams(search);
    next.set('runs', ids.filter((one) => one !== id).join(','));
    if (next.get('reference') === id) next.delete('reference');
    setSearch(next, { replace: true });
  };

  const [reference, view] = [search.get('reference'), search.get('view')];
  const comparison = useMemo(() => planComparison(loaded, { reference, view }), [loaded, reference, view]);
  const refused = comparison.refused.map(({ run, why }) => ({ id: run.id, name: run.name, why }));
  const failed = runs.flatMap(({ error }, index) =>
    error ? [{ id: ids[index] ?? '', name: null, why: error.message }] : [],
  );
  const toRuns = (
    <ButtonLink to={generatePath(paths.runs, { groupId })} tone={ids.length < 2 ? 'primary' : 'quiet'}>
      Choose runs
    </ButtonLink>
  );
  return (
    <Page
      title="Compare runs"
      subtitle="Curves over each other and maps side by side, with what differs between their inputs and by how much."
      actions={ids.length < 2 ? null : toRuns}
    >
      {ids.length < 2 ? (
        <EmptyState title="Two to six runs make a comparison" action={toRuns}>
          Tick them in the list of runs and press “Compare”.
        </EmptyState>
      ) : loaded.length + failed.length < ids.length ? (
        <LoadingState label="Opening the runs" rows={8} />
      ) : (
        <div className="flex flex-col gap-5">
          <LeftOutRuns runs={[...refused, ...failed]} onRemove={remove} />
          {comparison.drawn.length > 1 ? (
            <CompareRuns comparison={comparison} letters={letters} onRemove={remove} />
          ) : failed.length === ids.length ? (
            <ErrorState title="None of the runs could be opened" error={runs[0]?.error} />
          ) : (
            <EmptyState title="Fewer than two of these runs can be laid over each other" action={toRuns}>
              What keeps the others out is said above.
            </EmptyState>
          )}
        </div>
      )}
    </Page>
  );
}

/** A run keeps its letter when another one is left out. */
function lettersOf(ids: readonly string[]): ReadonlyMap<string, string> {
  return new Map(ids.map((id, index) => [id, String.fromCharCode(65 + index)]));
}
