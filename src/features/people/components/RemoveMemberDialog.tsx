import type { Member } from '../../../../shared/account.ts';
import { ConfirmDialog } from '../../../components/ConfirmDialog.tsx';
import { useRemoveMember } from '../api/removeMember.ts';

type RemoveMemberDialogProps = {
  groupId: string;
  member: Member;
  /** Whether people take themselves out. */
  leaving: boolean;
  onClose: () => void;
  onRemoved: () => void;
};

export function RemoveMemberDialog({
  groupId,
  member,
  leaving,
  onClose,
  onRemoved,
}: RemoveMemberDialogProps) {
  const remove = useRemoveMember(groupId);
  return (
    <ConfirmDialog
      open
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title={leaving ? 'Leave this group?' : `Remove ${member.name}?`}
      description={
        leaving
          ? 'You no longer see its stacks, runs and materials. What you made stays with the group; an owner can add you again.'
          : 'They no longer see the stacks, runs and materials of the group. What they made stays; their share links stay until somebody revokes them.'
      }
      action={leaving ? 'Leave group' : 'Remove'}
      busy={remove.isPending}
      error={remove.error?.message}
      onConfirm={() =>
        remove.mutate(member.userId, {
          onSuccess: () => {
            onClose();
            onRemoved();
          },
        })
      }
    />
  );
}
