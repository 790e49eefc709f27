import { mersenne } from 'pure-rand/generator/mersenne';
import { describe, expect, test } from 'vitest';
import type { Bounds, EvaluateFilms, Film } from './film.ts';
import { bestOf, isBetter } from './film.ts';
import { paretoFront } from './front.ts';
import { searchGlobally } from './globalSearch.ts';
import { searchLocally } from './localSearch.ts';

type Costs = (x: number[]) => number[];

/** Films whose costs are known functions; x is in nm only by name. */
function evaluator(costs: Costs, violation: (x: number[]) => number = () => 0): EvaluateFilms {
  return (nm) => Promise.resolve(nm.map((x) => ({ nm: x, costs: costs(x), violation: violation(x) })));
}

const box = (from: number, to: number, size: number): Bounds =>
  Array.from({ length: size }, () => ({ fromNm: from, toNm: to }));

const global = (bounds: Bounds, goals: 1 | 2, population: number, generations: number) => ({
  bounds,
  goals,
  population,
  generations,
  start: bounds.map(({ toNm }) => toNm),
  random: mersenne(5),
});

async function local(start: number[], bounds: Bounds, evaluate: EvaluateFilms, most = 2000) {
  const [film] = await evaluate([start]);
  const better: Film[] = [];
  const found = await searchLocally(film!, 0, bounds, most, evaluate, (one) => better.push(one));
  return { ...found, better };
}

// H. H. Rosenbrock, Comput. J. 3, 175 (1960): a curved valley, minimum 0 at (1, 1).
const rosenbrock: Costs = ([x, y]) => [100 * (y! - x! ** 2) ** 2 + (1 - x!) ** 2];

describe('the local search', () => {
  test('follows a curved valley to its end, better with every film', async () => {
    const { film, isSettled, better } = await local([-1.2, 1], box(-2, 2, 2), evaluator(rosenbrock));
    expect(isSettled).toBe(true);
    expect(film.nm[0]).toBeCloseTo(1, 3);
    expect(film.nm[1]).toBeCloseTo(1, 3);
    better.slice(1).forEach((one, i) => expect(isBetter(one, better[i]!, 0)).toBe(true));
  });

  test('ends exactly at a bound that the minimum lies beyond', async () => {
    // The minimum of Rosenbrock's function for x <= 0.5 is (0.5, 0.25): the second term alone is left.
    const bounds = [
      { fromNm: -2, toNm: 0.5 },
      { fromNm: -2, toNm: 2 },
    ];
    const { film } = await local([-1.2, 1], bounds, evaluator(rosenbrock));
    expect(film.nm[0]).toBe(0.5);
    expect(film.nm[1]).toBeCloseTo(0.25, 3);
  });

  test('stops when its films are spent, and says so', async () => {
    let solved = 0;
    const counted: EvaluateFilms = (nm) => {
      solved += nm.length;
      return evaluator(rosenbrock)(nm);
    };
    const { isSettled } = await local([-1.2, 1], box(-2, 2, 2), counted, 30);
    expect(isSettled).toBe(false);
    expect(solved).toBeLessThanOrEqual(31);
  });
});

describe('the global search', () => {
  // L. A. Rastrigin 1974: 11^3 local minima in this box, the least one 0 at the origin.
  const rastrigin: Costs = (x) => [
    x.reduce((sum, one) => sum + 10 + one ** 2 - 10 * Math.cos(2 * Math.PI * one), 0),
  ];

  test('finds the least of many minima and settles there', async () => {
    const search = global(box(-5.12, 5.12, 3), 1, 45, 400);
    const { films, isSettled } = await searchGlobally(search, evaluator(rastrigin), () => {});
    expect(isSettled).toBe(true);
    expect(bestOf(films, 0).costs[0]).toBeLessThan(1e-4);
  });

  test('does not take a film that may not be considered, however good', async () => {
    // Feasible is the ring between 1 and 2 around the origin: the minima there lie at one coordinate +-1, the others 0.
    const outside = (x: number[]) => Math.max(0, 1 - Math.hypot(...x), Math.hypot(...x) - 2);
    const search = global(box(-5.12, 5.12, 2), 1, 40, 300);
    const { films } = await searchGlobally(search, evaluator(rastrigin, outside), () => {});
    const best = bestOf(films, 0);
    expect(best.violation).toBe(0);
    expect(Math.hypot(...best.nm)).toBeGreaterThanOrEqual(1);
    expect(best.costs[0]).toBeCloseTo(1, 2);
  });

  test('finds a known front for two goals', async () => {
    // ZDT1 of E. Zitzler, K. Deb and L. Thiele, Evol. Comput. 8, 173 (2000): the front is f2 = 1 - sqrt(f1), 0 <= f1 <= 1.
    const zdt1: Costs = ([x, ...rest]) => {
      const g = 1 + (9 * rest.reduce((sum, one) => sum + one, 0)) / rest.length;
      return [x!, g * (1 - Math.sqrt(x! / g))];
    };
    const { films } = await searchGlobally(global(box(0, 1, 4), 2, 60, 250), evaluator(zdt1), () => {});
    const front = paretoFront(films);
    expect(front.length).toBeGreaterThan(50);
    for (const { costs } of front) expect(costs[1]! - (1 - Math.sqrt(costs[0]!))).toBeLessThan(0.02);
    const firsts = front.map(({ costs }) => costs[0]!);
    expect(firsts[0]).toBeLessThan(0.01);
    expect(firsts.at(-1)).toBeGreaterThan(0.99);
    // Spread over the front, not crowded at one place.
    firsts.slice(1).forEach((one, i) => expect(one - firsts[i]!).toBeLessThan(0.1));
  });
});
