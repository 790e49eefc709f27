import type { Complex } from '../../shared/complex.ts';
import { forwardRoot, minus, modulus, over, plus, scaled, squareRoot, times } from './complexNumber.ts';
import type { Geometry } from './geometry.ts';
import type { Matrix2 } from './matrix2.ts';
import { createMatrix2, determinant, invert, setDiagonal, subtract } from './matrix2.ts';
import { Medium } from './medium.ts';
import type { Quartic, RootPair } from './quartic.ts';
import { quarticRoots, refinePair } from './quartic.ts';
import type { FieldSystem, WaveEquation } from './waveEquation.ts';
import type { Tensor } from './tensor.ts';
import { gainOf, isPassive } from './tensor.ts';
import { exchanged, fieldSystem, polarizationGap, secularQuartic, waveEquation } from './waveEquation.ts';

/**
 * The pair of waves that travel one way through a medium, as a whole: never as two eigenvectors, which coincide in
 * an isotropic medium. With f = (Hy, Ey): f' = i P f and g = Z f on the pair. P is kept as half its trace and a
 * traceless rest, so that a splitting of 1e-15 is as accurate as one of 1.
 */
export type Beam = {
  /** Half the trace of P. */
  half: Complex;
  /** Traceless part of P: [h, p12; p21, -h]. */
  h: Complex;
  p12: Complex;
  p21: Complex;
  /** (u1 - u2)^2 / 4 of the two wave numbers. */
  splitting: Complex;
  /** g = Z f */
  z: Matrix2;
};

/** Modes of a medium at one wavelength and angle; `update` refreshes them in place. */
export class Modes {
  readonly medium: Medium;
  isotropic = true;
  /** Isotropic medium: normal wave number q, and g1 = zp f1, g2 = q f2. */
  q: Complex = [1, 0];
  zp: Complex = [1, 0];
  /** Any other medium. */
  readonly forward: Beam = createBeam();
  readonly backward: Beam = createBeam();
  /** Z of the forward beam less Z of the backward beam, and its inverse. */
  readonly zStep: Matrix2 = createMatrix2();
  readonly zStepInverse: Matrix2 = createMatrix2();
  /** The two beams are too much alike, or have no Z, to take the field apart into them. */
  inseparable = false;
  system: FieldSystem | null = null;

  constructor(medium: Medium) {
    this.medium = medium;
  }

  update(geometry: Geometry): void {
    const { medium } = this;
    this.isotropic = medium.isotropic;
    if (medium.isotropic) {
      this.q = forwardRoot(medium.diagonalLessXi2(1, geometry));
      // At a critical angle the wave neither enters nor leaves; a trace of q keeps the formulas finite.
      if (this.q[0] === 0 && this.q[1] === 0) this.q = [1e-150, 0];
      this.zp = over(this.q, [medium.tensor[0]!, medium.tensor[1]!]);
      return;
    }
    this.system = fieldSystem(medium, geometry);
    const size = largest(medium.tensor);
    const hasNoZ = modulus(this.system.b11) < INSEPARABLE * size;
    // Beams are made in any case, for layers too thick for the series; then of a medium a trace away.
    const system = hasNoZ ? { ...this.system, b11: [NUDGE * size, 0] as Complex } : this.system;
    const equation = waveEquation(system, polarizationGap(medium, system, geometry));
    const quartic = secularQuartic(equation);
    const pair = refinePair(quartic, forwardPair(medium, quartic, geometry));
    fillBeam(this.forward, equation, pair);
    fillBeam(this.backward, equation, otherPair(quartic, pair));
    subtract(this.zStep, this.forward.z, this.backward.z);
    // 4 q^2 in an isotropic medium.
    const apart = modulus(times(determinant(this.zStep), system.b11));
    // In a medium that gives energy a "forward" wave may grow: no pair is safe to carry through a thick layer.
    const gives = !medium.scalarDiagonal && !isPassive(medium.tensor);
    this.inseparable = hasNoZ || gives || !(apart > ALIKE * size);
    invert(this.zStepInverse, this.zStep);
  }

