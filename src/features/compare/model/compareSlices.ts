import { sweepXAxis } from '../../../components/plot/readingSeries.ts';
import type { ComparedRun, ComparedSlice, LoadedRun } from './comparedRun.ts';
import { describeDifferences } from './describeDifferences.ts';
import { heldInput } from './heldInput.ts';
import { heldAxesOf, isDiscrete } from './heldQuantities.ts';
import type { HeldQuantity } from './heldQuantities.ts';
import { nearestIndex } from '../../../components/plot/curveValues.ts';
import { sameValue, shareOf } from './interpolate.ts';
import type { GridShare } from './interpolate.ts';
import type { CompareView } from './planComparison.ts';
import { quantityWords } from './runAxes.ts';
import type { AxesByRun, RunAxis } from './runAxes.ts';
import { gridOf } from './runSlice.ts';

/** What a view draws of each run at the held values, with what differs between the inputs of all that is drawn. */
export function compareSlices(
  runs: readonly LoadedRun[],
  axes: AxesByRun,
  view: CompareView,
  held: readonly HeldQuantity[],
): ComparedRun[] {
  const cut = runs.map((one, position) => slicesOf(one, position, axes, view, held));
  const inputs = cut.flatMap(({ slices }) => slices.map(inputOf));
  const phrases = describeDifferences(inputs);
  let next = 0;
  return runs.map((one, index) => {
    const { slices, missing, members } = cut[index]!;
    const said = slices.map((slice) => ({ ...slice, phrases: phrases[next++] ?? [] }));
    const [first, ...others] = said;
    return {
      ...one,
      slices: said,
      members,
      phrases: (first?.phrases ?? []).filter((phrase) =>
        others.every((other) => other.phrases.includes(phrase)),
      ),
      notes: [...new Set([...said.flatMap(({ notes }) => notes), ...missing])],
    };
  });
}

function inputOf({ of, axes, at, heldAxes }: CutSlice) {
  const values = heldAxes.map(({ heldKey, axis }) => ({ axis, value: at.get(heldKey) ?? NaN }));
  return heldInput(
    of.run,
    axes.map(({ axis }) => axis),
    values,
  );
}

type CutSlice = Omit<ComparedSlice, 'phrases'> & { heldAxes: readonly RunAxis[] };
type HeldPlace = { place: GridShare; value: number; note: string | null };

function slicesOf(
  of: LoadedRun,
  position: number,
  axesByRun: AxesByRun,
  view: CompareView,
  held: readonly HeldQuantity[],
): { slices: CutSlice[]; missing: string[]; members: string } {
  const own = axesByRun.get(of.run.id) ?? [];
  const drawn = view.keys.flatMap((key) => own.find((one) => one.key === key) ?? []);
  const heldAxes = heldAxesOf(axesByRun, of.run, view);
  const missing: string[] = [];
  const places = heldAxes.map((axis) => {
    const quantity = held.find(({ key }) => key === axis.heldKey);
    const found = quantity ? placesOn(axis, gridOf(of.result, axis.field), quantity) : [];
    if (found.length === 0 && quantity) missing.push(outOfReach(axis, quantity));
    return found;
  });
  const combinations = places.reduce<HeldPlace[][]>(
    (before, choices) => before.flatMap((chosen) => choices.map((one) => [...chosen, one])),
    [[]],
  );
  const slices = combinations.map((chosen): CutSlice => {
    const texts = heldAxes.flatMap((axis, index) => {
      const several = (places[index]?.length ?? 0) > 1;
      return several ? [printOn(axis, chosen[index]?.value ?? NaN)] : [];
    });
    return {
      of,
      position,
      axes: drawn,
      along: drawn.map(({ field }) => field),
      held: heldAxes.flatMap(({ field }, index) => {
        const one = chosen[index];
        return one ? [{ field, place: one.place }] : [];
      }),
      heldAxes,
      at: new Map(heldAxes.map(({ heldKey }, index) => [heldKey, chosen[index]?.value ?? NaN])),
      member: texts.join(', '),
      notes: chosen.flatMap(({ note }) => note ?? []),
    };
  });
  const several = heldAxes.filter((_, index) => (places[index]?.length ?? 0) > 1);
  return { slices, missing, members: several.map(quantityWords).join(' and ') };
}

/** Where a run is held for a quantity: its members, its nearest member, or a cut where it reaches. */
function placesOn(axis: RunAxis, grid: ArrayLike<number>, { value, choices }: HeldQuantity): HeldPlace[] {
  const at = (index: number) => ({ place: { low: index, high: index, share: 0 }, value: grid[index]! });
  if (isDiscrete(axis)) {
    if (value === 'all') return Array.from(grid, (_, index) => ({ ...at(index), note: null }));
    const nearest = at(nearestIndex(grid, value));
    const note = sameValue(nearest.value, value)
      ? null
      : `no curve at ${printOn(axis, value)}: the nearest, ${printOn(axis, nearest.value)}, is drawn`;
    return [{ ...nearest, note }];
  }
  const wanted = value === 'all' ? (choices ?? []) : [value];
  return wanted.flatMap((one) => {
    const place = shareOf(grid, one);
    if (place === null) return [];
    const row = grid[place.low]!;
    const ends = [row, grid[place.high]!].sort((a, b) => a - b).map((end) => printOn(axis, end));
    const note =
      place.share === 0
        ? `cut at ${printOn(axis, one)}, a row of its grid`
        : `cut at ${printOn(axis, one)}, linear between its rows at ${ends.join(' and ')}`;
    return [{ place, value: place.share === 0 ? row : one, note }];
  });
}

function outOfReach(axis: RunAxis, { value }: HeldQuantity): string {
  const { from, to } = axis.axis;
  const [low, high] = [Math.min(from, to), Math.max(from, to)].map((end) => printOn(axis, end));
  const wanted = value === 'all' ? 'these values' : printOn(axis, value);
  return `nothing drawn at ${wanted}: it reaches from ${low} to ${high}`;
}

function printOn({ axis, word }: RunAxis, value: number): string {
  return (sweepXAxis(axis, word).format ?? String)(value);
}
