import { createContext, use } from 'react';
import type { Issue } from '../../../../shared/error.ts';

/** What is wrong with the form at the moment; paths as the form names its fields. */
export const IssueContext = createContext<readonly Issue[]>([]);

/** What is wrong at one field, if anything. */
export function useIssue(path: string): string | undefined {
  return use(IssueContext).find((issue) => issue.path === path)?.message;
}

/**
 * What is wrong in a part of the form at no field of its own: with a whole table, an order, a pair of ends.
 *
 * @param isField whether a path is that of a field, which shows its own problem
 */
export function useIssuesBelow(path: string, isField: (path: string) => boolean): readonly Issue[] {
  return use(IssueContext).filter(
    (issue) =>
      (issue.path === path || issue.path.startsWith(`${path}.`) || issue.path.startsWith(`${path}[`)) &&
      !isField(issue.path),
  );
}
