import { readingOf } from '../../shared/readings.ts';
import type { SolveCase } from '../../shared/solve.ts';
import { findLayerPath, inMagnetizationState, toSolveCase } from '../../shared/stackCase.ts';
import type { MagnetizationState } from '../../shared/stackCase.ts';
import { resolveCase } from '../dispersion/resolveCase.ts';
import type { ResolvableMaterial } from '../dispersion/resolveCase.ts';
import { StackSolver } from '../optics/stackSolver.ts';
import { axisValueAt, axisValues } from './axisValues.ts';
import { statesNeeded } from './magnetizationStates.ts';
import type { StatesNeeded } from './magnetizationStates.ts';
import type { Chunk } from './planChunks.ts';
import type { SharedResult } from './sharedResult.ts';
import { SolvedReadings, reflectsWeakly, unturned } from './solvedReadings.ts';
import { materialKey } from './sweepInput.ts';
import type { SweepInput } from './sweepInput.ts';

/** A stack in one magnetization state, compiled when it is first solved. */
class StateSolver {
  readonly readings = new SolvedReadings();
  readonly #resolved: SolveCase;
  readonly #state: MagnetizationState;
  #solver: StackSolver | null = null;

  constructor(resolved: SolveCase, state: MagnetizationState) {
    this.#resolved = resolved;
    this.#state = state;
  }

  get solver(): StackSolver {
    this.#solver ??= new StackSolver(inMagnetizationState(this.#resolved, this.#state));
    return this.#solver;
  }
}

/** One sweep as one thread solves it: any chunk of it, into the shared columns. */
export class SweepSolver {
  readonly #input: SweepInput;
  readonly #needed: StatesNeeded;
  readonly #materials: Map<string, ResolvableMaterial>;
  readonly #sweptLayer: number[] | null;
  /** Compiled once where the wavelength does not change. */
  #atOneWavelength: Record<MagnetizationState, StateSolver> | null = null;

  /** @throws Error when the axis names a layer that the document does not have */
  constructor(input: SweepInput) {
    const { axis, document } = input;
    this.#input = input;
    this.#needed = statesNeeded(document, input.readings);
    this.#materials = new Map(input.materials.map((material) => [materialKey(material), material]));
    this.#sweptLayer = axis.kind === 'thickness' ? findLayerPath(document.layers, axis.layerId) : null;
    if (axis.kind === 'thickness' && this.#sweptLayer === null) {
      throw new Error(`axis.layerId: the stack has no layer ${axis.layerId}`);
    }
  }

  /**
   * Solves the points of one chunk and stops early when the sweep is cancelled.
   *
   * @throws ResolutionError when a material does not reach to a wavelength of the chunk
   */
  solve(chunk: Chunk, result: SharedResult): void {
    const { axis, document, readings } = this.#input;
    const solvers = this.#solversFor(chunk);
    for (let offset = 0; offset < chunk.count; offset += 1) {
      if (result.cancelled) return;
      const index = chunk.start + offset;
      const value = axisValueAt(axis, index);
      result.columns[0]![index] = value;
      this.#solvePoint(
        solvers,
        axis.kind === 'wavelength' ? offset : 0,
        axis.kind === 'angle' ? value : document.workingPoint.angleDeg,
        axis.kind === 'thickness' ? value : null,
      );
      for (let column = 0; column < readings.length; column += 1) {
        const reading = readingOf(readings[column]!, this.#given, this.#zero, this.#reversed);
        result.columns[1 + column]![index] = reading ?? NaN;
      }
      result.addDone(1);
    }
  }

  #given = new SolvedReadings();
  #zero: typeof unturned = unturned;
  #reversed = this.#given;

  #solvePoint(
    solvers: Record<MagnetizationState, StateSolver>,
    wavelengthIndex: number,
    angleDeg: number,
    thicknessNm: number | null,
  ): void {
    const solve = (state: StateSolver) => {
      const { solver } = state;
      if (thicknessNm !== null) solver.setThickness(this.#sweptLayer!, thicknessNm);
      return solver.solve(wavelengthIndex, angleDeg);
    };
    const given = solve(solvers.given);
    this.#given = solvers.given.readings.take(given);
    const solvesZero =
      this.#needed.zero === 'always' || (this.#needed.zero === 'weak reflection' && reflectsWeakly(given));
    this.#zero = solvesZero ? solvers.zero.readings.take(solve(solvers.zero)) : unturned;
    this.#reversed = this.#needed.reversed
      ? solvers.reversed.readings.take(solve(solvers.reversed))
      : this.#given;
  }

  #solversFor(chunk: Chunk): Record<MagnetizationState, StateSolver> {
    const { axis, document } = this.#input;
    if (axis.kind === 'wavelength') return this.#compile(axisValues(axis, chunk.start, chunk.count));
    this.#atOneWavelength ??= this.#compile(document.workingPoint.wavelengthNm);
    return this.#atOneWavelength;
  }

  #compile(wavelengthNm: number | number[]): Record<MagnetizationState, StateSolver> {
    const { document } = this.#input;
    const given = toSolveCase(document, wavelengthNm, document.workingPoint.angleDeg);
    const resolved = resolveCase(given, this.#materials);
    return {
      given: new StateSolver(resolved, 'given'),
      zero: new StateSolver(resolved, 'zero'),
      reversed: new StateSolver(resolved, 'reversed'),
    };
  }
}
