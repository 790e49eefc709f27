import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { generatePath, useSearchParams } from 'react-router-dom';
import type { Membership } from '../../../shared/account.ts';
import { runStates } from '../../../shared/run.ts';
import { Button, ButtonLink } from '../../components/Button.tsx';
import { EmptyState } from '../../components/EmptyState.tsx';
import { Field } from '../../components/Field.tsx';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { Select } from '../../components/Select.tsx';
import { TextInput } from '../../components/TextInput.tsx';
import { MOST_RUNS } from '../../features/compare/model/comparedIds.ts';
import { runListQuery } from '../../features/runList/api/runList.ts';
import { RunTable } from '../../features/runList/components/RunTable.tsx';
import { GroupGate } from '../../features/session/components/GroupGate.tsx';
import { mayEdit } from '../../features/session/hooks/useSession.ts';
import { paths } from '../../lib/paths.ts';

const stateOptions = [
  { value: 'all', label: 'Any state' },
  ...runStates.map((state) => ({ value: state, label: state.charAt(0).toUpperCase() + state.slice(1) })),
];

export function RunsPage() {
  return <GroupGate>{(group) => <Runs key={group.groupId} group={group} />}</GroupGate>;
}

function Runs({ group }: { group: Membership }) {
  const runs = useQuery(runListQuery(group.groupId));
  const [search, setSearch] = useSearchParams();
  const [ids, setIds] = useState<readonly string[]>([]);
  const picked = useMemo(
    () => ({
      ids,
      most: MOST_RUNS,
      onToggle: (id: string) =>
        setIds((before) => (before.includes(id) ? before.filter((one) => one !== id) : [...before, id])),
    }),
    [ids],
  );
  const words = search.get('q') ?? '';
  const state = stateOptions.find((option) => option.value === search.get('state'))?.value ?? 'all';
  const change = (key: string, value: string) =>
    setSearch(
      (before) => {
        if (value === '' || value === 'all') before.delete(key);
        else before.set(key, value);
        return before;
      },
      { replace: true },
    );
  const wanted = words.trim().toLowerCase();

  return (
    <Page
      title="Runs"
      subtitle={`Stored sweeps of ${group.groupName}, each with everything it rests on.`}
      actions={<CompareLink groupId={group.groupId} ids={ids} />}
    >
      <QueryGate query={runs} what="runs">
        {(data) => {
          const found = data.runs.filter(
            (run) =>
              (state === 'all' || run.progress.state === state) &&
              `${run.name} ${run.stackName ?? ''} ${run.createdBy ?? ''}`.toLowerCase().includes(wanted),
          );
          if (data.runs.length === 0) {
            return (
              <EmptyState title="No runs yet">
                A run is a sweep that is kept: open a stack, choose what to sweep, and press “Keep as run”.
              </EmptyState>
            );
          }
          return (
            <>
              <div role="search" aria-label="Runs" className="mb-4 flex flex-wrap gap-3">
                <Field label="Search" className="w-64 max-sm:w-full">
                  {(control) => (
                    <TextInput
                      {...control}
                      type="search"
                      placeholder="Name, stack or person"
                      value={words}
                      onChange={(event) => change('q', event.target.value)}
                    />
                  )}
                </Field>
                <Field label="State">
                  {(control) => (
                    <Select
                      {...control}
                      value={state}
                      options={stateOptions}
                      onValueChange={(value) => change('state', value)}
                    />
                  )}
                </Field>
              </div>
              <div className={found.length > 0 ? 'card' : ''}>
                <RunTable
                  groupId={group.groupId}
                  runs={found}
                  mayEdit={mayEdit(group)}
                  picked={picked}
                  empty={
                    <EmptyState
                      title="No run fits"
                      action={<Button onClick={() => setSearch({}, { replace: true })}>Show all runs</Button>}
                    >
                      {data.runs.length} runs are there, but none with this search and state.
                    </EmptyState>
                  }
                />
              </div>
            </>
          );
        }}
      </QueryGate>
    </Page>
  );
}

/** Leads to the comparison of what is ticked. */
function CompareLink({ groupId, ids }: { groupId: string; ids: readonly string[] }) {
  const to = `${generatePath(paths.compareRuns, { groupId })}${ids.length > 0 ? `?runs=${ids.join(',')}` : ''}`;
  return (
    <ButtonLink to={to}>
      Compare
      <span aria-live="polite">{ids.length > 0 ? ` (${ids.length} of ${MOST_RUNS} ticked)` : ''}</span>
    </ButtonLink>
  );
}
