import { LeaveGuard as Guard } from '../../../components/LeaveGuard.tsx';

/** The way to a run that was just kept, which holds the film as edited, is taken without a question. */
export function LeaveGuard({ dirty }: { dirty: boolean }) {
  return (
    <Guard
      dirty={dirty}
      description="They are not in the group's stack yet. This tab keeps them until you come back to the stack or close it."
      lets={isKeptRun}
    />
  );
}

function isKeptRun(state: unknown): boolean {
  return typeof state === 'object' && state !== null && 'kept' in state && state.kept === true;
}
