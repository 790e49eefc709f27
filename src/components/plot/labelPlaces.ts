/** A curve in pixels, and the size of the text that names it. */
export type LabelledCurve = { x: ArrayLike<number>; y: ArrayLike<number>; textWidth: number };
export type LabelPlace = { x: number; y: number; above: boolean };
type Box = { left: number; right: number; top: number; bottom: number };
export type Frame = Box;

const TEXT_HEIGHT = 14;
const GAP = 6;
const CANDIDATES = 31;

/**
 * Places the name of each curve at the curve: of some thirty places along it, above and below, the one farthest
 * from every other curve and from the names already placed. Null for a curve with nothing inside the frame.
 */
export function placeLabels(curves: readonly LabelledCurve[], frame: Frame): (LabelPlace | null)[] {
  const taken: Box[] = [];
  const sampled = curves.map((curve) => sampleColumns(curve, frame));
  return curves.map((curve, self) => {
    let best: { place: LabelPlace; box: Box; score: number } | null = null;
    for (let step = 1; step < CANDIDATES; step++) {
      const x = frame.left + (step / CANDIDATES) * (frame.right - frame.left);
      for (const above of [true, false]) {
        const candidate = candidateAt(curve, sampled, self, x, above, frame);
        if (candidate === null) continue;
        // Ties go to the right end, where a reader who follows the curve arrives.
        const score = clearance(candidate.box, sampled, self, frame, taken) + 4 * (step / CANDIDATES);
        if (best === null || score > best.score) best = { ...candidate, score };
      }
    }
    if (best === null) return null;
    taken.push(best.box);
    return best.place;
  });
}

const COLUMN = 4;

/** Lowest and highest pixel of a curve in each column of four pixels; NaN where it is not drawn. */
type Columns = { top: Float64Array; bottom: Float64Array };

function sampleColumns(curve: LabelledCurve, frame: Frame): Columns {
  const count = Math.max(1, Math.ceil((frame.right - frame.left) / COLUMN));
  const columns = { top: new Float64Array(count).fill(NaN), bottom: new Float64Array(count).fill(NaN) };
  const mark = (x: number, y: number) => {
    const column = Math.floor((x - frame.left) / COLUMN);
    if (column < 0 || column >= count || Number.isNaN(y)) return;
    if (!(columns.top[column]! <= y)) columns.top[column] = y;
    if (!(columns.bottom[column]! >= y)) columns.bottom[column] = y;
  };
  for (let index = 0; index < curve.x.length; index++) {
    mark(curve.x[index]!, curve.y[index]!);
    if (index === 0) continue;
    const [x0, y0] = [curve.x[index - 1]!, curve.y[index - 1]!];
    const steps = Math.min(count, Math.ceil(Math.abs(curve.x[index]! - x0) / COLUMN));
    for (let step = 1; step < steps; step++) {
      const share = step / steps;
      mark(x0 + share * (curve.x[index]! - x0), y0 + share * (curve.y[index]! - y0));
    }
  }
  return columns;
}

function columnsUnder(box: Box, frame: Frame): [number, number] {
  return [
    Math.max(0, Math.floor((box.left - frame.left) / COLUMN)),
    Math.floor((box.right - frame.left) / COLUMN),
  ];
}

function candidateAt(
  curve: LabelledCurve,
  sampled: Columns[],
  self: number,
  x: number,
  above: boolean,
  frame: Frame,
): { place: LabelPlace; box: Box } | null {
  const [left, right] = [x - curve.textWidth / 2, x + curve.textWidth / 2];
  if (left < frame.left + 2 || right > frame.right - 2) return null;
  // The text stands clear of the whole stretch of its own curve that runs under it.
  let edge = NaN;
  const columns = sampled[self]!;
  const [first, last] = columnsUnder({ left, right, top: 0, bottom: 0 }, frame);
  for (let column = first; column <= last; column++) {
    const value = above ? columns.top[column]! : columns.bottom[column]!;
    if (Number.isNaN(value)) continue;
    if (Number.isNaN(edge) || (above ? value < edge : value > edge)) edge = value;
  }
  if (Number.isNaN(edge)) return null;
  const y = above ? edge - GAP : edge + GAP + TEXT_HEIGHT;
  const box = { left, right, top: y - TEXT_HEIGHT, bottom: y };
  if (box.top < frame.top || box.bottom > frame.bottom) return null;
  return { place: { x, y, above }, box };
}

/** Pixels between the box and the nearest other thing, at most 40; negative where something crosses it. */
function clearance(box: Box, sampled: Columns[], self: number, frame: Frame, taken: Box[]): number {
  let nearest = 40;
  const [first, last] = columnsUnder(box, frame);
  sampled.forEach((columns, index) => {
    if (index === self) return;
    for (let column = first; column <= last; column++) {
      const top = columns.top[column]!;
      if (Number.isNaN(top)) continue;
      nearest = Math.min(nearest, Math.max(top - box.bottom, box.top - columns.bottom[column]!));
    }
  });
  for (const other of taken) {
    const across = Math.max(other.left - box.right, box.left - other.right);
    const along = Math.max(other.top - box.bottom, box.top - other.bottom);
    nearest = Math.min(nearest, Math.max(across, along));
  }
  return nearest;
}
