import { mersenne } from 'pure-rand/generator/mersenne';
import type { PointReadings } from '../../../shared/designPoint.ts';
import type { OptimiseDesign, OptimiseResult } from '../../../shared/optimiseDesign.ts';
import { ComputeError } from '../../sweep/computeError.ts';
import type { DesignThreads } from '../designThreads.ts';
import { piecesOf } from '../designThreads.ts';
import { drawnLayers } from '../expandBlocks.ts';
import { BestSoFar } from './bestSoFar.ts';
import { checkOptimise } from './checkOptimise.ts';
import { budgetOf, globalTotal } from './effort.ts';
import type { EvaluateFilms, Film } from './film.ts';
import { bestOf, isBetter } from './film.ts';
import { searchGlobally } from './globalSearch.ts';
import type { LocalOptimum } from './localSearch.ts';
import { searchLocally } from './localSearch.ts';

/** Fewer films than this are not worth a second thread. */
const LEAST_PER_STEP = 4;
const PARTIAL_MS = 200;

/**
 * A global search, then local ones from its best film and from the one that was drawn; with two goals, for each of them
 * from both ends of the front. All random numbers are drawn here and threads only solve, so the outcome does not depend
 * on how many there are.
 *
 * @throws ComputeError `refused` when the design does not fit its film, `cancelled`
 */
export async function runOptimise(
  design: OptimiseDesign,
  threads: DesignThreads,
  onPartial?: (soFar: OptimiseResult) => void,
): Promise<OptimiseResult> {
  const issues = checkOptimise(design);
  if (issues.length > 0) {
    throw new ComputeError('refused', 'The optimisation does not fit the film.', issues);
  }
  const { variables, second } = design;
  const { population, generations } = budgetOf(design);
  const drawn = drawnThicknesses(design);
  // The film as drawn must not move, whatever it lacks.
  const start = (await threads.run({ kind: 'optimise start', nm: drawn })) as Film;
  const course = new BestSoFar(design, start);
  course.evaluations = 1;
  const evaluate = async (nm: number[][]) => {
    const films = await solveFilms(nm, threads);
    course.evaluations += films.length;
    return films;
  };
  const tell = throttled(() => {
    const soFar = onPartial && course.soFar();
    if (soFar) onPartial(soFar);
  });

  const search = await searchGlobally(
    {
      bounds: variables,
      population,
      generations,
      goals: second ? 2 : 1,
      start: variables.map(({ fromNm, toNm }, i) => Math.min(toNm, Math.max(fromNm, drawn[i]!))),
      random: mersenne(design.seed),
    },
    evaluate,
    (films) => {
      course.films = films;
      course.offer(bestOf(films, 0), 'global');
      tell();
    },
  );
  course.endPhase('global');
  // A search that settled early has done all of its work.
  threads.done = globalTotal(design);

  const isRefined = await refine(design, search, evaluate, course, tell);
  course.endPhase('local');

  const films = course.shown();
  const points = await readFilms(design, films, threads);
  const isConverged = search.isSettled && isRefined && films[0]!.violation === 0;
  return course.result(isConverged ? 'converged' : 'budget', points);
}

/** Every reading of each film at each working point, over all threads. */
async function readFilms(
  { points }: OptimiseDesign,
  films: readonly Film[],
  threads: DesignThreads,
): Promise<Map<Film, OptimiseResult['best']['points']>> {
  const pieces = piecesOf(films.length, Math.max(LEAST_PER_STEP, Math.ceil(films.length / threads.count)));
  const answers = await threads.runAll(
    pieces.map(({ from, to }) => ({
      kind: 'optimise readings',
      nm: films.slice(from, to).map(({ nm }) => nm),
    })),
  );
  // Given by designTask.ts for this kind of step; nothing comes back once the calculation was cancelled.
  const readings = (answers as (PointReadings[][] | undefined)[]).flatMap((one) => one ?? []);
  if (readings.length < films.length) throw new ComputeError('cancelled', 'The calculation was cancelled.');
  return new Map(
    films.map((film, i) => [
      film,
      points.map(({ id }, point) => ({ pointId: id, readings: readings[i]![point]! })),
    ]),
  );
}

/** Local searches for each goal, one after the other; whether the best of each ended in a point. */
async function refine(
  design: OptimiseDesign,
  { films, start }: { films: Film[]; start: Film },
  evaluate: EvaluateFilms,
  course: BestSoFar,
  tell: () => void,
): Promise<boolean> {
  const { variables, second } = design;
  const take = (film: Film) => {
    course.offer(film, 'local');
    tell();
  };
  let isRefined = true;
  for (const goal of second ? [0, 1] : [0]) {
    const from = [bestOf(films, goal), second ? bestOf(films, 1 - goal) : start];
    const found: LocalOptimum[] = [];
    for (const film of from) {
      found.push(await searchLocally(film, goal, variables, budgetOf(design).local, evaluate, take));
    }
    course.films = [...course.films, ...found.map(({ film }) => film)];
    const winner = found.reduce((best, one) => (isBetter(one.film, best.film, goal) ? one : best));
    isRefined &&= winner.isSettled;
  }
  return isRefined;
}

function drawnThicknesses({ document, variables }: OptimiseDesign): number[] {
  const layers = new Map(drawnLayers(document.layers).map(({ id, thicknessNm }) => [id, thicknessNm]));
  return variables.map(({ layerId }) => layers.get(layerId)!);
}

/** Films over all threads, in order. */
async function solveFilms(nm: number[][], threads: DesignThreads): Promise<Film[]> {
  const size = Math.max(LEAST_PER_STEP, Math.ceil(nm.length / threads.count));
  const answers = await threads.runAll(
    piecesOf(nm.length, size).map(({ from, to }) => ({ kind: 'optimise films', nm: nm.slice(from, to) })),
  );
  // Given by designTask.ts for this kind of step; nothing comes back once the calculation was cancelled.
  const films = (answers as (Film[] | null)[]).flatMap((one) => one ?? []);
  if (films.length < nm.length) throw new ComputeError('cancelled', 'The calculation was cancelled.');
  return films;
}

/** Calls at most about five times a second. When it does so changes nothing of the outcome. */
function throttled(call: () => void): () => void {
  let last = performance.now();
  return () => {
    const now = performance.now();
    if (now - last < PARTIAL_MS) return;
    last = now;
    call();
  };
}
