import type { StackDocument, StackItem, StackLayer } from '../../shared/stack.ts';

/** Nodes of one average (shared/spread.ts). */
const NODES = 7;
/** Graded interfaces are solved as slices, and first refined: a rough factor. */
const GRADED_COST = 30;

/**
 * Whether a stack has more than sharp layers in coherent light: averages, a thick slab, graded interfaces, or
 * layers that are solved as several. Such a stack goes through the solver's general entry.
 */
export function isGeneral(document: StackDocument): boolean {
  return (
    document.backside !== undefined ||
    averageCost(document) > 1 ||
    isGraded(document) ||
    anyLayer(document.layers, ({ dead, oxide }) => dead !== undefined || oxide !== undefined)
  );
}

/** How many times the work of one point with sharp layers a point of this stack is, roughly. */
export function generalCost(document: StackDocument): number {
  const slab = document.backside ? 2 : 1;
  return slab * averageCost(document) * (isGraded(document) ? GRADED_COST : 1);
}

function averageCost({ spread }: StackDocument): number {
  const { thicknessPercent = 0, divergenceDeg = 0, bandwidthNm = 0 } = spread ?? {};
  return NODES ** [thicknessPercent, divergenceDeg, bandwidthNm].filter((deviation) => deviation > 0).length;
}

function isGraded(document: StackDocument): boolean {
  return (
    (document.substrateGradedNm ?? 0) > 0 || anyLayer(document.layers, ({ gradedNm = 0 }) => gradedNm > 0)
  );
}

function anyLayer(items: StackItem[], holds: (layer: StackLayer) => boolean): boolean {
  return items.some((item) => ('layers' in item ? anyLayer(item.layers, holds) : holds(item)));
}
