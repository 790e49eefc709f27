import { axesOf } from '../../../../shared/runAxes.ts';
import type { AxisField } from '../../../../shared/runAxes.ts';
import type { Run, SweepAxis } from '../../../../shared/run.ts';
import { planeEnds } from '../../../components/plot/readingSeries.ts';
import { alignLayers, namedLayers } from './alignLayers.ts';
import { sweptWord } from './describeDifferences.ts';

/** An axis of a run. */
export type RunAxis = {
  /** Axes of several runs with the same key can be laid over each other. */
  key: string;
  /** Axes of several runs with the same one can be held at one value: they sweep the same of the same layer. */
  heldKey: string;
  axis: SweepAxis;
  field: AxisField;
  /** What the swept layer is called. */
  word: string | undefined;
};

export type AxesByRun = ReadonlyMap<string, readonly RunAxis[]>;

/**
 * The axes of each run by its id. The kind of an axis is its key, so that thicknesses of different layers can be laid
 * over each other; only where one run sweeps two of a kind the layer's name belongs to the key. 2 nm of one layer are
 * not 2 nm of another though: what is held has the layer in its key wherever the runs differ in it.
 */
export function runAxesOf(runs: readonly Run[]): AxesByRun {
  const twice = runs.flatMap((run) => {
    const kinds = axesOf<SweepAxis>(run).map(({ axis }) => axis.kind);
    return kinds.filter((kind, position) => kinds.indexOf(kind) !== position);
  });
  const slots = alignLayers(runs.map(namedLayers));
  const targetIn = (axis: SweepAxis, index: number) => targetOf(axis, runs[index]!, slots[index] ?? []);
  const targets = runs.flatMap((run, index) =>
    axesOf<SweepAxis>(run).map(({ axis }) => ({ kind: axis.kind, target: targetIn(axis, index) })),
  );
  return new Map(
    runs.map((run, index) => [
      run.id,
      axesOf<SweepAxis>(run).map(({ axis, field }): RunAxis => {
        const { kind } = axis;
        const word = sweptWord(axis, run);
        const name = word ?? ('blockId' in axis ? axis.blockId : 'all');
        const target = targetIn(axis, index);
        const apart = targets.some((other) => other.kind === kind && other.target !== target);
        const key = twice.includes(kind) ? `${kind} ${name}` : kind;
        return {
          key,
          heldKey: apart ? `${kind} ${target}` : key,
          ...{ axis, field, word },
        };
      }),
    ]),
  );
}

/** Of what an axis sweeps its quantity: equal for the layers of several films that are the same one. */
function targetOf(axis: SweepAxis, run: Run, slots: readonly string[]): string {
  const id = 'layerId' in axis ? axis.layerId : undefined;
  const layer = slots[namedLayers(run).findIndex((one) => one.layer.id === id)] ?? id ?? 'all';
  return axis.kind === 'direction' ? `${axis.plane} ${layer}` : layer;
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
  const of = word === undefined ? '' : ` of ${word}`;
  switch (axis.kind) {
    case 'thickness':
      return word === undefined ? kindWords.thickness : `the thickness${of}`;
    case 'graded':
      return word === undefined ? kindWords.graded : `the interface width above ${word}`;
    case 'direction':
      return `${kindWords.direction}${of} from ${planeEnds[axis.plane]}`;
    default:
      return kindWords[axis.kind] + of;
  }
}
