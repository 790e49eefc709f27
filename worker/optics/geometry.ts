/** What the angle of incidence fixes for every medium of the stack. */
export type Geometry = {
  /** Index N0 of the (lossless) incident medium. */
  n0: number;
  /** N0 sin(theta), conserved through the stack. */
  xi: number;
  /** N0 cos(theta). */
  q0: number;
};

/** @param angleDeg angle of incidence in the incident medium, [0, 90) deg */
export function incidenceGeometry(n0: number, angleDeg: number): Geometry {
  return {
    n0,
    xi: n0 * Math.sin((angleDeg * Math.PI) / 180),
    // cos(theta) as sin(90 deg - theta): near grazing the subtraction in degrees is exact.
    q0: n0 * Math.sin(((90 - angleDeg) * Math.PI) / 180),
  };
}
