import type { Goal } from '../../../shared/optimiseDesign.ts';

/** What one solve of a film at all working points says of it. */
export type Evaluation = {
  /** How far the film is from one that may be considered at all; 0 for those that may. */
  violation: number;
  /** Of each goal: the less the better. NaN where a reading does not exist. */
  costs: number[];
};

/** A film by the thicknesses of its variable layers, in the order of the variables. */
export type Film = Evaluation & { nm: number[] };

export type Bounds = readonly { fromNm: number; toNm: number }[];

/** Solves films, in the order of the thicknesses; one that lacks reflectance may come back thicker or thinner. */
export type EvaluateFilms = (nm: number[][]) => Promise<Film[]>;

/**
 * Whether a film is better in one goal: by the feasibility rules of K. Deb, Comput. Methods Appl. Mech. Eng. 186, 311
 * (2000). One that may be considered beats one that may not; among the latter the lesser violation counts, so no
 * weight has to be chosen between goal and violation.
 */
export function isBetter(film: Evaluation, other: Evaluation, goal: number): boolean {
  if (film.violation !== other.violation) return film.violation < other.violation;
  return film.violation === 0 && film.costs[goal]! < other.costs[goal]!;
}

/** The best in one goal; of equals the first. */
export function bestOf(films: readonly Film[], goal: number): Film {
  return films.reduce((best, film) => (isBetter(film, best, goal) ? film : best));
}

/** The value of a goal in the unit of its quantity; null for a film that may not be considered. */
export function valueOf({ quantity }: Goal, film: Evaluation, goal: number): number | null {
  return film.violation > 0 ? null : costSign(quantity) * film.costs[goal]!;
}

/** Costs are to become less; -1 for quantities that are to become greater. */
export function costSign(quantity: Goal['quantity']): 1 | -1 {
  switch (quantity) {
    case 'rotation':
    case 'ellipticity':
    case 'amplitude':
    case 'contrast':
      return -1;
    case 'zero ellipticity':
    case 'insensitivity':
    case 'least reflectance':
      return 1;
  }
}
