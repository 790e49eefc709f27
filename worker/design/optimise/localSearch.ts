import type { Bounds, EvaluateFilms, Film } from './film.ts';
import { isBetter } from './film.ts';

/** Sides of the first simplex as a share of the bounds, and of those of the later ones. */
const FIRST_SIDE = 0.02;
const LATER_SIDE = 0.002;
/** A simplex smaller than this is a point, nm: far below what any layer is known to. */
const POINT_NM = 1e-5;

export type LocalOptimum = { film: Film; isSettled: boolean };

/**
 * The best film near the given one in one goal: simplex search of J. A. Nelder and R. Mead, Comput. J. 7, 308 (1965), with
 * the factors of F. Gao and L. Han, Comput. Optim. Appl. 51, 259 (2012) for many variables. It compares films and
 * never calculates with their costs, so the feasibility rules hold here too. Thicknesses beyond a bound are set to it; a
 * simplex flattened by that is made good by starting anew until a new start brings nothing.
 *
 * @param onBetter called with each film that beats all before it
 */
export async function searchLocally(
  from: Film,
  goal: number,
  bounds: Bounds,
  most: number,
  evaluate: EvaluateFilms,
  onBetter: (film: Film) => void,
): Promise<LocalOptimum> {
  let best = from;
  let spent = 0;
  const solve = async (nm: number[][]): Promise<Film[]> => {
    const clipped = nm.map((list) =>
      list.map((one, i) => Math.min(bounds[i]!.toNm, Math.max(bounds[i]!.fromNm, one))),
    );
    const films = await evaluate(clipped);
    spent += films.length;
    for (const film of films) {
      if (!isBetter(film, best, goal)) continue;
      best = film;
      onBetter(film);
    }
    return films;
  };
  for (let share = FIRST_SIDE; ; share = LATER_SIDE) {
    const start = best;
    const isPoint = await contract(
      start,
      goal,
      bounds,
      share,
      () => spent + bounds.length + 2 <= most,
      solve,
    );
    if (!isPoint) return { film: best, isSettled: false };
    if (distanceNm(best, start) <= 10 * POINT_NM) return { film: best, isSettled: true };
  }
}

/** One simplex from its first size down to a point; false when there is no leave to go on before. */
async function contract(
  start: Film,
  goal: number,
  bounds: Bounds,
  share: number,
  mayGoOn: () => boolean,
  solve: EvaluateFilms,
): Promise<boolean> {
  const size = bounds.length;
  // Gao and Han's factors; for two variables those of Nelder and Mead, and for one, where theirs would shrink to nothing.
  const many = Math.max(2, size);
  const [expand, narrow, shrink] = [1 + 2 / many, 0.75 - 1 / (2 * many), 1 - 1 / many];
  const corners = bounds.map(({ fromNm, toNm }, i) => {
    const side = share * (toNm - fromNm);
    return start.nm.map((one, j) => (i !== j ? one : one + side <= toNm ? one + side : one - side));
  });
  const order = (a: Film, b: Film) => (isBetter(a, b, goal) ? -1 : isBetter(b, a, goal) ? 1 : 0);
  let simplex = [start, ...(await solve(corners))].sort(order);
  while (mayGoOn()) {
    const [first, worst] = [simplex[0]!, simplex[size]!];
    if (simplex.every((film) => distanceNm(film, first) <= POINT_NM)) return true;
    const centre = first.nm.map((_, i) => {
      const sum = simplex.slice(0, size).reduce((total, { nm }) => total + nm[i]!, 0);
      return sum / size;
    });
    const solveAt = async (factor: number) => {
      const [film] = await solve([centre.map((c, i) => c + factor * (c - worst.nm[i]!))]);
      return film!;
    };
    const reflected = await solveAt(1);
    let replacement: Film | null = null;
    if (isBetter(reflected, first, goal)) {
      const expanded = await solveAt(expand);
      replacement = isBetter(expanded, reflected, goal) ? expanded : reflected;
    } else if (isBetter(reflected, simplex[size - 1]!, goal)) {
      replacement = reflected;
    } else {
      const isOutside = isBetter(reflected, worst, goal);
      const contracted = await solveAt(isOutside ? narrow : -narrow);
      if (!isBetter(isOutside ? reflected : worst, contracted, goal)) replacement = contracted;
    }
    if (replacement) {
      simplex = [...simplex.slice(0, size), replacement].sort(order);
    } else {
      const nearer = simplex.slice(1).map(({ nm }) => nm.map((one, i) => towards(first.nm[i]!, one, shrink)));
      simplex = [first, ...(await solve(nearer))].sort(order);
    }
  }
  return false;
}

function towards(goal: number, from: number, share: number): number {
  return goal + share * (from - goal);
}

/** The greatest difference of a thickness. */
function distanceNm(film: Film, other: Film): number {
  return Math.max(...film.nm.map((one, i) => Math.abs(one - other.nm[i]!)));
}
