import type { Issue } from '../../shared/error.ts';
import { LIMITS } from '../../shared/limits.ts';
import type { LibrarySolveRequest, SolveCase, SolveResponse } from '../../shared/solve.ts';
import { checkSolveRequest } from '../../shared/solveRules.ts';
import { ResolutionError } from '../../worker/dispersion/resolveCase.ts';
import type { Dependencies } from '../dependencies.ts';
import { invalid } from '../errors.ts';
import type { LoadedMaterial } from './materialStore.ts';
import { namedMaterials } from './namedMaterials.ts';
import { resolveSafely } from './resolveSafely.ts';

const limits = {
  maxPoints: LIMITS.httpPoints,
  beyond: 'start a run (POST /api/v1/runs), or use the command line',
};

/**
 * Solves a request whose media may be named by library id.
 *
 * @param groupIds groups whose materials are in reach, beside the shipped library
 * @throws Refusal 422 with every issue
 */
export async function solve(
  { materials, pool }: Pick<Dependencies, 'materials' | 'pool'>,
  request: LibrarySolveRequest,
  groupIds: Iterable<string>,
): Promise<SolveResponse> {
  refuse(checkSolveRequest(request, limits));
  const found = await materials.loadFor(request.cases, groupIds);
  const cases = await resolveOrRefuse(pool, request, found);
  // Again: what the library put in must keep the rules too, such as an incident medium that does not absorb.
  refuse(checkSolveRequest({ cases }, limits));
  const response = await pool.solve({ cases });
  const results = response.results.map((result, position) => {
    const [asked, resolved] = [request.cases[position], cases[position]];
    return asked && resolved && namedMaterials(asked).length > 0 ? { ...result, resolved } : result;
  });
  return { ...response, results };
}

function refuse(issues: Issue[]): void {
  if (issues.length > 0) throw invalid(issues);
}

async function resolveOrRefuse(
  pool: Dependencies['pool'],
  { cases }: LibrarySolveRequest,
  materials: ReadonlyMap<string, LoadedMaterial>,
): Promise<SolveCase[]> {
  try {
    return await resolveSafely(pool, cases, materials);
  } catch (error) {
    if (error instanceof ResolutionError) throw invalid(error.issues);
    throw error;
  }
}
