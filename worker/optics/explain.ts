import type { Complex } from '../../shared/complex.ts';
import type { SolveCase, SolveOutput, SolvePoint } from '../../shared/solve.ts';
import { inMagnetizationState } from '../../shared/stackCase.ts';
import { baseFields, hasScalarDiagonals } from './baseFields.ts';
import { minus, modulus, plus } from './complexNumber.ts';
import type { Share } from './contributions.ts';
import { ceiling, layerShare } from './contributions.ts';
import { depthProfile } from './depthProfile.ts';
import { muellerOf } from './mueller.ts';
import { kerrAngles } from './observables.ts';
import { sharesByDifference } from './sharesByDifference.ts';
import { StackSolver } from './stackSolver.ts';

type Explanation = Pick<SolvePoint, 'mueller' | 'faraday' | 'contributions' | 'depth' | 'ceiling'>;

/** Points of a depth profile over all layers, about; each layer has at least its two faces. */
const PROFILE_POINTS = 400;

/** Anisotropic stacks are taken apart by two solves a layer; beyond this many layers that is too slow to offer. */
const SEPARATE_LAYERS = 400;

/**
 * The blocks that a case asks for in `outputs`, for the point that the solver has just solved.
 *
 * @param solver its `point` is the one to explain
 */
export function explain(
  solver: StackSolver,
  solveCase: SolveCase,
  wavelengthIndex: number,
  angleDeg: number,
  outputs: ReadonlySet<SolveOutput>,
): Explanation {
  const { point, stack } = solver;
  const answer: Explanation = {};
  if (outputs.has('mueller')) {
    const mueller = muellerOf(point.r);
    answer.mueller = [0, 4, 8, 12].map((start) => [...mueller.subarray(start, start + 4)]);
  }
  if (outputs.has('faraday')) {
    answer.faraday = point.t && { p: kerrAngles(point.t, 'p'), s: kerrAngles(point.t, 's') };
  }
  const isScalar = hasScalarDiagonals(stack);
  const fields =
    isScalar && (outputs.has('contributions') || outputs.has('ceiling'))
      ? baseFields(stack, wavelengthIndex, angleDeg)
      : null;
  if (outputs.has('ceiling')) {
    const bound = fields ? ceiling(fields) : { stack: null, material: null };
    answer.ceiling = {
      ...bound,
      shareReached: bound.material === null ? null : Math.hypot(point.r[4]!, point.r[5]!) / bound.material,
    };
  }
  if (outputs.has('contributions') && !isScalar && stack.sequence.length > SEPARATE_LAYERS) {
    answer.contributions = null;
  } else if (outputs.has('contributions')) {
    const shares = fields
      ? fields.layers.map((_, position) => layerShare(fields, position))
      : sharesByDifference(solver, solveCase, wavelengthIndex, angleDeg);
    answer.contributions = contributionsOf(solver, solveCase, wavelengthIndex, angleDeg, shares);
  }
  if (outputs.has('depth')) {
    const slices = Math.max(1, Math.round(PROFILE_POINTS / (stack.sequence.length + 1)));
    answer.depth = inLists(depthProfile(stack, wavelengthIndex, angleDeg, slices));
  }
  return answer;
}

function contributionsOf(
  solver: StackSolver,
  solveCase: SolveCase,
  wavelengthIndex: number,
  angleDeg: number,
  shares: Share[],
): NonNullable<SolvePoint['contributions']> {
  const { point, stack } = solver;
  const at = (i: number): Complex => [point.r[i]!, point.r[i + 1]!];
  const given = { sp: at(4), ps: at(2), pp: at(0) };
  const zero = new StackSolver(inMagnetizationState(solveCase, 'zero'), solver.options).solve(
    wavelengthIndex,
    angleDeg,
  );
  const unmagnetized = (i: number): Complex => [zero.r[i]!, zero.r[i + 1]!];
  let depthNm = 0;
  const layers = shares.flatMap((share, position) => {
    const layer = stack.sequence[position];
    const top = depthNm;
    depthNm += layer?.thicknessNm ?? 0;
    if (modulus(share.sp) + modulus(share.ps) + modulus(share.pp) === 0) return [];
    const path = layer ? layer.path.map((index) => `layers[${index}]`).join('.') : 'substrate';
    return [{ path, position, depthNm: top, ...share }];
  });
  const sum = (key: keyof Share): Complex =>
    layers.reduce<Complex>((total, one) => plus(total, one[key]), [0, 0]);
  return {
    layers,
    total: { sp: sum('sp'), ps: sum('ps'), pp: sum('pp') },
    // Cross terms of the unmagnetized stack, which anisotropic media may have, are no part of the signal.
    exact: {
      sp: minus(given.sp, unmagnetized(4)),
      ps: minus(given.ps, unmagnetized(2)),
      pp: minus(given.pp, unmagnetized(0)),
    },
  };
}

function inLists(profile: ReturnType<typeof depthProfile>): NonNullable<SolvePoint['depth']> {
  return {
    depthNm: profile.map((one) => one.depthNm),
    position: profile.map((one) => one.layer),
    field: { p: profile.map((one) => one.field.p), s: profile.map((one) => one.field.s) },
    absorbedPerNm: {
      p: profile.map((one) => one.absorbedPerNm.p),
      s: profile.map((one) => one.absorbedPerNm.s),
    },
    signalPerNm: profile.map((one) => one.signalPerNm),
  };
}