  /**
   * f = m x, g = n x of the waves that leave through a half space of this medium.
   *
   * @param geometry that of the last `update`
   */
  halfSpace(m: Matrix2, n: Matrix2, geometry: Geometry): void {
    setDiagonal(m, 1, 0, 1, 0);
    if (this.isotropic) {
      setDiagonal(n, this.zp[0], this.zp[1], this.q[0], this.q[1]);
    } else if (modulus(this.system!.b11) >= INSEPARABLE * largest(this.medium.tensor)) {
      n.set(this.forward.z);
    } else {
      // With Hy and Ex exchanged: (Hy, -Hx) = Z (Ex, Ey), x = (Ex, Ey).
      const equation = waveEquation(exchanged(this.system!));
      const quartic = secularQuartic(equation);
      const beam = createBeam();
      fillBeam(beam, equation, refinePair(quartic, forwardPair(this.medium, quartic, geometry, exchanged)));
      m.set(beam.z.subarray(0, 4));
      n.set([1, 0, 0, 0, ...beam.z.subarray(4)]);
    }
  }
}

/** Relative size below which a determinant is taken for zero; the digits lost at this size are the last three. */
const INSEPARABLE = 1e-5;

/** b11 of a medium that has none, by the tensor's size: wrong by as much, and as much lost in digits. */
const NUDGE = 1e-8;

/** Beams closer than this, as 4 q^2 against the permittivity, are too much alike: near a critical angle of the layer. */
const ALIKE = 1e-2;

function largest(tensor: Tensor): number {
  let size = 0;
  for (const value of tensor) size = Math.max(size, Math.abs(value));
  return size;
}

function createBeam(): Beam {
  const zero = (): Complex => [0, 0];
  return { half: zero(), h: zero(), p12: zero(), p21: zero(), splitting: zero(), z: createMatrix2() };
}

/** Loss added to tell forward from backward waves in a lossless medium (limiting absorption), by the tensor's size. */
const SORTING_LOSS = 1e-6;

/**
 * A first guess of sum and product of the two forward wave numbers.
 *
 * A weak magnet with scalar diagonal starts from its quartic without the linear term, which is of second order in
 * Q: u^2 then solves a quadratic. Any other tensor has all four roots found, and those taken that lie nearest to the
 * two forward ones of the same medium with a trace of loss, where forward waves are the ones that decay.
 */
function forwardPair(
  medium: Medium,
  quartic: Quartic,
  geometry: Geometry,
  arranged: (system: FieldSystem) => FieldSystem = (system) => system,
): RootPair {
  const { c2, c1, c0 } = quartic;
  const isWeak =
    modulus(c1) < 0.02 * modulus(c2) ** 1.5 &&
    modulus(minus(times(c2, c2), scaled(c0, 4))) < 0.2 * modulus(c2) ** 2;
  if (medium.scalarDiagonal && isWeak) {
    const centre = scaled(c2, -0.5);
    const spread = squareRoot(minus(times(centre, centre), c0));
    return pairOf(forwardRoot(plus(centre, spread)), forwardRoot(minus(centre, spread)));
  }
  const roots = quarticRoots(quartic);
  const lossy = quarticRoots(secularQuartic(waveEquation(arranged(fieldSystem(withLoss(medium), geometry)))));
  const [first, second] = lossy.sort((a, b) => b[1] - a[1]);
  const u1 = takeNearest(roots, first!);
  const u2 = takeNearest(roots, second!);
  return pairOf(u1, u2);
}

function pairOf(u1: Complex, u2: Complex): RootPair {
  return { sum: plus(u1, u2), product: times(u1, u2) };
}

/** Takes the root nearest to `target` out of `roots`. */
function takeNearest(roots: Complex[], target: Complex): Complex {
  let nearest = 0;
  for (let i = 1; i < roots.length; i++) {
    if (modulus(minus(roots[i]!, target)) < modulus(minus(roots[nearest]!, target))) nearest = i;
  }
  return roots.splice(nearest, 1)[0]!;
}

