import { LeaveGuard as Guard } from '../../../components/LeaveGuard.tsx';

/** The way to what was just saved is taken without a question. */
export function LeaveGuard({ dirty }: { dirty: boolean }) {
  return (
    <Guard
      dirty={dirty}
      description="They are not in the library yet. This tab keeps them until you come back to this form or close it."
      lets={isSaved}
    />
  );
}

function isSaved(state: unknown): boolean {
  return typeof state === 'object' && state !== null && 'saved' in state && state.saved === true;
}
