import type { StackLayer } from '../../../../shared/stack.ts';
import { layersIn } from './comparedInput.ts';
import type { ComparedInput } from './comparedInput.ts';
import { layerWord } from './mediumWords.ts';

type Slot = { key: string; ids: Set<string>; word: string };

/** A layer with what it is called. */
export type NamedLayer = { layer: StackLayer; word: string };

/** The layers of a film in the order in which light meets them. */
export function namedLayers({
  document,
  materials,
}: Pick<ComparedInput, 'document' | 'materials'>): NamedLayer[] {
  const layers = layersIn(document.layers);
  return layers.map((layer) => ({ layer, word: layerWord(layer, layers, materials) }));
}

/**
 * Which layers of several films are the same one: by id (a film and its copies), then by name, then by standing between
 * the same neighbours, so that a cap of another material is still the cap.
 *
 * @returns for each film the key of each of its layers; equal keys are the same layer
 */
export function alignLayers(films: readonly (readonly NamedLayer[])[]): string[][] {
  const slots: Slot[] = [];
  let made = 0;
  return films.map((film) => {
    const found = matchLayers(film, slots);
    film.forEach(({ layer, word }, position) => {
      const slot = found[position];
      if (slot) {
        slot.ids.add(layer.id);
        return;
      }
      const added = { key: `layer ${++made}`, ids: new Set([layer.id]), word };
      const above = position === 0 ? undefined : found[position - 1];
      slots.splice(above ? slots.indexOf(above) + 1 : 0, 0, added);
      found[position] = added;
    });
    return found.flatMap((slot) => slot?.key ?? []);
  });
}

function matchLayers(film: readonly NamedLayer[], slots: readonly Slot[]): (Slot | undefined)[] {
  const found = new Array<Slot | undefined>(film.length).fill(undefined);
  const free = new Set(slots);
  const take = (position: number, slot: Slot | undefined) => {
    if (!slot) return;
    found[position] = slot;
    free.delete(slot);
  };
  const passes: ((named: NamedLayer, position: number) => Slot | undefined)[] = [
    ({ layer }) => slots.find((slot) => free.has(slot) && slot.ids.has(layer.id)),
    ({ word }) => slots.find((slot) => free.has(slot) && slot.word === word),
    (_named, position) => slots.slice(...gapAround(found, slots, position)).find((slot) => free.has(slot)),
  ];
  for (const pass of passes) {
    film.forEach((named, position) => {
      if (!found[position]) take(position, pass(named, position));
    });
  }
  return found;
}

/** The slots between those of the nearest layers above and below that have one. */
function gapAround(
  found: readonly (Slot | undefined)[],
  slots: readonly Slot[],
  position: number,
): [start: number, end: number] {
  const above = found.slice(0, position).findLast((slot) => slot !== undefined);
  const below = found.slice(position + 1).find((slot) => slot !== undefined);
  return [above ? slots.indexOf(above) + 1 : 0, below ? slots.indexOf(below) : slots.length];
}
