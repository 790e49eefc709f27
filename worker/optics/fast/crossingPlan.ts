import type { FastMedium } from './fastMedium.ts';

/** A layer as written, in the order of the document; its thickness may change between solves. */
export type FastLayer = {
  medium: FastMedium;
  mediumNumber: number;
  thicknessNm: number;
  /** Thickness per point instead of one; `thicknessNm` is then the largest. */
  swept: boolean;
};

/** Layers and blocks in the order in which light from below meets them. */
export type FastItem = FastLayer | { repeat: number; items: FastItem[] };

/** One step up. The kernel passes that carry it out are chosen in tile.ts. */
export type Crossing =
  | { kind: 'plain'; layer: FastLayer; /** Of the series; 0 where exponentials are due. */ degree: number }
  | {
      kind: 'gyrotropic';
      layer: FastLayer;
      /** The layer is crossed in so many equal steps. */
      steps: number;
      degree: number;
      doublings: number;
    }
  | { kind: 'power'; block: Crossing[]; squarings: number; repeats: number };

/** e-foldings of amplitude a step may take: what comes from below loses no more than e^8 of its 2^53 digits. */
const FADE_PER_STEP = 4;
/** What lies deeper than this many e-foldings is zero in every number (e^-700 in r). */
const OPAQUE = 350;
/** |phi| up to which plain layers go by series. */
const THIN = 4;
/** |phi| up to which a gyrotropic series is summed before doubling, and how often it may be doubled. */
const SERIES_REACH = 2;
const MAX_DOUBLINGS = 7;
/** sin and cos of the kernel are good to here. */
const MAX_TURN = 1e6;
/** Truncation left by a series, relative. */
const TRUNCATION = 4e-17;
/** Complex products of one pass: a matrix product, a crossing by matrix, a plain and a gyrotropic layer. */
const COST = { product: 64, matrix: 32, plain: 35, gyrotropic: 140 };
/** A block of more layers than this is crossed layer by layer. */
const MAX_BLOCK = 64;

/**
 * Chooses how each layer is crossed, once for all points of a case.
 *
 * @returns steps from the substrate to the light; null when a layer is beyond the fast path
 */
export function planCrossings(items: FastItem[]): Crossing[] | null {
  const plan: Crossing[] = [];
  for (const item of items) {
    const steps = 'repeat' in item ? planBlock(item) : planLayer(item);
    if (steps === null) return null;
    plan.push(...steps);
  }
  return plan;
}

function planLayer(layer: FastLayer): Crossing[] | null {
  const { medium, thicknessNm } = layer;
  if (thicknessNm === 0) return [];
  const turn = medium.pace.turn * thicknessNm;
  if (!medium.gyrotropic) {
    if (!(turn < MAX_TURN)) return null;
    return [{ kind: 'plain', layer, degree: turn <= THIN ? evenDegree(turn) : 0 }];
  }
  const depthNm = visibleNm(medium, thicknessNm);
  const steps = Math.max(1, Math.ceil((medium.pace.fadeMost * depthNm) / FADE_PER_STEP));
  const stepTurn = (medium.pace.turn * depthNm) / steps;
  const doublings = Math.max(0, Math.ceil(Math.log2(stepTurn / SERIES_REACH)));
  if (!(doublings <= MAX_DOUBLINGS)) return null;
  return [{ kind: 'gyrotropic', layer, steps, degree: oddDegree(stepTurn / 2 ** doublings), doublings }];
}

/** The part of a thick gyrotropic layer that light reaches. */
export function visibleNm(medium: FastMedium, thicknessNm: number): number {
  return Math.min(thicknessNm, OPAQUE / medium.pace.fadeLeast);
}

function planBlock({ repeat, items }: { repeat: number; items: FastItem[] }): Crossing[] | null {
  const once = planCrossings(items);
  if (once === null || once.length === 0 || repeat === 0) return once && [];
  const least = fade(once, 'fadeLeast');
  const repeats = least * repeat > OPAQUE ? Math.ceil(OPAQUE / least) + 1 : repeat;
  const unrolled = () => Array.from({ length: repeats }, () => once).flat();
  const most = fade(once, 'fadeMost');
  if (!once.every(fitsMatrix) || once.length > MAX_BLOCK || repeats < 2) return unrolled();
  const { squarings, cost } = bestSquarings(repeats, most);
  const building = COST.matrix + COST.product * (once.length - 1);
  if (building + cost >= (repeats - 1) * once.reduce((sum, step) => sum + costOf(step), 0)) return unrolled();
  return [{ kind: 'power', block: once, squarings, repeats }];
}

const costOf = (step: Crossing) => (step.kind === 'plain' ? COST.plain : COST.gyrotropic);

const fitsMatrix = (step: Crossing) =>
  step.kind === 'plain' ? step.degree > 0 : step.kind === 'gyrotropic' && step.steps === 1;

/** Upper or lower bound of the e-foldings of amplitude in some steps. */
function fade(steps: Crossing[], bound: 'fadeMost' | 'fadeLeast'): number {
  let sum = 0;
  for (const step of steps) {
    if (step.kind === 'power') sum += step.repeats * fade(step.block, bound);
    else if (bound === 'fadeMost' || !step.layer.swept) {
      sum += step.layer.medium.pace[bound] * step.layer.thicknessNm;
    }
  }
  return sum;
}

/** How often to square the matrix of a block that is crossed `repeats` times, and the work that is left then. */
function bestSquarings(repeats: number, fadeOnce: number): { squarings: number; cost: number } {
  let best = { squarings: 0, cost: COST.matrix * repeats };
  for (let squarings = 1; 2 ** squarings <= repeats; squarings++) {
    if (fadeOnce * 2 ** squarings > FADE_PER_STEP) break;
    const whole = Math.floor(repeats / 2 ** squarings);
    const rest = bitCount(repeats % 2 ** squarings);
    const cost = COST.product * squarings + COST.matrix * (whole + rest);
    if (cost < best.cost) best = { squarings, cost };
  }
  return best;
}

function bitCount(value: number): number {
  let count = 0;
  for (let rest = value; rest > 0; rest = Math.floor(rest / 2)) count += rest % 2;
  return count;
}

/** Last n for which x^(2n)/(2n)! counts. */
function evenDegree(x: number): number {
  let degree = 2;
  for (let term = x ** 6 / 720; term > TRUNCATION; degree++) {
    term *= (x * x) / ((2 * degree + 3) * (2 * degree + 4));
  }
  return degree;
}

/** Last odd n for which x^n/n! counts. */
function oddDegree(x: number): number {
  let degree = 5;
  for (let term = x ** 6 / 720; term > TRUNCATION; degree += 2) {
    term *= (x * x) / ((degree + 2) * (degree + 3));
  }
  return degree;
}
