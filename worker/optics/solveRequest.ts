import type { Complex } from '../../shared/complex.ts';
import type { SolveCase, SolvePoint, SolveRequest, SolveResponse } from '../../shared/solve.ts';
import { polarizationOf } from '../../shared/stokes.ts';
import { explain } from './explain.ts';
import type { IntensityPoint } from './intensitySolver.ts';
import { IntensitySolver } from './intensitySolver.ts';
import type { Mueller } from './mueller.ts';
import { degreeOfPolarization, stokesForAzimuth } from './mueller.ts';
import type { Jones } from './observables.ts';
import type { Refinement } from './refine.ts';
import { refineInterfaces } from './refine.ts';
import type { SolvedPoint } from './stackSolver.ts';
import { StackSolver } from './stackSolver.ts';
import { solveWarnings } from './warnings.ts';

/**
 * Every point of one case, wavelength outermost, in the shape of the solve contract.
 *
 * @param solveCase a case that has passed `solveCaseSchema` and `checkSolveRequest`
 */
export function* solveCasePoints(
  solveCase: SolveCase,
  refinement: Refinement | null = refineInterfaces(solveCase),
): Generator<SolvePoint, void, void> {
  const outputs = new Set(solveCase.outputs);
  const wavelengthsNm = [solveCase.wavelengthNm].flat();
  const anglesDeg = [solveCase.angleDeg].flat();
  if (solveCase.backside || solveCase.average) {
    const solver = new IntensitySolver(solveCase, refinement?.slices);
    const { wavelengths, angles } = solver.groups;
    const { wavelengthWeights = [1], angleWeights = [1] } = solveCase.average ?? {};
    for (let i = 0; i < wavelengthsNm.length / wavelengths; i++) {
      for (let j = 0; j < anglesDeg.length / angles; j++) {
        yield {
          wavelengthNm: weighted(wavelengthsNm, i * wavelengths, wavelengthWeights),
          angleDeg: weighted(anglesDeg, j * angles, angleWeights),
          ...intensityAnswer(solver.solve(i, j), outputs.has('mueller')),
        };
      }
    }
    return;
  }
  const solver = new StackSolver(solveCase, refinement ? { slices: refinement.slices } : {});
  for (const [index, wavelengthNm] of wavelengthsNm.entries()) {
    for (const angleDeg of anglesDeg) {
      const answer = amplitudeAnswer(solver.solve(index, angleDeg));
      yield {
        wavelengthNm,
        angleDeg,
        ...answer,
        ...(outputs.size > 0 ? explain(solver, solveCase, index, angleDeg, outputs) : {}),
      };
    }
  }
}

function weighted(values: number[], start: number, weights: number[]): number {
  if (weights.length === 1) return values[start]!;
  const mean = weights.reduce((sum, weight, i) => sum + weight * values[start + i]!, 0);
  // The nodes lie evenly about the value asked for; rounding must not change its name.
  return Number(mean.toPrecision(12));
}

type PointAnswer = Omit<SolvePoint, 'wavelengthNm' | 'angleDeg'>;

/** All cases of a request, with the warnings that concern them. */
export function solveRequest(request: SolveRequest): SolveResponse {
  const warnings = solveWarnings(request);
  return {
    results: request.cases.map((one) => {
      const graded = refineInterfaces(one);
      return { points: [...solveCasePoints(one, graded)], ...(graded ? { graded } : {}) };
    }),
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

function intensityAnswer({ reflection, T }: IntensityPoint, withMueller: boolean): PointAnswer {
  const p = stokesForAzimuth(reflection, 0);
  const s = stokesForAzimuth(reflection, 90);
  return {
    r: null,
    t: null,
    R: { p: p[0]!, s: s[0]! },
    T,
    A: { p: 1 - p[0]! - T.p, s: 1 - s[0]! - T.s },
    kerr: { p: polarizationOf(p, 0), s: polarizationOf(s, 90) },
    degreeOfPolarization: { p: degreeOfPolarization(p), s: degreeOfPolarization(s) },
    ...(withMueller ? { mueller: rowsOf(reflection) } : {}),
  };
}

function rowsOf(mueller: Mueller): number[][] {
  return [0, 4, 8, 12].map((start) => [...mueller.subarray(start, start + 4)]);
}
