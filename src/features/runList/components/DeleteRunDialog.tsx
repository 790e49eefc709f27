import type { RunSummary } from '../../../../shared/run.ts';
import { ConfirmDialog } from '../../../components/ConfirmDialog.tsx';
import { useNotify } from '../../../components/Notices.tsx';
import { useDeleteRun } from '../api/deleteRun.ts';

export function DeleteRunDialog({ run, onClose }: { run: RunSummary; onClose: () => void }) {
  const remove = useDeleteRun(run.groupId);
  const notify = useNotify();
  return (
    <ConfirmDialog
      open
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title={`Delete “${run.name}”?`}
      description="Its numbers are gone for everybody in the group, and every share link to it stops to open. This cannot be undone."
      action="Delete run"
      busy={remove.isPending}
      error={remove.error?.message}
      onConfirm={() =>
        remove.mutate(run.id, {
          onSuccess: () => {
            onClose();
            notify.done(`“${run.name}” is deleted.`);
          },
        })
      }
    />
  );
}
