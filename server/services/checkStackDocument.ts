import type { Issue } from '../../shared/error.ts';
import { LIMITS } from '../../shared/limits.ts';
import { countLayers } from '../../shared/stackCase.ts';
import type { StackDocument, StackItem } from '../../shared/stack.ts';

/** What the schema of a document cannot say: how deep its blocks stand in one another, and how many layers they make. */
export function checkStackDocument(document: StackDocument): Issue[] {
  const issues = deepBlocks(document.layers, 'document.layers', 0);
  const layers = countLayers(document.layers);
  if (layers > LIMITS.expandedLayers) {
    issues.push({
      path: 'document.layers',
      message: `must have at most ${LIMITS.expandedLayers} layers after blocks are expanded, got ${layers}`,
    });
  }
  return issues;
}

function deepBlocks(items: StackItem[], path: string, depth: number): Issue[] {
  return items.flatMap((item, position) => {
    if (!('layers' in item)) return [];
    const here = `${path}[${position}].layers`;
    if (depth >= LIMITS.blockDepth) {
      return [{ path: here, message: `blocks may be nested at most ${LIMITS.blockDepth} deep` }];
    }
    return deepBlocks(item.layers, here, depth + 1);
  });
}
