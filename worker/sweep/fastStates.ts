import type { SolveCase } from '../../shared/solve.ts';
import { inMagnetizationState } from '../../shared/stackCase.ts';
import type { MagnetizationState } from '../../shared/stackCase.ts';
import { loadKernel } from '../kernel/loadKernel.ts';
import { CompiledStack } from '../optics/compiledStack.ts';
import { BatchResult, COLUMN } from '../optics/fast/batchResult.ts';
import { FastSolver } from '../optics/fast/fastSolver.ts';
import type { Jones } from '../optics/observables.ts';
import type { AdjustableStates, Needs, PointStates } from './chunkStates.ts';
import type { PointBatch } from './pointBatch.ts';
import { BatchRoom } from './pointBatch.ts';
import type { PartsNeeded } from './solvedReadings.ts';
import { SolvedReadings, isWeak, unturned } from './solvedReadings.ts';

/** Most points solved at a time: their columns stay in the second cache until the readings are made of them. */
export const BATCH_POINTS = 2_000;
/** Amplitudes of one Jones matrix as re, im. */
const JONES = 8;

/** One state of the stack, and its points as the readings take them. */
class FastState {
  readonly #solver: FastSolver;
  readonly #sweptLayer: number[] | null;
  readonly #result: BatchResult;
  readonly #source: BatchReadings;

  constructor(
    resolved: SolveCase,
    state: MagnetizationState,
    sweptLayer: number[] | null,
    needs: Needs,
    capacity: number,
  ) {
    this.#solver = new FastSolver(inMagnetizationState(resolved, state), loadKernel());
    this.#sweptLayer = sweptLayer;
    this.#result = new BatchResult(capacity, needs.parts.transmission);
    this.#source = new BatchReadings(this.#result, needs.parts);
  }

  setThickness(path: number[], thicknessNm: number): void {
    this.#solver.setThickness(path, thicknessNm);
  }

  solve({ wavelengthIndex, anglesDeg, thicknessNm }: PointBatch): void {
    const thickness =
      this.#sweptLayer && thicknessNm ? { path: this.#sweptLayer, nm: thicknessNm } : undefined;
    this.#solver.solveBatch({ wavelengthIndex, anglesDeg, thickness }, this.#result);
  }

  at(point: number): BatchReadings {
    return this.#source.takePoint(point);
  }
}

/** The columns of a batch, one point at a time. */
class BatchReadings extends SolvedReadings {
  readonly #columns: Float64Array[];
  readonly #parts: PartsNeeded;
  readonly jones: Jones = new Float64Array(JONES);
  readonly #transmitted: Jones = new Float64Array(JONES);
  readonly #kerrP = { rotationDeg: 0, ellipticityDeg: 0 };
  readonly #kerrS = { rotationDeg: 0, ellipticityDeg: 0 };
  transmitted: Jones | null = null;

  constructor({ columns }: BatchResult, parts: PartsNeeded) {
    super(parts);
    this.#columns = columns;
    this.#parts = parts;
  }

  takePoint(point: number): this {
    const columns = this.#columns;
    for (let i = 0; i < JONES; i += 1) this.jones[i] = columns[COLUMN.r + i]![point]!;
    this.R.p = columns[COLUMN.reflectanceP]![point]!;
    this.R.s = columns[COLUMN.reflectanceS]![point]!;
    this.kerr.p = this.#angles(this.#kerrP, COLUMN.rotationP, point);
    this.kerr.s = this.#angles(this.#kerrS, COLUMN.rotationS, point);
    if (this.#parts.transmission) this.#takeTransmission(point);
    this.takeAmplitudes(this.jones, this.transmitted);
    return this;
  }

  #takeTransmission(point: number): void {
    const columns = this.#columns;
    this.T.p = columns[COLUMN.transmittanceP]![point]!;
    this.T.s = columns[COLUMN.transmittanceS]![point]!;
    this.A.p = 1 - this.R.p - this.T.p;
    this.A.s = 1 - this.R.s - this.T.s;
    for (let i = 0; i < JONES; i += 1) this.#transmitted[i] = columns[COLUMN.t + i]![point]!;
    this.transmitted = Number.isNaN(this.#transmitted[0]) ? null : this.#transmitted;
  }

  /** Rotation and, in the next column, ellipticity; null where there is no beam. */
  #angles(angles: { rotationDeg: number; ellipticityDeg: number }, column: number, point: number) {
    angles.rotationDeg = this.#columns[column]![point]!;
    angles.ellipticityDeg = this.#columns[column + 1]![point]!;
    return Number.isNaN(angles.rotationDeg) ? null : angles;
  }
}

