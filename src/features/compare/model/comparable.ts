import type { Run, SweepAxis } from '../../../../shared/run.ts';

export const MOST_RUNS = 6;

const kindWords: Record<SweepAxis['kind'], string> = {
  wavelength: 'the wavelength',
  angle: 'the angle of incidence',
  thickness: 'a layer thickness',
  direction: 'the direction of m',
  voigtScale: 'the scale of Q',
  repeat: 'the repeats of a block',
  graded: 'an interface width',
};

/** Why a run cannot be laid over others that sweep this kind of quantity; null where it can. */
export function refusalOf(
  run: Pick<Run, 'axis' | 'second' | 'family' | 'progress'>,
  kind: SweepAxis['kind'],
) {
  if (run.progress.state !== 'done') {
    return `It has no values (${run.progress.state}): open it to see why, or take another run.`;
  }
  if (run.second) return 'It is a map over two axes, not a curve: start a run with one axis to compare it.';
  if (run.family) return 'It is a family of curves: start a run of the one curve that is to be compared.';
  if (run.axis.kind !== kind) {
    return `It sweeps ${kindWords[run.axis.kind]}, the reference ${kindWords[kind]}: curves over different quantities have no common axis.`;
  }
  return null;
}

/** The ids in the address, each once, at most as many as a plot can hold. */
export function readRunIds(search: URLSearchParams): string[] {
  const named = (search.get('runs') ?? '').split(',').filter((id) => id !== '');
  return [...new Set(named)].slice(0, MOST_RUNS);
}
