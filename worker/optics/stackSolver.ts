import type { Complex } from '../../shared/complex.ts';
import type { SolveCase } from '../../shared/solve.ts';
import type { WrittenLayer } from './compiledStack.ts';
import { CompiledStack } from './compiledStack.ts';
import { forwardRoot, over, scaled, times } from './complexNumber.ts';
import type { Geometry } from './geometry.ts';
import { incidenceGeometry } from './geometry.ts';
import type { Matrix2 } from './matrix2.ts';
import { add, createMatrix2, invert, multiply, scaleColumns, scaleRows, subtract } from './matrix2.ts';
import { Modes } from './modes.ts';
import type { Jones, KerrAngles, Polarized } from './observables.ts';
import { kerrAngles, reflectance } from './observables.ts';
import { FieldState, LayerStep } from './recursion.ts';

/** One solved point. The object and its arrays belong to the solver and are overwritten by its next `solve`. */
export type SolvedPoint = {
  /** Reflection `pp, ps, sp, ss` as re, im. */
  r: Jones;
  /** Transmission likewise; null unless the substrate's tensor is a multiple of the identity. */
  t: Jones | null;
  R: Polarized;
  T: Polarized;
  A: Polarized;
  kerr: { p: KerrAngles | null; s: KerrAngles | null };
};

/**
 * One case of the solve contract, compiled: equal media share their modes, layers of a repeated block are prepared
 * once per point.
 */
export class StackSolver {
  readonly stack: CompiledStack;

  readonly #modes: Modes[];
  readonly #substrate: Modes;
  readonly #steps = new Map<WrittenLayer, LayerStep>();
  /** From the substrate up. */
  readonly #upward: LayerStep[];

  readonly #state = new FieldState();
  readonly #inverse: Matrix2 = createMatrix2();
  readonly #product: Matrix2 = createMatrix2();
  readonly #exit: Matrix2 = createMatrix2();
  readonly #transmission: Jones = createMatrix2();
  /** The last solved point. */
  readonly point: SolvedPoint = {
    r: createMatrix2(),
    t: null,
    R: { p: 0, s: 0 },
    T: { p: 0, s: 0 },
    A: { p: 0, s: 0 },
    kerr: { p: null, s: null },
  };

  /** @param solveCase a case that has passed `solveCaseSchema` and `checkSolveRequest` */
  constructor(solveCase: SolveCase) {
    this.stack = new CompiledStack(solveCase);
    const modes = new Map(this.stack.media.map((medium) => [medium, new Modes(medium)]));
    this.#modes = [...modes.values()];
    this.#substrate = modes.get(this.stack.substrate)!;
    for (const layer of this.stack.written) {
      this.#steps.set(layer, new LayerStep(modes.get(layer.medium)!, layer));
    }
    this.#upward = this.stack.sequence.map((layer) => this.#steps.get(layer)!).reverse();
  }

  get wavelengthsNm(): Float64Array {
    return this.stack.wavelengthsNm;
  }

  get anglesDeg(): Float64Array {
    return this.stack.anglesDeg;
  }

  /**
   * Changes one written layer for the solves that follow.
   *
   * @param path positions into nested `layers` arrays, as `findLayerPath` gives them
   * @throws RangeError when there is no layer at that path
   */
  setThickness(path: number[], thicknessNm: number): void {
    const layer = this.stack.layerAt(path);
    if (!layer) throw new RangeError(`no layer at layers[${path.join('].layers[')}]`);
    layer.thicknessNm = thicknessNm;
  }

  /**
   * @param wavelengthIndex position in `wavelengthsNm`
   * @param angleDeg angle of incidence, [0, 90) deg
   */
  solve(wavelengthIndex: number, angleDeg: number): SolvedPoint {
    const index = this.stack.incidentIndex(wavelengthIndex);
    const geometry = incidenceGeometry(index[0], angleDeg);
    const { point } = this;
    this.solveAmplitudes(wavelengthIndex, geometry, index, [geometry.q0, 0]);
    const R = reflectance(point.r);
    point.R = R;
    point.T = this.#transmittance(geometry.q0);
    point.A = { p: 1 - R.p - point.T.p, s: 1 - R.s - point.T.s };
    point.kerr = { p: kerrAngles(point.r, 'p'), s: kerrAngles(point.r, 's') };
    return point;
  }

