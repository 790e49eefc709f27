import type { FieldValues, Path, UseFormSetError } from 'react-hook-form';
import { ApiError } from './apiClient.ts';

/** `layers[2].thicknessNm` of the API as react-hook-form names it: `layers.2.thicknessNm`. */
export function toFieldName(path: string): string {
  return path.replace(/\[(\d+)\]/g, '.$1').replace(/^\./, '');
}

/**
 * Puts the server's issues at the fields of a form; what fits no field, and any other failure, goes to
 * `errors.root.server`, which the form shows above its button.
 */
export function showServerIssues<Values extends FieldValues>(
  error: unknown,
  setError: UseFormSetError<Values>,
  fields: readonly Path<Values>[],
): void {
  const issues = error instanceof ApiError ? error.issues : [];
  const homeless: string[] = [];
  issues.forEach((issue) => {
    const name = toFieldName(issue.path);
    const field = fields.find((candidate) => candidate === name);
    if (field) setError(field, { type: 'server', message: issue.message }, { shouldFocus: true });
    else homeless.push(`${issue.path}: ${issue.message}`);
  });
  if (issues.length > 0 && homeless.length === 0) return;
  const message = error instanceof Error ? error.message : 'The request failed. Try again.';
  setError('root.server', { type: 'server', message: [message, ...homeless].join('\n') });
}
