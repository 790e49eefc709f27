import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Material } from '../../../../shared/material.ts';
import { Button } from '../../../components/Button.tsx';
import { ConfirmDialog } from '../../../components/ConfirmDialog.tsx';
import { ApiError } from '../../../lib/apiClient.ts';
import { useDeleteMaterial } from '../api/deleteMaterial.ts';
import { materialUsesQuery } from '../api/materialUses.ts';
import { UseList } from './UseList.tsx';

type Props = { material: Material; groupId: string; onDeleted: () => void };

/** Deletes a material that nothing uses. Where something does, the refusal says what. */
export function DeleteMaterial({ material, groupId, onDeleted }: Props) {
  const [asked, setAsked] = useState(false);
  const remove = useDeleteMaterial(groupId);
  const refused = remove.error instanceof ApiError && remove.error.code === 'conflict';
  const uses = useQuery({ ...materialUsesQuery(material.id), enabled: refused });
  return (
    <>
      <Button tone="danger" onClick={() => setAsked(true)}>
        Delete
      </Button>
      <ConfirmDialog
        open={asked}
        onOpenChange={(open) => {
          setAsked(open);
          remove.reset();
        }}
        title={`Delete “${material.name}”?`}
        description={
          refused && uses.data ? (
            <div className="flex flex-col gap-3">
              <p>It is used here. Put another material there, or delete these first.</p>
              <UseList uses={uses.data} />
            </div>
          ) : (
            'The material is gone with all its versions, for everybody in the group. It stays while a stack, a stored run or a mixture uses it.'
          )
        }
        action="Delete material"
        busy={remove.isPending}
        error={remove.error?.message}
        onConfirm={() => remove.mutate(material.id, { onSuccess: onDeleted })}
      />
    </>
  );
}