  /**
   * Only r and t of `point`, for light that arrives from the case's incident medium; that medium may absorb here,
   * as the inside of a thick slab does.
   *
   * @param geometry fixes xi, whatever medium the light comes from
   * @param index N of the medium the light arrives in
   * @param q its normal wave number over k0
   */
  solveAmplitudes(wavelengthIndex: number, geometry: Geometry, index: Complex, q: Complex): void {
    this.stack.load(wavelengthIndex);
    const { n0, xi, q0 } = geometry;
    const k0 = (2 * Math.PI) / this.wavelengthsNm[wavelengthIndex]!;
    for (const modes of this.#modes) modes.update(n0, xi, q0);
    for (const step of this.#steps.values()) step.update(k0);
    this.#state.start(this.#substrate);
    for (const step of this.#upward) step.cross(this.#state);
    this.#leave(index, q);
  }

  /**
   * Into the incident medium: f = diag(N0, 1) (incident + reflected), g = diag(q0 / N0, q0) (incident - reflected),
   * so r = D^-1 (Z0 M - N) (Z0 M + N)^-1 D with D = diag(1/N0, 1), free of any division by cos(theta).
   */
  #leave(n0: Complex, q0: Complex): void {
    const { m, n, chain } = this.#state;
    const product = this.#product;
    const inverse = this.#inverse;
    const { point } = this;
    const zp = over(q0, times(n0, n0));
    scaleRows(product, m, zp[0], zp[1], q0[0], q0[1]);
    add(inverse, product, n);
    invert(inverse, inverse);
    subtract(product, product, n);
    multiply(point.r, product, inverse);
    const inverseIndex = over([1, 0], n0);
    scaleElement(point.r, 2, n0);
    scaleElement(point.r, 4, inverseIndex);
    // x at the substrate for unit p (first column) and s light.
    multiply(this.#exit, chain, inverse);
    const p = over(scaled(q0, 2), n0);
    scaleColumns(this.#exit, this.#exit, p[0], p[1], 2 * q0[0], 2 * q0[1]);
    point.t = this.#transmittedAmplitudes(this.#exit);
  }

  /** Energy through the last interface: Re(Ex Hy* - Ey Hx*) / (N0 cos theta) with f = x, g = Z x there. */
  #transmittance(q0: number): Polarized {
    const g = this.#product;
    const x = this.#exit;
    const substrate = this.#substrate;
    if (substrate.isotropic) {
      scaleRows(g, x, substrate.zp[0], substrate.zp[1], substrate.q[0], substrate.q[1]);
    } else {
      multiply(g, substrate.forward.z, x);
    }
    const flux = (column: number) =>
      g[column]! * x[column]! +
      g[column + 1]! * x[column + 1]! +
      g[column + 4]! * x[column + 4]! +
      g[column + 5]! * x[column + 5]!;
    return { p: flux(0) / q0, s: flux(2) / q0 };
  }

  /** t by the unit vectors of an isotropic exit medium: Hy = N t_p, Ey = t_s. */
  #transmittedAmplitudes(x: Matrix2): Jones | null {
    const { isotropic, medium } = this.#substrate;
    if (!isotropic) return null;
    const index: Complex =
      medium.index && medium.scalarDiagonal
        ? medium.index
        : forwardRoot([medium.tensor[0]!, medium.tensor[1]!]);
    const inverse = over([1, 0], index);
    scaleRows(this.#transmission, x, inverse[0], inverse[1], 1, 0);
    return this.#transmission;
  }
}

function scaleElement(matrix: Matrix2, at: 2 | 4, factor: Complex): void {
  const value = times([matrix[at]!, matrix[at + 1]!], factor);
  matrix[at] = value[0];
  matrix[at + 1] = value[1];
}
