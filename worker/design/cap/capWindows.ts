/** A stretch of thicknesses in which something holds, nm. */
export type Window = { fromNm: number; toNm: number };

/** Edges are found to this, nm. */
const EDGE_NM = 0.001;

/**
 * The stretches in which a condition holds, from its values on a grid.
 *
 * @param nm ascending
 * @param holdsAt asked between two points that differ, to refine the edge by bisection; left out, edges stay on the
 *   grid. A window that lies between two points of the grid is not found.
 */
export function windowsOf(
  nm: readonly number[],
  holds: readonly boolean[],
  holdsAt?: (nm: number) => boolean,
): Window[] {
  const edge = (inside: number, outside: number): number => {
    if (!holdsAt) return inside;
    let [held, not] = [inside, outside];
    while (Math.abs(held - not) > EDGE_NM) {
      const middle = (held + not) / 2;
      if (holdsAt(middle)) held = middle;
      else not = middle;
    }
    return held;
  };
  const windows: Window[] = [];
  for (let start = 0; start < nm.length; start += 1) {
    if (!holds[start]) continue;
    let end = start;
    while (holds[end + 1]) end += 1;
    windows.push({
      fromNm: start === 0 ? nm[0]! : edge(nm[start]!, nm[start - 1]!),
      toNm: end === nm.length - 1 ? nm[end]! : edge(nm[end]!, nm[end + 1]!),
    });
    start = end;
  }
  return windows;
}
