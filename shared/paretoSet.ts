import type { ParetoFilm } from './optimiseDesign.ts';

/** What films of a Pareto set have beyond being in it. */
export type ParetoRole = 'best first' | 'compromise' | 'best second';

export const paretoRoleWords: Record<ParetoRole, string> = {
  'best first': 'best of the first goal',
  compromise: 'compromise',
  'best second': 'best of the second goal',
};

type Values = readonly Pick<ParetoFilm, 'first' | 'second'>[];

/**
 * The films of a set that have a name, by their place in it: both ends, and the one between that is nearest to both bests,
 * the difference from each best taken as a share of its range over the set (common practice, no source).
 *
 * @param pareto ordered by the first goal, as a result holds it
 */
export function paretoRoles(pareto: Values): Map<number, ParetoRole> {
  const last = pareto.length - 1;
  // A film that stands alone is the best of both goals: nothing has to be chosen.
  if (last < 1) return new Map();
  const roles = new Map<number, ParetoRole>([
    [0, 'best first'],
    [last, 'best second'],
  ]);
  const [begin, end] = [pareto[0]!, pareto[last]!];
  const distance = ({ first, second }: Values[number]) =>
    Math.hypot(
      (first - begin.first) / (end.first - begin.first),
      (second - end.second) / (begin.second - end.second),
    );
  const between = pareto.map((_, place) => place).slice(1, -1);
  if (between.length > 0) {
    const nearest = between.reduce((best, place) =>
      distance(pareto[place]!) < distance(pareto[best]!) ? place : best,
    );
    roles.set(nearest, 'compromise');
  }
  return roles;
}
