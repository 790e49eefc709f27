import type { OptimiseDesign } from './optimiseDesign.ts';

/** A thickness this near to a bound is at it, nm. */
const AT_BOUND_NM = 1e-3;

/** Layers of a film whose thickness ended at a bound of its variable. */
export function layersAtBounds(
  variables: OptimiseDesign['variables'],
  thicknessesNm: readonly number[],
): string[] {
  return variables
    .filter(({ fromNm, toNm }, i) => {
      const nm = thicknessesNm[i]!;
      return Math.min(nm - fromNm, toNm - nm) <= AT_BOUND_NM;
    })
    .map(({ layerId }) => layerId);
}
