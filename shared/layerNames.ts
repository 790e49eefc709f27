import type { StackLayer, StackMedium } from './stack.ts';

/**
 * What layers are called in sentences and titles, by id: "Pt (cap)" by medium and note, and where two would be called alike
 * "Pt, layer 3", counted from the light side as drawn.
 *
 * @param layers every layer of the film as drawn, light side first
 */
export function layerNames(
  layers: readonly StackLayer[],
  mediumName: (medium: StackMedium) => string,
): Map<string, string> {
  const plain = layers.map(({ medium, note }) => mediumName(medium) + (note ? ` (${note})` : ''));
  return new Map(
    layers.map(({ id }, position) => {
      const name = plain[position]!;
      const isAlone = plain.filter((other) => other === name).length === 1;
      return [id, isAlone ? name : `${name}, layer ${position + 1}`];
    }),
  );
}
