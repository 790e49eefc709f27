import type { KeyboardEvent, PointerEvent } from 'react';
import type { StackLayer } from '../../../../shared/stack.ts';
import { mediumClass, mediumName } from '../model/media.ts';
import { classFill, magnetHatch } from './classColours.ts';
import { DepthTick } from './DepthTick.tsx';
import { useFilm } from './film.ts';
import { stepItem } from './itemActions.ts';
import { LayerControls } from './LayerControls.tsx';
import { BottomPart, GradedBand, TopParts } from './SampleMarks.tsx';
import { ThicknessHandle } from './ThicknessHandle.tsx';

type Props = {
  layer: StackLayer;
  /** Position as people count, such as "2" or "3.1" inside a block. */
  position: string;
  height: number;
  /** Depth of its lower face, nm; null where the tick would say nothing new. */
  depthNm: number | null;
  /** Fill of what lies above, which a graded interface runs over from. */
  fillAbove: string;
  dragged: boolean;
  /** Whether it is pointed at elsewhere on the page, such as at its share of the signal. */
  active: boolean;
  onGrab?: ((id: string) => (event: PointerEvent) => void) | undefined;
};

/** One layer of the drawing: its colour, its height, the depth of its lower face, and its controls. */
export function LayerRow({ layer, position, height, depthNm, fillAbove, dragged, active, onGrab }: Props) {
  const { materials, edit, announce } = useFilm();
  const onKeyDown = (event: KeyboardEvent) => {
    if (!edit || !event.altKey || event.defaultPrevented) return;
    if (event.key !== 'ArrowUp' && event.key !== 'ArrowDown') return;
    event.preventDefault();
    stepItem(edit, announce, layer, event.key === 'ArrowUp' ? 'up' : 'down');
  };
  return (
    <li
      data-item-id={layer.id}
      data-drop-id={layer.id}
      data-drop-kind="layer"
      aria-label={`${mediumName(layer.medium, materials)}, layer ${position}`}
      className={`group relative flex flex-col border-b-[1.5px] border-paper ${dragged ? 'opacity-45' : ''} ${active ? 'outline-2 -outline-offset-2 outline-magnet' : ''}`}
      style={{
        minHeight: height,
        background: classFill[mediumClass(layer.medium, materials)],
        backgroundImage: layer.m === undefined ? undefined : magnetHatch,
      }}
      onKeyDown={onKeyDown}
    >
      {layer.gradedNm !== undefined && <GradedBand fillAbove={fillAbove} />}
      <TopParts layer={layer} />
      <div className="flex flex-1 flex-col justify-center">
        <LayerControls layer={layer} position={position} onGrab={onGrab} />
      </div>
      <BottomPart layer={layer} />
      <ThicknessHandle layer={layer} />
      {depthNm !== null && <DepthTick depthNm={depthNm} />}
    </li>
  );
}
