import type { Issue } from '../../../shared/error.ts';
import type { OptimiseDesign } from '../../../shared/optimiseDesign.ts';
import type { StackLayer } from '../../../shared/stack.ts';
import { addsIntensities } from '../../../shared/stackCase.ts';
import { drawnLayers } from '../expandBlocks.ts';

/** What the oxide and the parts without magnetization take of a layer: it cannot be thinner. */
export function leastThicknessNm({ dead, oxide }: StackLayer): number {
  return (dead?.topNm ?? 0) + (dead?.bottomNm ?? 0) + (oxide?.consumedNm ?? 0);
}

/** What the schema cannot see: whether layers exist and can be as thin as asked, and whether goals exist for the film. */
export function checkOptimise(design: OptimiseDesign): Issue[] {
  const { document, variables } = design;
  const layers = new Map(drawnLayers(document.layers).map((layer) => [layer.id, layer]));
  const issues: Issue[] = [];
  variables.forEach(({ layerId, fromNm }, position) => {
    const at = `variables[${position}]`;
    const layer = layers.get(layerId);
    if (!layer) {
      issues.push({ path: `${at}.layerId`, message: `names no layer of the film: ${layerId}` });
    } else if (fromNm < leastThicknessNm(layer)) {
      const message = `must be at least ${leastThicknessNm(layer)} nm: oxide and dead parts take as much of the layer`;
      issues.push({ path: `${at}.fromNm`, message });
    }
    if (variables.findIndex((other) => other.layerId === layerId) < position) {
      issues.push({ path: `${at}.layerId`, message: `is used twice: ${layerId}` });
    }
  });
  for (const name of ['goal', 'second'] as const) {
    const goal = design[name];
    if (goal?.layerId !== undefined && !layers.has(goal.layerId)) {
      issues.push({ path: `${name}.layerId`, message: `names no layer of the film: ${goal.layerId}` });
    }
    if (goal?.quantity === 'amplitude' && addsIntensities(document)) {
      const message = 'cannot be the amplitude: with a thick slab or averages only intensities add up';
      issues.push({ path: `${name}.quantity`, message });
    }
  }
  return issues;
}
