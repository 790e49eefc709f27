import type { SweepAxes, SweepAxis } from '../../../shared/run.ts';
import { pointCountOf } from '../../../shared/runAxes.ts';
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
export function describeAxes({ axis, second, family }: SweepAxes): { span: string; points: string } {
  const spans = [axis, second, family].flatMap((one) => (one ? [spanOf(one)] : []));
  const count = pointCountOf({ axis, second, family });
  const spacing = axis.spacing === 'log' ? ', log spacing' : '';
  const points = count === 1 ? '1 point' : `${formatCount(count)} points`;
  return { span: spans.join(' × '), points: points + spacing };
}

function spanOf(axis: SweepAxis): string {
  const span = `${formatPlain(axis.from)}–${formatPlain(axis.to)}${units[axis.kind]}`;
  return `${kinds[axis.kind]} ${span}`;
}
