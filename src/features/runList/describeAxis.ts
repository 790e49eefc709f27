import type { SweepAxis } from '../../../shared/run.ts';
import { formatCount, formatPlain } from '../../lib/format.ts';

const kinds = {
  wavelength: 'wavelength',
  angle: 'angle',
  thickness: 'layer thickness',
  direction: 'direction of m',
  voigtScale: 'scale of Q',
  repeat: 'repeats',
  graded: 'interface width',
} as const;
const units = {
  wavelength: ' nm',
  angle: '°',
  thickness: ' nm',
  direction: '°',
  voigtScale: '',
  repeat: '',
  graded: ' nm',
} as const;

/** What a run sweeps: `angle 0–85°` and `171 points`. */
export function describeAxis(axis: SweepAxis): { span: string; points: string } {
  const span = `${formatPlain(axis.from)}–${formatPlain(axis.to)}${units[axis.kind]}`;
  const spacing = axis.spacing === 'log' ? ', log spacing' : '';
  const points = axis.points === 1 ? '1 point' : `${formatCount(axis.points)} points`;
  return { span: `${kinds[axis.kind]} ${span}`, points: points + spacing };
}
