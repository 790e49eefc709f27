import { readingOf } from '../../shared/readings.ts';
import type { ReadingName } from '../../shared/run.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { toSolveCase } from '../../shared/stackCase.ts';
import type { ResolvableMaterial } from '../dispersion/resolveCase.ts';
import { resolveCase } from '../dispersion/resolveCase.ts';
import type { Needs, PointStates, States } from '../sweep/chunkStates.ts';
import { GeneralStates, SharpStates } from '../sweep/chunkStates.ts';
import { isGeneral } from '../sweep/generalStack.ts';
import { statesNeeded } from '../sweep/magnetizationStates.ts';
import { BatchRoom } from '../sweep/pointBatch.ts';
import { partsNeeded } from '../sweep/solvedReadings.ts';

/** What the axis of a sweep would be: the film itself decides which states are needed. */
const ANGLES = { kind: 'angle', from: 0, to: 89, points: 1, spacing: 'linear' } as const;

/** The readings of one film at any angle of incidence, one at a time. */
export class AngleReadings<Name extends ReadingName> {
  readonly #document: StackDocument;
  readonly #materials: ReadonlyMap<string, ResolvableMaterial>;
  readonly #names: readonly Name[];
  readonly #needs: Needs;
  readonly #sharp: States | null;
  readonly #room = new BatchRoom(1);

  /** @throws ResolutionError when a material is not known at the wavelength of the working point */
  constructor(
    document: StackDocument,
    materials: ReadonlyMap<string, ResolvableMaterial>,
    names: readonly Name[],
  ) {
    this.#document = document;
    this.#materials = materials;
    this.#names = names;
    this.#needs = {
      states: statesNeeded({ document, axis: ANGLES }, [...names]),
      parts: partsNeeded(names),
    };
    this.#sharp = isGeneral(document) ? null : new SharpStates(this.#resolved(0), this.#needs, null);
  }

  /** Whether each angle is an average or a sum of many solves. */
  get isSlow(): boolean {
    return this.#sharp === null;
  }

  /** NaN where a reading does not exist. */
  at(angleDeg: number): Record<Name, number> {
    const states = this.#sharp ?? new GeneralStates(this.#resolved(angleDeg), this.#needs);
    this.#room.clear();
    this.#room.add(0, angleDeg, 0);
    const found: { point?: Record<Name, number> } = {};
    states.solve(this.#room.batch(false), (_point, solved) => (found.point = this.#read(solved)));
    return found.point!;
  }

  #read({ given, zero, reversed }: PointStates): Record<Name, number> {
    const values = this.#names.map((name) => [name, readingOf(name, given, zero, reversed) ?? NaN] as const);
    // One value for every name.
    return Object.fromEntries(values) as Record<Name, number>;
  }

  #resolved(angleDeg: number) {
    const { wavelengthNm } = this.#document.workingPoint;
    return resolveCase(toSolveCase(this.#document, wavelengthNm, angleDeg), this.#materials);
  }
}
