import type { ReactNode } from 'react';
import { Link, generatePath } from 'react-router-dom';
import type { StudySummary } from '../../../../shared/study.ts';
import { DataTable } from '../../../components/DataTable.tsx';
import type { Column } from '../../../components/DataTable.tsx';
import { formatDate, formatDateTime, formatSince } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';

const columns: readonly Column<StudySummary>[] = [
  {
    id: 'title',
    header: 'Study',
    value: (study) => study.title,
    cell: (study) => (
      <div className="min-w-0">
        <Link
          to={generatePath(paths.study, { studyId: study.id })}
          className="font-semibold text-ink no-underline hover:text-accent hover:underline"
        >
          {study.title}
        </Link>
        {study.isDemo ? <span className="ml-2 text-small font-normal text-muted">demo</span> : null}
        <div className="line-clamp-2 max-w-prose text-note font-normal text-muted">{study.question}</div>
      </div>
    ),
  },
  {
    id: 'decided',
    header: 'Decision',
    value: (study) => study.decided?.at ?? null,
    cell: ({ decided }) =>
      decided ? (
        `${decided.by}, ${formatDate(decided.at)}`
      ) : (
        <span className="text-muted">not decided yet</span>
      ),
  },
  { id: 'items', header: 'Items', value: (study) => study.itemCount },
  {
    id: 'updated',
    header: 'Saved',
    value: (study) => study.updatedAt,
    cell: (study) => (
      <time dateTime={study.updatedAt} title={formatDateTime(study.updatedAt)} className="whitespace-nowrap">
        {formatSince(study.updatedAt)}
        {study.updatedBy ? `, ${study.updatedBy}` : ''}
      </time>
    ),
  },
];

export function StudyTable({ studies, empty }: { studies: readonly StudySummary[]; empty: ReactNode }) {
  return (
    <DataTable
      caption="Studies of this group"
      columns={columns}
      rows={studies}
      rowKey={(study) => study.id}
      empty={empty}
      initialSort={{ id: 'updated', descending: true }}
    />
  );
}
