import type { DesignKind } from '../../../../shared/design.ts';

/** What each kind of question is called. */
export const kindLabels: Record<DesignKind, string> = {
  cap: 'Cap chooser',
  optimise: 'Optimise',
  tolerance: 'Sensitivity and tolerance',
};
