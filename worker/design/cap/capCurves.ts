import type { CapCandidate, CapDesign } from '../../../shared/capDesign.ts';
import type { DesignPoint, PointReadings } from '../../../shared/designPoint.ts';
import { foldDegrees } from '../../../shared/units.ts';
import { materialKey } from '../../sweep/sweepInput.ts';
import type { ResolvableMaterial } from '../../dispersion/resolveCase.ts';
import { asksContrast, failedDemands, isSeen, signalOf, signedSignalOf } from '../demands.ts';
import { FilmErrors } from '../filmErrors.ts';
import type { FilmChange } from '../filmSolver.ts';
import { FilmSolver, UNCHANGED } from '../filmSolver.ts';
import { leastThicknesses } from '../leastThicknesses.ts';
import { mediaBeside } from '../mediaBeside.ts';
import type { CandidateFilm } from './candidateFilm.ts';
import { bareFilm, candidateFilm, capLayerId } from './candidateFilm.ts';

/** Half the step of the difference that gives the slope, nm: far below any structure, far above rounding. */
const SLOPE_STEP_NM = 0.005;

/** The thicknesses of the curve, ends included, nm. */
export function capThicknesses({ range }: CapDesign): number[] {
  const { fromNm, toNm, points } = range;
  return Array.from({ length: points }, (_, i) => fromNm + ((toNm - fromNm) * i) / (points - 1));
}

/** One candidate on its film at every working point. */
export class CapCurves {
  readonly candidate: CapCandidate;
  readonly #design: CapDesign;
  readonly #film: CandidateFilm;
  readonly #errors: FilmErrors;
  /** With every reading, for the nominal curves. */
  readonly #full: FilmSolver[];
  /** With what the samples need only. */
  readonly #lean: FilmSolver[];

  constructor(design: CapDesign, candidateId: string, materials: readonly ResolvableMaterial[]) {
    const candidate = design.candidates.find(({ id }) => id === candidateId);
    if (!candidate) throw new RangeError(`there is no candidate ${candidateId}`);
    this.candidate = candidate;
    this.#design = design;
    this.#film = candidateFilm(design, candidate);
    this.#errors = new FilmErrors(design.tolerance, this.#film.drawn, mediaBeside(this.#film.document));
    const known = new Map(materials.map((material) => [materialKey(material), material]));
    const contrast = asksContrast(design.demands, design.signal);
    const solverOf = (ceiling: boolean) => (point: DesignPoint) =>
      new FilmSolver({ ...this.#film.document, workingPoint: point.workingPoint }, known, {
        contrast: contrast || (ceiling && isTransverse(point)),
        ceiling,
      });
    this.#full = design.points.map(solverOf(true));
    this.#lean = design.points.map(solverOf(false));
  }

  /** Readings at these thicknesses of the swept layer, by working point. */
  nominal(nm: readonly number[]): PointReadings[][] {
    return this.#full.map((solver) => solver.curve(UNCHANGED, { layerId: this.#film.sweptId, nm }));
  }

  /**
   * d |signal| / d thickness over |signal|, percent per nm, by working point: of the signed signal, since its size has a
   * kink where it changes sign.
   */
  slopes(nm: readonly number[], change: FilmChange = UNCHANGED): (number | null)[][] {
    const layerId = this.#film.sweptId;
    const { signal } = this.#design;
    const least = leastThicknesses(this.#film.document).get(layerId) ?? 0;
    return this.#lean.map((solver) => {
      const below = nm.map((one) => Math.max(least, one - SLOPE_STEP_NM));
      const above = nm.map((one) => Math.max(least, one) + SLOPE_STEP_NM);
      const signals = [below, nm, above].map((list) =>
        solver.curve(change, { layerId, nm: list }).map((one) => signedSignalOf(one, signal)),
      );
      return nm.map((_, i) => {
        const [low, here, high] = [signals[0]![i]!, signals[1]![i]!, signals[2]![i]!];
        if (low === null || !isSeen(here) || high === null) return null;
        const change = signal === 'rotation' ? foldDegrees(high - low) : high - low;
        return (100 * change) / (above[i]! - below[i]!) / here;
      });
    });
  }

  /**
   * One film as it might come out, at each nominal thickness of the curve.
   *
   * @param take called with the |signal| (NaN where there is none) for each working point and thickness, in order, and
   *   whether all demands are met there
   */
  sample(
    number: number,
    nm: readonly number[],
    take: (point: number, position: number, signal: number, isMet: boolean) => void,
  ): void {
    const { demands, signal } = this.#design;
    const { thickness, constants } = this.#errors.draw(number);
    const { sweptId, layers } = this.#film;
    const thicknessNm = new Map(
      layers.map(({ layer }) => [layer.id, layer.thicknessNm * (thickness.get(layer.id) ?? 1)]),
    );
    const factor = thickness.get(sweptId) ?? 1;
    const grown = nm.map((one) => Math.max(0, one * factor));
    const change = { thicknessNm, constants };
    const slopes = demands.mostSlopePercentPerNm === undefined ? null : this.slopes(grown, change);
    const isFixedThick = this.candidate.layers.every(
      ({ fixedNm, leastNm }, position) =>
        fixedNm === null || fixedNm * (thickness.get(capLayerId(position)) ?? 1) >= leastNm,
    );
    const leastNm = isFixedThick ? this.#sweptLeastNm : Infinity;
    this.#lean.forEach((solver, point) => {
      const curve = solver.curve(change, { layerId: sweptId, nm: grown });
      curve.forEach((readings, position) => {
        const isMet =
          grown[position]! >= leastNm &&
          failedDemands(readings, demands, slopes?.[point]?.[position] ?? null).length === 0;
        take(point, position, signalOf(readings, signal) ?? NaN, isMet);
      });
    });
  }

  get #sweptLeastNm(): number {
    return this.candidate.layers.find(({ fixedNm }) => fixedNm === null)!.leastNm;
  }

  /** Least thickness of the swept layer that protects; infinite where the layer that is not swept is too thin. */
  leastNm(): number {
    const { layers } = this.candidate;
    const isTooThin = layers.some(({ fixedNm, leastNm }) => fixedNm !== null && fixedNm < leastNm);
    return isTooThin ? Infinity : this.#sweptLeastNm;
  }

  /** Whether the nominal film of this thickness meets all demands; readings and slopes by working point. */
  isMet(nm: number, readings: PointReadings[], slopes: (number | null)[]): boolean {
    return (
      nm >= this.leastNm() &&
      readings.every((one, point) => failedDemands(one, this.#design.demands, slopes[point]).length === 0)
    );
  }
}

/** The film without any cap at each working point. */
export function bareReadings(
  design: CapDesign,
  materials: readonly ResolvableMaterial[],
): { pointId: string; readings: PointReadings; signal: number | null }[] {
  const known = new Map(materials.map((material) => [materialKey(material), material]));
  const document = bareFilm(design);
  return design.points.map((point) => {
    const wanted = {
      contrast: asksContrast(design.demands, design.signal) || isTransverse(point),
      ceiling: true,
    };
    const solver = new FilmSolver({ ...document, workingPoint: point.workingPoint }, known, wanted);
    const readings = solver.readings(UNCHANGED);
    return { pointId: point.id, readings, signal: signalOf(readings, design.signal) };
  });
}

/** A transverse m gives contrast in place of rotation, so it is worth a look. */
function isTransverse({ workingPoint: { magnetization } }: DesignPoint): boolean {
  return magnetization.mode === 'direction' && magnetization.m[1] !== 0;
}
