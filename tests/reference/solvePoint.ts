import type { Complex } from '../../shared/complex.ts';
import type { SolveCase, SolvePoint } from '../../shared/solve.ts';
import { solveCaseSchema } from '../../shared/solve.ts';
import { checkSolveRequest } from '../../shared/solveRules.ts';
import { solveCasePoints } from '../../worker/optics/solveRequest.ts';

/** A point whose reflected beam has a phase: every stack but one on a thick incoherent slab. */
export type CoherentPoint = SolvePoint & { r: NonNullable<SolvePoint['r']> };

/** Every point of a case that also passes the contract's own checks, so that no test feeds the core a refused one. */
export function solvePoints(solveCase: SolveCase): CoherentPoint[] {
  const parsed = solveCaseSchema.parse(solveCase);
  const issues = checkSolveRequest({ cases: [parsed] }, { maxPoints: 1e6, beyond: '' });
  if (issues.length > 0) throw new Error(JSON.stringify(issues));
  return [...solveCasePoints(parsed)].map(({ r, ...rest }) => {
    if (r === null) throw new Error('expected a coherent stack');
    return { ...rest, r };
  });
}

/** The only point of a case with one wavelength and one angle. */
export function solvePoint(solveCase: SolveCase): CoherentPoint {
  const [point, ...others] = solvePoints(solveCase);
  if (!point || others.length > 0) throw new Error('expected a case of one point');
  return point;
}

/** |a - b| of two complex numbers. */
export const distance = (a: Complex, b: Complex): number => Math.hypot(a[0] - b[0], a[1] - b[1]);

/** |a| */
export const size = (a: Complex): number => Math.hypot(a[0], a[1]);
