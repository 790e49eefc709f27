import type { OptimiseDesign, OptimiseResult } from '../../../shared/optimiseDesign.ts';
import { layersAtBounds } from '../../../shared/atBounds.ts';
import { optimiseTotal } from './effort.ts';
import type { Film } from './film.ts';
import { bestOf, isBetter, valueOf } from './film.ts';
import { paretoFront } from './front.ts';

type Phase = OptimiseResult['path'][number]['phase'];
type FilmPoints = OptimiseResult['best']['points'];

/** A path has about this many entries at the most; of a crowd the last one stays. */
const PATH_ENTRIES = 400;

/** The course of a search, and what its result is at any time. */
export class BestSoFar {
  readonly #design: OptimiseDesign;
  readonly #start: Film;
  /** Films between entries of the path. */
  readonly #leastGap: number;
  readonly #path: OptimiseResult['path'] = [];
  #best: Film | null = null;
  /** Films solved. */
  evaluations = 0;
  /** Among which the front for two goals is. */
  films: readonly Film[] = [];

  /** @param start the film as drawn, which need not be within the bounds */
  constructor(design: OptimiseDesign, start: Film) {
    this.#design = design;
    this.#start = start;
    this.#leastGap = optimiseTotal(design) / PATH_ENTRIES;
  }

  /** Adds a film to the path when it beats all before it in the first goal. */
  offer(film: Film, phase: Phase): void {
    if (this.#best && !isBetter(film, this.#best, 0)) return;
    this.#best = film;
    this.#enter(film, phase);
  }

  /** The path goes on to the end of a phase even where nothing better came. */
  endPhase(phase: Phase): void {
    if (this.#best && this.#path.at(-1)?.evaluations !== this.evaluations) this.#enter(this.#best, phase);
  }

  #enter(film: Film, phase: Phase): void {
    const value = valueOf(this.#design.goal, film, 0);
    const [before, last] = this.#path.slice(-2);
    const isCrowded =
      last?.phase === phase &&
      before?.phase === phase &&
      last.evaluations - before.evaluations < this.#leastGap;
    if (isCrowded) this.#path.pop();
    this.#path.push({ phase, evaluations: this.evaluations, value, thicknessesNm: film.nm });
  }

  /** The films that a result shows: the front of two goals, else the best film. */
  shown(): Film[] {
    const front = this.#design.second ? this.#front() : [];
    return front.length > 0 ? front : [bestOf(this.#all(), 0)];
  }

  #front(): Film[] {
    return paretoFront(this.#all());
  }

  /** In a local search the best film is not among the others yet. */
  #all(): readonly Film[] {
    return this.#best ? [...this.films, this.#best] : this.films;
  }

  /** @param points the readings of the films that are shown, as far as they are known */
  result(ended: OptimiseResult['ended'], points: ReadonlyMap<Film, FilmPoints>): OptimiseResult {
    const { goal, second, variables, seed } = this.#design;
    const best = this.shown()[0]!;
    return {
      kind: 'optimise',
      layerIds: variables.map(({ layerId }) => layerId),
      start: { thicknessesNm: this.#start.nm, value: valueOf(goal, this.#start, 0) },
      best: {
        thicknessesNm: best.nm,
        value: valueOf(goal, best, 0),
        points: points.get(best) ?? [],
        atBounds: layersAtBounds(variables, best.nm),
      },
      path: [...this.#path],
      evaluations: this.evaluations,
      ended,
      pareto: second
        ? this.#front().map((film) => {
            const found = points.get(film);
            return {
              thicknessesNm: film.nm,
              first: valueOf(goal, film, 0)!,
              second: valueOf(second, film, 1)!,
              ...(found ? { points: found } : {}),
            };
          })
        : null,
      seed,
    };
  }

  /** What there is to show before the end; readings come with the result. */
  soFar(): OptimiseResult | null {
    return this.#best && this.result('unfinished', new Map());
  }
}
