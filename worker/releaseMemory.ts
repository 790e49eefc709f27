import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';

/** Below this the ordinary collector does as well. */
const WORTH_BYTES = 8_000_000;

let collect: (() => void) | null = null;

/**
 * Gives back the buffers of a large run or download at once. The collector learns late of memory outside its heap, and several
 * maps in a row would pile up buffers that nobody holds any more. Takes some 20 ms of the calling thread.
 *
 * @param bytes size of what was dropped
 */
export function releaseMemory(bytes: number): void {
  if (bytes < WORTH_BYTES) return;
  collect ??= exposedCollector();
  collect();
}

function exposedCollector(): () => void {
  setFlagsFromString('--expose-gc');
  return runInNewContext('gc') as () => void;
}
