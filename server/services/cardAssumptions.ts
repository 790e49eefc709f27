import type { ReadingName, UsedMaterial } from '../../shared/run.ts';
import type { ToleranceDesign } from '../../shared/toleranceDesign.ts';
import { layerRemarks } from './cardRemarks.ts';
import { sharedErrors } from './designAssumptions.ts';
import { filmAssumptions } from './runAssumptions.ts';

/**
 * What the numbers of a card rest on, beyond what stands elsewhere on it: the working points above their readings, sizes of
 * errors and number of films in `cardToleranceSentences`, what is not measured in `cardSources`, the planning sentence in
 * `cardCautions`.
 */
export function cardAssumptions(
  { document, points, signal }: ToleranceDesign,
  materials: UsedMaterial[],
): string[] {
  const wavelengths = new Set(points.map(({ workingPoint }) => workingPoint.wavelengthNm));
  const explained: ReadingName[] = ['rotationP', ...(signal === 'contrast' ? (['contrastP'] as const) : [])];
  return [
    'Errors are normal. A layer is its nominal thickness times 1 + both of its errors; below 0 it counts as absent.',
    ...sharedErrors(document),
    ...filmAssumptions(document, explained, materials, wavelengths.size > 1, false),
    ...layerRemarks(document, materials),
  ];
}
