import type { StackSummary } from '../../../../shared/stack.ts';
import { ConfirmDialog } from '../../../components/ConfirmDialog.tsx';
import { useNotify } from '../../../components/Notices.tsx';
import { useDeleteStack } from '../api/deleteStack.ts';

export function DeleteStackDialog({ stack, onClose }: { stack: StackSummary; onClose: () => void }) {
  const remove = useDeleteStack(stack.groupId);
  const notify = useNotify();
  return (
    <ConfirmDialog
      open
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title={`Delete “${stack.name}”?`}
      description="The stack is gone for everybody in the group. Runs made from it stay, and so do their share links."
      action="Delete stack"
      busy={remove.isPending}
      error={remove.error?.message}
      onConfirm={() =>
        remove.mutate(stack.id, {
          onSuccess: () => {
            onClose();
            notify.done(`“${stack.name}” is deleted.`);
          },
        })
      }
    />
  );
}
