import { Ellipsis, GripVertical } from 'lucide-react';
import { memo, useState } from 'react';
import type { KeyboardEvent, PointerEvent } from 'react';
import type { StackLayer, StackMedium } from '../../../../shared/stack.ts';
import { IconButton } from '../../../components/Button.tsx';
import { Menu } from '../../../components/Menu.tsx';
import { Quantity } from '../../../components/Quantity.tsx';
import { withLayer } from '../model/items.ts';
import type { LayerPatch } from '../model/items.ts';
import { isMagnetic, mediumClass, mediumName } from '../model/media.ts';
import { lengthOf } from '../model/magnetization.ts';
import { classFill, magnetHatch } from './classColours.ts';
import { DepthTick } from './DepthTick.tsx';
import { useFilm } from './film.ts';
import { itemMenu, stepItem } from './itemActions.ts';
import { MagnetizationChip } from './MagnetizationChip.tsx';
import { MediumNotes } from './MediumNotes.tsx';
import { MediumPicker } from './MediumPicker.tsx';

type Props = {
  layer: StackLayer;
  /** Position as people count, such as "2" or "3.1" inside a block. */
  position: string;
  height: number;
  /** Depth of its lower face, nm; null where the tick would say nothing new. */
  depthNm: number | null;
  dragged: boolean;
  onGrab?: ((id: string) => (event: PointerEvent) => void) | undefined;
};

/** One layer of the drawing: everything that can be said of it is edited where it stands. */
export const LayerRow = memo(function LayerRow({ layer, position, height, depthNm, dragged, onGrab }: Props) {
  const { materials, edit, issues, announce } = useFilm();
  const name = mediumName(layer.medium, materials);
  const label = `${name}, layer ${position}`;
  const magnetic = layer.m !== undefined;
  const ownIssues = issues.get(layer.id) ?? [];
  const issueAt = (field: string) => ownIssues.find(({ path }) => path === field)?.message;
  const change = (patch: LayerPatch, name: string | null) =>
    edit?.((document) => withLayer(document, layer.id, patch), name && `${name} of ${layer.id}`);

  const changeMedium = (medium: StackMedium, editName: string | null) => {
    const willBe = isMagnetic(medium, materials);
    // A material that can be magnetic arrives magnetized, or nothing would show what it does.
    change({ medium, m: willBe ? (layer.m ?? [0, 0, 1]) : undefined }, editName && 'constants');
  };
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
      aria-label={label}
      className={`group relative flex flex-col justify-center border-b-[1.5px] border-paper ${dragged ? 'opacity-45' : ''}`}
      style={{
        minHeight: height,
        background: classFill[mediumClass(layer.medium, materials)],
        backgroundImage: magnetic ? magnetHatch : undefined,
      }}
      onKeyDown={onKeyDown}
    >
      <div className="flex items-center gap-1.5 px-1">
        {edit && onGrab && <Handle id={layer.id} label={label} onGrab={onGrab} />}
        {edit ? (
          <MediumPicker
            medium={layer.medium}
            label={`layer ${position}`}
            onChange={changeMedium}
            className={`text-lead font-semibold ${magnetic ? 'bg-paper/85' : ''}`}
          >
            {name}
          </MediumPicker>
        ) : (
          <span
            className={`rounded-box px-2 py-[2px] text-lead font-semibold ${magnetic ? 'bg-paper/85' : 'ml-1'}`}
          >
            {name}
          </span>
        )}
        <Note
          note={layer.note ?? ''}
          label={label}
          onChange={edit && ((note) => change({ note }, 'note'))}
          crowded={magnetic}
        />
        <span className="ml-auto flex shrink-0 items-center gap-1.5">
          {layer.m && (
            <MagnetizationChip
              m={layer.m}
              label={label}
              fixed={layer.fixed === true}
              onChange={edit ? (m) => change({ m }, 'm') : undefined}
            />
          )}
          <Quantity
            label={`thickness of ${label}`}
            unit="nm"
            value={layer.thicknessNm}
            min={0}
            step={layer.thicknessNm < 2 ? 0.1 : layer.thicknessNm < 100 ? 1 : 10}
            readOnly={edit === null}
            error={issueAt('thicknessNm')}
            onChange={(thicknessNm) => change({ thicknessNm }, 'thickness')}
          />
          {edit && (
            <Menu
              trigger={
                <IconButton label={`Actions for ${label}`} className="-mr-0.5 size-6!">
                  <Ellipsis size={15} aria-hidden />
                </IconButton>
              }
              items={itemMenu(layer, edit, announce)}
            />
          )}
        </span>
      </div>
      <MediumNotes
        medium={layer.medium}
        magnetized={layer.m !== undefined && lengthOf(layer.m) > 0}
        issues={ownIssues.filter(({ path }) => path !== 'thicknessNm')}
        onChange={edit ? (medium) => change({ medium }, null) : undefined}
      />
      {depthNm !== null && <DepthTick depthNm={depthNm} />}
    </li>
  );
});

/** What an item is dragged by; the arrow keys with Alt do the same. */
export function Handle({
  id,
  label,
  onGrab,
}: {
  id: string;
  label: string;
  onGrab: (id: string) => (event: PointerEvent) => void;
}) {
  return (
    <button
      type="button"
      data-handle={id}
      aria-label={`Move ${label}`}
      aria-keyshortcuts="Alt+ArrowUp Alt+ArrowDown"
      title="Drag into order, or Alt with the arrow keys"
      onPointerDown={onGrab(id)}
      className="-mr-1 inline-flex h-6 w-4 shrink-0 cursor-grab touch-none items-center justify-center rounded-box text-ink opacity-60 group-hover:opacity-100 focus-visible:opacity-100"
    >
      <GripVertical size={13} aria-hidden />
    </button>
  );
}

type NoteProps = { note: string; label: string; onChange: ((note: string) => void) | null; crowded: boolean };

/** The layer's role in the film, such as cap or buffer. An empty one shows only where it can be filled in. */
function Note({ note, label, onChange, crowded }: NoteProps) {
  const [focused, setFocused] = useState(false);
  if (!onChange) return note ? <span className="truncate text-note text-ink/80">{note}</span> : null;
  const hidden = note === '' && !focused;
  return (
    <input
      aria-label={`Note for ${label}`}
      value={note}
      maxLength={120}
      placeholder="note"
      onFocus={() => setFocused(true)}
      onBlur={() => setFocused(false)}
      onChange={(event) => onChange(event.target.value)}
      className={`min-w-0 rounded-box border-0 bg-transparent px-1.5 py-[3px] text-note text-ink/80 ring-1 ring-transparent outline-none hover:ring-edge focus:bg-paper/85 focus:ring-2 focus:ring-accent ${
        crowded ? 'w-14' : 'w-28'
      } ${hidden ? 'placeholder:text-ink/0 group-hover:placeholder:text-ink/80' : ''}`}
    />
  );
}
