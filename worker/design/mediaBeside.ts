import type { StackDocument, StackMedium } from '../../shared/stack.ts';
import { drawnLayers } from './expandBlocks.ts';

/** The media of a film that are no layers of their own: around it, and what has become of the layers in air. */
export function mediaBeside({ incident, layers, substrate, backside }: StackDocument): StackMedium[] {
  return [
    substrate,
    incident,
    ...drawnLayers(layers).flatMap(({ oxide }) => (oxide ? [oxide.medium] : [])),
    ...(backside ? [backside.exit] : []),
  ];
}
