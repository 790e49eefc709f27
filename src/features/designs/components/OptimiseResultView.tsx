import { useMemo } from 'react';
import type { ReactNode } from 'react';
import type { OptimiseDesign, OptimiseResult } from '../../../../shared/optimiseDesign.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import { formatCount } from '../../../lib/format.ts';
import type { DesignView } from '../model/designView.ts';
import { goalWords } from '../model/goalWords.ts';
import { layerWords, withThicknesses } from '../model/layerNames.ts';
import type { NamedMaterial } from '../model/layerNames.ts';
import { goalQuantityLooks, printQuantity } from '../model/quantities.ts';
import { FilmTable } from './FilmTable.tsx';
import { ParetoPlot } from './ParetoPlot.tsx';
import { PointReadingsTable } from './PointReadingsTable.tsx';
import { SearchPath } from './SearchPath.tsx';

type Props = {
  input: OptimiseDesign;
  result: OptimiseResult;
  materials: readonly NamedMaterial[];
  view: DesignView;
  onView: (change: Partial<DesignView>) => void;
  actions?: (document: StackDocument) => ReactNode;
};

/** The best film beside the one drawn, the way there, and with two goals the films of which none is better in both. */
export function OptimiseResultView({ input, result, materials, view, onView, actions }: Props) {
  const { goal, second, document } = input;
  const member = view.member === null ? undefined : result.pareto?.[view.member];
  const thicknessesNm = member?.thicknessesNm ?? result.best.thicknessesNm;
  const film = useMemo(
    () => withThicknesses(document, result.layerIds, thicknessesNm),
    [document, result.layerIds, thicknessesNm],
  );
  const look = goalQuantityLooks[goal.quantity];
  const atBounds = result.best.atBounds.map((id) => layerWords(document, id, materials));
  return (
    <div className="flex flex-col gap-6">
      <section aria-label="Answer" className="card px-5 py-4">
        <p className="text-note text-muted">{goalWords(goal, document, materials)}</p>
        <div className="flex flex-wrap items-start gap-x-6 gap-y-3">
          <p className="min-w-0 flex-1 text-lead">
            {printQuantity(look, result.start.value)} as drawn, {printQuantity(look, result.best.value)} at
            best
          </p>
          {actions?.(film)}
        </div>
        {second && (
          <p className="mt-1 text-note text-muted">Second goal: {goalWords(second, document, materials)}.</p>
        )}
        <p className="mt-1 text-note text-muted">
          {formatCount(result.evaluations)} films solved;{' '}
          {result.ended === 'converged'
            ? 'the search ended because nothing better was found near the best film'
            : 'the search ended because its effort was used up: more effort may find a better film'}
          . Seed {result.seed}.
        </p>
        {atBounds.length > 0 && (
          <p className="mt-1 text-warn">
            ▲ At the end of its bounds: {atBounds.join('; ')}. Wider bounds may give more.
          </p>
        )}
      </section>
      {result.pareto && second && (
        <ParetoPlot
          goal={goal}
          second={second}
          pareto={result.pareto}
          member={view.member}
          onMember={(chosen) => onView({ member: chosen })}
        />
      )}
      <div className="grid grid-cols-1 gap-6 lg:grid-cols-2">
        <FilmTable
          input={input}
          materials={materials}
          startNm={result.start.thicknessesNm}
          chosenNm={thicknessesNm}
          chosenLabel={member ? 'Chosen' : 'Best'}
        />
        <PointReadingsTable points={input.points} found={result.best.points} />
      </div>
      <SearchPath goal={goal} path={result.path} />
    </div>
  );
}
