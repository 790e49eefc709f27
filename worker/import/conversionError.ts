import type { Issue } from '../../shared/error.ts';

/** A table that cannot become constants as it is mapped; the paths are those of the mapping. */
export class ConversionError extends Error {
  override readonly name = 'ConversionError';

  constructor(readonly issues: Issue[]) {
    super(issues.map(({ path, message }) => `${path}: ${message}`).join('\n'));
  }
}