/** Sharp layers of media with a scalar eps_d, thousands of points at a time (optics/fast). */
export class FastStates implements AdjustableStates {
  readonly batchPoints: number;
  readonly #needs: Needs;
  readonly #sweptLayer: number[] | null;
  readonly #given: FastState;
  readonly #zero: FastState | null;
  readonly #reversed: FastState | null;
  /** Fields for the ceiling, which the fast path does not give. */
  readonly #stack: CompiledStack | null;
  readonly #states: PointStates = { given: unturned, zero: unturned, reversed: unturned };
  readonly #weak: BatchRoom;
  /** Where a point stands among those solved at m = 0; -1 for one that was not. */
  readonly #zeroAt: Int32Array;

  /**
   * @param resolved a case that `FastSolver.canSolve`, without averages, slab or graded interfaces
   * @param sweptLayer path of the layer whose thickness changes
   * @param points that are to be solved, if not more
   */
  constructor(resolved: SolveCase, needs: Needs, sweptLayer: number[] | null, points: number) {
    this.batchPoints = Math.min(BATCH_POINTS, points);
    this.#weak = new BatchRoom(this.batchPoints);
    this.#zeroAt = new Int32Array(this.batchPoints);
    this.#needs = needs;
    this.#sweptLayer = sweptLayer;
    const stateOf = (state: MagnetizationState) =>
      new FastState(resolved, state, sweptLayer, needs, this.batchPoints);
    this.#given = stateOf('given');
    this.#zero = needs.states.zero === 'never' ? null : stateOf('zero');
    this.#reversed = needs.states.reversed ? stateOf('reversed') : null;
    this.#stack = needs.parts.ceiling ? new CompiledStack(resolved) : null;
  }

  setThickness(path: number[], thicknessNm: number): void {
    for (const state of [this.#given, this.#zero, this.#reversed]) state?.setThickness(path, thicknessNm);
    const layer = this.#stack?.layerAt(path);
    if (layer) layer.thicknessNm = thicknessNm;
  }

  solve(batch: PointBatch, take: (point: number, states: PointStates) => void): void {
    this.#given.solve(batch);
    this.#reversed?.solve(batch);
    this.#solveZero(batch);
    const states = this.#states;
    for (let point = 0; point < batch.anglesDeg.length; point += 1) {
      const given = this.#given.at(point);
      if (this.#stack) this.#takeCeiling(this.#stack, given, batch, point);
      const zeroAt = this.#zero ? this.#zeroAt[point]! : -1;
      states.given = given;
      states.zero = this.#zero && zeroAt >= 0 ? this.#zero.at(zeroAt) : unturned;
      states.reversed = this.#reversed ? this.#reversed.at(point) : given;
      take(point, states);
    }
  }

  /** The points that need it at m = 0, one after the other in the batch of that state. */
  #solveZero(batch: PointBatch): void {
    const zero = this.#zero;
    if (!zero) return;
    const weak = this.#weak;
    const always = this.#needs.states.zero === 'always';
    weak.clear();
    for (let point = 0; point < batch.anglesDeg.length; point += 1) {
      const given = always ? null : this.#given.at(point);
      const isNeeded = given === null || isWeak(given.jones, given.transmitted, this.#needs.parts);
      this.#zeroAt[point] = isNeeded ? weak.count : -1;
      if (!isNeeded) continue;
      weak.add(batch.wavelengthIndex[point]!, batch.anglesDeg[point]!, batch.thicknessNm?.[point] ?? 0);
    }
    if (weak.count > 0) zero.solve(weak.batch(batch.thicknessNm !== null));
  }

  #takeCeiling(stack: CompiledStack, given: BatchReadings, batch: PointBatch, point: number): void {
    const layer = this.#sweptLayer && stack.layerAt(this.#sweptLayer);
    if (layer && batch.thicknessNm) layer.thicknessNm = batch.thicknessNm[point]!;
    given.takeCeiling(stack, batch.wavelengthIndex[point]!, batch.anglesDeg[point]!);
  }
}
