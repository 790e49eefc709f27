import { useMemo, useState } from 'react';
import type { Member } from '../../../../shared/account.ts';
import { Button } from '../../../components/Button.tsx';
import { DataTable } from '../../../components/DataTable.tsx';
import type { Column } from '../../../components/DataTable.tsx';
import { useNotify } from '../../../components/Notices.tsx';
import { Select } from '../../../components/Select.tsx';
import { formatDate } from '../../../lib/format.ts';
import { useChangeRole } from '../api/changeRole.ts';
import { RemoveMemberDialog } from './RemoveMemberDialog.tsx';
import { roleOptions } from './roleTexts.ts';

type MemberTableProps = {
  groupId: string;
  members: readonly Member[];
  /** The person who looks. */
  userId: string;
  isOwner: boolean;
  /** Own role changed or own membership ended: the session must be asked for anew. */
  onOwnPlaceChanged: () => void;
};

export function MemberTable({ groupId, members, userId, isOwner, onOwnPlaceChanged }: MemberTableProps) {
  const [removing, setRemoving] = useState<Member | null>(null);
  const { mutate: changeRole } = useChangeRole(groupId);
  const notify = useNotify();
  const columns = useMemo<Column<Member>[]>(
    () => [
      {
        id: 'name',
        header: 'Name',
        value: (member) => member.name,
        cell: (member) => (
          <span>
            {member.name}
            {member.userId === userId ? <span className="font-normal text-muted"> (you)</span> : null}
          </span>
        ),
      },
      {
        id: 'email',
        header: 'E-mail',
        value: (member) => member.email,
        cell: (member) => <span className="wrap-anywhere">{member.email}</span>,
      },
      {
        id: 'role',
        header: 'Role',
        value: (member) => member.role,
        cell: (member) =>
          isOwner ? (
            <Select
              aria-label={`Role of ${member.name}`}
              value={member.role}
              options={roleOptions}
              onValueChange={(role) =>
                changeRole(
                  { userId: member.userId, role },
                  {
                    onSuccess: () => {
                      notify.done(`${member.name} is now ${role}.`);
                      if (member.userId === userId) onOwnPlaceChanged();
                    },
                    onError: (error) => notify.problem(`The role stays: ${error.message}`),
                  },
                )
              }
            />
          ) : (
            member.role
          ),
      },
      {
        id: 'joined',
        header: 'Since',
        value: (member) => member.joinedAt,
        cell: (member) => formatDate(member.joinedAt),
      },
      {
        id: 'actions',
        header: 'Actions',
        hideHeader: true,
        sortable: false,
        align: 'end',
        value: () => null,
        cell: (member) =>
          isOwner || member.userId === userId ? (
            <Button tone="plain" onClick={() => setRemoving(member)}>
              {member.userId === userId ? 'Leave' : 'Remove'}
              <span className="sr-only"> {member.name}</span>
            </Button>
          ) : null,
      },
    ],
    [userId, isOwner, changeRole, notify, onOwnPlaceChanged],
  );
  return (
    <>
      <DataTable
        caption="People of this group"
        columns={columns}
        rows={members}
        rowKey={(member) => member.userId}
        empty={null}
        initialSort={{ id: 'name', descending: false }}
      />
      {removing ? (
        <RemoveMemberDialog
          groupId={groupId}
          member={removing}
          leaving={removing.userId === userId}
          onClose={() => setRemoving(null)}
          onRemoved={() => {
            if (removing.userId === userId) onOwnPlaceChanged();
          }}
        />
      ) : null}
    </>
  );
}
