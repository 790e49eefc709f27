import { pointCountOf } from '../../shared/runAxes.ts';
import type { AxisRole } from './axisRoles.ts';
import { axisRoles } from './axisRoles.ts';
import {
  countWritten,
  fastMicrosecondsPerPoint,
  microsecondsPerPoint,
  microsecondsPerStack,
} from './cost.ts';
import { countAnisotropic, generalCost, hasScalarMedia, isGeneralSomewhere } from './generalStack.ts';
import { countStates, statesNeeded } from './magnetizationStates.ts';
import type { SweepInput } from './sweepInput.ts';

/**
 * Points that one thread solves in one go: a stretch of the first axis, at every `stride`-th value of the second
 * axis, for one value of the family. A sweep without second axis or family has one value of them.
 */
export type Chunk = {
  first: { start: number; count: number };
  second: { start: number; stride: number; count: number };
  family: number;
};

/** Work of one chunk: 25 ms cost little beside the trip to a thread, and two sweeps alternate smoothly. */
const CHUNK_MICROSECONDS = 25_000;
/** Fewest chunks for each thread, so that all end at about the same time. */
const CHUNKS_PER_THREAD = 4;
/** Below this a chunk costs more in coming and going than in work. */
const FEWEST_POINTS = 32;
/** Layers x wavelengths whose constants one chunk holds at a time (about 100 bytes each). */
const MOST_SAMPLES = 200_000;

/** Of one layer at one point. */
const ANISOTROPIC_MICROSECONDS = 100;

export function chunkPoints({ first, second }: Chunk): number {
  return first.count * second.count;
}

/**
 * Cuts a sweep into chunks for the threads, each point in one of them. Each chunk of a map is spread over its whole
 * second axis, so that the first ones to be solved show all of it coarsely.
 *
 * @param threads how many work at the same time
 */
export function planChunks(input: SweepInput, threads: number): Chunk[] {
  const roles = axisRoles(input);
  const rows = input.second?.points ?? 1;
  const families = input.family?.points ?? 1;
  const byTime = CHUNK_MICROSECONDS / microsecondsOf(input, roles);
  const byThreads = Math.max(FEWEST_POINTS, pointCountOf(input) / (threads * CHUNKS_PER_THREAD));
  const points = Math.max(1, Math.floor(Math.min(byTime, byThreads)));
  const samples = Math.max(1, Math.floor(MOST_SAMPLES / (countWritten(input.document.layers) + 2)));
  const most = (role: AxisRole, count: number) => (role === 'wavelength' ? Math.min(count, samples) : count);
  const stretches = cut(input.axis.points, most(roles.first, points));
  const longest = Math.ceil(input.axis.points / stretches.length);
  const stride = Math.ceil(rows / most(roles.second, Math.max(1, Math.floor(points / longest))));
  const chunks: Chunk[] = [];
  for (const start of scattered(stride)) {
    const second = { start, stride, count: Math.ceil((rows - start) / stride) };
    for (let family = 0; family < families; family += 1) {
      for (const first of stretches) chunks.push({ first, second, family });
    }
  }
  return chunks;
}

/** Equal parts rather than a small rest at the end. */
function cut(total: number, size: number): { start: number; count: number }[] {
  const count = Math.ceil(total / size);
  const edge = (index: number) => Math.floor((total * index) / count);
  return Array.from({ length: count }, (_, index) => ({
    start: edge(index),
    count: edge(index + 1) - edge(index),
  }));
}

/** 0 .. count - 1, each next one far from those before: the digits of the binary numbers read backwards. */
function scattered(count: number): number[] {
  const bits = Math.ceil(Math.log2(count));
  const reversed = (index: number) => {
    let result = 0;
    for (let bit = 0; bit < bits; bit += 1) result = 2 * result + (Math.floor(index / 2 ** bit) % 2);
    return result;
  };
  return Array.from({ length: 2 ** bits }, (_, index) => reversed(index)).filter((index) => index < count);
}

/** Of one point, with its share in making the solver. */
function microsecondsOf(input: SweepInput, roles: { first: AxisRole; second: AxisRole }): number {
  const { document, readings } = input;
  const { layers } = document;
  const perStack = pointsPerStack(input, roles);
  const isFast = perStack > 1 && !isGeneralSomewhere(input) && hasScalarMedia(document);
  const asksCeiling = readings.some((name) => name === 'ceilingShare' || name === 'stackCeiling');
  const solving =
    isFast && !asksCeiling
      ? fastMicrosecondsPerPoint(layers)
      : microsecondsPerPoint(layers) + ANISOTROPIC_MICROSECONDS * countAnisotropic(layers);
  const states = countStates(statesNeeded(input, readings));
  return states * (generalCost(input) * solving + microsecondsPerStack(layers) / perStack);
}

function pointsPerStack({ axis, second }: SweepInput, roles: { first: AxisRole; second: AxisRole }): number {
  const inner = (role: AxisRole, points: number) => (role === 'stack' ? 1 : points);
  return inner(roles.first, axis.points) * inner(roles.second, second?.points ?? 1);
}
