import type { OptimiseDesign, OptimiseResult } from '../../../shared/optimiseDesign.ts';
import { optimiseTotal } from './effort.ts';
import type { Film } from './film.ts';
import { isBetter, valueOf } from './film.ts';
import { paretoFront } from './front.ts';

type Phase = OptimiseResult['path'][number]['phase'];

/** A path has about this many entries at the most; of a crowd the last one stays. */
const PATH_ENTRIES = 400;
/** A thickness this near to a bound is at it, nm. */
const AT_BOUND_NM = 1e-3;

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

  result(
    ended: OptimiseResult['ended'],
    best: Film,
    points: OptimiseResult['best']['points'],
  ): OptimiseResult {
    const { goal, second, variables, seed } = this.#design;
    const pareto = second
      ? paretoFront(this.films).map((film) => ({
          thicknessesNm: film.nm,
          first: valueOf(goal, film, 0)!,
          second: valueOf(second, film, 1)!,
        }))
      : null;
    return {
      kind: 'optimise',
      layerIds: variables.map(({ layerId }) => layerId),
      start: { thicknessesNm: this.#start.nm, value: valueOf(goal, this.#start, 0) },
      best: {
        thicknessesNm: best.nm,
        value: valueOf(goal, best, 0),
        points,
        atBounds: variables
          .filter(({ fromNm, toNm }, i) => Math.min(best.nm[i]! - fromNm, toNm - best.nm[i]!) <= AT_BOUND_NM)
          .map(({ layerId }) => layerId),
      },
      path: [...this.#path],
      evaluations: this.evaluations,
      ended,
      pareto,
      seed,
    };
  }

  /** What there is to show before the end; the readings of the best film come with the result. */
  soFar(): OptimiseResult | null {
    return this.#best && this.result('budget', this.#best, []);
  }
}
