import type { RunResult } from '../../../shared/resultFormat.ts';
import { nearestIndex } from '../../components/plot/curveValues.ts';
import type { GridPlace } from '../../features/runs/model/sweepPlace.ts';

/** What somebody marked on the plot of a run: a value on its first axis, a member of its family. */
export type MarkedPlace = { at: number | null; member: number | null };

export function readMarkedPlace(search: URLSearchParams): MarkedPlace {
  const at = search.get('at');
  const member = search.get('member');
  return {
    at: at !== null && at !== '' && Number.isFinite(Number(at)) ? Number(at) : null,
    member: member !== null && /^\d{1,3}$/.test(member) ? Number(member) : null,
  };
}

/** As a point of the grid; nothing where the run does not reach it. */
export function markedPlaceIn({ at, member }: MarkedPlace, result: RunResult): Partial<GridPlace> {
  const { axis, family } = result;
  const inside = at !== null && at >= Math.min(...ends(axis)) && at <= Math.max(...ends(axis));
  return {
    ...(inside && { ix: nearestIndex(axis, at) }),
    ...(member !== null && member < (family?.length ?? 1) && { member }),
  };
}

function ends(grid: Float64Array): [number, number] {
  return [grid[0] ?? NaN, grid[grid.length - 1] ?? NaN];
}
