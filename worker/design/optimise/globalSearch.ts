import type { RandomGenerator } from 'pure-rand/types/RandomGenerator';
import { scattered, trialsOf } from './evolution.ts';
import type { Bounds, EvaluateFilms, Film } from './film.ts';
import { isBetter } from './film.ts';
import { selectByFronts } from './front.ts';
import { settlingOfCosts, settlingOfFront } from './settling.ts';

export type GlobalSearch = {
  bounds: Bounds;
  population: number;
  generations: number;
  goals: 1 | 2;
  /** A film to begin with beside those drawn at random. */
  start: number[];
  random: RandomGenerator;
};

/**
 * Films that compete for generations until they have settled. With one goal each trial replaces its film unless it is
 * worse; with two the best of both generations stay.
 *
 * @param onGeneration called with all films, the first time with those to begin with
 * @returns the last generation, and the film begun with as it was solved
 */
export async function searchGlobally(
  { bounds, population, generations, goals, start, random }: GlobalSearch,
  evaluate: EvaluateFilms,
  onGeneration: (films: readonly Film[]) => void,
): Promise<{ films: Film[]; start: Film; isSettled: boolean }> {
  const isSettled = goals === 1 ? settlingOfCosts() : settlingOfFront();
  let films = await evaluate([start, ...scattered(bounds, population - 1, random)]);
  const first = films[0]!;
  onGeneration(films);
  for (let generation = 0; generation < generations; generation += 1) {
    if (isSettled(films)) return { films, start: first, isSettled: true };
    const trials = await evaluate(trialsOf(films, bounds, random));
    films =
      goals === 1
        ? films.map((film, i) => (isBetter(film, trials[i]!, 0) ? film : trials[i]!))
        : selectByFronts([...films, ...trials], population);
    onGeneration(films);
  }
  return { films, start: first, isSettled: isSettled(films) };
}
