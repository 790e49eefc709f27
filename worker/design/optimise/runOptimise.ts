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
import type { Evaluation, Film } from './film.ts';
import { bestOf } from './film.ts';
import { paretoFront } from './front.ts';
import { searchGlobally } from './globalSearch.ts';
import { searchLocally } from './localSearch.ts';

/** Fewer films than this are not worth a second thread. */
const LEAST_PER_STEP = 4;
const PARTIAL_MS = 200;

/**
 * A global search, then a local one from its best film. All random numbers are drawn here and threads only solve, so the
 * outcome does not depend on how many there are. With a second goal the ends of the front are refined.
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
  const { population, generations, local } = budgetOf(design);
  const drawn = drawnThicknesses(design);
  const [start] = await solveFilms([drawn], threads);
  const course = new BestSoFar(design, start!);
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

  let isSettled = search.isSettled;
  for (const goal of second ? [0, 1] : [0]) {
    const from = bestOf(course.films, goal);
    const refined = await searchLocally(from, goal, variables, local, evaluate, (film) => {
      course.offer(film, 'local');
      tell();
    });
    course.films = [...course.films, refined.film];
    isSettled &&= refined.isSettled;
  }
  course.endPhase('local');

  const best = (second ? paretoFront(course.films)[0] : undefined) ?? bestOf(course.films, 0);
  // Given by designTask.ts for this kind of step.
  const readings = (await threads.run({ kind: 'optimise readings', nm: best.nm })) as PointReadings[];
  const points = design.points.map(({ id }, i) => ({ pointId: id, readings: readings[i]! }));
  return course.result(isSettled && best.violation === 0 ? 'converged' : 'budget', best, points);
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
  const evaluations = (answers as (Evaluation[] | null)[]).flatMap((one) => one ?? []);
  if (evaluations.length < nm.length) {
    throw new ComputeError('cancelled', 'The calculation was cancelled.');
  }
  return nm.map((thicknesses, i) => ({ nm: thicknesses, ...evaluations[i]! }));
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
