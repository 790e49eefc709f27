import type { Film } from './film.ts';
import { paretoFront } from './front.ts';

/** Films whose costs differ by no more than this share are as good as each other. */
const SAME = 1e-6;
/** The area that a front must gain within so many generations not to count as settled. */
const LEAST_GAIN = 2e-4;
const GENERATIONS_OF_GAIN = 30;

/** Says of generation after generation whether the search has settled. */
export type IsSettled = (films: readonly Film[]) => boolean;

/**
 * One goal: all films are equally good, by the cost of the best or, where that goes to 0, by what was usual in the first
 * generation.
 */
export function settlingOfCosts(): IsSettled {
  let usual: number | null = null;
  return (films) => {
    if (films.some(({ violation }) => violation > 0)) return false;
    const costs = films.map(({ costs: [cost] }) => cost!).sort((a, b) => a - b);
    usual ??= Math.abs(costs[costs.length >> 1]!);
    return costs.at(-1)! - costs[0]! <= SAME * Math.max(usual, Math.abs(costs[0]!));
  };
}

/** Two goals: the area that the front dominates (E. Zitzler and L. Thiele, 1999) hardly grows any more. */
export function settlingOfFront(): IsSettled {
  const fronts: Film[][] = [];
  return (films) => {
    const now = paretoFront(films);
    fronts.push(now);
    if (fronts.length <= GENERATIONS_OF_GAIN) return false;
    const before = fronts.shift()!;
    if (before.length === 0 || now.length === 0) return false;
    const both = [...before, ...now];
    const [worst, ranges] = [0, 1].reduce<[number[], number[]]>(
      ([most, spans], goal) => {
        const costs = both.map((film) => film.costs[goal]!);
        const [low, high] = [Math.min(...costs), Math.max(...costs)];
        const isOne = high - low <= SAME * Math.max(Math.abs(low), Math.abs(high));
        return [
          [...most, high],
          [...spans, isOne ? 0 : high - low],
        ];
      },
      [[], []],
    );
    if (ranges.every((range) => range === 0)) return true;
    const corner = worst.map((one, goal) => one + 0.1 * ranges[goal]!);
    const area = dominatedArea(now, corner);
    return area > 0 && area - dominatedArea(before, corner) <= LEAST_GAIN * area;
  };
}

/** @param front ordered by the first goal */
function dominatedArea(front: readonly Film[], corner: number[]): number {
  return front.reduce((area, { costs }, i) => {
    const until = i + 1 < front.length ? front[i + 1]!.costs[0]! : corner[0]!;
    return area + (until - costs[0]!) * (corner[1]! - costs[1]!);
  }, 0);
}
