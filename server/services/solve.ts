import type { Issue } from '../../shared/error.ts';
import { LIMITS } from '../../shared/limits.ts';
import type { LibrarySolveRequest, SolveCase, SolveResponse } from '../../shared/solve.ts';
import { checkSolveRequest } from '../../shared/solveRules.ts';
import { resolveCase, ResolutionError } from '../../worker/dispersion/resolveCase.ts';
import type { ResolvableMaterial } from '../../worker/dispersion/resolveCase.ts';
import type { Dependencies } from '../dependencies.ts';
import { invalid } from '../errors.ts';
import { namedMaterials } from './namedMaterials.ts';

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
  const cases = resolveCases(request, found);
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

function resolveCases(
  { cases }: LibrarySolveRequest,
  materials: ReadonlyMap<string, ResolvableMaterial>,
): SolveCase[] {
  const issues: Issue[] = [];
  const resolved = cases.flatMap((one, position) => {
    try {
      return [resolveCase(one, materials)];
    } catch (error) {
      if (!(error instanceof ResolutionError)) throw error;
      issues.push(
        ...error.issues.map(({ path, message }) => ({ path: `cases[${position}].${path}`, message })),
      );
      return [];
    }
  });
  refuse(issues);
  return resolved;
}
