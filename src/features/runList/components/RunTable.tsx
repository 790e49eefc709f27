import { Trash2 } from 'lucide-react';
import { useMemo, useState } from 'react';
import type { ReactNode } from 'react';
import { Link, generatePath } from 'react-router-dom';
import type { RunSummary } from '../../../../shared/run.ts';
import { IconButton } from '../../../components/Button.tsx';
import { DataTable } from '../../../components/DataTable.tsx';
import type { Column } from '../../../components/DataTable.tsx';
import { useNotify } from '../../../components/Notices.tsx';
import { formatDateTime, formatSince } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import { useCancelRun } from '../api/cancelRun.ts';
import { describeAxes } from '../describeAxis.ts';
import { DeleteRunDialog } from './DeleteRunDialog.tsx';
import { RunStateCell } from './RunStateCell.tsx';

type RunTableProps = {
  groupId: string;
  runs: readonly RunSummary[];
  mayEdit: boolean;
  empty: ReactNode;
  /** Runs ticked for a comparison; no boxes where there is nothing to tick for. */
  picked?: { ids: readonly string[]; onToggle: (id: string) => void; most: number };
};

export function RunTable({ groupId, runs, mayEdit, empty, picked }: RunTableProps) {
  const [deleting, setDeleting] = useState<RunSummary | null>(null);
  const { mutate: cancel, isPending, variables } = useCancelRun(groupId);
  const notify = useNotify();

  const columns = useMemo(() => {
    const shown: Column<RunSummary>[] = [
      {
        id: 'name',
        header: 'Run',
        value: (run) => run.name,
        cell: (run) => (
          <div className="flex items-start gap-2.5">
            {picked ? <PickBox run={run} picked={picked} /> : null}
            <RunName run={run} />
          </div>
        ),
      },
      {
        id: 'sweep',
        header: 'Sweep',
        value: (run) => describeAxes(run).span,
        cell: (run) => (
          <div>
            {describeAxes(run).span}
            <div className="text-note text-muted">{describeAxes(run).points}</div>
          </div>
        ),
      },
      {
        id: 'state',
        header: 'State',
        value: (run) => run.progress.state,
        cell: (run) => (
          <RunStateCell
            run={run}
            cancelling={isPending && variables === run.id}
            onCancel={
              mayEdit
                ? () =>
                    cancel(run.id, { onError: (error) => notify.problem(`Not cancelled: ${error.message}`) })
                : undefined
            }
          />
        ),
      },
      {
        id: 'started',
        header: 'Started',
        value: (run) => run.createdAt,
        cell: (run) => (
          <time dateTime={run.createdAt} title={formatDateTime(run.createdAt)} className="whitespace-nowrap">
            {formatSince(run.createdAt)}
          </time>
        ),
      },
      { id: 'by', header: 'By', value: (run) => run.createdBy },
    ];
    if (mayEdit) {
      shown.push({
        id: 'actions',
        header: 'Actions',
        hideHeader: true,
        sortable: false,
        align: 'end',
        value: () => null,
        cell: (run) => (
          <IconButton label={`Delete ${run.name}`} onClick={() => setDeleting(run)}>
            <Trash2 aria-hidden="true" className="size-4" />
          </IconButton>
        ),
      });
    }
    return shown;
  }, [mayEdit, cancel, isPending, variables, notify, picked]);

  return (
    <>
      <DataTable
        caption="Runs of this group"
        columns={columns}
        rows={runs}
        rowKey={(run) => run.id}
        empty={empty}
        initialSort={{ id: 'started', descending: true }}
      />
      {deleting ? <DeleteRunDialog run={deleting} onClose={() => setDeleting(null)} /> : null}
    </>
  );
}

function PickBox({ run, picked }: { run: RunSummary; picked: NonNullable<RunTableProps['picked']> }) {
  const ticked = picked.ids.includes(run.id);
  return (
    <input
      type="checkbox"
      aria-label={`Compare ${run.name}`}
      checked={ticked}
      disabled={!ticked && (picked.ids.length >= picked.most || run.progress.state !== 'done')}
      onChange={() => picked.onToggle(run.id)}
      className="mt-[3px] size-4 shrink-0 accent-accent"
    />
  );
}

function RunName({ run }: { run: RunSummary }) {
  return (
    <div className="min-w-0">
      <Link
        to={generatePath(paths.run, { runId: run.id })}
        className="font-semibold text-ink no-underline hover:text-accent hover:underline"
      >
        {run.name}
      </Link>
      {run.isDemo ? <span className="ml-2 text-small font-normal text-muted">demo</span> : null}
      {run.stackName ? (
        <div className="text-note font-normal text-muted">
          {run.stackId ? (
            <Link
              to={generatePath(paths.stack, { stackId: run.stackId })}
              className="text-muted no-underline hover:underline"
            >
              {run.stackName}
            </Link>
          ) : (
            run.stackName
          )}
        </div>
      ) : null}
    </div>
  );
}
