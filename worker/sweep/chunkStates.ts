import type { ReadingSource } from '../../shared/readings.ts';
import type { SolveCase } from '../../shared/solve.ts';
import { inMagnetizationState } from '../../shared/stackCase.ts';
import type { MagnetizationState } from '../../shared/stackCase.ts';
import { refineInterfaces } from '../optics/refine.ts';
import { solveCasePoints } from '../optics/solveRequest.ts';
import { StackSolver } from '../optics/stackSolver.ts';
import type { StatesNeeded } from './magnetizationStates.ts';
import { SolvedReadings, reflectsWeakly, unturned } from './solvedReadings.ts';

/** One point in the states that its readings compare; overwritten by the next point. */
export type PointStates = Record<MagnetizationState, ReadingSource>;

/** Where a point stands; `thicknessNm` of the swept layer when there is one. */
export type PointPlace = { wavelengthIndex: number; angleDeg: number; thicknessNm: number | null };

/** A stack in one magnetization state, compiled when it is first solved. */
class StateSolver {
  readonly readings = new SolvedReadings();
  readonly #resolved: SolveCase;
  readonly #state: MagnetizationState;
  readonly #sweptLayer: number[] | null;
  #solver: StackSolver | null = null;

  constructor(resolved: SolveCase, state: MagnetizationState, sweptLayer: number[] | null) {
    this.#resolved = resolved;
    this.#state = state;
    this.#sweptLayer = sweptLayer;
  }

  solve({ wavelengthIndex, angleDeg, thicknessNm }: PointPlace): ReturnType<StackSolver['solve']> {
    this.#solver ??= new StackSolver(inMagnetizationState(this.#resolved, this.#state));
    if (thicknessNm !== null) this.#solver.setThickness(this.#sweptLayer!, thicknessNm);
    return this.#solver.solve(wavelengthIndex, angleDeg);
  }
}

/** Sharp layers in coherent light: solvers compiled once, no new objects at each point. */
export class SharpStates {
  readonly #given: StateSolver;
  readonly #zero: StateSolver;
  readonly #reversed: StateSolver;
  readonly #needed: StatesNeeded;
  readonly #states: PointStates = { given: unturned, zero: unturned, reversed: unturned };

  /** @param sweptLayer path of the layer whose thickness changes */
  constructor(resolved: SolveCase, needed: StatesNeeded, sweptLayer: number[] | null) {
    this.#needed = needed;
    this.#given = new StateSolver(resolved, 'given', sweptLayer);
    this.#zero = new StateSolver(resolved, 'zero', sweptLayer);
    this.#reversed = new StateSolver(resolved, 'reversed', sweptLayer);
  }

  solve(place: PointPlace): PointStates {
    const { zero, reversed } = this.#needed;
    const given = this.#given.solve(place);
    const solvesZero = zero === 'always' || (zero === 'weak reflection' && reflectsWeakly(given));
    this.#states.given = this.#given.readings.take(given);
    this.#states.zero = solvesZero ? this.#zero.readings.take(this.#zero.solve(place)) : unturned;
    this.#states.reversed = reversed
      ? this.#reversed.readings.take(this.#reversed.solve(place))
      : this.#states.given;
    return this.#states;
  }
}

/** Any stack, by the solver's general entry, one point after the other. */
export class GeneralStates {
  readonly #given: Iterator<ReadingSource>;
  readonly #zero: Iterator<ReadingSource> | null;
  readonly #reversed: Iterator<ReadingSource> | null;

  /** @param cases whose points, in order, are those of the chunk; asked for once for each state */
  constructor(cases: () => Iterable<SolveCase>, needed: StatesNeeded) {
    this.#given = pointsOf(cases(), 'given');
    this.#zero = needed.zero === 'never' ? null : pointsOf(cases(), 'zero');
    this.#reversed = needed.reversed ? pointsOf(cases(), 'reversed') : null;
  }

  solve(): PointStates {
    const given = nextOf(this.#given);
    return {
      given,
      zero: this.#zero ? nextOf(this.#zero) : unturned,
      reversed: this.#reversed ? nextOf(this.#reversed) : given,
    };
  }
}

/** Interfaces are refined for the given state and cut alike in the others: only the magnetization must differ. */
function* pointsOf(cases: Iterable<SolveCase>, state: MagnetizationState): Generator<ReadingSource, void> {
  for (const one of cases) yield* solveCasePoints(inMagnetizationState(one, state), refineInterfaces(one));
}

function nextOf(points: Iterator<ReadingSource>): ReadingSource {
  const next = points.next();
  if (next.done) throw new RangeError('The solver gave fewer points than the chunk has.');
  return next.value;
}
