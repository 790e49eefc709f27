import { foldDegrees } from './units.ts';

/** Azimuth less that of the input, folded into (-90, 90], and ellipticity, deg. */
export type Ellipse = { rotationDeg: number; ellipticityDeg: number };

/** A beam weaker than this has no polarization worth the name (physics.md section 4). */
const NO_BEAM = 1e-28;

/**
 * The ellipse of the beam that leaves for linear input (physics.md section 4).
 *
 * @param mueller 4x4, rows and columns S0..S3; S2 = 2 Re(Ep Es*), S3 = 2 Im(Ep* Es)
 * @param azimuthDeg of the incident light, from p (0) toward s (90), deg
 * @returns null where S0 < 1e-28
 */
export function ellipseAt(mueller: readonly (readonly number[])[], azimuthDeg: number): Ellipse | null {
  const [cos, sin] = doubledAngle(azimuthDeg);
  const [s0, s1, s2, s3] = mueller.map((row) => row[0]! + row[1]! * cos + row[2]! * sin);
  if (s0! < NO_BEAM) return null;
  // Turned into the frame of the input first, so that a small rotation keeps its digits.
  const rotationDeg = toDegrees(Math.atan2(s2! * cos - s1! * sin, s1! * cos + s2! * sin)) / 2;
  // atan2 of the rest of the intensity is the arc sine without its loss of digits near circular light.
  const rest = Math.sqrt(Math.max(0, (s0! - s3!) * (s0! + s3!)));
  return { rotationDeg: foldDegrees(rotationDeg), ellipticityDeg: toDegrees(Math.atan2(s3!, rest)) / 2 };
}

/** Cosine and sine of twice the azimuth; p, s and the diagonals exactly, so that rounding never mixes them. */
function doubledAngle(azimuthDeg: number): [number, number] {
  const eighths = (((azimuthDeg / 45) % 4) + 4) % 4;
  if (Number.isInteger(eighths)) return [[1, 0, -1, 0][eighths]!, [0, 1, 0, -1][eighths]!];
  const angle = (azimuthDeg * Math.PI) / 90;
  return [Math.cos(angle), Math.sin(angle)];
}

function toDegrees(radians: number): number {
  return (radians * 180) / Math.PI;
}
