import type { Issue } from '../shared/error.ts';

/**
 * What a task answers. Everything that crosses between threads is plain: the fields of an error do not survive the
 * way, so a refusal comes back as a value.
 */
export type TaskOutcome<Value> = { ok: true; value: Value } | { ok: false; message: string; issues: Issue[] };

export function outcomeOf<Value>(work: () => Value): TaskOutcome<Value> {
  try {
    return { ok: true, value: work() };
  } catch (error) {
    const message = error instanceof Error ? error.message : String(error);
    const issues = error instanceof Error && 'issues' in error ? (error.issues as Issue[]) : [];
    return { ok: false, message, issues };
  }
}
