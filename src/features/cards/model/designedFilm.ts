import type { Design, DesignResult } from '../../../../shared/design.ts';
import type { StackDocument, StackItem, StackLayer } from '../../../../shared/stack.ts';

/** Which film of a design is meant. */
export type DesignChoice = { candidateId: string | null; member: number | null };

/**
 * The film that a design calculation ended with: the best thickness of a candidate cap, or the best thicknesses found; the
 * film as drawn where there is no better one.
 *
 * @param chosen.candidateId of the cap; the best of the ranking when it is null or not there
 * @param chosen.member place of a film in the set of two goals; the best of the first goal when it is null or not there
 */
export function designedFilm(
  { input }: Design,
  result: DesignResult,
  { candidateId, member }: DesignChoice,
): StackDocument {
  if (input.kind === 'optimise' && result.kind === 'optimise') {
    const { layerIds, best, pareto } = result;
    const { thicknessesNm } = (member === null ? undefined : pareto?.[member]) ?? best;
    const nm = new Map(layerIds.map((id, index) => [id, thicknessesNm[index]!]));
    return mapLayers(input.document, (layer) => ({
      ...layer,
      thicknessNm: nm.get(layer.id) ?? layer.thicknessNm,
    }));
  }
  if (input.kind === 'cap' && result.kind === 'cap') {
    const ids = result.candidates.map(({ id }) => id);
    const chosen = candidateId !== null && ids.includes(candidateId) ? candidateId : result.ranking[0];
    const candidate = input.candidates.find(({ id }) => id === chosen);
    const best = result.candidates.find(({ id }) => id === chosen)?.best;
    if (!candidate || !best) return input.document;
    const cap = candidate.layers.map(({ medium, fixedNm }, index): StackLayer => ({
      id: `cap-${index + 1}`,
      medium,
      thicknessNm: fixedNm ?? best.thicknessNm,
      note: 'cap',
    }));
    return { ...input.document, layers: [...cap, ...without(input.document.layers, input.replaces)] };
  }
  return input.document;
}

/** The layers under the cap, also where one that it replaces stands in a block. */
function without(items: readonly StackItem[], ids: readonly string[]): StackItem[] {
  return items.flatMap((item): StackItem[] => {
    if ('layers' in item) return [{ ...item, layers: without(item.layers, ids) }];
    return ids.includes(item.id) ? [] : [item];
  });
}

function mapLayers(document: StackDocument, change: (layer: StackLayer) => StackLayer): StackDocument {
  const changeItem = (item: StackItem): StackItem =>
    'layers' in item ? { ...item, layers: item.layers.map(changeItem) } : change(item);
  return { ...document, layers: document.layers.map(changeItem) };
}
