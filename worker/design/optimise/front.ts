import type { Film } from './film.ts';

/** At least as good in both goals and better in one; films that may be considered come first (Deb 2002, sec. VI). */
function dominates(film: Film, other: Film): boolean {
  if (film.violation !== other.violation) return film.violation < other.violation;
  if (film.violation > 0) return false;
  const [a, b] = film.costs as [number, number];
  const [c, d] = other.costs as [number, number];
  return a <= c && b <= d && (a < c || b < d);
}

/**
 * The best `count` films for two goals: whole fronts in order, of the last one the films with the most room around them.
 * K. Deb, A. Pratap, S. Agarwal and T. Meyarivan, IEEE Trans. Evol. Comput. 6, 182 (2002).
 */
export function selectByFronts(films: readonly Film[], count: number): Film[] {
  const chosen: Film[] = [];
  for (const front of frontsOf(films)) {
    const left = count - chosen.length;
    if (front.length <= left) {
      chosen.push(...front);
    } else {
      const room = roomAround(front);
      const order = front.map((_, i) => i).sort((a, b) => room[b]! - room[a]! || a - b);
      chosen.push(...order.slice(0, left).map((i) => front[i]!));
    }
    if (chosen.length === count) break;
  }
  return chosen;
}

/** Films that no other beats, each after those that it loses to. */
function frontsOf(films: readonly Film[]): Film[][] {
  const beatenBy = films.map(() => 0);
  const beats: number[][] = films.map(() => []);
  films.forEach((film, i) => {
    films.forEach((other, j) => {
      if (i === j || !dominates(film, other)) return;
      beats[i]!.push(j);
      beatenBy[j]! += 1;
    });
  });
  const fronts: Film[][] = [];
  let front = films.flatMap((_, i) => (beatenBy[i] === 0 ? [i] : []));
  while (front.length > 0) {
    fronts.push(front.map((i) => films[i]!));
    const next: number[] = [];
    for (const j of front.flatMap((i) => beats[i]!)) {
      beatenBy[j]! -= 1;
      if (beatenBy[j] === 0) next.push(j);
    }
    front = next;
  }
  return fronts;
}

/** Crowding distance: the sides of the box between a film's neighbours in the front; infinite at its ends. */
function roomAround(front: readonly Film[]): number[] {
  const room = front.map(() => 0);
  for (const goal of [0, 1]) {
    const cost = (i: number) => front[i]!.costs[goal]!;
    const order = front.map((_, i) => i).sort((a, b) => cost(a) - cost(b) || a - b);
    const [first, last] = [order[0]!, order.at(-1)!];
    const range = cost(last) - cost(first);
    order.forEach((i, place) => {
      if (i === first || i === last) room[i] = Infinity;
      else if (range > 0) room[i]! += (cost(order[place + 1]!) - cost(order[place - 1]!)) / range;
    });
  }
  return room;
}

/** The films that may be considered and that none beats, each once, from the best in the first goal on. */
export function paretoFront(films: readonly Film[]): Film[] {
  const order = films
    .filter(({ violation }) => violation === 0)
    .sort((a, b) => a.costs[0]! - b.costs[0]! || a.costs[1]! - b.costs[1]!);
  let least = Infinity;
  return order.filter(({ costs }) => {
    const isFirst = costs[1]! < least;
    if (isFirst) least = costs[1]!;
    return isFirst;
  });
}
