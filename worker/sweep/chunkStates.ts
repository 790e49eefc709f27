import type { ReadingSource } from '../../shared/readings.ts';
import type { SolveCase, SolveOutput } from '../../shared/solve.ts';
import { inMagnetizationState } from '../../shared/stackCase.ts';
import type { MagnetizationState } from '../../shared/stackCase.ts';
import { refineInterfaces } from '../optics/refine.ts';
import { solveCasePoints } from '../optics/solveRequest.ts';
import type { SolvedPoint } from '../optics/stackSolver.ts';
import { StackSolver } from '../optics/stackSolver.ts';
import type { StatesNeeded } from './magnetizationStates.ts';
import type { PointBatch } from './pointBatch.ts';
import type { PartsNeeded } from './solvedReadings.ts';
import { SolvedReadings, isWeak, unturned } from './solvedReadings.ts';

/** One point in the states that its readings compare; overwritten by the next point. */
export type PointStates = Record<MagnetizationState, ReadingSource>;

/** What the readings of a sweep need to be solved for. */
export type Needs = { states: StatesNeeded; parts: PartsNeeded };

/** Solves points of one stack in the states that its readings compare. */
export type States = {
  /** Points to hand over at a time. */
  readonly batchPoints: number;
  /** @param take called for each point of the batch, in order */
  solve(batch: PointBatch, take: (point: number, states: PointStates) => void): void;
};

/** ... whose layers can change from batch to batch without compiling it anew. */
export type AdjustableStates = States & {
  /**
   * @param path positions into nested `layers` arrays of the case, as `findLayerPath` gives them
   * @throws RangeError when there is no layer at that path
   */
  setThickness(path: number[], thicknessNm: number): void;
};

/** A stack in one magnetization state, compiled when it is first solved. */
class StateSolver {
  readonly readings: SolvedReadings;
  readonly #resolved: SolveCase;
  readonly #state: MagnetizationState;
  readonly #sweptLayer: number[] | null;
  #solver: StackSolver | null = null;
  /** Thicknesses set before the first solve. */
  readonly #thicknesses = new Map<string, { path: number[]; nm: number }>();

  constructor(resolved: SolveCase, state: MagnetizationState, sweptLayer: number[] | null, needs: Needs) {
    this.readings = new SolvedReadings(needs.parts);
    this.#resolved = resolved;
    this.#state = state;
    this.#sweptLayer = sweptLayer;
  }

  setThickness(path: number[], nm: number): void {
    if (this.#solver) this.#solver.setThickness(path, nm);
    else this.#thicknesses.set(path.join('/'), { path, nm });
  }

  solve({ wavelengthIndex, anglesDeg, thicknessNm }: PointBatch, point: number): SolvedPoint {
    this.#solver ??= this.#compile();
    if (this.#sweptLayer && thicknessNm) this.#solver.setThickness(this.#sweptLayer, thicknessNm[point]!);
    const solved = this.#solver.solve(wavelengthIndex[point]!, anglesDeg[point]!);
    this.readings.take(solved);
    if (this.#state === 'given') {
      this.readings.takeCeiling(this.#solver.stack, wavelengthIndex[point]!, anglesDeg[point]!);
    }
    return solved;
  }

  #compile(): StackSolver {
    const solver = new StackSolver(inMagnetizationState(this.#resolved, this.#state));
    for (const { path, nm } of this.#thicknesses.values()) solver.setThickness(path, nm);
    return solver;
  }
}

/** Sharp layers in coherent light: solvers compiled once, no new objects at each point. */
export class SharpStates implements AdjustableStates {
  readonly batchPoints = 1;
  readonly #given: StateSolver;
  readonly #zero: StateSolver;
  readonly #reversed: StateSolver;
  readonly #needs: Needs;
  readonly #states: PointStates = { given: unturned, zero: unturned, reversed: unturned };

  /** @param sweptLayer path of the layer whose thickness changes */
  constructor(resolved: SolveCase, needs: Needs, sweptLayer: number[] | null) {
    this.#needs = needs;
    this.#given = new StateSolver(resolved, 'given', sweptLayer, needs);
    this.#zero = new StateSolver(resolved, 'zero', sweptLayer, needs);
    this.#reversed = new StateSolver(resolved, 'reversed', sweptLayer, needs);
  }

  setThickness(path: number[], thicknessNm: number): void {
    for (const state of [this.#given, this.#zero, this.#reversed]) state.setThickness(path, thicknessNm);
  }

  solve(batch: PointBatch, take: (point: number, states: PointStates) => void): void {
    for (let point = 0; point < batch.anglesDeg.length; point += 1) {
      this.#solvePoint(batch, point);
      take(point, this.#states);
    }
  }

  #solvePoint(batch: PointBatch, point: number): void {
    const states = this.#states;
    const { zero, reversed } = this.#needs.states;
    const { r, t } = this.#given.solve(batch, point);
    states.given = this.#given.readings;
    states.zero = unturned;
    states.reversed = states.given;
    if (zero === 'always' || (zero === 'weak beam' && isWeak(r, t, this.#needs.parts))) {
      this.#zero.solve(batch, point);
      states.zero = this.#zero.readings;
    }
    if (reversed) {
      this.#reversed.solve(batch, point);
      states.reversed = this.#reversed.readings;
    }
  }
}

/** Any stack, by the solver's general entry, one point after the other. */
export class GeneralStates implements States {
  readonly batchPoints = 1;
  readonly #given: Iterator<ReadingSource>;
  readonly #zero: Iterator<ReadingSource> | null;
  readonly #reversed: Iterator<ReadingSource> | null;

  /** @param resolved its points, wavelength outermost, are those of the batches to come */
  constructor(resolved: SolveCase, needs: Needs) {
    // Interfaces are refined for the given state and cut alike in the others: only the magnetization must differ.
    const refinement = refineInterfaces(resolved);
    const outputs = outputsOf(resolved, needs.parts);
    const pointsOf = (state: MagnetizationState) =>
      solveCasePoints({ ...inMagnetizationState(resolved, state), outputs }, refinement);
    this.#given = pointsOf('given');
    this.#zero = needs.states.zero === 'never' ? null : pointsOf('zero');
    this.#reversed = needs.states.reversed ? pointsOf('reversed') : null;
  }

  solve(batch: PointBatch, take: (point: number, states: PointStates) => void): void {
    for (let point = 0; point < batch.anglesDeg.length; point += 1) {
      const given = nextOf(this.#given);
      take(point, {
        given,
        zero: this.#zero ? nextOf(this.#zero) : unturned,
        reversed: this.#reversed ? nextOf(this.#reversed) : given,
      });
    }
  }
}

/** Intensities have neither amplitudes nor a ceiling. */
function outputsOf({ average, backside }: SolveCase, parts: PartsNeeded): SolveOutput[] {
  const addsIntensities = average !== undefined || backside !== undefined;
  return [
    ...(parts.mueller ? (['mueller'] as const) : []),
    ...(parts.faraday && !addsIntensities ? (['faraday'] as const) : []),
    ...(parts.ceiling && !addsIntensities ? (['ceiling'] as const) : []),
  ];
}

function nextOf(points: Iterator<ReadingSource>): ReadingSource {
  const next = points.next();
  if (next.done) throw new RangeError('The solver gave fewer points than the chunk has.');
  return next.value;
}
