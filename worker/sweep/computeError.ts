import type { Issue } from '../../shared/error.ts';

export type ComputeFailure =
  /** The caller asked to stop. */
  | 'cancelled'
  /** The thread ended (out of memory, killed) or threw something that is no refusal. */
  | 'crashed'
  /** The input cannot be solved; `issues` name where. */
  | 'refused'
  /** A request took longer than it may. */
  | 'timeout'
  /** The pool is being closed. */
  | 'closed';

/** Why the pool did not deliver. */
export class ComputeError extends Error {
  readonly failure: ComputeFailure;
  readonly issues: Issue[];

  constructor(failure: ComputeFailure, message: string, issues: Issue[] = []) {
    super(message);
    this.name = 'ComputeError';
    this.failure = failure;
    this.issues = issues;
  }
}
