import type { CapCandidate } from '../../shared/capDesign.ts';
import type { DesignInput } from '../../shared/design.ts';
import type { DesignPoint } from '../../shared/designPoint.ts';
import type { StackDocument, StackMedium } from '../../shared/stack.ts';
import { drawnLayers } from '../../worker/design/expandBlocks.ts';
import { mediaBeside } from '../../worker/design/mediaBeside.ts';

/** Everything in a design question that holds media: its film, and the layers of candidates. */
export type DesignMedia = { document: StackDocument; candidates: CapCandidate[] };

export function mediaOf(design: DesignInput): DesignMedia {
  return { document: design.document, candidates: candidatesOf(design) };
}

export function withMedia(design: DesignInput, { document, candidates }: DesignMedia): DesignInput {
  return design.kind === 'cap' ? { ...design, document, candidates } : { ...design, document };
}

export function candidatesOf(design: DesignInput): CapCandidate[] {
  return design.kind === 'cap' ? design.candidates : [];
}

/** The film as it is read at a working point. */
export function filmAt(document: StackDocument, { workingPoint }: DesignPoint): StackDocument {
  return { ...document, workingPoint };
}

/** The layers of a candidate alone, between vacua: what is wrong there is wrong with the candidate. */
export function candidateAlone(
  { layers }: CapCandidate,
  { workingPoint }: Pick<DesignPoint, 'workingPoint'>,
): StackDocument {
  return {
    incident: { index: 1 },
    layers: layers.map(({ medium, fixedNm }, position) => ({
      id: `candidate ${position}`,
      medium,
      thicknessNm: fixedNm ?? 1,
    })),
    substrate: { index: 1 },
    workingPoint,
  };
}

/** Media of which errors may be stated: of every layer and its oxide, around the film, and of the candidates. */
export function mediaWithErrors(design: DesignInput): StackMedium[] {
  return [
    ...drawnLayers(design.document.layers).map(({ medium }) => medium),
    ...mediaBeside(design.document),
    ...candidatesOf(design).flatMap(({ layers }) => layers.map(({ medium }) => medium)),
  ];
}
