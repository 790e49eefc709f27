import { useEffect, useRef } from 'react';
import { Button } from '../../../components/Button.tsx';

/** In place of an item that was removed and is not saved yet. It takes the focus that the item had. */
export function RemovedItem({ name, onUndo }: { name: string; onUndo: () => void }) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (document.activeElement === document.body) box.current?.querySelector('button')?.focus();
  }, []);
  return (
    <div
      ref={box}
      className="flex flex-wrap items-center gap-3 rounded-card border border-dashed border-edge px-4 py-2 text-muted"
    >
      <span className="min-w-0 flex-1">{name} is removed when you save.</span>
      <Button className="py-1!" onClick={onUndo}>
        Put it back<span className="sr-only">: {name}</span>
      </Button>
    </div>
  );
}
