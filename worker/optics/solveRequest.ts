import type { Complex } from '../../shared/complex.ts';
import type { SolveCase, SolvePoint, SolveRequest, SolveResponse } from '../../shared/solve.ts';
import type { Jones } from './observables.ts';
import type { SolvedPoint } from './stackSolver.ts';
import { StackSolver } from './stackSolver.ts';
import { solveWarnings } from './warnings.ts';

/**
 * Every point of one case, wavelength outermost, in the shape of the solve contract.
 *
 * @param solveCase a case that has passed `solveCaseSchema` and `checkSolveRequest`
 */
export function* solveCasePoints(solveCase: SolveCase): Generator<SolvePoint, void, void> {
  const solver = new StackSolver(solveCase);
  for (const [index, wavelengthNm] of solver.wavelengthsNm.entries()) {
    for (const angleDeg of solver.anglesDeg) {
      yield toSolvePoint(wavelengthNm, angleDeg, solver.solve(index, angleDeg));
    }
  }
}

/** All cases of a request, with the warnings that concern them. */
export function solveRequest(request: SolveRequest): SolveResponse {
  const warnings = solveWarnings(request);
  return {
    results: request.cases.map((one) => ({ points: [...solveCasePoints(one)] })),
    ...(warnings.length > 0 ? { warnings } : {}),
  };
}

function toSolvePoint(wavelengthNm: number, angleDeg: number, point: SolvedPoint): SolvePoint {
  return {
    wavelengthNm,
    angleDeg,
    r: amplitudes(point.r),
    t: point.t && amplitudes(point.t),
    R: point.R,
    T: point.T,
    A: point.A,
    kerr: point.kerr,
  };
}

function amplitudes(jones: Jones): SolvePoint['r'] {
  // 0 + x turns a negative zero, which means nothing here, into a plain one.
  const at = (index: number): Complex => [0 + jones[index]!, 0 + jones[index + 1]!];
  return { pp: at(0), ps: at(2), sp: at(4), ss: at(6) };
}
