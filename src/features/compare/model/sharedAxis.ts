import type { PlotAxis } from '../../../components/plot/plotTypes.ts';
import { sweepXAxis } from '../../../components/plot/readingSeries.ts';
import { quantityWords } from './runAxes.ts';
import type { RunAxis } from './runAxes.ts';

/** What the layers are called that axes of several runs sweep; never one of them where they differ. */
export function sharedWord(axes: readonly Pick<RunAxis, 'word'>[]): string | undefined {
  const words = [...new Set(axes.map(({ word }) => word))];
  if (words.length === 1) return words[0];
  return words.length > 2 ? 'each run’s own layer' : words.map((word) => word ?? 'every magnet').join(' or ');
}

/** What axes sweep that are laid over each other, in words. */
export function sharedQuantityWords(axes: readonly RunAxis[]): string {
  const [first] = axes;
  if (!first) return '';
  return severalPlanes(axes) ? 'the direction of m' : quantityWords({ ...first, word: sharedWord(axes) });
}

/** The one plot axis of axes that are laid over each other; null where there are none. */
export function sharedXAxis(axes: readonly RunAxis[]): PlotAxis | null {
  const [first] = axes;
  if (!first) return null;
  const drawn = sweepXAxis(first.axis, sharedWord(axes));
  return severalPlanes(axes) ? { ...drawn, label: 'angle of m in each run’s own plane (deg)' } : drawn;
}

function severalPlanes(axes: readonly RunAxis[]): boolean {
  return new Set(axes.flatMap(({ axis }) => (axis.kind === 'direction' ? axis.plane : []))).size > 1;
}
