import { createContext, use } from 'react';
import type { Issue } from '../../../../shared/error.ts';

/** What is wrong with the question at the moment; paths as the API names the fields of `input`. */
export const IssueContext = createContext<readonly Issue[]>([]);

/** What is wrong at one field, if anything. */
export function useIssue(path: string): string | undefined {
  return use(IssueContext).find((issue) => issue.path === path)?.message;
}
