import type { SharedRun, SweepAxis } from '../../../../shared/run.ts';
import type { StackBlock, StackItem, StackLayer } from '../../../../shared/stack.ts';

/** What of a run decides the numbers that are drawn, and over which axes they are drawn: one of a curve, two of a map. */
export type ComparedInput = Pick<SharedRun, 'document' | 'materials' | 'readings'> & {
  swept: readonly SweepAxis[];
};

/** The axis of this kind among those that are drawn. */
export function sweptAs<Kind extends SweepAxis['kind']>(
  { swept }: Pick<ComparedInput, 'swept'>,
  kind: Kind,
): Extract<SweepAxis, { kind: Kind }>[] {
  return swept.filter((axis): axis is Extract<SweepAxis, { kind: Kind }> => axis.kind === kind);
}

/**
 * One thing that a run was computed from. Runs differ in it when `value` is not the same in all; what is said of each
 * run then is `phrase`, or `detail` where the phrases alone would be alike.
 */
export type InputFact = {
  key: string;
  value: string;
  phrase: string;
  detail?: string;
  /** Said of a run that has no such thing; without it only the runs that have it are compared. */
  absent?: string;
  /** A fact that this one says too: it is left out where both differ. */
  covers?: string;
};

/** Every layer once, in the order in which light meets them; blocks are not expanded. */
export function layersIn(items: readonly StackItem[]): StackLayer[] {
  return items.flatMap((item) => ('layers' in item ? layersIn(item.layers) : [item]));
}

/** Every block, outer ones before those inside them. */
export function blocksIn(items: readonly StackItem[]): StackBlock[] {
  return items.flatMap((item) => ('layers' in item ? [item, ...blocksIn(item.layers)] : []));
}
