import type { OptimiseDesign, OptimiseResult, ParetoFilm } from '../../../../shared/optimiseDesign.ts';
import { paretoRoles, paretoRoleWords } from '../../../../shared/paretoSet.ts';

/** The film of a search that is looked at, with everything that is said of it. */
export type ShownFilm = {
  /** Such as "best film", "compromise" or "film 12 of 57". */
  name: string;
  /** Place in the Pareto set; null for the best film. */
  member: number | null;
  thicknessesNm: readonly number[];
  first: number | null;
  /** Null with one goal, and where no film may be considered. */
  second: number | null;
  /** Empty where the result holds no readings of this film. */
  points: OptimiseResult['best']['points'];
};

/** @param member place in the Pareto set; what lies beyond it is the best of the first goal, as null is */
export function shownFilm({ best, pareto }: OptimiseResult, member: number | null): ShownFilm {
  const place = member !== null && pareto?.[member] ? member : 0;
  const film = pareto?.[place];
  if (!film || place === 0) {
    return {
      name: film ? memberName(pareto, 0) : 'best film',
      member: null,
      thicknessesNm: best.thicknessesNm,
      first: best.value,
      second: film?.second ?? null,
      points: best.points,
    };
  }
  return { name: memberName(pareto, place), member: place, points: [], ...film };
}

/** What a film of a set is called. */
export function memberName(pareto: readonly ParetoFilm[], place: number): string {
  if (pareto.length === 1) return 'best of both goals';
  const role = paretoRoles(pareto).get(place);
  return role ? paretoRoleWords[role] : `film ${place + 1} of ${pareto.length}`;
}

/** Films that reflect less hardly reflect at all: common practice, no source. */
export const FAINT_REFLECTANCE = 0.01;

/** The working points at which a film hardly reflects. */
export function faintPoints(
  { points }: OptimiseDesign,
  film: ShownFilm,
): { label: string; reflectance: number }[] {
  return film.points.flatMap(({ pointId, readings: { reflectance } }) =>
    reflectance < FAINT_REFLECTANCE
      ? [{ label: points.find(({ id }) => id === pointId)?.label ?? pointId, reflectance }]
      : [],
  );
}
