import type { DesignInput, DesignKind } from '../../../../shared/design.ts';
import type { SignalName, Tolerance } from '../../../../shared/designPoint.ts';
import type { MaterialSummary } from '../../../../shared/material.ts';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { startCandidates } from './capCandidates.ts';
import { newGoal } from './goalLight.ts';
import { drawnLayers } from './layerNames.ts';
import { pointWords } from './pointWords.ts';

/** Errors to begin with: +-5 % of the rate is what growers plan for; common practice, no source. */
const tolerance: Tolerance = {
  ratePercent: 5,
  randomPercent: 2,
  indexPercent: 0,
  voigtPercent: 0,
  materials: [],
  samples: 2000,
  seed: 1,
};

/** A question of each kind as it stands before anything is filled in: about this film, at its own working point. */
export function startInput(
  kind: DesignKind,
  document: StackDocument,
  library: readonly MaterialSummary[],
): DesignInput {
  const point = newPoint(document.workingPoint);
  const signal = signalFor(document);
  switch (kind) {
    case 'cap':
      return {
        kind,
        document,
        replaces: presentCap(document),
        candidates: startCandidates(library, document.workingPoint.wavelengthNm),
        range: { fromNm: 0, toNm: 10, points: 101 },
        points: [point],
        signal,
        demands: {},
        tolerance,
        leastYield: 0.9,
      };
    case 'optimise': {
      const layers = drawnLayers(document.layers);
      const first = layers.find(({ m }) => m === undefined) ?? layers[0];
      return {
        kind,
        document,
        variables: first ? [newVariable(first)] : [],
        points: [point],
        goal: newGoal(signal),
        effort: 'normal',
        seed: 1,
      };
    }
    case 'tolerance':
      return { kind, document, points: [point], signal, demands: {}, tolerance };
  }
}

export function newPoint(workingPoint: WorkingPoint) {
  return { id: crypto.randomUUID().slice(0, 13), label: pointWords(workingPoint), workingPoint };
}

/** Bounds to begin with: from nothing to three times the thickness, at least 10 nm. */
export function newVariable({ id, thicknessNm }: { id: string; thicknessNm: number }) {
  return { layerId: id, fromNm: 0, toNm: Math.max(10, 3 * thicknessNm) };
}

/** The layers above the first magnetic one, two at most; a block ends the cap. */
export function presentCap({ layers }: StackDocument): string[] {
  const end = layers.findIndex((item) => 'layers' in item || item.m !== undefined);
  return layers.slice(0, end < 0 ? 0 : Math.min(end, 2)).map(({ id }) => id);
}

/** A film magnetized along y only has no rotation to read, but a contrast. */
function signalFor({ layers, workingPoint: { magnetization } }: StackDocument): SignalName {
  const vectors =
    magnetization.mode === 'direction'
      ? [magnetization.m]
      : drawnLayers(layers).flatMap(({ m }) => (m ? [m] : []));
  const transverse = vectors.length > 0 && vectors.every(([x, y, z]) => x === 0 && z === 0 && y !== 0);
  return transverse ? 'contrast' : 'rotation';
}
