import type { Complex } from '../../shared/complex.ts';
import type { SolveCase, SolvePoint } from '../../shared/solve.ts';
import { solveCaseSchema } from '../../shared/solve.ts';
import { checkSolveRequest } from '../../shared/solveRules.ts';
import { solveCasePoints } from '../../worker/optics/solveRequest.ts';

/** Every point of a case that also passes the contract's own checks, so that no test feeds the core a refused one. */
export function solvePoints(solveCase: SolveCase): SolvePoint[] {
  const parsed = solveCaseSchema.parse(solveCase);
  const issues = checkSolveRequest({ cases: [parsed] }, { maxPoints: 1e6, beyond: '' });
  if (issues.length > 0) throw new Error(JSON.stringify(issues));
  return [...solveCasePoints(parsed)];
}

/** The only point of a case with one wavelength and one angle. */
export function solvePoint(solveCase: SolveCase): SolvePoint {
  const [point, ...others] = solvePoints(solveCase);
  if (!point || others.length > 0) throw new Error('expected a case of one point');
  return point;
}

/** |a - b| of two complex numbers. */
export const distance = (a: Complex, b: Complex): number => Math.hypot(a[0] - b[0], a[1] - b[1]);

/** |a| */
export const size = (a: Complex): number => Math.hypot(a[0], a[1]);
