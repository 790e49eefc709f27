import { Ellipsis } from 'lucide-react';
import { useMemo, useState } from 'react';
import type { ReactNode } from 'react';
import type { MaterialSummary } from '../../../../shared/material.ts';
import type { StackSummary } from '../../../../shared/stack.ts';
import { IconButton } from '../../../components/Button.tsx';
import { DataTable } from '../../../components/DataTable.tsx';
import type { Column } from '../../../components/DataTable.tsx';
import { Menu } from '../../../components/Menu.tsx';
import { useNotify } from '../../../components/Notices.tsx';
import { formatCount, formatDateTime, formatSince } from '../../../lib/format.ts';
import { useDuplicateStack } from '../api/duplicateStack.ts';
import { DeleteStackDialog } from './DeleteStackDialog.tsx';
import { RenameStackForm } from './RenameStackForm.tsx';
import { StackName } from './StackName.tsx';

type StackTableProps = {
  groupId: string;
  stacks: readonly StackSummary[];
  materials: readonly MaterialSummary[];
  mayEdit: boolean;
  empty: ReactNode;
};

export function StackTable({ groupId, stacks, materials, mayEdit, empty }: StackTableProps) {
  const [renaming, setRenaming] = useState<string | null>(null);
  const [deleting, setDeleting] = useState<StackSummary | null>(null);
  const { mutate: duplicate } = useDuplicateStack(groupId);
  const notify = useNotify();

  const columns = useMemo(() => {
    const shown: Column<StackSummary>[] = [
      {
        id: 'name',
        header: 'Stack',
        value: (stack) => stack.name,
        cell: (stack) =>
          renaming === stack.id ? (
            <RenameStackForm stack={stack} onClose={() => setRenaming(null)} />
          ) : (
            <StackName stack={stack} materials={materials} />
          ),
      },
      {
        id: 'layers',
        header: 'Layers',
        align: 'end',
        value: (stack) => stack.layerCount,
        cell: (stack) => formatCount(stack.layerCount),
      },
      { id: 'version', header: 'Version', align: 'end', value: (stack) => stack.version },
      {
        id: 'saved',
        header: 'Saved',
        value: (stack) => stack.updatedAt,
        cell: (stack) => (
          <time
            dateTime={stack.updatedAt}
            title={formatDateTime(stack.updatedAt)}
            className="whitespace-nowrap"
          >
            {formatSince(stack.updatedAt)}
          </time>
        ),
      },
      { id: 'by', header: 'By', value: (stack) => stack.updatedBy },
    ];
    if (mayEdit) {
      shown.push({
        id: 'actions',
        header: 'Actions',
        hideHeader: true,
        sortable: false,
        align: 'end',
        value: () => null,
        cell: (stack) => (
          <Menu
            trigger={
              <IconButton label={`Actions for ${stack.name}`}>
                <Ellipsis aria-hidden="true" className="size-4" />
              </IconButton>
            }
            items={[
              { kind: 'action', label: 'Rename', onSelect: () => setRenaming(stack.id) },
              {
                kind: 'action',
                label: 'Duplicate',
                onSelect: () =>
                  duplicate(stack, {
                    onSuccess: (copy) => notify.done(`“${copy.name}” is made.`),
                    onError: (error) => notify.problem(`Not duplicated: ${error.message}`),
                  }),
              },
              { kind: 'action', label: 'Delete', danger: true, onSelect: () => setDeleting(stack) },
            ]}
          />
        ),
      });
    }
    return shown;
  }, [mayEdit, materials, renaming, duplicate, notify]);

  return (
    <>
      <DataTable
        caption="Stacks of this group"
        columns={columns}
        rows={stacks}
        rowKey={(stack) => stack.id}
        empty={empty}
        initialSort={{ id: 'saved', descending: true }}
      />
      {deleting ? <DeleteStackDialog stack={deleting} onClose={() => setDeleting(null)} /> : null}
    </>
  );
}
