import type { Complex } from '../../shared/complex.ts';
import type { SolveCase } from '../../shared/solve.ts';
import type { CompileOptions } from './compiledStack.ts';
import { CompiledStack } from './compiledStack.ts';
import { forwardRoot, minus, over, plus, scaled, times } from './complexNumber.ts';
import type { WrittenLayer } from './layers.ts';
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
  readonly options: CompileOptions;

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
  constructor(solveCase: SolveCase, options: CompileOptions = {}) {
    this.options = options;
    this.stack = new CompiledStack(solveCase, options);
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
    point.T = this.#transmittance(geometry);
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
    const k0 = (2 * Math.PI) / this.wavelengthsNm[wavelengthIndex]!;
    for (const modes of this.#modes) modes.update(geometry);
    for (const step of this.#steps.values()) step.update(k0);
    this.#state.start(this.#substrate, geometry);
    for (const step of this.#upward) step.cross(this.#state);
    this.#leave(index, q);
  }

  /**
   * Into the incident medium: f = diag(N0, 1) (incident + reflected), g = diag(q0 / N0, q0) (incident - reflected),
   * so r = D^-1 (Z0 M - N) (Z0 M + N)^-1 D with D = diag(1/N0, 1), free of any division by cos(theta).
   */
  #leave(n0: Complex, q0: Complex): void {
    const { m, n, chain } = this.#state;
    const { point } = this;
    const x = this.#product;
    const inverse = this.#inverse;
    const zp = over(q0, times(n0, n0));
    scaleRows(x, m, zp[0], zp[1], q0[0], q0[1]);
    add(inverse, x, n);
    invert(inverse, inverse);
    subtract(point.r, x, n);
    multiply(point.r, point.r, inverse);
    // The cross terms of the same product without their cancellation near grazing incidence, X = Z0 M:
    // 2 (X21 N22 - N21 X22) / det(X + N), and the like.
    const at = (matrix: Matrix2, i: number): Complex => [matrix[i]!, matrix[i + 1]!];
    const sum = (i: number): Complex => plus(at(x, i), at(n, i));
    const twice = over([2, 0], minus(times(sum(0), sum(6)), times(sum(2), sum(4))));
    const ps = minus(times(at(x, 2), at(n, 0)), times(at(n, 2), at(x, 0)));
    const sp = minus(times(at(x, 4), at(n, 6)), times(at(n, 4), at(x, 6)));
    point.r.set(times(times(ps, twice), n0), 2);
    point.r.set(over(times(sp, twice), n0), 4);
    // x at the substrate for unit p (first column) and s light.
    multiply(this.#exit, chain, inverse);
    const p = over(scaled(q0, 2), n0);
    scaleColumns(this.#exit, this.#exit, p[0], p[1], 2 * q0[0], 2 * q0[1]);
    point.t = this.#transmittedAmplitudes(this.#exit);
  }

  /** Energy through the last interface: Re(Ex Hy* - Ey Hx*) / (N0 cos theta) = Re(f^H g) / q0 there. */
  #transmittance(geometry: Geometry): Polarized {
    const f = this.#inverse;
    const g = this.#product;
    this.#substrate.halfSpace(f, g, geometry);
    multiply(f, f, this.#exit);
    multiply(g, g, this.#exit);
    const flux = (column: number) =>
      g[column]! * f[column]! +
      g[column + 1]! * f[column + 1]! +
      g[column + 4]! * f[column + 4]! +
      g[column + 5]! * f[column + 5]!;
    return { p: flux(0) / geometry.q0, s: flux(2) / geometry.q0 };
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
