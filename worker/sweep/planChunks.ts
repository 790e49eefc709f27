import type { StackItem } from '../../shared/stack.ts';
import { microsecondsPerPoint } from './cost.ts';
import { generalCost } from './generalStack.ts';
import { countStates, statesNeeded } from './magnetizationStates.ts';
import type { SweepInput } from './sweepInput.ts';

/** Points `start` .. `start + count - 1` of an axis, solved by one thread in one go. */
export type Chunk = { start: number; count: number };

/** Work of one chunk: 25 ms cost little beside the trip to a thread, and two sweeps alternate smoothly. */
const CHUNK_MICROSECONDS = 25_000;
/** Fewest chunks for each thread, so that all end at about the same time. */
const CHUNKS_PER_THREAD = 4;
/** Below this a chunk costs more in coming and going than in work. */
const FEWEST_POINTS = 32;
/** Layers x wavelengths whose constants one chunk holds at a time (about 100 bytes each). */
const MOST_SAMPLES = 200_000;

/**
 * Cuts a sweep into chunks for the threads, in order and without gaps.
 *
 * @param threads how many work at the same time
 */
export function planChunks(input: SweepInput, threads: number): Chunk[] {
  const { axis, document, readings } = input;
  const states = countStates(statesNeeded(document, readings));
  const microseconds = states * generalCost(document) * microsecondsPerPoint(document.layers);
  const byTime = CHUNK_MICROSECONDS / microseconds;
  const byThreads = Math.max(FEWEST_POINTS, axis.points / (threads * CHUNKS_PER_THREAD));
  const byMemory = axis.kind === 'wavelength' ? MOST_SAMPLES / (countItems(document.layers) + 2) : Infinity;
  const size = Math.max(1, Math.floor(Math.min(byTime, byThreads, byMemory)));
  const count = Math.ceil(axis.points / size);
  // Equal parts rather than a small rest at the end.
  const edge = (index: number) => Math.floor((axis.points * index) / count);
  return Array.from({ length: count }, (_, index) => ({
    start: edge(index),
    count: edge(index + 1) - edge(index),
  }));
}

function countItems(items: StackItem[]): number {
  return items.reduce((sum, item) => sum + ('layers' in item ? countItems(item.layers) : 1), 0);
}
