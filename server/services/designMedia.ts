import type { CapCandidate, CapDesign } from '../../shared/capDesign.ts';
import type { DesignInput } from '../../shared/design.ts';
import type { DesignPoint } from '../../shared/designPoint.ts';
import type { StackDocument, StackLayer, StackMedium } from '../../shared/stack.ts';
import { bareFilm } from '../../worker/design/cap/candidateFilm.ts';
import { drawnLayers, expandBlocks } from '../../worker/design/expandBlocks.ts';
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

/** What the candidates are graded into: the layer under them, or the substrate; null where that interface is sharp. */
export function gradedUnderCap(design: CapDesign): StackLayer | null {
  const film = bareFilm(design);
  const { substrate, substrateM, substrateGradedNm = 0 } = film;
  const top = expandBlocks(film).layers[0]?.layer ?? {
    id: 'substrate',
    medium: substrate,
    thicknessNm: substrateGradedNm,
    ...(substrateM ? { m: substrateM } : {}),
    gradedNm: substrateGradedNm,
  };
  return (top.gradedNm ?? 0) > 0 ? top : null;
}

/** Media of which errors may be stated: of every layer and its oxide, around the film, and of the candidates. */
export function mediaWithErrors(design: DesignInput): StackMedium[] {
  return [
    ...drawnLayers(design.document.layers).map(({ medium }) => medium),
    ...mediaBeside(design.document),
    ...candidatesOf(design).flatMap(({ layers }) => layers.map(({ medium }) => medium)),
  ];
}
