import { applyAxis } from '../../shared/applyAxis.ts';
import { readingOf } from '../../shared/readings.ts';
import type { SweepAxis } from '../../shared/run.ts';
import { axesOf } from '../../shared/runAxes.ts';
import type { SolveCase } from '../../shared/solve.ts';
import { findLayerPath, toSolveCase } from '../../shared/stackCase.ts';
import { inputAzimuthOf } from '../../shared/stack.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { resolveCase } from '../dispersion/resolveCase.ts';
import type { ResolvableMaterial } from '../dispersion/resolveCase.ts';
import { FastSolver } from '../optics/fast/fastSolver.ts';
import type { AxisRole } from './axisRoles.ts';
import { axisRoles } from './axisRoles.ts';
import { axisValueAt } from '../../shared/axisValues.ts';
import { GeneralStates, SharpStates } from './chunkStates.ts';
import type { Needs, PointStates, States } from './chunkStates.ts';
import { BATCH_POINTS, FastStates } from './fastStates.ts';
import { isGeneral } from './generalStack.ts';
import { statesNeeded } from './magnetizationStates.ts';
import type { Chunk } from './planChunks.ts';
import { BatchRoom } from './pointBatch.ts';
import type { SharedResult } from './sharedResult.ts';
import { partsNeeded } from './solvedReadings.ts';
import { materialKey } from './sweepInput.ts';
import type { SweepInput } from './sweepInput.ts';

/** Points of a chunk that share one stack. */
type Block = {
  document: StackDocument;
  /** Names the document and the wavelengths, so that a solver can be kept for the next chunk. */
  key: string;
  family: number;
  /** Positions on the axes. */
  first: number[];
  second: number[];
};

/** Solvers that a thread keeps of one sweep; a family has at most 12 stacks. */
const KEPT_SOLVERS = 16;
/** Fewer points are solved sooner than the fast path is made ready for them. */
const FEWEST_FAST_POINTS = 12;

/** One sweep as one thread solves it: any chunk of it, into the shared columns. */
export class SweepSolver {
  readonly #input: SweepInput;
  readonly #needs: Needs;
  readonly #roles: { first: AxisRole; second: AxisRole };
  readonly #materials: Map<string, ResolvableMaterial>;
  readonly #sweptLayer: number[] | null;
  readonly #kept = new Map<string, States>();
  readonly #room = new BatchRoom(BATCH_POINTS);
  /** Where the points of the room stand in the result. */
  readonly #places = new Int32Array(BATCH_POINTS);

  /** @throws Error when an axis names a layer or block that the document does not have */
  constructor(input: SweepInput) {
    this.#input = input;
    this.#needs = { states: statesNeeded(input, input.readings), parts: partsNeeded(input.readings) };
    this.#roles = axisRoles(input);
    this.#materials = new Map(input.materials.map((material) => [materialKey(material), material]));
    for (const { field, axis } of axesOf(input)) {
      if (axis.kind !== 'thickness' || findLayerPath(input.document.layers, axis.layerId)) continue;
      throw new Error(`${field}.layerId: the stack has no layer ${axis.layerId}`);
    }
    this.#sweptLayer = this.#sweptPath();
  }

  #sweptPath(): number[] | null {
    const { first, second } = this.#roles;
    const axis =
      first === 'thickness' ? this.#input.axis : second === 'thickness' ? this.#input.second : null;
    return axis?.kind === 'thickness' ? findLayerPath(this.#input.document.layers, axis.layerId) : null;
  }

  /**
   * Solves the points of one chunk and stops early when the sweep is cancelled.
   *
   * @throws ResolutionError when a material does not reach to a wavelength of the chunk
   */
  solve(chunk: Chunk, result: SharedResult): void {
    for (const block of this.#blocksOf(chunk)) {
      if (result.cancelled) return;
      this.#solveBlock(block, result);
    }
  }

