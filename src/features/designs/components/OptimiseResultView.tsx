import { useMemo } from 'react';
import type { ReactNode } from 'react';
import type { OptimiseDesign, OptimiseResult } from '../../../../shared/optimiseDesign.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import type { DesignView } from '../model/designView.ts';
import { withThicknesses } from '../model/layerNames.ts';
import type { NamedMaterial } from '../model/layerNames.ts';
import { shownFilm } from '../model/shownFilm.ts';
import type { ShownFilm } from '../model/shownFilm.ts';
import { FilmTable } from './FilmTable.tsx';
import { OptimiseAnswer } from './OptimiseAnswer.tsx';
import { ParetoPlot } from './ParetoPlot.tsx';
import { PointReadingsTable } from './PointReadingsTable.tsx';
import { SearchPath } from './SearchPath.tsx';

/** A film that a search has found, to do something with. */
export type FoundFilm = Pick<ShownFilm, 'name' | 'member'> & { document: StackDocument };

type Props = {
  input: OptimiseDesign;
  result: OptimiseResult;
  materials: readonly NamedMaterial[];
  view: DesignView;
  onView: (change: Partial<DesignView>) => void;
  running: boolean;
  actions?: (film: FoundFilm) => ReactNode;
};

/** The film shown beside the one drawn, the way there, and with two goals the films of which none is better in both. */
export function OptimiseResultView({ input, result, materials, view, onView, running, actions }: Props) {
  const { goal, second, document } = input;
  // While a search goes on, a place in the set means another film every second.
  const film = useMemo(() => shownFilm(result, running ? null : view.member), [result, running, view.member]);
  const { name, member, thicknessesNm, points } = film;
  const found = useMemo(
    () => ({ name, member, document: withThicknesses(document, result.layerIds, thicknessesNm) }),
    [name, member, document, result.layerIds, thicknessesNm],
  );
  const unfinished = result.ended === 'unfinished';
  return (
    <div className="flex flex-col gap-6">
      <OptimiseAnswer input={input} result={result} film={film} materials={materials} running={running}>
        {actions?.(found)}
      </OptimiseAnswer>
      {result.pareto && result.pareto.length > 0 && second && (
        <ParetoPlot
          goal={goal}
          second={second}
          pareto={result.pareto}
          member={member ?? 0}
          {...(running
            ? {}
            : { onMember: (place: number) => onView({ member: place === 0 ? null : place }) })}
        />
      )}
      <div className="grid grid-cols-1 gap-6 lg:grid-cols-2">
        <FilmTable
          input={input}
          materials={materials}
          startNm={result.start.thicknessesNm}
          chosenNm={thicknessesNm}
          chosenLabel={unfinished ? 'So far' : member === null ? 'Best' : 'Chosen'}
        />
        <PointReadingsTable
          points={input.points}
          found={points}
          of={name}
          whyNone={whyNone(unfinished, running)}
        />
      </div>
      <SearchPath goal={goal} result={result} />
    </div>
  );
}

function whyNone(unfinished: boolean, running: boolean): string {
  if (running) return 'They are taken when the search has come to its end.';
  if (unfinished) return 'They are taken at the end of a search. A stack made of the film shows them too.';
  return 'This answer was stored before each film kept its readings. Rerun the design to have them.';
}
