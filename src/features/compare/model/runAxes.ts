import { axesOf } from '../../../../shared/runAxes.ts';
import type { AxisField } from '../../../../shared/runAxes.ts';
import type { Run, SweepAxis } from '../../../../shared/run.ts';
import { sweptWord } from './describeDifferences.ts';

/** An axis of a run. Axes of several runs with the same `key` sweep the same quantity. */
export type RunAxis = {
  key: string;
  axis: SweepAxis;
  field: AxisField;
  /** What the swept layer is called. */
  word: string | undefined;
};

export type AxesByRun = ReadonlyMap<string, readonly RunAxis[]>;

/**
 * The axes of each run by its id. The kind of an axis is its key, so that thicknesses of different layers can be laid
 * over each other; only where one run sweeps two of a kind the layer's name belongs to the key.
 */
export function runAxesOf(runs: readonly Run[]): AxesByRun {
  const twice = runs.flatMap((run) => {
    const kinds = axesOf<SweepAxis>(run).map(({ axis }) => axis.kind);
    return kinds.filter((kind, position) => kinds.indexOf(kind) !== position);
  });
  return new Map(
    runs.map((run) => [
      run.id,
      axesOf<SweepAxis>(run).map(({ axis, field }): RunAxis => {
        const word = sweptWord(axis, run);
        const target = word ?? ('blockId' in axis ? axis.blockId : 'all');
        return { key: twice.includes(axis.kind) ? `${axis.kind} ${target}` : axis.kind, axis, field, word };
      }),
    ]),
  );
}

/** The axes along which a run has enough values to be drawn; a family has a few curves or maps only. */
export function drawnAxesOf(axes: readonly RunAxis[]): RunAxis[] {
  return axes.filter(({ field }) => field !== 'family');
}

const kindWords: Record<SweepAxis['kind'], string> = {
  wavelength: 'the wavelength',
  angle: 'the angle of incidence',
  thickness: 'a layer thickness',
  direction: 'the direction of m',
  voigtScale: 'the scale of Q',
  repeat: 'the repeats of a block',
  graded: 'an interface width',
};

/** What is swept, in words: `the angle of incidence`, `the thickness of Pt cap`. */
export function quantityWords({ axis, word }: Pick<RunAxis, 'axis' | 'word'>): string {
  return axis.kind === 'thickness' && word ? `the thickness of ${word}` : kindWords[axis.kind];
}
