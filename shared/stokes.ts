/** Azimuth less that of the input, folded into (-90, 90], and ellipticity, deg. */
export type Ellipse = { rotationDeg: number; ellipticityDeg: number };

/** A beam weaker than this has no polarization worth the name (physics.md section 4). */
export const NO_BEAM = 1e-28;

const HALF_IN_DEGREES = 90 / Math.PI;

/** S1 and S2 of linear light; p, s and the diagonals exactly, so that rounding never mixes them. */
export function linearStokes(azimuthDeg: number): [s1: number, s2: number] {
  const eighths = (((azimuthDeg / 45) % 4) + 4) % 4;
  if (Number.isInteger(eighths)) return [[1, 0, -1, 0][eighths]!, [0, 1, 0, -1][eighths]!];
  const angle = (azimuthDeg * Math.PI) / 90;
  return [Math.cos(angle), Math.sin(angle)];
}

/**
 * Azimuth of the ellipse less that of the input, and ellipticity angle (physics.md section 4). For a partly
 * polarized beam the ellipticity is half the arc sine of S3 / S0, what a detector of circular light reads against
 * the whole intensity.
 *
 * @param stokes S0..S3; S2 = 2 Re(Ep Es*), S3 = 2 Im(Ep* Es)
 * @param azimuthDeg of the incident light, from p (0) toward s (90), deg
 * @returns null where S0 < 1e-28
 */
export function polarizationOf(stokes: ArrayLike<number>, azimuthDeg: number): Ellipse | null {
  const [s0, s1, s2, s3] = [stokes[0]!, stokes[1]!, stokes[2]!, stokes[3]!];
  if (s0 < NO_BEAM) return null;
  // Turned into the frame of the input first, so that a small rotation keeps its digits.
  const [cos, sin] = linearStokes(azimuthDeg);
  const rotationDeg = HALF_IN_DEGREES * Math.atan2(s2 * cos - s1 * sin, s1 * cos + s2 * sin);
  // atan2 of the rest of the intensity is the arc sine without its loss of digits near circular light.
  const rest = Math.sqrt(Math.max(0, (s0 - s3) * (s0 + s3)));
  return {
    rotationDeg: rotationDeg <= -90 ? rotationDeg + 180 : rotationDeg,
    ellipticityDeg: HALF_IN_DEGREES * Math.atan2(s3, rest),
  };
}

/**
 * The ellipse of the beam that leaves for linear input.
 *
 * @param mueller 4x4, rows and columns S0..S3
 */
export function ellipseAt(mueller: readonly (readonly number[])[], azimuthDeg: number): Ellipse | null {
  const [s1, s2] = linearStokes(azimuthDeg);
  return polarizationOf(
    mueller.map((row) => row[0]! + row[1]! * s1 + row[2]! * s2),
    azimuthDeg,
  );
}
