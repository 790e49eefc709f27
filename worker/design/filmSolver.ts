import type { PointReadings } from '../../shared/designPoint.ts';
import { readingOf } from '../../shared/readings.ts';
import type { ReadingName } from '../../shared/run.ts';
import type { StackDocument, StackItem } from '../../shared/stack.ts';
import { findLayerPath, toSolveCase } from '../../shared/stackCase.ts';
import type { ResolvableMaterial } from '../dispersion/resolveCase.ts';
import { resolveCase } from '../dispersion/resolveCase.ts';
import { FastSolver } from '../optics/fast/fastSolver.ts';
import type { AdjustableStates, Needs, PointStates, States } from '../sweep/chunkStates.ts';
import { GeneralStates, SharpStates } from '../sweep/chunkStates.ts';
import { FastStates } from '../sweep/fastStates.ts';
import { isGeneral, splitsLayers } from '../sweep/generalStack.ts';
import { statesNeeded } from '../sweep/magnetizationStates.ts';
import { BatchRoom } from '../sweep/pointBatch.ts';
import { partsNeeded } from '../sweep/solvedReadings.ts';
import type { ConstantFactors } from './frozenFilm.ts';
import { freezeDocument, scaleConstants } from './frozenFilm.ts';
import { leastThicknesses } from './leastThicknesses.ts';

/** Which readings are needed beside rotation, ellipticity, amplitude and reflectance; each costs time. */
export type Wanted = { contrast: boolean; ceiling: boolean };

/** How a film differs from the one that was given. */
export type FilmChange = {
  /** nm, by layer id; the others are as given. Less than what has become of a layer's parts counts as that. */
  thicknessNm: ReadonlyMap<string, number>;
  /** By `materialKeyOf`; null leaves all constants as given. */
  constants: ReadonlyMap<string, ConstantFactors> | null;
};

export const UNCHANGED: FilmChange = { thicknessNm: new Map(), constants: null };

/** One layer through several thicknesses. */
export type SweptLayer = { layerId: string; nm: readonly number[] };

/** Curves at least this long are worth the fast path. */
const FEWEST_FAST_POINTS = 12;

type Compiled = { states: AdjustableStates; capacity: number };

/**
 * One film at one working point, solved over and over with other thicknesses and constants: what tolerance, cap chooser
 * and optimisation are made of. Sharp coherent films are compiled once and only their thicknesses change; films with
 * averages, slabs, graded interfaces, oxides or dead parts are built anew each time.
 */
export class FilmSolver {
  readonly #frozen: StackDocument;
  readonly #names: ReadingNames;
  readonly #needs: Needs;
  readonly #adjustable: boolean;
  readonly #nominal = new Map<string, number>();
  readonly #least: ReadonlyMap<string, number>;
  readonly #paths = new Map<string, number[]>();
  readonly #compiled = new Map<string, Compiled>();

