import { useState } from 'react';
import type { Run } from '../../../../shared/run.ts';
import { Button } from '../../../components/Button.tsx';
import { ConfirmDialog } from '../../../components/ConfirmDialog.tsx';
import { useDeleteRun } from '../api/changeRun.ts';

export function DeleteRun({ run, onDeleted }: { run: Run; onDeleted: () => void }) {
  const [asked, setAsked] = useState(false);
  const remove = useDeleteRun(run);
  return (
    <>
      <Button tone="danger" onClick={() => setAsked(true)}>
        Delete
      </Button>
      <ConfirmDialog
        open={asked}
        onOpenChange={setAsked}
        title={`Delete the run “${run.name}”?`}
        description="Its values are gone and its share links stop to open. The stack stays."
        action="Delete run"
        busy={remove.isPending}
        error={remove.error?.message}
        onConfirm={() => remove.mutate(undefined, { onSuccess: onDeleted })}
      />
    </>
  );
}
