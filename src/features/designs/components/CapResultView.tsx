import type { ReactNode } from 'react';
import type { CapDesign, CapResult } from '../../../../shared/capDesign.ts';
import { formatCount, formatNumber } from '../../../lib/format.ts';
import type { DesignView } from '../model/designView.ts';
import { CapPlot } from './CapPlot.tsx';
import { CapRanking } from './CapRanking.tsx';
import { DemandWords } from './DemandWords.tsx';

type Props = {
  input: CapDesign;
  result: CapResult;
  view: DesignView;
  onView: (change: Partial<DesignView>) => void;
  actions?: (candidateId: string) => ReactNode;
};

/** Which cap, and how thick: the answer in a sentence, the curves, and the candidates in their order. */
export function CapResultView({ input, result, view, onView, actions }: Props) {
  const best = result.candidates.find(({ id, best }) => id === result.ranking[0] && best !== null);
  return (
    <div className="flex flex-col gap-6">
      <section aria-label="Answer" className="card px-5 py-4">
        {best?.best ? (
          <div className="flex flex-wrap items-start gap-x-6 gap-y-3">
            <div className="min-w-0 flex-1 basis-80">
              <p className="text-lead">
                {best.label}, {formatNumber(best.best.thicknessNm, { digits: 3 })} nm
              </p>
              <p className="mt-1">{best.best.reason}</p>
              {best.best.thicknessNm >= input.range.toNm && (
                <p className="mt-1 text-note text-warn">
                  <span aria-hidden="true">▲ </span>At the end of the range: a wider range may give more.
                </p>
              )}
            </div>
            {actions?.(best.id)}
          </div>
        ) : (
          <>
            <p className="text-lead">No candidate meets the demands</p>
            <p className="mt-1">What keeps each of them from it stands in the table below.</p>
          </>
        )}
        <DemandWords demands={input.demands} className="mt-2 text-note text-muted" />
      </section>
      <CapPlot input={input} result={result} view={view} onView={onView} />
      <CapRanking input={input} result={result} pointId={view.pointId} {...(actions ? { actions } : {})} />
      <p className="text-note text-muted">
        Bands hold 68.27 % of {formatCount(result.samples)} films with errors of one standard deviation:{' '}
        {formatNumber(input.tolerance.ratePercent, { digits: 3 })} % of the rate of each material,{' '}
        {formatNumber(input.tolerance.randomPercent, { digits: 3 })} % of each layer; seed {result.seed}.
      </p>
    </div>
  );
}