  /**
   * @param document its working point is the one that counts
   * @param materials by `${id}@${version}`
   * @throws ResolutionError when a material is not known at the working point
   */
  constructor(document: StackDocument, materials: ReadonlyMap<string, ResolvableMaterial>, wanted: Wanted) {
    this.#frozen = freezeDocument(document, materials);
    this.#names = readingNamesOf(this.#frozen, wanted);
    const names = Object.values(this.#names).filter((name) => name !== null);
    this.#needs = {
      states: statesNeeded({ document: this.#frozen, axis: NO_AXIS }, names),
      parts: partsNeeded(names),
    };
    this.#adjustable = !isGeneral(this.#frozen) && !splitsLayers(this.#frozen);
    this.#least = leastThicknesses(this.#frozen);
    const visit = (items: StackItem[]): void => {
      for (const item of items) {
        if ('layers' in item) {
          visit(item.layers);
          continue;
        }
        this.#nominal.set(item.id, item.thicknessNm);
        this.#paths.set(item.id, findLayerPath(this.#frozen.layers, item.id)!);
      }
    };
    visit(this.#frozen.layers);
  }

  readings(change: FilmChange): PointReadings {
    return this.curve(change, null)[0]!;
  }

  /**
   * Readings at each thickness of one layer, or at the film's own.
   *
   * @throws RangeError when a layer that is named does not exist
   */
  curve(change: FilmChange, swept: SweptLayer | null): PointReadings[] {
    for (const id of [...change.thicknessNm.keys(), ...(swept ? [swept.layerId] : [])]) {
      if (!this.#nominal.has(id)) throw new RangeError(`the film has no layer ${id}`);
    }
    return this.#adjustable && change.constants === null
      ? this.#adjusted(change, swept)
      : this.#rebuilt(change, swept);
  }

  #adjusted(change: FilmChange, swept: SweptLayer | null): PointReadings[] {
    const { states } = this.#compile(swept);
    for (const [id, nominal] of this.#nominal) {
      states.setThickness(this.#paths.get(id)!, Math.max(0, change.thicknessNm.get(id) ?? nominal));
    }
    return this.#solve(states, swept);
  }

  #compile(swept: SweptLayer | null): Compiled {
    const points = swept?.nm.length ?? 1;
    const key = swept?.layerId ?? '';
    const known = this.#compiled.get(key);
    if (known && known.capacity >= points) return known;
    const compiled = { states: this.#statesOf(this.#frozen, swept, points), capacity: points };
    this.#compiled.set(key, compiled);
    return compiled;
  }

  /** With other constants the media change, so the film is compiled once more; the curve is still one batch. */
  #rebuilt(change: FilmChange, swept: SweptLayer | null): PointReadings[] {
    const document = withThicknesses(
      change.constants ? scaleConstants(this.#frozen, change.constants) : this.#frozen,
      change.thicknessNm,
      this.#least,
    );
    if (this.#adjustable) {
      return this.#solve(this.#statesOf(document, swept, swept?.nm.length ?? 1), swept);
    }
    return (swept?.nm ?? [null]).flatMap((nm) => {
      const one =
        nm === null ? document : withThicknesses(document, new Map([[swept!.layerId, nm]]), this.#least);
      return this.#solve(this.#generalStatesOf(one), null);
    });
  }

  #statesOf(document: StackDocument, swept: SweptLayer | null, points: number): AdjustableStates {
    const resolved = resolvedAtPoint(document);
    const path = swept ? this.#paths.get(swept.layerId)! : null;
    return points >= FEWEST_FAST_POINTS && FastSolver.canSolve(resolved)
      ? new FastStates(resolved, this.#needs, path, points)
      : new SharpStates(resolved, this.#needs, path);
  }

  #generalStatesOf(document: StackDocument): States {
    const resolved = resolvedAtPoint(document);
    return isGeneral(document)
      ? new GeneralStates(resolved, this.#needs)
      : new SharpStates(resolved, this.#needs, null);
  }

  #solve(states: States, swept: SweptLayer | null): PointReadings[] {
    const { angleDeg } = this.#frozen.workingPoint;
    const thicknesses = swept?.nm ?? [0];
    const room = new BatchRoom(states.batchPoints);
    const found: PointReadings[] = [];
    const flush = () => {
      states.solve(room.batch(swept !== null), (_point, point) => found.push(this.#read(point)));
      room.clear();
    };
    for (const nm of thicknesses) {
      room.add(0, angleDeg, Math.max(0, nm));
      if (room.count >= states.batchPoints) flush();
    }
    if (room.count > 0) flush();
    return found;
  }

  #read({ given, zero, reversed }: PointStates): PointReadings {
    const read = (name: ReadingName | null) =>
      name === null ? null : readingOf(name, given, zero, reversed);
    const names = this.#names;
    return {
      rotationDeg: read(names.rotation),
      ellipticityDeg: read(names.ellipticity),
      amplitude: read(names.amplitude),
      contrast: read(names.contrast),
      reflectance: read(names.reflectance) ?? 0,
      ceilingShare: read(names.ceiling),
    };
  }
}

type ReadingNames = Record<
  'rotation' | 'ellipticity' | 'amplitude' | 'contrast' | 'reflectance' | 'ceiling',
  ReadingName | null
>;

function readingNamesOf({ workingPoint }: StackDocument, wanted: Wanted): ReadingNames {
  const isP = workingPoint.input === 'p';
  return {
    rotation: isP ? 'rotationP' : 'rotationS',
    ellipticity: isP ? 'ellipticityP' : 'ellipticityS',
    amplitude: isP ? 'crossSp' : 'crossPs',
    contrast: wanted.contrast ? (isP ? 'contrastP' : 'contrastS') : null,
    reflectance: isP ? 'reflectanceP' : 'reflectanceS',
    ceiling: wanted.ceiling ? 'ceilingShare' : null,
  };
}

/** What `statesNeeded` looks at is the film; a single point has no axis worth the name. */
const NO_AXIS = { kind: 'angle', from: 0, to: 0, points: 1, spacing: 'linear' } as const;

function resolvedAtPoint(document: StackDocument) {
  const { wavelengthNm, angleDeg } = document.workingPoint;
  return resolveCase(toSolveCase(document, wavelengthNm, angleDeg), new Map());
}

function withThicknesses(
  document: StackDocument,
  nm: ReadonlyMap<string, number>,
  least: ReadonlyMap<string, number>,
): StackDocument {
  if (nm.size === 0) return document;
  const change = (item: StackItem): StackItem => {
    if ('layers' in item) return { ...item, layers: item.layers.map(change) };
    const thickness = nm.get(item.id);
    return thickness === undefined
      ? item
      : { ...item, thicknessNm: Math.max(thickness, least.get(item.id) ?? 0) };
  };
  return { ...document, layers: document.layers.map(change) };
}
