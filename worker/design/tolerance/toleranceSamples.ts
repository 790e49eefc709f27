import type { PointReadings } from '../../../shared/designPoint.ts';
import type { ToleranceDesign } from '../../../shared/toleranceDesign.ts';
import type { ResolvableMaterial } from '../../dispersion/resolveCase.ts';
import { materialKey } from '../../sweep/sweepInput.ts';
import { asksContrast } from '../demands.ts';
import { expandBlocks } from '../expandBlocks.ts';
import { FilmErrors } from '../filmErrors.ts';
import { FilmSolver } from '../filmSolver.ts';
import { mediaBeside } from '../mediaBeside.ts';

/** What is kept of each sample, in the order of the buffer. */
export const keptReadings = [
  'rotationDeg',
  'ellipticityDeg',
  'amplitude',
  'contrast',
  'reflectance',
] as const;

/**
 * All samples in one shared buffer of Float64, filled by all threads: index
 * (point * keptReadings.length + reading) * samples + sample; NaN where a reading does not exist.
 */
export class ToleranceSamples {
  readonly buffer: SharedArrayBuffer;
  readonly #values: Float64Array<SharedArrayBuffer>;
  readonly #samples: number;

  constructor(design: ToleranceDesign, buffer?: SharedArrayBuffer) {
    this.#samples = design.tolerance.samples;
    const count = design.points.length * keptReadings.length * this.#samples;
    this.buffer = buffer ?? new SharedArrayBuffer(8 * count);
    this.#values = new Float64Array(this.buffer);
  }

  set(point: number, sample: number, readings: PointReadings): void {
    keptReadings.forEach((name, reading) => {
      this.#values[this.#start(point, reading) + sample] = readings[name] ?? NaN;
    });
  }

  /** One reading over all samples. */
  column(point: number, name: (typeof keptReadings)[number]): Float64Array {
    const start = this.#start(point, keptReadings.indexOf(name));
    return this.#values.subarray(start, start + this.#samples);
  }

  #start(point: number, reading: number): number {
    return (point * keptReadings.length + reading) * this.#samples;
  }
}

/** The film of a tolerance question, one drawn film after the other. */
export class ToleranceFilms {
  readonly #errors: FilmErrors;
  readonly #layers: { id: string; thicknessNm: number }[];
  readonly #solvers: FilmSolver[];

  constructor(
    { document, points, tolerance, demands, signal }: ToleranceDesign,
    materials: readonly ResolvableMaterial[],
  ) {
    const film = expandBlocks(document);
    this.#layers = film.layers.map(({ layer }) => layer);
    this.#errors = new FilmErrors(
      tolerance,
      film.layers.map(({ layer }) => layer),
      mediaBeside(document),
    );
    const known = new Map(materials.map((material) => [materialKey(material), material]));
    const wanted = { contrast: asksContrast(demands, signal), ceiling: false };
    this.#solvers = points.map(
      ({ workingPoint }) => new FilmSolver({ ...film.document, workingPoint }, known, wanted),
    );
  }

  /** Readings of one film at each working point. */
  solve(sample: number): PointReadings[] {
    const { thickness, constants } = this.#errors.draw(sample);
    const thicknessNm = new Map(
      this.#layers.map(({ id, thicknessNm: nm }) => [id, nm * (thickness.get(id) ?? 1)]),
    );
    return this.#solvers.map((solver) => solver.readings({ thicknessNm, constants }));
  }
}
