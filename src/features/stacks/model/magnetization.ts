import type { Vector } from '../../../../shared/complex.ts';
import type { StackDocument, WorkingMagnetization } from '../../../../shared/stack.ts';
import { listLayers } from './items.ts';

/** The geometries by name; + polar points into the film. */
export const geometries: readonly { name: string; m: Vector }[] = [
  { name: 'polar, +z', m: [0, 0, 1] },
  { name: 'polar, −z', m: [0, 0, -1] },
  { name: 'longitudinal, +x', m: [1, 0, 0] },
  { name: 'longitudinal, −x', m: [-1, 0, 0] },
  { name: 'transverse, +y', m: [0, 1, 0] },
  { name: 'transverse, −y', m: [0, -1, 0] },
];

const DEGREES = 180 / Math.PI;
/** Below this a component is rounding of a turned arrow. */
const NOTHING = 1e-9;

export function lengthOf(m: Vector): number {
  return Math.hypot(m[0], m[1], m[2]);
}

/** What the drawing prints beside the arrow: the geometry where m lies along an axis, else its components. */
export function describeM(m: Vector): string {
  const length = lengthOf(m);
  if (length < NOTHING) return 'm = 0';
  const along = geometries.find(({ m: axis }) =>
    axis.every((part, index) => Math.abs(part * length - m[index]!) < 1e-6),
  );
  const size = Math.abs(length - 1) < 1e-6 ? '' : `, ${short(length)}`;
  if (along) return along.name + size;
  return `${short(m[0])}, ${short(m[1])}, ${short(m[2])}`;
}

function short(value: number): string {
  return String(Number(value.toFixed(2)) + 0).replace('-', '−');
}

export function describeWorkingM(magnetization: WorkingMagnetization): string {
  switch (magnetization.mode) {
    case 'drawn':
      return 'as drawn';
    case 'reversed':
      return 'reversed';
    case 'direction':
      return describeM(magnetization.m);
  }
}

/** Angle of the arrow on the drawing, where x runs right and z down: 0 = +x, 90 deg = +z, in (-180, 180]. */
export function drawnAngleDeg(m: Vector): number {
  return Math.hypot(m[0], m[2]) < NOTHING ? 90 : Math.atan2(m[2], m[0]) * DEGREES;
}

/**
 * m with its arrow on the drawing turned to this angle. The part across the drawing (y) stays; where m has no
 * other part, the whole of it turns into the plane of the drawing. m = 0 becomes a full arrow.
 */
export function turnedTo(m: Vector, angleDeg: number): Vector {
  // The angle comes from an arctangent: without its last digits, steps of 15 deg end on the axes.
  const angle = Number(angleDeg.toFixed(6));
  const inPlane = Math.hypot(m[0], m[2]);
  const length = inPlane < NOTHING ? lengthOf(m) || 1 : inPlane;
  const y = inPlane < NOTHING ? 0 : m[1];
  return [exact(length * cosDeg(angle)), y, exact(length * cosDeg(angle - 90))];
}

/** The cosine with its zeros and ones exact, so that an arrow turned to an axis lies on it. */
function cosDeg(angleDeg: number): number {
  const quarter = angleDeg / 90;
  if (Number.isInteger(quarter)) return [1, 0, -1, 0][((quarter % 4) + 4) % 4]!;
  return Math.cos(angleDeg / DEGREES);
}

function exact(value: number): number {
  return Number(value.toFixed(12)) + 0;
}

/** m scaled to this length; m = 0 has no direction and becomes polar. */
export function withLength(m: Vector, length: number): Vector {
  const now = lengthOf(m);
  if (now < NOTHING) return [0, 0, length];
  return [exact((m[0] / now) * length), exact((m[1] / now) * length), exact((m[2] / now) * length)];
}

/**
 * m with one component set. Where it would be longer than 1, the other two shrink, so that what was typed stays.
 */
export function withComponent(m: Vector, index: 0 | 1 | 2, value: number): Vector {
  const next: Vector = [...m];
  next[index] = value;
  if (lengthOf(next) <= 1) return next;
  const others = ([0, 1, 2] as const).filter((other) => other !== index);
  const rest = Math.hypot(...others.map((other) => m[other]));
  const room = Math.sqrt(Math.max(0, 1 - value * value));
  for (const other of others) next[other] = rest === 0 ? 0 : exact((m[other] / rest) * room);
  return next;
}

/** Every m of the film as the working point has it. */
export function workingVectors(document: StackDocument, magnetization: WorkingMagnetization): Vector[] {
  const media = [...listLayers(document.layers), { m: document.substrateM, fixed: false }];
  return media.flatMap(({ m, fixed }) => {
    if (m === undefined) return [];
    return [magnetization.mode === 'direction' && fixed !== true ? magnetization.m : m];
  });
}

/** Whether the readings are for a magnetization along y only, in which case the contrast is what there is to read. */
export function isTransverse(vectors: readonly Vector[]): boolean {
  const magnetic = vectors.filter((m) => lengthOf(m) > NOTHING);
  return magnetic.length > 0 && magnetic.every((m) => Math.hypot(m[0], m[2]) <= 1e-6 * lengthOf(m));
}
