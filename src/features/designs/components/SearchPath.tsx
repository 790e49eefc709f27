import { useMemo } from 'react';
import type { Goal, OptimiseResult } from '../../../../shared/optimiseDesign.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import type { PlotSeries } from '../../../components/plot/plotTypes.ts';
import { formatCount } from '../../../lib/format.ts';
import { unitLabel, goalQuantityLooks, printQuantity } from '../model/quantities.ts';

const xAxis = { label: 'films solved', format: (value: number) => `${formatCount(value)} films` };

/** The best value so far against the films solved: the global search solid, the local one dashed. */
export function SearchPath({ goal, path }: { goal: Goal; path: OptimiseResult['path'] }) {
  const look = goalQuantityLooks[goal.quantity];
  const series = useMemo(() => pathSeries(goal, path), [goal, path]);
  const yAxes = useMemo(() => [{ label: unitLabel(goalQuantityLooks[goal.quantity]) }], [goal]);
  if (path.length === 0) return null;
  return (
    <section aria-label="Path of the search">
      <h2 className="mb-2 text-lead">Path of the search: best {look.label} so far</h2>
      <LinePlot
        series={series}
        xAxis={xAxis}
        yAxes={yAxes}
        height={240}
        ariaLabel={`Best ${look.label} so far against the films solved`}
      />
    </section>
  );
}

function pathSeries(goal: Goal, path: OptimiseResult['path']): PlotSeries[] {
  const look = goalQuantityLooks[goal.quantity];
  const firstLocal = path.findIndex(({ phase }) => phase === 'local');
  // The local part begins where the global one ended, so that the line is one.
  const parts = [
    {
      name: 'global search',
      steps: firstLocal < 0 ? path : path.slice(0, firstLocal),
      dash: 'solid' as const,
    },
    {
      name: 'local search',
      steps: firstLocal < 0 ? [] : path.slice(Math.max(0, firstLocal - 1)),
      dash: 'dashed' as const,
    },
  ];
  return parts.flatMap(({ name, steps, dash }) =>
    steps.length === 0
      ? []
      : [
          {
            name,
            dash,
            x: steps.map(({ evaluations }) => evaluations),
            y: steps.map(({ value }) => (value === null ? NaN : value * look.scale)),
            tone: look.tone,
            format: (value: number) => printQuantity({ ...look, scale: 1 }, value),
          },
        ],
  );
}
