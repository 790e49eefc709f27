import { useBlocker } from 'react-router-dom';
import { Button } from '../../../components/Button.tsx';
import { Dialog } from '../../../components/Dialog.tsx';

/** Asks before another page is opened over unsaved changes. They stay in this tab either way. */
export function StudyLeaveGuard({ dirty }: { dirty: boolean }) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) => dirty && currentLocation.pathname !== nextLocation.pathname,
  );
  return (
    <Dialog
      open={blocker.state === 'blocked'}
      onOpenChange={(open) => {
        if (!open) blocker.reset?.();
      }}
      title="Leave with unsaved changes?"
      description="They are not in the group's study yet. This tab keeps them until you come back to the study or close it."
    >
      <div className="flex justify-end gap-2">
        <Button onClick={() => blocker.reset?.()}>Stay</Button>
        <Button onClick={() => blocker.proceed?.()}>Leave</Button>
      </div>
    </Dialog>
  );
}
