import type { Complex } from '../../shared/complex.ts';
import type { SolveCase, SolvePoint, SolveRequest, SolveResponse } from '../../shared/solve.ts';
import { explain } from './explain.ts';
import { IncoherentSlabSolver } from './incoherentSlab.ts';
import type { Mueller, Stokes } from './mueller.ts';
import { degreeOfPolarization, polarizationOf, stokesForAzimuth } from './mueller.ts';
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
  const pointAt = pointSolver(solveCase);
  for (const [index, wavelengthNm] of [solveCase.wavelengthNm].flat().entries()) {
    for (const angleDeg of [solveCase.angleDeg].flat()) {
      yield { wavelengthNm, angleDeg, ...pointAt(index, angleDeg) };
    }
  }
}

type PointAnswer = Omit<SolvePoint, 'wavelengthNm' | 'angleDeg'>;

function pointSolver(solveCase: SolveCase): (wavelengthIndex: number, angleDeg: number) => PointAnswer {
  const outputs = new Set(solveCase.outputs);
  if (solveCase.backside) {
    const solver = new IncoherentSlabSolver(solveCase);
    return (index, angleDeg) => {
      const { reflection, transmission, power } = solver.solve(index, angleDeg);
      return {
        ...intensityAnswer(reflection, transmission, power),
        ...(outputs.has('mueller') ? { mueller: rowsOf(reflection) } : {}),
      };
    };
  }
  const solver = new StackSolver(solveCase);
  return (index, angleDeg) => {
    const point = solver.solve(index, angleDeg);
    const answer = amplitudeAnswer(point);
    return outputs.size > 0 ? { ...answer, ...explain(solver, solveCase, index, angleDeg, outputs) } : answer;
  };
}

/** All cases of a request, with the warnings that concern them. */
export function solveRequest(request: SolveRequest): SolveResponse {
  const warnings = solveWarnings(request);
  return {
    results: request.cases.map((one) => ({ points: [...solveCasePoints(one)] })),
    ...(warnings.length > 0 ? { warnings } : {}),
  };
}

function amplitudeAnswer(point: SolvedPoint): PointAnswer {
  return {
    r: amplitudes(point.r),
    t: point.t && amplitudes(point.t),
    R: point.R,
    T: point.T,
    A: point.A,
    kerr: point.kerr,
  };
}

function amplitudes(jones: Jones): NonNullable<SolvePoint['r']> {
  // 0 + x turns a negative zero, which means nothing here, into a plain one.
  const at = (index: number): Complex => [0 + jones[index]!, 0 + jones[index + 1]!];
  return { pp: at(0), ps: at(2), sp: at(4), ss: at(6) };
}

function intensityAnswer(
  reflection: Mueller,
  transmission: Mueller,
  power: { p: number; s: number },
): PointAnswer {
  const reflected = { p: stokesForAzimuth(reflection, 0), s: stokesForAzimuth(reflection, 90) };
  const through = (stokes: Stokes) =>
    (power.p * (stokes[0]! + stokes[1]!) + power.s * (stokes[0]! - stokes[1]!)) / 2;
  const R = { p: reflected.p[0]!, s: reflected.s[0]! };
  const T = {
    p: through(stokesForAzimuth(transmission, 0)),
    s: through(stokesForAzimuth(transmission, 90)),
  };
  return {
    r: null,
    t: null,
    R,
    T,
    A: { p: 1 - R.p - T.p, s: 1 - R.s - T.s },
    kerr: { p: polarizationOf(reflected.p, 0), s: polarizationOf(reflected.s, 90) },
    degreeOfPolarization: {
      p: degreeOfPolarization(reflected.p),
      s: degreeOfPolarization(reflected.s),
    },
  };
}

function rowsOf(mueller: Mueller): number[][] {
  return [0, 4, 8, 12].map((start) => [...mueller.subarray(start, start + 4)]);
}
