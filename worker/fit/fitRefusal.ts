import type { Issue } from '../../shared/error.ts';

/** Everything that keeps a fit from being tried, each with its path in the request. */
export class FitRefusal extends Error {
  override readonly name = 'FitRefusal';

  constructor(readonly issues: Issue[]) {
    super(issues.map(({ path, message }) => `${path}: ${message}`).join('\n'));
  }
}
