import type { ReactNode } from 'react';
import { layersAtBounds } from '../../../../shared/atBounds.ts';
import type { OptimiseDesign, OptimiseResult } from '../../../../shared/optimiseDesign.ts';
import { formatCount, formatNumber } from '../../../lib/format.ts';
import { needsLight } from '../model/goalLight.ts';
import { goalWords } from '../model/goalWords.ts';
import { layerWords } from '../model/layerNames.ts';
import type { NamedMaterial } from '../model/layerNames.ts';
import { goalQuantityLooks, printQuantity } from '../model/quantities.ts';
import { faintPoints } from '../model/shownFilm.ts';
import type { ShownFilm } from '../model/shownFilm.ts';

type Props = {
  input: OptimiseDesign;
  result: OptimiseResult;
  film: ShownFilm;
  materials: readonly NamedMaterial[];
  running: boolean;
  /** What can be done with the film. */
  children: ReactNode;
};

/** What was sought, what the film shown reaches, and what to mind about it. */
export function OptimiseAnswer({ input, result, film, materials, running, children }: Props) {
  const { goal, second, document, variables } = input;
  const asked = [goal, ...(second ? [second] : [])].map((one) => goalWords(one, document, materials));
  return (
    <section aria-label="Answer" className="card px-5 py-4">
      <p className="text-note text-muted">
        {second ? `First goal: ${asked[0]}. Second goal: ${asked[1]}.` : asked[0]}
      </p>
      <div className="flex flex-wrap items-start gap-x-6 gap-y-3">
        <p className="min-w-56 flex-1 text-lead">{reached(input, result, film)}</p>
        {children}
      </div>
      <p className="mt-1 text-note text-muted">
        {formatCount(result.evaluations)} films solved; {ending(result, running)}. Seed {result.seed}.
      </p>
      {cautions().map((caution) => (
        <p key={caution} className="mt-1 text-warn">
          ▲ {caution}
        </p>
      ))}
    </section>
  );

  function cautions(): string[] {
    const atBounds = layersAtBounds(variables, film.thicknessesNm).map((id) =>
      layerWords(document, id, materials),
    );
    const faint = faintPoints(input, film).map(
      ({ label, reflectance }) => `${formatNumber(100 * reflectance, { digits: 2 })} % at ${label}`,
    );
    const remedy = [goal, second].some((one) => one && needsLight(one.quantity))
      ? ' A greater least reflectance in the goal leaves such films out.'
      : '';
    return [
      ...(film.first === null
        ? ['No film meets the goal’s conditions at every working point: shown is the one that lacks least.']
        : []),
      ...(faint.length > 0
        ? [`This film reflects only ${faint.join(', ')}: the angles of so little light say little.${remedy}`]
        : []),
      ...(atBounds.length > 0
        ? [`At the end of its bounds: ${atBounds.join('; ')}. Wider bounds may give more.`]
        : []),
    ];
  }
}

function reached(
  { goal, second }: OptimiseDesign,
  { start, ended }: OptimiseResult,
  film: ShownFilm,
): string {
  const look = goalQuantityLooks[goal.quantity];
  const drawn = `${printQuantity(look, start.value)} as drawn`;
  if (!second)
    return `${drawn}, ${printQuantity(look, film.first)} at best${ended === 'unfinished' ? ' so far' : ''}`;
  const other = goalQuantityLooks[second.quantity];
  const name = film.name.charAt(0).toUpperCase() + film.name.slice(1);
  return `${name}: ${look.label} ${printQuantity(look, film.first)} (${drawn}), ${other.label} ${printQuantity(other, film.second)}`;
}

function ending({ ended }: OptimiseResult, running: boolean): string {
  switch (ended) {
    case 'converged':
      return 'the search ended because nothing better was found near the best film';
    case 'budget':
      return 'the search ended because its effort was used up: more effort may find a better film';
    case 'unfinished':
      return running
        ? 'partial: the search goes on'
        : 'partial: the search was stopped before its end, and a better film may have come';
  }
}
