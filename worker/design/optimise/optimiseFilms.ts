import type { PointReadings } from '../../../shared/designPoint.ts';
import type { Goal, OptimiseDesign } from '../../../shared/optimiseDesign.ts';
import { foldDegrees } from '../../../shared/units.ts';
import type { ResolvableMaterial } from '../../dispersion/resolveCase.ts';
import { materialKey } from '../../sweep/sweepInput.ts';
import { drawnLayers } from '../expandBlocks.ts';
import type { FilmChange } from '../filmSolver.ts';
import { FilmSolver } from '../filmSolver.ts';
import { leastThicknesses } from '../leastThicknesses.ts';
import type { Film } from './film.ts';
import { costSign } from './film.ts';
import { repaired } from './repaired.ts';

/** Half the step of the difference that gives a slope, nm: far below any structure, far above rounding. */
const SLOPE_STEP_NM = 0.001;

/** The films of one optimisation as one thread solves them. */
export class OptimiseFilms {
  readonly #design: OptimiseDesign;
  readonly #goals: Goal[];
  readonly #materials: ReadonlyMap<string, ResolvableMaterial>;
  /** By working point, with what the goals need only. */
  readonly #solvers: FilmSolver[];
  readonly #least: ReadonlyMap<string, number>;
  /** ... and with every reading, made when the first film is read. */
  #readers: FilmSolver[] | null = null;

  /** @throws ResolutionError when a material is not known at a working point */
  constructor(design: OptimiseDesign, materials: readonly ResolvableMaterial[]) {
    this.#design = design;
    this.#goals = design.second ? [design.goal, design.second] : [design.goal];
    this.#materials = new Map(materials.map((material) => [materialKey(material), material]));
    this.#least = leastThicknesses(design.document);
    const contrast = this.#goals.some(({ quantity }) => quantity === 'contrast');
    this.#solvers = this.#solversWith({ contrast, ceiling: false });
  }

  /**
   * One film at all working points; of a goal the worst point counts. The violation is the reflectance that the film
   * lacks, summed over goals and points; a reading that does not exist counts 1, as much as a reflectance can lack.
   *
   * @param nm thicknesses in the order of the variables
   */
  evaluate(nm: number[]): Film {
    const change = this.#changeTo(nm);
    const costs = this.#goals.map(() => -Infinity);
    let violation = 0;
    for (const solver of this.#solvers) {
      const readings = solver.readings(change);
      this.#goals.forEach((goal, position) => {
        const value = this.#value(goal, readings, solver, change);
        violation += value === null ? 1 : Math.max(0, (goal.leastReflectance ?? 0) - readings.reflectance);
        // NaN spreads: a goal without a value at one point has none at all.
        costs[position] = Math.max(costs[position]!, value === null ? NaN : costSign(goal.quantity) * value);
      });
    }
    return { nm, violation, costs };
  }

  /** A film, or where it lacks reflectance the nearest that does not, as far as one can be found. */
  trial(nm: number[]): Film {
    const film = this.evaluate(nm);
    return film.violation > 0 ? repaired(film, this.#design.variables, (one) => this.evaluate(one)) : film;
  }

  /** Every reading of one film, by working point. */
  readings(nm: readonly number[]): PointReadings[] {
    const change = this.#changeTo(nm);
    this.#readers ??= this.#solversWith({ contrast: true, ceiling: true });
    return this.#readers.map((solver) => solver.readings(change));
  }

  #solversWith(wanted: { contrast: boolean; ceiling: boolean }): FilmSolver[] {
    const { document, points } = this.#design;
    return points.map(
      ({ workingPoint }) => new FilmSolver({ ...document, workingPoint }, this.#materials, wanted),
    );
  }

  #changeTo(nm: readonly number[]): FilmChange {
    const { variables } = this.#design;
    return { thicknessNm: new Map(variables.map(({ layerId }, i) => [layerId, nm[i]!])), constants: null };
  }

  #value(goal: Goal, readings: PointReadings, solver: FilmSolver, change: FilmChange): number | null {
    const { rotationDeg, ellipticityDeg, amplitude, contrast, reflectance } = readings;
    switch (goal.quantity) {
      case 'rotation':
        return sizeOf(rotationDeg);
      case 'ellipticity':
      case 'zero ellipticity':
        return sizeOf(ellipticityDeg);
      case 'amplitude':
        return sizeOf(amplitude);
      case 'contrast':
        return sizeOf(contrast);
      case 'least reflectance':
        return reflectance;
      case 'insensitivity':
        return this.#relativeSlope(goal.layerId!, rotationDeg, solver, change);
    }
  }

  /** |d rotation / d thickness| / |rotation| by a central difference, 1/nm; null where nothing turns. */
  #relativeSlope(
    layerId: string,
    rotationDeg: number | null,
    solver: FilmSolver,
    change: FilmChange,
  ): number | null {
    if (rotationDeg === null || rotationDeg === 0) return null;
    const layer = drawnLayers(this.#design.document.layers).find(({ id }) => id === layerId)!;
    const here = change.thicknessNm.get(layerId) ?? layer.thicknessNm;
    const below = Math.max(this.#least.get(layerId) ?? 0, here - SLOPE_STEP_NM);
    const above = here + SLOPE_STEP_NM;
    const [low, high] = solver.curve(change, { layerId, nm: [below, above] });
    if (low!.rotationDeg === null || high!.rotationDeg === null) return null;
    const turned = foldDegrees(high!.rotationDeg - low!.rotationDeg);
    return Math.abs(turned / (above - below) / rotationDeg);
  }
}

function sizeOf(value: number | null): number | null {
  return value === null ? null : Math.abs(value);
}
