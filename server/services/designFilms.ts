import type { CapCandidate, CapDesign, CapResult } from '../../shared/capDesign.ts';
import type { DesignInput, DesignResult } from '../../shared/design.ts';
import type { OptimiseDesign, OptimiseResult } from '../../shared/optimiseDesign.ts';
import type { StackDocument, StackItem } from '../../shared/stack.ts';
import { bareFilm } from '../../worker/design/cap/candidateFilm.ts';
import { drawnLayers } from '../../worker/design/expandBlocks.ts';

/** Layers in all the films of a cap chooser's curves that are still written out one by one. */
const MOST_WRITTEN_LAYERS = 60_000;

/**
 * The films that an answer shows, in the order of `input.json`, each to be read at every working point:
 *
 * - cap: the bare film; every candidate with a best thickness at that; then for each candidate the film at every
 *   thickness of its curve or, where those would be too many, at the edges of its windows
 * - optimise: the film as drawn, then the best one
 * - tolerance: the nominal film
 */
export function shownFilms(design: DesignInput, result: DesignResult): StackDocument[] {
  if (design.kind === 'cap' && result.kind === 'cap') return capFilms(design, result);
  if (design.kind === 'optimise' && result.kind === 'optimise') return optimiseFilms(design, result);
  return [design.document];
}

/** Whether the curves of a cap chooser are among the films, every thickness. */
export function showsCurves({ candidates, points, range, document }: CapDesign): boolean {
  const films = candidates.length * points.length * range.points;
  return films * (2 + drawnLayers(document.layers).length) <= MOST_WRITTEN_LAYERS;
}

function capFilms(design: CapDesign, result: CapResult): StackDocument[] {
  const film = bareFilm(design);
  const outcomes = design.candidates.map((candidate) => ({
    candidate,
    outcome: result.candidates.find(({ id }) => id === candidate.id)!,
  }));
  const best = outcomes.flatMap(({ candidate, outcome }) =>
    outcome.best ? [withCap(film, candidate, outcome.best.thicknessNm)] : [],
  );
  const further = outcomes.flatMap(({ candidate, outcome }) => {
    const edges = outcome.windows.flatMap(({ fromNm, toNm }) => [fromNm, toNm]);
    const thicknesses = showsCurves(design) ? result.thicknessNm : edges;
    return thicknesses.map((nm) => withCap(film, candidate, nm));
  });
  return [film, ...best, ...further];
}

function withCap(film: StackDocument, { layers }: CapCandidate, sweptNm: number): StackDocument {
  const cap = layers.map(({ medium, fixedNm }, position) => ({
    id: `cap ${position}`,
    medium,
    thicknessNm: fixedNm ?? sweptNm,
  }));
  return { ...film, layers: [...cap, ...film.layers] };
}

function optimiseFilms({ document }: OptimiseDesign, result: OptimiseResult): StackDocument[] {
  return [result.start, result.best].map(({ thicknessesNm }) => {
    const nm = new Map(result.layerIds.map((id, position) => [id, thicknessesNm[position]!]));
    const change = (item: StackItem): StackItem =>
      'layers' in item
        ? { ...item, layers: item.layers.map(change) }
        : { ...item, thicknessNm: nm.get(item.id) ?? item.thicknessNm };
    return { ...document, layers: document.layers.map(change) };
  });
}
