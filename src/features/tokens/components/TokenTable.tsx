import { useMemo, useState } from 'react';
import type { ApiToken } from '../../../../shared/account.ts';
import { Button } from '../../../components/Button.tsx';
import { ConfirmDialog } from '../../../components/ConfirmDialog.tsx';
import { DataTable } from '../../../components/DataTable.tsx';
import type { Column } from '../../../components/DataTable.tsx';
import { EmptyState } from '../../../components/EmptyState.tsx';
import { useNotify } from '../../../components/Notices.tsx';
import { formatDate, formatSince } from '../../../lib/format.ts';
import { useRevokeToken } from '../api/revokeToken.ts';

export function TokenTable({ tokens }: { tokens: readonly ApiToken[] }) {
  const [revoking, setRevoking] = useState<ApiToken | null>(null);
  const revoke = useRevokeToken();
  const notify = useNotify();
  const columns = useMemo<Column<ApiToken>[]>(
    () => [
      { id: 'name', header: 'Token', value: (token) => token.name },
      {
        id: 'made',
        header: 'Made',
        value: (token) => token.createdAt,
        cell: (token) => formatDate(token.createdAt),
      },
      {
        id: 'used',
        header: 'Last use',
        value: (token) => token.lastUsedAt,
        cell: (token) => (token.lastUsedAt ? formatSince(token.lastUsedAt) : 'never'),
      },
      {
        id: 'actions',
        header: 'Actions',
        hideHeader: true,
        sortable: false,
        align: 'end',
        value: () => null,
        cell: (token) => (
          <Button tone="plain" onClick={() => setRevoking(token)}>
            Revoke<span className="sr-only"> {token.name}</span>
          </Button>
        ),
      },
    ],
    [],
  );
  return (
    <>
      <DataTable
        caption="API tokens"
        columns={columns}
        rows={tokens}
        rowKey={(token) => token.id}
        initialSort={{ id: 'made', descending: true }}
        empty={
          <EmptyState title="No tokens yet">A script needs one; the pages here work without.</EmptyState>
        }
      />
      {revoking ? (
        <ConfirmDialog
          open
          onOpenChange={(open) => {
            if (!open) setRevoking(null);
          }}
          title={`Revoke “${revoking.name}”?`}
          description="Scripts that use it are refused from now on."
          action="Revoke token"
          busy={revoke.isPending}
          error={revoke.error?.message}
          onConfirm={() =>
            revoke.mutate(revoking.id, {
              onSuccess: () => {
                setRevoking(null);
                notify.done('The token is revoked.');
              },
            })
          }
        />
      ) : null}
    </>
  );
}
