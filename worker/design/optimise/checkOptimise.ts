import type { Issue } from '../../../shared/error.ts';
import type { OptimiseDesign } from '../../../shared/optimiseDesign.ts';
import { addsIntensities } from '../../../shared/stackCase.ts';
import { drawnLayers } from '../expandBlocks.ts';
import { leastThicknesses } from '../leastThicknesses.ts';

/** What the schema cannot see: whether layers exist and can be as thin as asked, and whether goals exist for the film. */
export function checkOptimise(design: OptimiseDesign): Issue[] {
  const { document, variables } = design;
  const layers = new Set(drawnLayers(document.layers).map(({ id }) => id));
  const least = leastThicknesses(document);
  const issues: Issue[] = [];
  variables.forEach(({ layerId, fromNm }, position) => {
    const at = `variables[${position}]`;
    const leastNm = least.get(layerId) ?? 0;
    if (!layers.has(layerId)) {
      issues.push({ path: `${at}.layerId`, message: `names no layer of the film: ${layerId}` });
    } else if (fromNm < leastNm) {
      const message = `must be at least ${leastNm} nm: oxide, dead parts and graded interfaces take as much of the layer`;
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
