import { useBlocker } from 'react-router-dom';
import { Button } from './Button.tsx';
import { Dialog } from './Dialog.tsx';

type LeaveGuardProps = {
  dirty: boolean;
  /** What is lost, and what is not. */
  description: string;
  /** Whether a way is taken without a question, by the state it carries: the one to what was just saved. */
  lets?: (state: unknown) => boolean;
};

/** Asks before another page is opened over unsaved changes. */
export function LeaveGuard({ dirty, description, lets }: LeaveGuardProps) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      dirty && currentLocation.pathname !== nextLocation.pathname && !(lets?.(nextLocation.state) ?? false),
  );
  return (
    <Dialog
      open={blocker.state === 'blocked'}
      onOpenChange={(open) => {
        if (!open) blocker.reset?.();
      }}
      title="Leave with unsaved changes?"
      description={description}
    >
      <div className="flex justify-end gap-2">
        <Button onClick={() => blocker.reset?.()}>Stay</Button>
        <Button onClick={() => blocker.proceed?.()}>Leave</Button>
      </div>
    </Dialog>
  );
}
