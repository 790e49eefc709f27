import type { Run } from '../../../../shared/run.ts';
import { drawnAxesOf, quantityWords, runAxesOf } from './runAxes.ts';
import type { AxesByRun, RunAxis } from './runAxes.ts';
import { sharedQuantityWords } from './sharedAxis.ts';

/** What runs are drawn over: one quantity as curves, two as maps, the first of them across. */
export type CompareView = { id: string; keys: readonly string[]; label: string };

export type Comparison = {
  /** The reference; null where no run has values. */
  base: Run | null;
  axes: AxesByRun;
  /** In what ways the reference can be laid over at least one other run. */
  views: readonly CompareView[];
  view: CompareView | null;
  drawn: readonly Run[];
  refused: readonly { run: Run; why: string }[];
};

/**
 * Which runs can be laid over each other and how. Without a choice the way that takes in most runs, and the first
 * run that has any partner as the reference; one that was asked for and has none is no reference.
 */
export function planComparison(
  runs: readonly Run[],
  wanted: { reference: string | null; view: string | null },
): Comparison {
  const done = runs.filter(({ progress }) => progress.state === 'done');
  const axes = runAxesOf(done);
  const of = (run: Run) => axes.get(run.id) ?? [];
  const fits = (run: Run, { keys }: Pick<CompareView, 'keys'>) =>
    keys.every((key) => drawnAxesOf(of(run)).some((one) => one.key === key));
  const usable = (run: Run) =>
    viewsOf(of(run)).flatMap((view): CompareView[] => {
      const others = done.filter((other) => other !== run && fits(other, view));
      return others.length > 0 ? [{ ...view, label: labelOf(view, [run, ...others].map(of)) }] : [];
    });
  const asked = done.filter(({ id }) => id === wanted.reference);
  const base = [...asked, ...done].find((run) => usable(run).length > 0) ?? asked[0] ?? done[0] ?? null;
  const views = base ? usable(base) : [];
  const count = (view: CompareView) => done.filter((run) => fits(run, view)).length;
  const most = Math.max(0, ...views.map(count));
  const view = views.find(({ id }) => id === wanted.view) ?? views.find((one) => count(one) === most) ?? null;
  const whyNot = (run: Run): string | null => {
    if (run.progress.state !== 'done') {
      return `It has no values (${run.progress.state}): open it to see why, or take another run.`;
    }
    if (!base || run === base || (view && fits(run, view))) return null;
    const other = views.find((one) => fits(run, one));
    return other ? `${has(of(run))}: choose “${other.label}” to see it.` : noCommonAxis(of(run), of(base));
  };
  const refused = runs.flatMap((run) => {
    const why = whyNot(run);
    return why === null ? [] : [{ run, why }];
  });
  const drawn = view ? done.filter((run) => fits(run, view)) : [];
  return { base, axes, views, view, drawn, refused };
}

/** Over what a run could be drawn, a map before its cuts. */
function viewsOf(axes: readonly RunAxis[]): Omit<CompareView, 'label'>[] {
  const keys = drawnAxesOf(axes).map(({ key }) => key);
  const curves = keys.map((key) => ({ id: key, keys: [key] }));
  return keys.length < 2 ? curves : [{ id: 'map', keys }, ...curves];
}

function labelOf({ keys }: Pick<CompareView, 'keys'>, axes: readonly (readonly RunAxis[])[]): string {
  const words = keys.map((key) =>
    sharedQuantityWords(axes.flatMap((own) => drawnAxesOf(own).filter((one) => one.key === key))),
  );
  return `${keys.length > 1 ? 'maps' : 'curves'} over ${words.join(' and ')}`;
}

function has(axes: readonly RunAxis[]): string {
  return `It is swept over ${drawnAxesOf(axes).map(quantityWords).join(' and ')}`;
}

function noCommonAxis(own: readonly RunAxis[], base: readonly RunAxis[]): string {
  const wanted = drawnAxesOf(base).map(quantityWords);
  return (
    `${has(own)}, the reference over ${wanted.join(' and ')}: they have no axis in common. ` +
    `Start its film as a run over ${wanted.join(' or ')}, or take one of the two out.`
  );
}
