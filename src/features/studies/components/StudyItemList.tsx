import { useCallback, useRef, useState } from 'react';
import type { ReactNode } from 'react';
import type { StudyItem } from '../../../../shared/study.ts';
import { useItemDrag } from '../hooks/useItemDrag.ts';
import { changeItem, itemsOf, moveByOne, moveTo, setRemoved } from '../model/rows.ts';
import type { StudyRow } from '../model/rows.ts';
import { ItemFrame } from './ItemFrame.tsx';
import { NoteItem } from './NoteItem.tsx';
import { PinnedItem } from './PinnedItem.tsx';
import { RemovedItem } from './RemovedItem.tsx';

type Props = {
  rows: readonly StudyRow[];
  /** Absent for people who may not change the study. */
  onRows: ((change: (rows: readonly StudyRow[]) => StudyRow[]) => void) | undefined;
  /** Draws a run or design as it was pinned. */
  renderPinned: (item: Exclude<StudyItem, { kind: 'note' }>) => ReactNode;
  /** What stands below the caption of a pinned thing. */
  renderBelow?: (item: Exclude<StudyItem, { kind: 'note' }>) => ReactNode;
  /** What the pinned thing is called. */
  nameOf: (item: StudyItem) => string;
};

/** The items in their order. They are moved by dragging, and by buttons that keep the focus on what they move. */
export function StudyItemList({ rows, onRows, renderPinned, renderBelow, nameOf }: Props) {
  const list = useRef<HTMLOListElement | null>(null);
  const [said, setSaid] = useState('');
  const drop = useCallback(
    (id: string, before: number) => onRows?.((now) => moveTo(now, id, before)),
    [onRows],
  );
  const { setList, draggedId, before, start } = useItemDrag(drop);
  const count = itemsOf(rows).length;

  const move = (item: StudyItem, step: -1 | 1) => {
    onRows?.((now) => moveByOne(now, item.id, step));
    const place = itemsOf(rows).findIndex(({ id }) => id === item.id) + step;
    setSaid(`${nameOf(item)} is now number ${place + 1} of ${count}.`);
    // The browser lets go of the focus when the row changes its place in the page; a button that has come to
    // the end gives it to the other one.
    requestAnimationFrame(() => focusMove(list.current, item.id, step));
  };

  let number = 0;
  return (
    <>
      <p role="status" className="sr-only">
        {said}
      </p>
      <ol
        ref={(element) => {
          list.current = element;
          setList(element);
        }}
        className="flex flex-col gap-4"
      >
        {rows.map(({ item, removed }, index) => {
          if (!removed) number++;
          return (
            <li key={item.id} data-row={item.id} className={draggedId === item.id ? 'opacity-50' : ''}>
              {draggedId !== null && before === index && <DropLine />}
              {removed ? (
                <RemovedItem
                  name={nameOf(item)}
                  onUndo={() => onRows?.((now) => setRemoved(now, item.id, false))}
                />
              ) : (
                <ItemFrame
                  name={nameOf(item)}
                  number={number}
                  count={count}
                  {...(onRows && {
                    edit: {
                      onMove: (step) => move(item, step),
                      onDragStart: start(item.id),
                      onRemove: () => onRows((now) => setRemoved(now, item.id, true)),
                    },
                  })}
                >
                  {item.kind === 'note' ? (
                    <NoteItem
                      note={item}
                      onChange={onRows && ((next) => onRows((now) => changeItem(now, next)))}
                    />
                  ) : (
                    <PinnedItem
                      item={item}
                      below={renderBelow?.(item)}
                      onCaption={
                        onRows && ((caption) => onRows((now) => changeItem(now, { ...item, caption })))
                      }
                    >
                      {renderPinned(item)}
                    </PinnedItem>
                  )}
                </ItemFrame>
              )}
              {draggedId !== null && before === rows.length && index === rows.length - 1 && <DropLine />}
            </li>
          );
        })}
      </ol>
    </>
  );
}

function DropLine() {
  return <div aria-hidden="true" className="my-1 h-1 rounded-full bg-accent" />;
}

function focusMove(list: HTMLElement | null, id: string, step: -1 | 1): void {
  const rows = [...(list?.querySelectorAll<HTMLElement>('[data-row]') ?? [])];
  const row = rows.find(({ dataset }) => dataset['row'] === id);
  const buttons = [step, -step].map((one) =>
    row?.querySelector<HTMLButtonElement>(`button[data-move="${one}"]:not(:disabled)`),
  );
  (buttons[0] ?? buttons[1])?.focus();
}
