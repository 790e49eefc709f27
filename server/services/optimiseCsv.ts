import type { PointReadingName } from '../../shared/designPoint.ts';
import type { Goal, OptimiseDesign, OptimiseResult } from '../../shared/optimiseDesign.ts';
import { paretoRoles, paretoRoleWords } from '../../shared/paretoSet.ts';
import { cellLine } from './csvLines.ts';
import { goalWords, readingTitles } from './designNames.ts';

type Line = {
  film: string;
  evaluations?: number;
  thicknessesNm: number[];
  first: number | null;
  second?: number | undefined;
  points?: OptimiseResult['best']['points'] | undefined;
};

/**
 * A line for the film as drawn, each step of the path, each film of the front, and the best film; readings at every working
 * point of those that have them.
 *
 * @param names of the layers whose thickness varies
 */
export function* optimiseLines(
  { goal, second, points }: OptimiseDesign,
  { start, best, path, pareto }: OptimiseResult,
  names: string[],
): Generator<string> {
  const readings = Object.keys(readingTitles) as PointReadingName[];
  yield cellLine([
    'Film',
    'Films solved',
    ...names.map((name) => `Thickness of ${name} (nm)`),
    titleOf(goal),
    ...(second ? [titleOf(second)] : []),
    ...points.flatMap(({ label }) =>
      readings.map((name) => `${readingTitles[name].title} at ${label} (${readingTitles[name].unit})`),
    ),
  ]);
  const line = ({ film, evaluations, thicknessesNm, first, second: other, points: found = [] }: Line) =>
    cellLine([
      ...[film, evaluations, ...thicknessesNm, first],
      ...(second ? [other] : []),
      ...points.flatMap(({ id }) => {
        const here = found.find(({ pointId }) => pointId === id)?.readings;
        return readings.map((name) => here?.[name]);
      }),
    ]);
  yield line({ film: 'as drawn', thicknessesNm: start.thicknessesNm, first: start.value });
  yield path
    .map(({ phase, value, ...step }) => line({ film: `${phase} search`, first: value, ...step }))
    .join('');
  const roles = paretoRoles(pareto ?? []);
  yield (pareto ?? [])
    .map((film, place) => {
      const role = roles.get(place);
      return line({ film: role ? `front, ${paretoRoleWords[role]}` : 'front', ...film });
    })
    .join('');
  const { thicknessesNm, value: first, points: found } = best;
  yield line({ film: 'best', thicknessesNm, first, second: pareto?.[0]?.second, points: found });
}

function titleOf({ quantity }: Goal): string {
  const { words, unit } = goalWords[quantity];
  return `${words.replace(/^(greatest|least) /, '')} (${unit})`;
}
