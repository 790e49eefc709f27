import { useEffect, useEffectEvent } from 'react';
import type { StackLayer } from '../../../../shared/stack.ts';
import { useThicknessDrag } from '../hooks/useThicknessDrag.ts';
import { withLayer } from '../model/items.ts';
import { useFilm } from './film.ts';

/**
 * The lower face of a layer, dragged up and down to change its thickness. For the pointer only: the arrow keys in the
 * thickness field of the same layer do the same.
 */
export function ThicknessHandle({ layer }: { layer: StackLayer }) {
  const { edit } = useFilm();
  const { id, thicknessNm, oxide, dead } = layer;
  const leastNm = (oxide?.consumedNm ?? 0) + (dead?.topNm ?? 0) + (dead?.bottomNm ?? 0);
  const { dragging, handlers, putBack } = useThicknessDrag(thicknessNm, leastNm, (nm, drag) =>
    edit?.((document) => withLayer(document, id, { thicknessNm: nm }), `${drag} of thickness of ${id}`),
  );
  const onEscape = useEffectEvent((event: KeyboardEvent) => {
    if (event.key === 'Escape') putBack();
  });
  useEffect(() => {
    if (!dragging) return undefined;
    const listener = (event: KeyboardEvent) => onEscape(event);
    window.addEventListener('keydown', listener);
    return () => window.removeEventListener('keydown', listener);
  }, [dragging]);
  if (!edit) return null;
  return (
    <div
      aria-hidden="true"
      data-thickness-handle={id}
      title="Drag to change the thickness"
      {...handlers}
      className="absolute inset-x-[30%] -bottom-[6px] z-10 flex h-[11px] cursor-ns-resize touch-none items-center justify-center"
    >
      <span
        className={`h-[3px] w-9 rounded-full bg-ink group-hover:opacity-70 ${dragging ? 'opacity-90' : 'opacity-25'}`}
      />
    </div>
  );
}
