import { useMemo } from 'react';
import type { ReactNode } from 'react';
import { Link, generatePath } from 'react-router-dom';
import type { DesignSummary } from '../../../../shared/design.ts';
import { DataTable } from '../../../components/DataTable.tsx';
import type { Column } from '../../../components/DataTable.tsx';
import { formatDateTime, formatSince } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import { kindLabels } from '../model/kinds.ts';

type Props = {
  designs: readonly DesignSummary[];
  /** How a design stands; the page has it from the runs. */
  stateOf: (design: DesignSummary) => ReactNode;
  empty: ReactNode;
};

export function DesignTable({ designs, stateOf, empty }: Props) {
  const columns = useMemo(
    (): Column<DesignSummary>[] => [
      { id: 'name', header: 'Design', value: ({ name }) => name, cell: (one) => <DesignName design={one} /> },
      { id: 'kind', header: 'Question', value: ({ kind }) => kindLabels[kind] },
      { id: 'state', header: 'State', value: ({ progress }) => progress.state, cell: stateOf },
      {
        id: 'started',
        header: 'Started',
        value: ({ createdAt }) => createdAt,
        cell: ({ createdAt }) => (
          <time dateTime={createdAt} title={formatDateTime(createdAt)} className="whitespace-nowrap">
            {formatSince(createdAt)}
          </time>
        ),
      },
      { id: 'by', header: 'By', value: ({ createdBy }) => createdBy },
    ],
    [stateOf],
  );
  return (
    <DataTable
      caption="Designs of this group"
      columns={columns}
      rows={designs}
      rowKey={({ id }) => id}
      empty={empty}
      initialSort={{ id: 'started', descending: true }}
    />
  );
}

function DesignName({ design }: { design: DesignSummary }) {
  return (
    <div className="min-w-0">
      <Link
        to={generatePath(paths.design, { designId: design.id })}
        className="font-semibold text-ink no-underline hover:text-accent hover:underline"
      >
        {design.name}
      </Link>
      {design.isDemo ? <span className="ml-2 text-small font-normal text-muted">demo</span> : null}
      {design.stackName ? <div className="text-note font-normal text-muted">{design.stackName}</div> : null}
    </div>
  );
}
