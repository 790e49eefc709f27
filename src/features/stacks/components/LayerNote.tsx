import { useState } from 'react';

type NoteProps = { note: string; label: string; onChange: ((note: string) => void) | null; crowded: boolean };

/** The layer's role in the film, such as cap or buffer. An empty one shows only where it can be filled in. */
export function LayerNote({ note, label, onChange, crowded }: NoteProps) {
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
      className={`w-0 min-w-0 flex-1 rounded-box border-0 bg-transparent px-1.5 py-[3px] text-note text-ink/80 ring-1 ring-transparent outline-none hover:ring-edge focus:bg-paper/85 focus:ring-2 focus:ring-accent ${
        crowded ? 'max-w-14' : 'max-w-36'
      } ${hidden ? 'placeholder:text-ink/0 group-hover:placeholder:text-ink/80' : ''}`}
    />
  );
}