/** The loaded medium as a bare tensor, made passive and then lossy by SORTING_LOSS of its size. */
function withLoss(medium: Medium): Medium {
  const lossy = Medium.fromTensor(medium.tensor);
  const loss = SORTING_LOSS * largest(medium.tensor) + gainOf(medium.tensor);
  for (const i of [1, 9, 17]) lossy.tensor[i] = lossy.tensor[i]! + loss;
  return lossy;
}

/** Sum and product of the other two roots, from the quotient of the quartic by the factor of the first two. */
function otherPair({ c3, c2 }: Quartic, { sum, product }: RootPair): RootPair {
  const d1 = plus(c3, sum);
  return { sum: scaled(d1, -1), product: plus(minus(c2, product), times(sum, d1)) };
}

/**
 * P from sum a and product b of its eigenvalues. Cayley-Hamilton, P^2 = a P - b, in P^2 - U P + V = 0 gives
 * P = (a - U)^-1 (b - V) without eigenvectors.
 */
function fillBeam(beam: Beam, equation: WaveEquation, { sum, product }: RootPair): void {
  const { u11, u12, u21, v12, v21, v22, vGap, a11, a12, b11 } = equation;
  const aLessU11 = minus(sum, u11);
  const scale = minus(times(sum, aLessU11), times(u12, u21));
  const bLessV22 = minus(product, v22);
  const bLessV11 = plus(bLessV22, vGap);
  beam.p12 = over(minus(times(u12, bLessV22), times(sum, v12)), scale);
  beam.p21 = over(minus(times(u21, bLessV11), times(aLessU11, v21)), scale);
  const trace = plus(times(sum, vGap), times(u11, bLessV22));
  const coupling = minus(times(u21, v12), times(u12, v21));
  beam.h = scaled(over(plus(trace, coupling), scale), 0.5);
  beam.half = scaled(sum, 0.5);
  beam.splitting = plus(times(beam.h, beam.h), times(beam.p12, beam.p21));
  const z11 = over(minus(plus(beam.half, beam.h), a11), b11);
  const z12 = over(minus(beam.p12, a12), b11);
  const z22 = minus(beam.half, beam.h);
  beam.z.set([...z11, ...z12, ...beam.p21, ...z22]);
}

/**
 * out = exp(sign i k0 d P), the propagation of a beam through a layer.
 *
 * @param phase k0 d (real): d in the length unit of 1/k0
 */
export function propagate(out: Matrix2, beam: Beam, phase: number, sign: 1 | -1): void {
  const i: Complex = [0, sign * phase];
  const delta = squareRoot(beam.splitting);
  const w = scaled(delta, phase);
  let cosine: Complex;
  let slope: Complex; // (exp(i k0 d u1) - exp(i k0 d u2)) / (u1 - u2)
  if (modulus(w) < 1) {
    const carrier = exponential(times(i, beam.half));
    cosine = times(carrier, cosineOf(w));
    slope = times(times(carrier, i), sincOf(w));
  } else {
    // Apart: each wave on its own, so that nothing overflows where both decay strongly.
    const e1 = exponential(times(i, plus(beam.half, delta)));
    const e2 = exponential(times(i, minus(beam.half, delta)));
    cosine = scaled(plus(e1, e2), 0.5);
    slope = over(scaled(minus(e1, e2), 0.5), delta);
  }
  const along = times(slope, beam.h);
  out.set([
    ...plus(cosine, along),
    ...times(slope, beam.p12),
    ...times(slope, beam.p21),
    ...minus(cosine, along),
  ]);
}

function exponential(z: Complex): Complex {
  const size = Math.exp(z[0]);
  return [size * Math.cos(z[1]), size * Math.sin(z[1])];
}

function cosineOf(z: Complex): Complex {
  return [Math.cos(z[0]) * Math.cosh(z[1]), -Math.sin(z[0]) * Math.sinh(z[1])];
}

function sincOf(z: Complex): Complex {
  if (modulus(z) < 1e-4) {
    const square = times(z, z);
    return plus([1, 0], scaled(square, -1 / 6));
  }
  return over([Math.sin(z[0]) * Math.cosh(z[1]), Math.cos(z[0]) * Math.sinh(z[1])], z);
}
