import { readingOf } from '../../shared/readings.ts';
import type { SolveCase } from '../../shared/solve.ts';
import { findLayerPath, toSolveCase } from '../../shared/stackCase.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { resolveCase } from '../dispersion/resolveCase.ts';
import type { ResolvableMaterial } from '../dispersion/resolveCase.ts';
import { axisValueAt, axisValues } from './axisValues.ts';
import { GeneralStates, SharpStates } from './chunkStates.ts';
import type { PointPlace } from './chunkStates.ts';
import { isGeneral } from './generalStack.ts';
import { statesNeeded } from './magnetizationStates.ts';
import type { StatesNeeded } from './magnetizationStates.ts';
import type { Chunk } from './planChunks.ts';
import type { SharedResult } from './sharedResult.ts';
import { materialKey } from './sweepInput.ts';
import type { SweepInput } from './sweepInput.ts';
import { withThickness } from './withThickness.ts';

/** One sweep as one thread solves it: any chunk of it, into the shared columns. */
export class SweepSolver {
  readonly #input: SweepInput;
  readonly #needed: StatesNeeded;
  readonly #materials: Map<string, ResolvableMaterial>;
  readonly #sweptLayer: number[] | null;
  /** Compiled once where the wavelength does not change. */
  #atOneWavelength: SharpStates | null = null;

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
    const { axis, readings } = this.#input;
    const states = this.#statesFor(chunk);
    for (let offset = 0; offset < chunk.count; offset += 1) {
      if (result.cancelled) return;
      const index = chunk.start + offset;
      const value = axisValueAt(axis, index);
      const { given, zero, reversed } = states.solve(this.#placeOf(offset, value));
      result.columns[0]![index] = value;
      for (let column = 0; column < readings.length; column += 1) {
        const reading = readingOf(readings[column]!, given, zero, reversed);
        result.columns[1 + column]![index] = reading ?? NaN;
      }
      result.addDone(1);
    }
  }

  readonly #place: PointPlace = { wavelengthIndex: 0, angleDeg: 0, thicknessNm: null };

  #placeOf(offset: number, value: number): PointPlace {
    const { axis, document } = this.#input;
    this.#place.wavelengthIndex = axis.kind === 'wavelength' ? offset : 0;
    this.#place.angleDeg = axis.kind === 'angle' ? value : document.workingPoint.angleDeg;
    this.#place.thicknessNm = axis.kind === 'thickness' ? value : null;
    return this.#place;
  }

  #statesFor(chunk: Chunk): SharpStates | GeneralStates {
    const { axis, document } = this.#input;
    const { wavelengthNm, angleDeg } = document.workingPoint;
    if (isGeneral(document)) return new GeneralStates(() => this.#casesOf(chunk), this.#needed);
    if (axis.kind === 'wavelength') {
      const wavelengths = axisValues(axis, chunk.start, chunk.count);
      return new SharpStates(this.#resolve(document, wavelengths, angleDeg), this.#needed, null);
    }
    this.#atOneWavelength ??= new SharpStates(
      this.#resolve(document, wavelengthNm, angleDeg),
      this.#needed,
      this.#sweptLayer,
    );
    return this.#atOneWavelength;
  }

  *#casesOf(chunk: Chunk): Generator<SolveCase, void> {
    const { axis, document } = this.#input;
    const { wavelengthNm, angleDeg } = document.workingPoint;
    const values = axisValues(axis, chunk.start, chunk.count);
    switch (axis.kind) {
      case 'wavelength':
        yield this.#resolve(document, values, angleDeg);
        return;
      case 'angle':
        yield this.#resolve(document, wavelengthNm, values);
        return;
      case 'thickness':
        for (const value of values) {
          yield this.#resolve(withThickness(document, axis.layerId, value), wavelengthNm, angleDeg);
        }
    }
  }

  #resolve(document: StackDocument, wavelengthNm: number | number[], angleDeg: number | number[]): SolveCase {
    return resolveCase(toSolveCase(document, wavelengthNm, angleDeg), this.#materials);
  }
}
