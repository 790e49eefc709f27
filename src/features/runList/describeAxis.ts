import type { SweepAxis } from '../../../shared/run.ts';
import { formatCount, formatPlain } from '../../lib/format.ts';

const kinds = { wavelength: 'wavelength', angle: 'angle', thickness: 'layer thickness' } as const;
const units = { wavelength: ' nm', angle: '°', thickness: ' nm' } as const;

/** What a run sweeps, in a line: `angle 0–85°, 171 points`. */
export function describeAxis(axis: SweepAxis): string {
  const span = `${formatPlain(axis.from)}–${formatPlain(axis.to)}${units[axis.kind]}`;
  const spacing = axis.spacing === 'log' ? ', log' : '';
  const points = axis.points === 1 ? '1 point' : `${formatCount(axis.points)} points`;
  return `${kinds[axis.kind]} ${span}, ${points}${spacing}`;
}
