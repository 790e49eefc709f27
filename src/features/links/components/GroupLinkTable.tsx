import { useMemo, useState } from 'react';
import { Link as RouterLink } from 'react-router-dom';
import type { Link } from '../../../../shared/link.ts';
import { Button } from '../../../components/Button.tsx';
import { ConfirmDialog } from '../../../components/ConfirmDialog.tsx';
import { DataTable } from '../../../components/DataTable.tsx';
import type { Column } from '../../../components/DataTable.tsx';
import { EmptyState } from '../../../components/EmptyState.tsx';
import { useNotify } from '../../../components/Notices.tsx';
import { formatCount, formatDate, formatSince } from '../../../lib/format.ts';
import { useRevokeGroupLink } from '../api/revokeGroupLink.ts';
import { linkState } from '../linkState.ts';
import { subjectPath, subjectWords } from '../linkSubject.ts';

export function GroupLinkTable({ groupId, links }: { groupId: string; links: readonly Link[] }) {
  const [revoking, setRevoking] = useState<Link | null>(null);
  const revoke = useRevokeGroupLink(groupId);
  const notify = useNotify();
  const columns = useMemo<Column<Link>[]>(
    () => [
      {
        id: 'subject',
        header: 'Opens',
        value: (link) => link.subjectName,
        cell: (link) => (
          <div>
            <RouterLink
              to={subjectPath(link)}
              className="font-semibold text-ink no-underline hover:text-accent hover:underline"
            >
              {link.subjectName}
            </RouterLink>
            <span className="ml-2 text-small font-normal text-muted">{subjectWords[link.opens]}</span>
            {link.label ? <div className="text-note font-normal text-muted">{link.label}</div> : null}
          </div>
        ),
      },
      {
        id: 'state',
        header: 'State',
        value: (link) => linkState(link).text,
        cell: (link) => {
          const { open, text } = linkState(link);
          return <span className={open ? '' : 'text-muted'}>{text}</span>;
        },
      },
      {
        id: 'used',
        header: 'Last use',
        value: (link) => link.lastUsedAt,
        cell: (link) =>
          link.lastUsedAt ? `${formatSince(link.lastUsedAt)}, ${formatCount(link.useCount)} in all` : 'never',
      },
      {
        id: 'made',
        header: 'Made',
        value: (link) => link.createdAt,
        cell: (link) => `${formatDate(link.createdAt)}${link.createdBy ? `, ${link.createdBy}` : ''}`,
      },
      {
        id: 'actions',
        header: 'Actions',
        hideHeader: true,
        sortable: false,
        align: 'end',
        value: () => null,
        cell: (link) =>
          linkState(link).open ? (
            <Button tone="plain" onClick={() => setRevoking(link)}>
              Revoke<span className="sr-only"> the link to {link.subjectName}</span>
            </Button>
          ) : null,
      },
    ],
    [],
  );
  return (
    <>
      <DataTable
        caption="Share links of this group"
        columns={columns}
        rows={links}
        rowKey={(link) => link.id}
        initialSort={{ id: 'made', descending: true }}
        empty={
          <EmptyState title="No share links">
            A link opens one run, design, study or growth card without an account. Editors make them on its
            page.
          </EmptyState>
        }
      />
      {revoking ? (
        <ConfirmDialog
          open
          onOpenChange={(open) => {
            if (!open) setRevoking(null);
          }}
          title={`Revoke the link to “${revoking.subjectName}”?`}
          description="Whoever has it sees from now on that it was revoked. It cannot be opened again; a new link can be made."
          action="Revoke link"
          busy={revoke.isPending}
          error={revoke.error?.message}
          onConfirm={() =>
            revoke.mutate(revoking.id, {
              onSuccess: () => {
                setRevoking(null);
                notify.done('The link is revoked.');
              },
            })
          }
        />
      ) : null}
    </>
  );
}
