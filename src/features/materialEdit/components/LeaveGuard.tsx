import { useBlocker } from 'react-router-dom';
import { Button } from '../../../components/Button.tsx';
import { Dialog } from '../../../components/Dialog.tsx';

/** Asks before another page is opened over unsaved edits. The way to what was just saved is taken without a question. */
export function LeaveGuard({ dirty }: { dirty: boolean }) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      dirty && currentLocation.pathname !== nextLocation.pathname && !isSaved(nextLocation.state),
  );
  return (
    <Dialog
      open={blocker.state === 'blocked'}
      onOpenChange={(open) => {
        if (!open) blocker.reset?.();
      }}
      title="Leave with unsaved changes?"
      description="They are not in the library yet. This tab keeps them until you come back to this form or close it."
    >
      <div className="flex justify-end gap-2">
        <Button onClick={() => blocker.reset?.()}>Stay</Button>
        <Button onClick={() => blocker.proceed?.()}>Leave</Button>
      </div>
    </Dialog>
  );
}

function isSaved(state: unknown): boolean {
  return typeof state === 'object' && state !== null && 'saved' in state && state.saved === true;
}
