/** Where the beam meets the film and how much room it has above it, px. */
export type BeamFrame = { width: number; height: number; x: number; surface: number };
export type Point = { x: number; y: number };

const RADIANS = Math.PI / 180;

/**
 * The incoming ray at its true angle to the normal: it starts where it would leave the frame.
 *
 * @param angleDeg angle of incidence, 0 <= angle < 90
 */
export function incomingRay(angleDeg: number, frame: BeamFrame): { start: Point; end: Point } {
  const [sin, cos] = [Math.sin(angleDeg * RADIANS), Math.cos(angleDeg * RADIANS)];
  const toSide = sin > 0 ? (Math.min(frame.x, frame.width - frame.x) - 6) / sin : Infinity;
  const toTop = cos > 0 ? (frame.surface - 8) / cos : Infinity;
  const length = Math.min(toSide, toTop, 205);
  return {
    start: { x: frame.x - length * sin, y: frame.surface - length * cos },
    end: { x: frame.x, y: frame.surface },
  };
}

/** The reflected ray: the mirror image of the incoming one. */
export function outgoingRay(angleDeg: number, frame: BeamFrame): { start: Point; end: Point } {
  const { start, end } = incomingRay(angleDeg, frame);
  return { start: end, end: { x: 2 * frame.x - start.x, y: start.y } };
}

/**
 * How far apart, to either side, the two rays are drawn near normal incidence, where they would cover each other.
 * They keep their angle.
 *
 * @param share where along the outgoing ray something wide stands
 * @param halfWidth of that, px
 */
export function raysApart(angleDeg: number, frame: BeamFrame, share: number, halfWidth: number): number {
  const { start } = incomingRay(angleDeg, frame);
  return Math.max(3, halfWidth - share * (frame.x - start.x));
}

/** The arc between normal and incoming ray, as an SVG path. */
export function angleArc(angleDeg: number, frame: BeamFrame, radius: number): string {
  const [sin, cos] = [Math.sin(angleDeg * RADIANS), Math.cos(angleDeg * RADIANS)];
  const end = { x: frame.x - radius * sin, y: frame.surface - radius * cos };
  return `M${frame.x} ${frame.surface - radius}A${radius} ${radius} 0 0 0 ${end.x.toFixed(2)} ${end.y.toFixed(2)}`;
}

/** A point on the way from `from` to `to`. */
export function along(from: Point, to: Point, share: number): Point {
  return { x: from.x + (to.x - from.x) * share, y: from.y + (to.y - from.y) * share };
}

/** Largest tilt and narrowest-to-widest ratio that the small ellipse is drawn with. */
const MOST_DRAWN_DEG = 38;

/**
 * By how much the tilt of the outgoing ellipse is exaggerated: a round number that makes the larger of rotation
 * and ellipticity as visible as it can be without turning the ellipse over. 1 where the angles are large as they are.
 */
export function exaggeration(rotationDeg: number, ellipticityDeg: number): number {
  const largest = Math.max(Math.abs(rotationDeg), Math.abs(ellipticityDeg));
  if (largest === 0) return 1;
  const most = MOST_DRAWN_DEG / largest;
  if (most <= 1) return 1;
  // Beyond this the drawing would shout about what no bench can measure.
  const capped = Math.min(most, 10_000);
  const power = 10 ** Math.floor(Math.log10(capped));
  const lead = capped / power;
  return (lead >= 5 ? 5 : lead >= 3 ? 3 : lead >= 2 ? 2 : 1) * power;
}
