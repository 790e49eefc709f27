import type { SolveRequest } from '../../shared/solve.ts';

type Item = object | { repeat: number; layers: Item[] };

/**
 * A rough cost of solving one point of one stack, in microseconds (measured on one 2-core machine). Work is only
 * shared out by it: chunks get longer or shorter when it is wrong.
 */
export function microsecondsPerPoint(layers: Item[]): number {
  return 2 + 1.2 * countExpanded(layers);
}

/** ... by the fast path; a repeated block is composed in few steps. */
export function fastMicrosecondsPerPoint(layers: Item[]): number {
  return 0.4 + 0.08 * countWritten(layers);
}

/** Making the solver of one stack, beside solving. */
export function microsecondsPerStack(layers: Item[]): number {
  return 50 + 10 * countWritten(layers);
}

function countExpanded(items: Item[]): number {
  return items.reduce<number>(
    (sum, item) => sum + ('layers' in item ? item.repeat * countExpanded(item.layers) : 1),
    0,
  );
}

/** Layers as written, blocks not expanded. */
export function countWritten(items: Item[]): number {
  return items.reduce<number>((sum, item) => sum + ('layers' in item ? countWritten(item.layers) : 1), 0);
}

/** ... and of a whole request. */
export function microsecondsOf(request: SolveRequest): number {
  const count = (values: number | number[]) => (typeof values === 'number' ? 1 : values.length);
  return request.cases.reduce(
    (sum, one) => sum + count(one.wavelengthNm) * count(one.angleDeg) * microsecondsPerPoint(one.layers),
    0,
  );
}
