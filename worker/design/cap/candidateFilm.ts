import type { CapCandidate, CapDesign } from '../../../shared/capDesign.ts';
import type { StackDocument, StackItem, StackLayer } from '../../../shared/stack.ts';
import type { FlatFilm } from '../expandBlocks.ts';
import { expandBlocks } from '../expandBlocks.ts';

/** The film under the cap: the design's document without the layers that the candidates replace. */
export function bareFilm({ document, replaces }: CapDesign): StackDocument {
  const keep = (items: StackItem[]): StackItem[] =>
    items.flatMap((item): StackItem[] => {
      if ('layers' in item) return [{ ...item, layers: keep(item.layers) }];
      return replaces.includes(item.id) ? [] : [item];
    });
  return { ...document, layers: keep(document.layers) };
}

/** A film with one candidate on top, every layer of it able to be off by itself. */
export type CandidateFilm = FlatFilm & {
  /** The layer whose thickness is the axis. */
  sweptId: string;
  /** Layers in the order in which errors are drawn: the film's first, so that all candidates share those. */
  drawn: StackLayer[];
};

/** The id of a layer of the cap; those of expanded films begin with a number, those of blocks are drawn ids. */
export function capLayerId(position: number): string {
  return `cap layer ${position}`;
}

/** The nominal thickness of the swept layer in the film; the solver sets it anew at each point. */
const PLACEHOLDER_NM = 1;

export function candidateFilm(design: CapDesign, candidate: CapCandidate): CandidateFilm {
  const cap: StackLayer[] = candidate.layers.map(({ medium, fixedNm }, position) => ({
    id: capLayerId(position),
    medium,
    thicknessNm: fixedNm ?? PLACEHOLDER_NM,
  }));
  const sweptId = cap[candidate.layers.findIndex(({ fixedNm }) => fixedNm === null)]!.id;
  const film = expandBlocks(bareFilm(design));
  return {
    ...film,
    document: { ...film.document, layers: [...cap, ...film.document.layers] },
    layers: [...cap.map((layer) => ({ layer, drawnId: layer.id })), ...film.layers],
    sweptId,
    drawn: [...film.layers.map(({ layer }) => layer), ...cap],
  };
}
