import type { WorkingMagnetization, WorkingPoint } from '../../../../shared/stack.ts';
import { formatPlain } from '../../../lib/format.ts';

export const geometryNames = [
  'as drawn',
  'reversed',
  'polar',
  'longitudinal',
  'transverse',
  'another direction',
] as const;
export type GeometryName = (typeof geometryNames)[number];

/** A geometry as the magnetization of a working point; null for a direction that has no name. */
export function magnetizationOf(geometry: GeometryName): WorkingMagnetization | null {
  switch (geometry) {
    case 'as drawn':
      return { mode: 'drawn' };
    case 'reversed':
      return { mode: 'reversed' };
    case 'polar':
      return { mode: 'direction', m: [0, 0, 1] };
    case 'longitudinal':
      return { mode: 'direction', m: [1, 0, 0] };
    case 'transverse':
      return { mode: 'direction', m: [0, 1, 0] };
    case 'another direction':
      return null;
  }
}

export function geometryOf(magnetization: WorkingMagnetization): GeometryName {
  const text = JSON.stringify(magnetization);
  return (
    geometryNames.find((name) => {
      const named = magnetizationOf(name);
      return named !== null && JSON.stringify(named) === text;
    }) ?? 'another direction'
  );
}

/** What a working point is called until somebody calls it otherwise: `632.8 nm, 30°, p, polar`. */
export function pointWords({ wavelengthNm, angleDeg, input, magnetization }: WorkingPoint): string {
  return `${formatPlain(wavelengthNm)} nm, ${formatPlain(angleDeg)}°, ${input}, ${geometryOf(magnetization)}`;
}
