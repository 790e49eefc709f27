import { Ellipsis } from 'lucide-react';
import type { PointerEvent, ReactNode } from 'react';
import type { StackBlock } from '../../../../shared/stack.ts';
import { LIMITS } from '../../../../shared/limits.ts';
import { IconButton } from '../../../components/Button.tsx';
import { Menu } from '../../../components/Menu.tsx';
import { Quantity } from '../../../components/Quantity.tsx';
import { formatDepth } from '../model/depthScale.ts';
import { withRepeat } from '../model/items.ts';
import { DepthTick } from './DepthTick.tsx';
import { useFilm } from './film.ts';
import { itemMenu, stepItem } from './itemActions.ts';
import { Handle } from './Handle.tsx';

type Props = {
  block: StackBlock;
  position: string;
  periodNm: number;
  /** Depth of the lower face of the last repetition, nm. */
  depthNm: number;
  dragged: boolean;
  onGrab?: ((id: string) => (event: PointerEvent) => void) | undefined;
  /** The rows of one period. */
  children: ReactNode;
};

/** A repeated block: one period is drawn inside a bracket that says how often it stands in the film. */
export function BlockFrame({ block, position, periodNm, depthNm, dragged, onGrab, children }: Props) {
  const { edit, announce } = useFilm();
  const label = `block ${position}`;
  return (
    <li
      data-item-id={block.id}
      aria-label={`${label}, repeated ${block.repeat} times`}
      className={`group relative border-b-[1.5px] border-paper border-l-4 border-l-edge ${dragged ? 'opacity-45' : ''}`}
    >
      <div
        data-drop-id={block.id}
        data-drop-kind="head"
        className="flex h-9 items-center gap-1 bg-panel px-1 text-note text-muted"
        onKeyDown={(event) => {
          if (!edit || !event.altKey || event.defaultPrevented) return;
          if (event.key !== 'ArrowUp' && event.key !== 'ArrowDown') return;
          event.preventDefault();
          stepItem(edit, announce, block, event.key === 'ArrowUp' ? 'up' : 'down');
        }}
      >
        {edit && onGrab && <Handle id={block.id} label={label} onGrab={onGrab} />}
        <span className="pl-1.5">repeated</span>
        <Quantity
          label={`how often ${label} is repeated`}
          unit="×"
          value={block.repeat}
          whole
          min={0}
          max={LIMITS.repeat}
          readOnly={edit === null}
          onChange={(repeat) =>
            edit?.((document) => withRepeat(document, block.id, repeat), `repeat of ${block.id}`)
          }
        />
        <span className="ml-auto whitespace-nowrap">
          period {formatDepth(periodNm)} nm, {formatDepth(periodNm * block.repeat)} in all
        </span>
        {edit && (
          <Menu
            trigger={
              <IconButton label={`Actions for ${label}`} className="size-6!">
                <Ellipsis size={15} aria-hidden />
              </IconButton>
            }
            items={itemMenu(block, edit, announce)}
          />
        )}
      </div>
      <ol>{children}</ol>
      {block.layers.length === 0 && (
        <p className="px-3 py-2 text-note text-muted">Empty: drag a layer here.</p>
      )}
      <div data-drop-id={block.id} data-drop-kind="foot" className="h-1.5 bg-panel" />
      <DepthTick depthNm={depthNm} />
    </li>
  );
}
