import type { ReactNode } from 'react';

/** What a model means: its formula on a line of its own, then what the letters are and their units. */
export function Definition({ formula, children }: { formula: ReactNode; children?: ReactNode }) {
  return (
    <div className="rounded-control bg-paper px-3 py-2">
      <p className="overflow-x-auto">{formula}</p>
      {children ? <p className="mt-0.5 text-note text-muted">{children}</p> : null}
    </div>
  );
}
