import type { PlainIndex, PlainVoigt } from '../../../../shared/dispersion.ts';
import { readPlainIndex } from './draftOfForm.ts';
import type { ContentForm } from './form.ts';

/** The models of a form that have parameters to be fitted; null where there is none, as in a table. */
export function fitStart({ index, voigt }: ContentForm): {
  index: PlainIndex | null;
  voigt: PlainVoigt | null;
} {
  const hasModel =
    index.kind === 'sellmeier' ||
    index.kind === 'cauchy' ||
    index.kind === 'oscillators' ||
    index.kind === 'formula';
  return {
    index: hasModel ? readPlainIndex(index, 'start', []) : null,
    voigt: voigt.kind === 'lines' || voigt.kind === 'formula' ? voigt : null,
  };
}
