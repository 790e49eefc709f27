import type { Complex } from '../../shared/complex.ts';
import type { SolveCase } from '../../shared/solve.ts';
import { forwardRoot, minus, over, plus, times } from './complexNumber.ts';
import type { Geometry } from './geometry.ts';
import { incidenceGeometry } from './geometry.ts';
import type { Matrix2 } from './matrix2.ts';
import { createMatrix2, setDiagonal } from './matrix2.ts';
import { Medium } from './medium.ts';
import type { Mueller } from './mueller.ts';
import { muellerOf, multiplyMueller, solveRoundTrips } from './mueller.ts';
import { StackSolver } from './stackSolver.ts';

/** Reflection and transmission of intensities, both for beams of unit amplitude. */
export type IncoherentPoint = {
  reflection: Mueller;
  transmission: Mueller;
  /** Power in the exit medium, in units of the incident power, per |Ep|^2 and |Es|^2 there. */
  power: { p: number; s: number };
};

/**
 * A stack on a thick slab whose inner reflections add in intensity (physics.md section 6), its bare back face
 * toward an isotropic exit medium.
 */
export class IncoherentSlabSolver {
  readonly front: StackSolver;
  readonly #inside: StackSolver;
  readonly #slab: Medium;
  readonly #exit: Medium;
  readonly #thicknessNm: number;

  /**
   * @param solveCase a valid case with `backside`
   * @param slices per graded interface
   */
  constructor(solveCase: SolveCase, slices?: number) {
    const { backside, ...front } = solveCase;
    if (!backside) throw new TypeError('the case has no backside');
    const options = slices === undefined ? {} : { slices };
    this.front = new StackSolver(front, options);
    this.#inside = new StackSolver(front, { ...options, fromBelow: true });
    this.#slab = new Medium(solveCase.substrate);
    this.#exit = new Medium(backside.exit);
    this.#thicknessNm = backside.thicknessNm;
  }

  solve(wavelengthIndex: number, angleDeg: number): IncoherentPoint {
    this.#slab.load(wavelengthIndex);
    this.#exit.load(wavelengthIndex);
    const incident = this.front.stack.incidentIndex(wavelengthIndex);
    const geometry = incidenceGeometry(incident[0], angleDeg);
    const slab = waveIn(this.#slab, geometry);
    this.front.solveAmplitudes(wavelengthIndex, geometry, incident, [geometry.q0, 0]);
    this.#inside.solveAmplitudes(wavelengthIndex, geometry, slab.index, slab.q);
    const exit = waveIn(this.#exit, geometry);
    const back = fresnel(slab, exit);
    const k0 = (2 * Math.PI) / this.front.wavelengthsNm[wavelengthIndex]!;
    const tau = Math.exp(-2 * k0 * this.#thicknessNm * slab.q[1]);
    const backReflection = muellerOf(back.r);
    const into = muellerOf(this.front.point.t!);
    // Mirrored in the film plane, p amplitudes of both beams change sign, so the cross terms do.
    const insideReflection = muellerOf(crossReversed(this.#inside.point.r));
    const outward = muellerOf(crossReversed(this.#inside.point.t!));
    const roundTrip = scaledBy(multiplyMueller(insideReflection, backReflection), tau * tau);
    const arriving = solveRoundTrips(roundTrip, into);
    const returning = multiplyMueller(outward, multiplyMueller(backReflection, arriving));
    const reflection = muellerOf(this.front.point.r);
    for (let i = 0; i < 16; i++) reflection[i] = reflection[i]! + tau * tau * returning[i]!;
    return {
      reflection,
      transmission: scaledBy(multiplyMueller(muellerOf(back.t), arriving), tau),
      // Re(Ex Hy*) = Re(N* q / N) |Ep|^2 and Re(q) |Es|^2 of a plane wave.
      power: {
        p: over(times([exit.index[0], -exit.index[1]], exit.q), exit.index)[0] / geometry.q0,
        s: exit.q[0] / geometry.q0,
      },
    };
  }
}

type Wave = { index: Complex; q: Complex };

function waveIn(medium: Medium, geometry: Geometry): Wave {
  const index = medium.index ?? forwardRoot([medium.tensor[0]!, medium.tensor[1]!]);
  return { index, q: forwardRoot(medium.diagonalLessXi2(1, geometry)) };
}

/** Fresnel amplitudes of a bare face (physics.md section 1 gives the unit vectors): r_pp = -r_ss at normal incidence. */
function fresnel(from: Wave, to: Wave): { r: Matrix2; t: Matrix2 } {
  const zFrom = over(from.q, times(from.index, from.index));
  const zTo = over(to.q, times(to.index, to.index));
  const rP = over(minus(zFrom, zTo), plus(zFrom, zTo));
  const rS = over(minus(from.q, to.q), plus(from.q, to.q));
  const tP = over(times(over(times([2, 0], zFrom), plus(zFrom, zTo)), from.index), to.index);
  const tS = over(times([2, 0], from.q), plus(from.q, to.q));
  const r = createMatrix2();
  const t = createMatrix2();
  setDiagonal(r, rP[0], rP[1], rS[0], rS[1]);
  setDiagonal(t, tP[0], tP[1], tS[0], tS[1]);
  return { r, t };
}

function scaledBy(mueller: Mueller, factor: number): Mueller {
  return mueller.map((value) => value * factor);
}

function crossReversed(jones: Matrix2): Matrix2 {
  const out = Float64Array.from(jones);
  for (let i = 2; i < 6; i++) out[i] = -out[i]!;
  return out;
}
