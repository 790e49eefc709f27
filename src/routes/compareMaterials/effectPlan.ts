import type { Material, MaterialSummary } from '../../../shared/material.ts';
import type { ReadingName } from '../../../shared/run.ts';
import type { LibrarySolveRequest } from '../../../shared/solve.ts';
import type { StackDocument } from '../../../shared/stack.ts';
import { commonRangeNm, exchangeMaterial } from '../../features/materials/model/exchangeMaterial.ts';
import { isTransverse, workingVectors } from '../../features/stacks/model/magnetization.ts';
import { sweepRequest } from '../../features/stacks/model/solveStates.ts';
import type { Sweep } from '../../features/stacks/model/solveStates.ts';
import { axisGrid, previewPoints } from '../../features/stacks/model/sweepAxis.ts';

/** Enough for a smooth curve that is there at once. */
const POINTS = 120;
/** nm; beyond what any laser of a Kerr bench gives, where nothing of the library limits the film. */
const WIDEST_NM = [200, 2000] as const;

export type EffectPlan = {
  sweep: Sweep;
  /** With A and with B. */
  requests: [LibrarySolveRequest, LibrarySolveRequest];
};

/**
 * Two sweeps over the wavelengths that both films know, the working point's among them; null where there is none.
 * For transverse m the contrast takes the place of the Kerr angles.
 *
 * @param outgoing ids in whose place A and B stand
 */
export function planEffect(
  document: StackDocument,
  outgoing: readonly string[],
  a: Material,
  b: Material,
  library: readonly MaterialSummary[],
): EffectPlan | null {
  const filmOf = ({ id, version }: Material) =>
    exchangeMaterial(document, outgoing, { material: id, version });
  // Ranges of A and B are those of the compared versions, the others' those of the newest.
  const rangeOf = (own: Material) =>
    commonRangeNm(filmOf(own), new Map([...library, own].map((one) => [one.id, one])), WIDEST_NM);
  const [rangeA, rangeB] = [rangeOf(a), rangeOf(b)];
  if (!rangeA || !rangeB) return null;
  const [from, to] = [Math.max(rangeA[0], rangeB[0]), Math.min(rangeA[1], rangeB[1])];
  if (from > to) return null;
  const { workingPoint } = document;
  const axis = { kind: 'wavelength', from, to, points: POINTS, spacing: 'linear' } as const;
  const points = from === to ? 1 : Math.min(POINTS, previewPoints(axis, document));
  const inside = workingPoint.wavelengthNm >= from && workingPoint.wavelengthNm <= to;
  const grid = [...new Set([...axisGrid(axis, points), ...(inside ? [workingPoint.wavelengthNm] : [])])];
  const sweep: Sweep = { axis, grid: grid.sort((x, y) => x - y), readings: readingsFor(document) };
  return {
    sweep,
    requests: [sweepRequest(filmOf(a), workingPoint, sweep), sweepRequest(filmOf(b), workingPoint, sweep)],
  };
}

function readingsFor(document: StackDocument): ReadingName[] {
  const { magnetization, input } = document.workingPoint;
  const p = input === 'p';
  if (isTransverse(workingVectors(document, magnetization))) return [p ? 'contrastP' : 'contrastS'];
  return p ? ['rotationP', 'ellipticityP'] : ['rotationS', 'ellipticityS'];
}
