import { Plus } from 'lucide-react';
import { memo, useCallback, useMemo } from 'react';
import type { StackDocument, StackItem, StackMedium } from '../../../../shared/stack.ts';
import { Button } from '../../../components/Button.tsx';
import { useLayerDrag } from '../hooks/useLayerDrag.ts';
import { layerHeights } from '../model/depthScale.ts';
import { dropItem } from '../model/dropTarget.ts';
import type { DropTarget } from '../model/dropTarget.ts';
import { isBlock, listLayers } from '../model/items.ts';
import { mediumClass } from '../model/media.ts';
import { layerLike } from '../model/newStackItems.ts';
import { BlockFrame } from './BlockFrame.tsx';
import { classFill } from './classColours.ts';
import { DepthTick } from './DepthTick.tsx';
import { useFilm } from './film.ts';
import { LayerRow } from './LayerRow.tsx';
import { Substrate } from './Substrate.tsx';

/** Height that the layers of the drawing keep to where they can, px. */
const ROOM = 430;

type Props = { document: StackDocument; activeLayer: string | null };

/** The film from its surface down: layers on a compressed depth scale, blocks in brackets, the substrate fading out. */
export const CrossSection = memo(function CrossSection({ document, activeLayer }: Props) {
  const { materials, edit, announce } = useFilm();
  const onDrop = useCallback(
    (id: string, target: DropTarget) => {
      edit?.((now) => ({ ...now, layers: dropItem(now.layers, id, target) }), null);
      announce('Moved');
    },
    [edit, announce],
  );
  const { setFilm, draggedId, target, start } = useLayerDrag(onDrop);
  const heights = useMemo(() => {
    const layers = listLayers(document.layers);
    const px = layerHeights(
      layers.map((layer) => layer.thicknessNm),
      ROOM,
    );
    return new Map(layers.map((layer, index) => [layer.id, px[index]!]));
  }, [document.layers]);

  const fillBefore = (items: readonly StackItem[], index: number, first: string) => {
    const above = listLayers(items.slice(0, index)).at(-1);
    return above ? fillOf(above.medium) : first;
  };
  const fillOf = (medium: StackMedium) => classFill[mediumClass(medium, materials)];
  const rowsOf = (items: readonly StackItem[], startNm: number, prefix: string, fillAbove: string) => {
    let depthNm = startNm;
    return items.map((item, index) => {
      const position = `${prefix}${index + 1}`;
      const common = { position, dragged: draggedId === item.id, onGrab: edit ? start : undefined };
      const topNm = depthNm;
      depthNm += thicknessOf(item);
      return isBlock(item) ? (
        <BlockFrame key={item.id} block={item} periodNm={periodOf(item.layers)} depthNm={depthNm} {...common}>
          {rowsOf(item.layers, topNm, `${position}.`, fillBefore(items, index, fillAbove))}
        </BlockFrame>
      ) : (
        <LayerRow
          key={item.id}
          layer={item}
          active={item.id === activeLayer}
          height={heights.get(item.id) ?? 34}
          fillAbove={fillBefore(items, index, fillAbove)}
          // The face of a block's last layer is that of the block, many repetitions further down.
          depthNm={prefix !== '' && index === items.length - 1 ? null : depthNm}
          {...common}
        />
      );
    });
  };

  return (
    <div ref={setFilm} className="relative ml-[38px]">
      {document.layers.length === 0 && (
        <div className="border-b-[1.5px] border-paper bg-panel px-4 py-4 text-note text-muted">
          <p>No layer yet: light meets the bare substrate.</p>
          {edit && (
            <Button
              className="mt-2"
              icon={<Plus size={15} aria-hidden />}
              onClick={() => edit((now) => ({ ...now, layers: [layerLike(undefined, now.substrate)] }), null)}
            >
              Add a layer
            </Button>
          )}
        </div>
      )}
      <ol aria-label="Layers, from the surface down" className="relative">
        {rowsOf(document.layers, 0, '', 'transparent')}
      </ol>
      <DepthTick depthNm={0} atTop />
      <Substrate
        substrate={document.substrate}
        substrateM={document.substrateM}
        backside={document.backside}
        graded={document.substrateGradedNm !== undefined}
        fillAbove={fillBefore(document.layers, document.layers.length, 'transparent')}
      />
      {target && (
        <div
          className="pointer-events-none absolute inset-x-0 z-10 h-[3px] -translate-y-1/2 rounded-full bg-accent"
          style={{ top: target.y }}
        />
      )}
    </div>
  );
});

function periodOf(items: readonly StackItem[]): number {
  return items.reduce((sum, item) => sum + thicknessOf(item), 0);
}

function thicknessOf(item: StackItem): number {
  if (isBlock(item)) return item.repeat * periodOf(item.layers);
  // An oxide is thicker than the metal that it grew from.
  return item.thicknessNm + (item.oxide ? item.oxide.consumedNm * (item.oxide.expansion - 1) : 0);
}
