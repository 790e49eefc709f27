import type { UsedMaterial } from '../../shared/run.ts';
import type { StackDocument, StackLayer } from '../../shared/stack.ts';
import { drawnLayers } from '../../worker/design/expandBlocks.ts';
import { mediumName } from './cardLayers.ts';

/** What a film has beside thicknesses, a sentence for each layer that has some of it, in the order of growth. */
export function layerRemarks(document: StackDocument, materials: readonly UsedMaterial[]): string[] {
  const { substrateM, substrateVoigtScale, substrateGradedNm } = document;
  const substrate = remarksOf(
    { m: substrateM, voigtScale: substrateVoigtScale, gradedNm: substrateGradedNm },
    materials,
  );
  return [
    ...(substrate === '' ? [] : [`Substrate: ${substrate}.`]),
    ...drawnLayers(document.layers)
      .toReversed()
      .flatMap((layer) => {
        const said = remarksOf(layer, materials);
        const name = [mediumName(layer.medium, materials), ...(layer.note ? [`(${layer.note})`] : [])];
        return said === '' ? [] : [`Layer ${name.join(' ')}: ${said}.`];
      }),
  ];
}

type Extras = Partial<Omit<StackLayer, 'id' | 'medium' | 'thicknessNm'>>;

function remarksOf(
  { m, fixed, voigtScale, gradedNm, dead, oxide }: Extras,
  materials: readonly UsedMaterial[],
): string {
  return [
    ...(m ? [`m = (${m.join(', ')})${fixed ? ', fixed' : ''}`] : []),
    ...(voigtScale !== undefined && voigtScale !== 1 ? [`Q times ${voigtScale}`] : []),
    ...(gradedNm ? [`graded over ${gradedNm} nm with what is above`] : []),
    ...(dead
      ? [`without magnetization for ${dead.topNm} nm at the top and ${dead.bottomNm} nm at the bottom`]
      : []),
    ...(oxide
      ? [
          `the upper ${oxide.consumedNm} nm turned into ${oxide.expansion} times as much ${mediumName(oxide.medium, materials)}`,
        ]
      : []),
  ].join('; ');
}
