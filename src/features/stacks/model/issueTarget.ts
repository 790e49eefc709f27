import type { StackDocument, StackItem } from '../../../../shared/stack.ts';
import { isBlock } from './items.ts';

/** Which part of the page a path of the server speaks of. */
export type IssueTarget =
  | { place: 'layer'; id: string; field: string }
  | { place: 'incident' | 'substrate' | 'point'; field: string }
  | { place: 'page'; field: string };

/**
 * `cases[0].layers[2].layers[0].thicknessNm` (a solve) or `document.layers[2].thicknessNm` (a save) as the item
 * of the document it names.
 */
export function issueTarget(document: StackDocument, path: string): IssueTarget {
  const parts = path.replace(/^(cases\[\d+\]|document)\.?/, '').match(/[^.[\]]+/g) ?? [];
  const [first, ...rest] = parts;
  if (first === 'incident' || first === 'substrate') return { place: first, field: rest.join('.') };
  if (first === 'substrateM') return { place: 'substrate', field: 'm' };
  if (first === 'wavelengthNm' || first === 'angleDeg') return { place: 'point', field: first };
  if (first === 'workingPoint') return { place: 'point', field: rest.join('.') };
  let items: readonly StackItem[] = document.layers;
  let found: StackItem | null = null;
  let position = 0;
  while (parts[position] === 'layers') {
    const item = items[Number(parts[position + 1])];
    if (item === undefined) break;
    found = item;
    position += 2;
    items = isBlock(item) ? item.layers : [];
  }
  const field = parts.slice(position).join('.');
  return found === null ? { place: 'page', field: path } : { place: 'layer', id: found.id, field };
}
