import type { PointReadingName } from '../../../../shared/designPoint.ts';

/** Those that spread and change with the film, in the order of the tables. */
export const spreadReadings = [
  'rotationDeg',
  'ellipticityDeg',
  'amplitude',
  'contrast',
  'reflectance',
] as const satisfies readonly PointReadingName[];
export type SpreadReading = (typeof spreadReadings)[number];

export const pointReadingNames = [
  ...spreadReadings,
  'ceilingShare',
] as const satisfies readonly PointReadingName[];
