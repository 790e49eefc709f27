/** hc/e: photon energy in eV times vacuum wavelength in nm (CODATA 2018, exact constants, rounded). */
export const EV_NM = 1239.841984;

/** Photon energy in eV of a vacuum wavelength in nm; the same formula turns eV back into nm. */
export function photonEnergyEv(wavelengthNm: number): number {
  return EV_NM / wavelengthNm;
}

/**
 * Folds an angle in degrees into (-90, 90]: an ellipse turned by 180 degrees is the same ellipse.
 * physics.md section 4 calls this `fold`.
 */
export function foldDegrees(angleDeg: number): number {
  const turned = angleDeg - 180 * Math.round(angleDeg / 180);
  return turned <= -90 ? turned + 180 : turned;
}
