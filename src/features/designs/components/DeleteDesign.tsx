import { useState } from 'react';
import type { Design } from '../../../../shared/design.ts';
import { Button } from '../../../components/Button.tsx';
import { ConfirmDialog } from '../../../components/ConfirmDialog.tsx';
import { useDeleteDesign } from '../api/changeDesign.ts';

export function DeleteDesign({ design, onDeleted }: { design: Design; onDeleted: () => void }) {
  const [asked, setAsked] = useState(false);
  const remove = useDeleteDesign(design);
  return (
    <>
      <Button tone="danger" onClick={() => setAsked(true)}>
        Delete
      </Button>
      <ConfirmDialog
        open={asked}
        onOpenChange={setAsked}
        title={`Delete the design “${design.name}”?`}
        description="Its answer is gone and its share links stop to open. The stack and growth cards made from it stay."
        action="Delete design"
        busy={remove.isPending}
        error={remove.error?.message}
        onConfirm={() => remove.mutate(undefined, { onSuccess: onDeleted })}
      />
    </>
  );
}
