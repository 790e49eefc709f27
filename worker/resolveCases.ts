import type { Issue } from '../shared/error.ts';
import type { LibrarySolveCase, SolveCase } from '../shared/solve.ts';
import { ResolutionError, resolveCase } from './dispersion/resolveCase.ts';
import type { ResolvableMaterial } from './dispersion/resolveCase.ts';

/**
 * Several cases with numbers in place of library ids.
 *
 * @param materials as in resolveCase
 * @throws ResolutionError with the issues of all cases, paths such as `cases[2].layers[1].material`
 */
export function resolveCases(
  cases: LibrarySolveCase[],
  materials: ReadonlyMap<string, ResolvableMaterial>,
): SolveCase[] {
  const issues: Issue[] = [];
  const resolved = cases.flatMap((one, position) => {
    try {
      return [resolveCase(one, materials)];
    } catch (error) {
      if (!(error instanceof ResolutionError)) throw error;
      for (const { path, message } of error.issues) {
        issues.push({ path: `cases[${position}].${path}`, message });
      }
      return [];
    }
  });
  if (issues.length > 0) throw new ResolutionError(issues);
  return resolved;
}
