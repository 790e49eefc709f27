import { useMemo, useState } from 'react';
import { rangeWithin } from './curveValues.ts';
import type { PlotAxis, PlotSeries } from './plotTypes.ts';

type Figure = { series: readonly PlotSeries[]; yAxes: readonly PlotAxis[] };
type Range = readonly [number, number];

/**
 * The y axes of a figure whose curves are being moved: they enclose all that was drawn since the movement began, so that
 * the curves move and not the scale under them. Logarithmic axes stay as they are.
 */
export function useSteadyAxes(figure: Figure, steady: boolean): readonly PlotAxis[] {
  const [kept, setKept] = useState<{ figure: Figure; ranges: ReadonlyMap<string, Range> } | null>(null);
  if (!steady && kept !== null) setKept(null);
  if (steady && kept?.figure !== figure) {
    setKept({ figure, ranges: widened(kept?.ranges ?? new Map(), figure) });
  }
  const ranges = steady ? kept?.ranges : undefined;
  // The same axes while the figure is the same: new ones would draw it again at every step of the pointer.
  return useMemo(() => {
    if (!ranges) return figure.yAxes;
    return figure.yAxes.map((axis) => {
      const range = ranges.get(axis.label);
      return axis.log || !range ? axis : { ...axis, include: [...(axis.include ?? []), ...range] };
    });
  }, [figure.yAxes, ranges]);
}

function widened(before: ReadonlyMap<string, Range>, { series, yAxes }: Figure): Map<string, Range> {
  const ranges = new Map(before);
  series.forEach((one) => {
    const label = yAxes[one.yAxisIndex ?? 0]?.label;
    const range = rangeWithin(one, -Infinity, Infinity, false);
    if (label === undefined || range === null) return;
    const [low, high] = ranges.get(label) ?? range;
    ranges.set(label, [Math.min(low, range[0]), Math.max(high, range[1])]);
  });
  return ranges;
}
