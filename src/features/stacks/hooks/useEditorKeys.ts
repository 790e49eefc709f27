import { useEffect } from 'react';

type Actions = { undo: () => void; redo: () => void; save: () => void };

/** Ctrl or Cmd with Z, Shift Z or Y, and S, wherever the focus is on the page. */
export function useEditorKeys({ undo, redo, save }: Actions, enabled: boolean): void {
  useEffect(() => {
    if (!enabled) return;
    const onKeyDown = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey) return;
      const key = event.key.toLowerCase();
      if (key === 's') save();
      else if (key === 'y' || (key === 'z' && event.shiftKey)) besideTyping(redo);
      else if (key === 'z') besideTyping(undo);
      else return;
      event.preventDefault();
    };
    window.addEventListener('keydown', onKeyDown);
    return () => window.removeEventListener('keydown', onKeyDown);
  }, [undo, redo, save, enabled]);
}

/** A number being typed shows its text; it has to be left and entered again to show what undo made of it. */
function besideTyping(change: () => void): void {
  const focused = document.activeElement;
  const typing = focused instanceof HTMLInputElement || focused instanceof HTMLTextAreaElement;
  if (typing) focused.blur();
  change();
  if (typing) requestAnimationFrame(() => focused.focus());
}
