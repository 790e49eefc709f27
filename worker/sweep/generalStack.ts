import type { SweepAxes } from '../../shared/run.ts';
import { axesOf } from '../../shared/runAxes.ts';
import type { StackDocument, StackItem, StackLayer, StackMedium } from '../../shared/stack.ts';

/** Nodes of one average (shared/spread.ts). */
const NODES = 7;
/** Graded interfaces are solved as slices, and first refined: a rough factor. */
const GRADED_COST = 30;

/**
 * Whether a stack has more than sharp layers in coherent light: averages, a thick slab or graded interfaces. Such a
 * stack goes through the solver's general entry.
 */
export function isGeneral(document: StackDocument): boolean {
  return document.backside !== undefined || averageCost(document) > 1 || isGraded(document);
}

/** ... or it is one somewhere on the axes. */
export function isGeneralSomewhere({ document, ...axes }: SweepAxes & { document: StackDocument }): boolean {
  return isGeneral(document) || axesOf(axes).some(({ axis }) => axis.kind === 'graded');
}

/** Layers with an oxide or dead parts are solved as several: a layer of the case is none of the document then. */
export function splitsLayers(document: StackDocument): boolean {
  return anyLayer(document.layers, ({ dead, oxide }) => dead !== undefined || oxide !== undefined);
}

/** Media whose p and s light may mix at m = 0. Second order in m is not among them: it vanishes with m. */
export function turnsLightUnmagnetized(document: StackDocument): boolean {
  return anyMedium(document, (medium) => medium.epsilon !== undefined || medium.extraordinary !== undefined);
}

/** Whether every medium has a scalar eps_d, as the fast path needs it. */
export function hasScalarMedia(document: StackDocument): boolean {
  return !anyMedium(
    document,
    (medium) =>
      medium.epsilon !== undefined ||
      medium.extraordinary !== undefined ||
      medium.quadratic !== undefined ||
      medium.mixture !== undefined,
  );
}

/** How many times the work of one point with sharp layers a point of this stack is, roughly. */
export function generalCost({ document, ...axes }: SweepAxes & { document: StackDocument }): number {
  const slab = document.backside ? 2 : 1;
  const graded = isGraded(document) || axesOf(axes).some(({ axis }) => axis.kind === 'graded');
  return slab * averageCost(document) * (graded ? GRADED_COST : 1);
}

/** Layers whose waves have to be found without a formula, which takes far longer than all else of a layer. */
export function countAnisotropic(items: StackItem[]): number {
  return items.reduce((sum, item) => {
    if ('layers' in item) return sum + countAnisotropic(item.layers);
    const { epsilon, extraordinary, quadratic } = item.medium;
    const isAnisotropic = epsilon !== undefined || extraordinary !== undefined || quadratic !== undefined;
    return sum + (isAnisotropic ? 1 : 0);
  }, 0);
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

function anyMedium(document: StackDocument, holds: (medium: StackMedium) => boolean): boolean {
  return (
    holds(document.incident) ||
    holds(document.substrate) ||
    anyLayer(document.layers, ({ medium, oxide }) => holds(medium) || (oxide ? holds(oxide.medium) : false))
  );
}

function anyLayer(items: StackItem[], holds: (layer: StackLayer) => boolean): boolean {
  return items.some((item) => ('layers' in item ? anyLayer(item.layers, holds) : holds(item)));
}