  *#blocksOf({ first, second, family }: Chunk): Generator<Block, void> {
    const { axis, second: secondAxis, family: familyAxis } = this.#input;
    const firsts = Array.from({ length: first.count }, (_, i) => first.start + i);
    const seconds = Array.from({ length: second.count }, (_, i) => second.start + i * second.stride);
    const base = applied(this.#input.document, familyAxis, family);
    const split = (positions: number[], role: AxisRole) =>
      role === 'stack' ? positions.map((position) => [position]) : [positions];
    for (const theseSeconds of split(seconds, this.#roles.second)) {
      const isSecondStack = this.#roles.second === 'stack';
      const outer = isSecondStack ? applied(base, secondAxis, theseSeconds[0]!) : base;
      for (const theseFirsts of split(firsts, this.#roles.first)) {
        const isFirstStack = this.#roles.first === 'stack';
        yield {
          document: isFirstStack ? applied(outer, axis, theseFirsts[0]!) : outer,
          key: [
            family,
            ...this.#keyOf(this.#roles.second, theseSeconds),
            ...this.#keyOf(this.#roles.first, theseFirsts),
          ].join(' '),
          family,
          first: theseFirsts,
          second: theseSeconds,
        };
      }
    }
  }

  /** What a solver depends on of the positions on an axis. */
  #keyOf(role: AxisRole, positions: number[]): (string | number)[] {
    if (role !== 'stack' && role !== 'wavelength') return [];
    return [role, positions[0]!, positions.at(-1)!, positions.length];
  }

  #solveBlock(block: Block, result: SharedResult): void {
    const { workingPoint } = block.document;
    const wavelengths = this.#valuesOf('wavelength', block) ?? [workingPoint.wavelengthNm];
    const angles = this.#valuesOf('angle', block) ?? [workingPoint.angleDeg];
    const thicknesses = this.#valuesOf('thickness', block);
    const states = this.#statesFor(block, wavelengths, angles, (thicknesses ?? [0]).length);
    const write = (count: number) => {
      this.#write(states, count, thicknesses !== null, inputAzimuthOf(workingPoint), result);
    };
    this.#room.clear();
    for (let w = 0; w < wavelengths.length; w += 1) {
      for (let a = 0; a < angles.length; a += 1) {
        for (let t = 0; t < (thicknesses?.length ?? 1); t += 1) {
          this.#places[this.#room.count] = this.#placeOf(block, w, a, t);
          this.#room.add(w, angles[a]!, thicknesses?.[t] ?? 0);
          if (this.#room.count < states.batchPoints) continue;
          if (result.cancelled) return;
          write(this.#room.count);
        }
      }
    }
    if (this.#room.count > 0 && !result.cancelled) write(this.#room.count);
  }

  #write(
    states: States,
    count: number,
    withThickness: boolean,
    azimuthDeg: number,
    result: SharedResult,
  ): void {
    const { readings } = this.#input;
    states.solve(this.#room.batch(withThickness), (point, { given, zero, reversed }: PointStates) => {
      const place = this.#places[point]!;
      for (let column = 0; column < readings.length; column += 1) {
        const reading = readingOf(readings[column]!, given, zero, reversed, azimuthDeg);
        result.columns[column]![place] = reading ?? NaN;
      }
    });
    this.#room.clear();
    result.addDone(count);
  }

  /** Values of the axis that has this role in the block; null when none has. */
  #valuesOf(role: AxisRole, block: Block): number[] | null {
    const { axis, second } = this.#input;
    if (this.#roles.first === role) return block.first.map((position) => axisValueAt(axis, position));
    if (second && this.#roles.second === role) {
      return block.second.map((position) => axisValueAt(second, position));
    }
    return null;
  }

  /** Index in the result of the point at these positions among the wavelengths, angles and thicknesses. */
  #placeOf({ family, first, second }: Block, w: number, a: number, t: number): number {
    const at = (role: AxisRole) =>
      role === 'wavelength' ? w : role === 'angle' ? a : role === 'thickness' ? t : 0;
    const rows = this.#input.second?.points ?? 1;
    const row = family * rows + second[at(this.#roles.second)]!;
    return row * this.#input.axis.points + first[at(this.#roles.first)]!;
  }

  #statesFor(block: Block, wavelengths: number[], angles: number[], thicknesses: number): States {
    const resolve = () => this.#resolve(block.document, alone(wavelengths), alone(angles));
    if (isGeneral(block.document)) return new GeneralStates(resolve(), this.#needs);
    const kept = this.#kept.get(block.key);
    if (kept) return kept;
    const resolved = resolve();
    const points = wavelengths.length * angles.length * thicknesses;
    const isFast = points >= FEWEST_FAST_POINTS && FastSolver.canSolve(resolved);
    const states = isFast
      ? new FastStates(resolved, this.#needs, this.#sweptLayer, points)
      : new SharpStates(resolved, this.#needs, this.#sweptLayer);
    if (this.#kept.size >= KEPT_SOLVERS) this.#kept.clear();
    this.#kept.set(block.key, states);
    return states;
  }

  #resolve(document: StackDocument, wavelengthNm: number | number[], angleDeg: number | number[]): SolveCase {
    return resolveCase(toSolveCase(document, wavelengthNm, angleDeg), this.#materials);
  }
}

function applied(document: StackDocument, axis: SweepAxis | undefined, position: number): StackDocument {
  return axis ? applyAxis(document, axis, axisValueAt(axis, position)) : document;
}

/** A list of one value as the value: a constant given for one wavelength then fits. */
function alone(values: number[]): number | number[] {
  return values.length === 1 ? values[0]! : values;
}
