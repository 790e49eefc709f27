import { useState } from 'react';
import type { ToleranceDesign, ToleranceResult } from '../../../../shared/toleranceDesign.ts';
import { formatCount, formatNumber } from '../../../lib/format.ts';
import { demandLooks, demandNames } from '../model/demands.ts';
import type { DesignView } from '../model/designView.ts';
import { spreadReadings } from '../model/readingNames.ts';
import { DemandWords } from './DemandWords.tsx';
import { Distribution } from './Distribution.tsx';
import { PointSelect } from './PointSelect.tsx';
import { SensitivityTable } from './SensitivityTable.tsx';

type Props = {
  input: ToleranceDesign;
  result: ToleranceResult;
  view: DesignView;
  onView: (change: Partial<DesignView>) => void;
};

/** How many films would meet the demands, how far each reading spreads, and what it hangs on. */
export function ToleranceResultView({ input, result, view, onView }: Props) {
  const [reading, setReading] = useState<(typeof spreadReadings)[number]>('rotationDeg');
  const point = result.points.find(({ pointId }) => pointId === view.pointId);
  return (
    <div className="flex flex-col gap-6">
      <section aria-label="Answer" className="card px-5 py-4">
        <p className="text-lead">
          {result.yield
            ? `${percent(result.yield.share)} of the films meet all demands`
            : 'No demand was made, so there is no yield'}
        </p>
        {result.yield && (
          <p className="mt-1">
            95 % interval {percent(result.yield.low)} to {percent(result.yield.high)}, from{' '}
            {formatCount(result.samples)} films (Wilson).
          </p>
        )}
        {result.byDemand.length > 1 && (
          <ul className="mt-1 list-disc pl-5">
            {result.byDemand.map(({ demand, share }) => (
              <li key={demand}>
                {percent(share)} meet the demand on the {demandLabel(demand)}
              </li>
            ))}
          </ul>
        )}
        <DemandWords demands={input.demands} className="mt-2 text-note text-muted" />
      </section>
      <section aria-labelledby="spread-heading">
        <div className="mb-2 flex flex-wrap items-center gap-x-4 gap-y-2">
          <h2 id="spread-heading" className="text-lead">
            Spread of the readings
          </h2>
          <PointSelect
            points={input.points}
            value={view.pointId}
            onChange={(pointId) => onView({ pointId })}
          />
        </div>
        <div className="grid gap-5 md:grid-cols-2 xl:grid-cols-3">
          {point &&
            spreadReadings.map((name) => (
              <Distribution
                key={name}
                reading={name}
                nominal={point.nominal[name]}
                distribution={point.distributions[name]}
              />
            ))}
        </div>
      </section>
      <SensitivityTable
        input={input}
        sensitivities={result.sensitivities}
        pointId={view.pointId}
        reading={reading}
        onReading={setReading}
      />
      <p className="text-note text-muted">
        {formatCount(result.samples)} films, seed {result.seed}: the same seed gives the same films.
      </p>
    </div>
  );
}

function percent(share: number): string {
  return `${formatNumber(100 * share, { digits: 3 })} %`;
}

function demandLabel(demand: string): string {
  const name = demandNames.find((one) => one === demand);
  return name ? demandLooks[name].label : demand;
}
