import type { StackDocument, StackItem, StackLayer } from '../../shared/stack.ts';

/**
 * What oxide, dead parts and graded interfaces take of each layer, nm by layer id: it cannot be thinner. Of a graded
 * interface half lies in either layer, in an oxide or a dead part where there is one.
 */
export function leastThicknesses({
  layers,
  substrateGradedNm = 0,
}: Pick<StackDocument, 'layers' | 'substrateGradedNm'>): ReadonlyMap<string, number> {
  const sequence = sequenceOf(layers);
  const least = new Map<string, number>();
  sequence.forEach((layer, position) => {
    const { dead, oxide, gradedNm = 0 } = layer;
    const below = position + 1 === sequence.length ? substrateGradedNm : sequence[position + 1]!.gradedNm;
    const [topNm, bottomNm, consumedNm] = [dead?.topNm ?? 0, dead?.bottomNm ?? 0, oxide?.consumedNm ?? 0];
    const above = consumedNm > 0 || topNm > 0 ? 0 : gradedNm / 2;
    const taken = topNm + bottomNm + consumedNm + above + (bottomNm > 0 ? 0 : (below ?? 0) / 2);
    // A layer of a block has another neighbour at the end of the block.
    least.set(layer.id, Math.max(taken, least.get(layer.id) ?? 0));
  });
  return least;
}

/** The layers in order; two repetitions of a block meet every neighbour that more would meet. */
function sequenceOf(items: StackItem[]): StackLayer[] {
  return items.flatMap((item) => {
    if (!('layers' in item)) return [item];
    const once = sequenceOf(item.layers);
    return item.repeat > 1 ? [...once, ...once] : item.repeat === 1 ? once : [];
  });
}
