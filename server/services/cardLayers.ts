import type { Tolerance } from '../../shared/designPoint.ts';
import type { CardLayer } from '../../shared/growthCard.ts';
import type { UsedMaterial } from '../../shared/run.ts';
import type { StackDocument, StackItem, StackMedium } from '../../shared/stack.ts';
import { drawnLayers } from '../../worker/design/expandBlocks.ts';
import { FilmErrors } from '../../worker/design/filmErrors.ts';

type Rates = readonly { layerId: string; nmPerMin: number }[];

/**
 * The lines of a card as a grower needs them: the substrate, then every drawn layer in the order of growth. A layer of a
 * block is one line, which says how often its steps are repeated.
 *
 * @param rates deposition rates, nm/min; time = thickness / rate
 */
export function cardLayers(
  document: StackDocument,
  materials: readonly UsedMaterial[],
  tolerance: Tolerance,
  rates: Rates,
): CardLayer[] {
  const errors = new FilmErrors(tolerance, drawnLayers(document.layers), [document.substrate]);
  const substrate: CardLayer = {
    step: null,
    block: null,
    material: mediumName(document.substrate, materials),
    role: 'substrate',
    thicknessNm: null,
    deviationNm: null,
    nmPerMin: null,
    seconds: null,
  };
  const lines: CardLayer[] = [substrate];
  const grow = (items: StackItem[], blocks: string[]): void => {
    for (const item of items.toReversed()) {
      const first = lines.length;
      if ('layers' in item) {
        // A block that is repeated 0 times is not grown.
        if (item.repeat === 0) continue;
        const last = first + drawnCount(item.layers) - 1;
        if (last >= first) grow(item.layers, [...blocks, repetition(item.repeat, first, last)]);
        continue;
      }
      const nmPerMin = rates.find(({ layerId }) => layerId === item.id)?.nmPerMin ?? null;
      lines.push({
        step: first,
        block: blocks.length === 0 ? null : blocks.join(', in each '),
        material: mediumName(item.medium, materials),
        role: item.note ?? '',
        thicknessNm: item.thicknessNm,
        deviationNm: item.thicknessNm * errors.relativeDeviation(item.id),
        nmPerMin,
        seconds: nmPerMin === null ? null : (item.thicknessNm / nmPerMin) * 60,
      });
    }
  };
  grow(document.layers, []);
  return lines;
}

/** Lines that these items take on the card. */
function drawnCount(items: StackItem[]): number {
  return items.reduce((sum, item) => {
    if (!('layers' in item)) return sum + 1;
    return item.repeat === 0 ? sum : sum + drawnCount(item.layers);
  }, 0);
}

function repetition(repeat: number, first: number, last: number): string {
  const times = repeat === 1 ? 'once' : `${repeat} times`;
  return first === last ? `${times} step ${first}` : `${times} steps ${first} to ${last}`;
}

/** Such as "Pt, Platinum", or what somebody called the constants that they typed in. */
export function mediumName(medium: StackMedium, materials: readonly UsedMaterial[]): string {
  const used = materials.find(({ id }) => id === medium.material);
  if (used) return used.formula === '' ? used.name : `${used.formula}, ${used.name}`;
  return medium.label ?? medium.material ?? 'constants typed in';
}
