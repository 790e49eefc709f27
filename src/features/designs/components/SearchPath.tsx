import { useMemo } from 'react';
import type { Goal, OptimiseResult } from '../../../../shared/optimiseDesign.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import type { PlotSeries } from '../../../components/plot/plotTypes.ts';
import { formatCount } from '../../../lib/format.ts';
import { unitLabel, goalQuantityLooks, printQuantity } from '../model/quantities.ts';

const xAxis = { label: 'films solved', format: (value: number) => `${formatCount(value)} films` };

/** The best value so far against the films solved: the global search solid, the local one dashed. */
export function SearchPath({ goal, result }: { goal: Goal; result: OptimiseResult }) {
  const look = goalQuantityLooks[goal.quantity];
  const series = useMemo(() => pathSeries(goal, wholePath(result)), [goal, result]);
  const yAxes = useMemo(() => [{ label: unitLabel(goalQuantityLooks[goal.quantity]) }], [goal]);
  if (result.path.length === 0) return null;
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

/** The path up to the films solved: of an unfinished search the last ones may have brought nothing better. */
function wholePath({ path, evaluations }: OptimiseResult): OptimiseResult['path'] {
  const last = path.at(-1);
  return last && last.evaluations < evaluations ? [...path, { ...last, evaluations }] : path;
}

function pathSeries(goal: Goal, path: OptimiseResult['path']): PlotSeries[] {
  const look = goalQuantityLooks[goal.quantity];
  const valueOf = ({ value }: (typeof path)[number]) => (value === null ? NaN : value * look.scale);
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
            // Until a better film comes the best stays as it is.
            x: steps.flatMap(({ evaluations }, i) => (i === 0 ? [evaluations] : [evaluations, evaluations])),
            y: steps.flatMap((step, i) => (i === 0 ? [step] : [steps[i - 1]!, step])).map(valueOf),
            tone: look.tone,
            format: (value: number) => printQuantity({ ...look, scale: 1 }, value),
          },
        ],
  );
}
