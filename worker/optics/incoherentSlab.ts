import type { Complex, Vector } from '../../shared/complex.ts';
import type { MediumInput, TensorInput } from '../../shared/medium.ts';
import type { SolveCase, StackItemInput } from '../../shared/solve.ts';
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

  /** @param solveCase a valid case with `backside` */
  constructor(solveCase: SolveCase) {
    const { backside, ...front } = solveCase;
    if (!backside) throw new TypeError('the case has no backside');
    this.front = new StackSolver(front);
    this.#inside = new StackSolver(mirrored(front));
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
  return { index, q: forwardRoot(medium.yyLessXi2(geometry)) };
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

/**
 * The stack as seen from inside the slab: reversed order, mirrored in the film plane. m is an axial vector and keeps
 * its z component, an optic axis is a polar one and turns it, a tensor changes the sign of xz and yz.
 */
function mirrored(solveCase: SolveCase): SolveCase {
  const item = (one: StackItemInput): StackItemInput =>
    'layers' in one
      ? { repeat: one.repeat, layers: one.layers.map(item).reverse() }
      : { ...mirroredMedium(one), thicknessNm: one.thicknessNm };
  return {
    ...solveCase,
    incident: solveCase.substrate,
    layers: solveCase.layers.map(item).reverse(),
    substrate: solveCase.incident,
  };
}

function mirroredMedium(medium: MediumInput): MediumInput {
  const axial = (v: Vector): Vector => [-v[0], -v[1], v[2]];
  const polar = (v: Vector): Vector => [v[0], v[1], -v[2]];
  const { m, axis, epsilon, ...rest } = medium;
  return {
    ...rest,
    ...(m ? { m: axial(m) } : {}),
    ...(axis ? { axis: polar(axis) } : {}),
    ...(epsilon
      ? {
          epsilon: Array.isArray(epsilon)
            ? mirroredTensor(epsilon)
            : { samples: epsilon.samples.map(mirroredTensor) },
        }
      : {}),
  };
}

function mirroredTensor(tensor: TensorInput): TensorInput {
  const minusOne = (value: TensorInput[0][0]): TensorInput[0][0] =>
    typeof value === 'number' ? -value : [-value[0], -value[1]];
  const [x, y, z] = tensor;
  return [
    [x[0], x[1], minusOne(x[2])],
    [y[0], y[1], minusOne(y[2])],
    [minusOne(z[0]), minusOne(z[1]), z[2]],
  ];
}
