import { axisValueAt, axisValues } from '../../../../shared/axisValues.ts';
import type { Run } from '../../../../shared/run.ts';
import { nearestIndex } from '../../../components/plot/curveValues.ts';
import { sweepXAxis } from '../../../components/plot/readingSeries.ts';
import { placeOnAxis } from '../../../lib/placeOnAxis.ts';
import type { Comparison, CompareView } from './planComparison.ts';
import { quantityWords } from './runAxes.ts';
import type { AxesByRun, RunAxis } from './runAxes.ts';
import { sharedWord } from './sharedAxis.ts';

/** Curves on one plot, and differences on another, that can still be told apart. */
export const MOST_CURVES = 12;

/** A quantity that some runs sweep and that is not drawn: held at one value, or a curve for each. */
export type HeldQuantity = {
  key: string;
  /** Where its values come from: the reference where that has them. */
  source: RunAxis;
  /** Values to choose from; null where any value between the ends can be cut at. */
  choices: readonly number[] | null;
  value: number | 'all';
  mayBeAll: boolean;
  /** Another run sweeps it of another layer (or m in another plane) instead: one value of each is drawn at a time. */
  apart: boolean;
};

/** The field of the address that says at which value a quantity is held. */
export function heldField(key: string): string {
  return `at-${key}`;
}

/** What is held at one value, in words: `the wavelength 632.8 nm`. */
export function heldWords(held: readonly HeldQuantity[]): string[] {
  return held.flatMap(({ source, value, apart }) => {
    const print = sweepXAxis(source.axis, source.word).format ?? String;
    const where = apart ? ' in runs that sweep it' : '';
    return value === 'all' ? [] : [`${quantityWords(source)} ${print(value)}${where}`];
  });
}

/** Whether a run has members of this quantity, between which nothing is interpolated. */
export function isDiscrete({ field, axis }: RunAxis): boolean {
  return field === 'family' || axis.kind === 'repeat';
}

/** What is held in a view, at the values of the address or, without, at those that make most sense. */
export function heldQuantities(
  { base, axes, view, drawn }: Pick<Comparison, 'base' | 'axes' | 'view' | 'drawn'>,
  search: URLSearchParams,
): HeldQuantity[] {
  if (!base || !view) return [];
  const ordered = [base, ...drawn.filter((run) => run !== base)];
  const found = ordered.flatMap((run) => heldAxesOf(axes, run, view));
  const keys = [...new Set(found.map(({ heldKey }) => heldKey))];
  const held = keys.map((key): HeldQuantity => {
    const own = found.filter((one) => one.heldKey === key);
    const source = { ...(own.find(isDiscrete) ?? own[0]!), word: sharedWord(own) };
    const apart = sweptApart(source, axes, ordered, view);
    const choices = isDiscrete(source) ? axisValues(source.axis) : null;
    const given = search.get(heldField(key));
    const all = choices !== null && view.keys.length === 1 && !apart && (given === null || given === 'all');
    const value = all ? 'all' : valueFor(source, choices, given, axes, ordered);
    return { key, source, choices, value, mayBeAll: false, apart };
  });
  // Too many curves: the quantities that come last are held at one value.
  for (let last = held.length - 1; last >= 0 && curveCount(held, axes, ordered, view) > MOST_CURVES; last--) {
    const { source, choices, value } = held[last]!;
    if (value === 'all')
      held[last] = { ...held[last]!, value: valueFor(source, choices, null, axes, ordered) };
  }
  return held.map((one, position) => {
    const asAll = held.map((other, index) =>
      index === position ? { ...other, value: 'all' as const } : other,
    );
    const possible = one.choices !== null && view.keys.length === 1 && !one.apart;
    return { ...one, mayBeAll: possible && curveCount(asAll, axes, ordered, view) <= MOST_CURVES };
  });
}

/** The axes of a run that a view does not draw. */
export function heldAxesOf(axes: AxesByRun, run: Run, { keys }: CompareView): RunAxis[] {
  return (axes.get(run.id) ?? []).filter(({ key }) => !keys.includes(key));
}

/** Whether a run holds the same of another layer, which a run that holds this quantity does not. */
function sweptApart(
  { heldKey, axis }: RunAxis,
  axes: AxesByRun,
  runs: readonly Run[],
  view: CompareView,
): boolean {
  const held = runs.map((run) =>
    heldAxesOf(axes, run, view)
      .filter((one) => one.axis.kind === axis.kind)
      .map((one) => one.heldKey),
  );
  const [having, others] = [true, false].map((has) => held.filter((own) => own.includes(heldKey) === has));
  return others!.flat().some((other) => having!.some((own) => !own.includes(other)));
}

/** As in the address; else as in a film that does not sweep the quantity, which is what the others are held against. */
function valueFor(
  { heldKey, axis }: RunAxis,
  choices: readonly number[] | null,
  given: string | null,
  axes: AxesByRun,
  runs: readonly Run[],
): number {
  const [low, high] = [Math.min(axis.from, axis.to), Math.max(axis.from, axis.to)];
  const plain = runs.filter((run) => !axes.get(run.id)?.some((one) => one.heldKey === heldKey));
  const places = [...plain, ...runs].map(({ document }) => placeOnAxis(axis, document));
  const wanted = [given === null || given.trim() === '' ? null : Number(given), ...places].find(
    (place) => place !== null && place >= low && place <= high,
  );
  const value = wanted ?? axisValueAt(axis, Math.floor((axis.points - 1) / 2));
  return choices === null ? value : (choices[nearestIndex(choices, value)] ?? value);
}

/** Curves that all runs have together, or differences where those are more. */
function curveCount(
  held: readonly HeldQuantity[],
  axes: AxesByRun,
  [base, ...others]: readonly Run[],
  view: CompareView,
): number {
  const several = held.filter(({ value }) => value === 'all');
  const membersOf = (run: Run, { key, choices }: HeldQuantity): number => {
    const own = heldAxesOf(axes, run, view).find((one) => one.heldKey === key);
    return own === undefined ? 1 : isDiscrete(own) ? own.axis.points : (choices?.length ?? 1);
  };
  const curvesOf = (run: Run) => several.reduce((count, one) => count * membersOf(run, one), 1);
  const curves = base ? [base, ...others].reduce((sum, run) => sum + curvesOf(run), 0) : 0;
  const pairs = others.reduce(
    (sum, run) =>
      sum +
      several.reduce(
        (count, one) => count * Math.max(membersOf(run, one), base ? membersOf(base, one) : 1),
        1,
      ),
    0,
  );
  return Math.max(curves, pairs);
}
