import { isDesignRun } from '../models/run.ts';
import type { Run } from '../models/run.ts';

/** What may help where a calculation takes its computer down, as part of a sentence. */
export function askForLess(run: Run): string {
  return isDesignRun(run)
    ? 'ask for fewer samples, thicknesses or working points, or of a film of fewer layers'
    : 'ask for fewer points or a smaller stack';
}
