import type { ReactNode } from 'react';
import type { Issue } from '../../shared/error.ts';
import { Button } from './Button.tsx';

/** What stands between edits and the server. */
export function SaveNotice({ tone, children }: { tone: 'warn' | 'danger'; children: ReactNode }) {
  const look = tone === 'warn' ? 'bg-warn-soft text-ink' : 'bg-danger-soft text-danger';
  return (
    <div role="alert" className={`mt-2 flex flex-col gap-2 rounded-control px-3 py-2 text-note ${look}`}>
      {children}
    </div>
  );
}

/** A save that failed, with everything that was wrong. */
export function NotSavedNotice({ message, issues }: { message: string; issues: readonly Issue[] }) {
  return (
    <SaveNotice tone="danger">
      <p>
        Not saved: {message}
        {issues.map(({ path, message: wrong }) => (
          <span key={path + wrong} className="block">
            {path}: {wrong}
          </span>
        ))}
      </p>
    </SaveNotice>
  );
}

/** Edits that came back after a reload. */
export function RestoredNotice({ onDiscard, onKeep }: { onDiscard: () => void; onKeep: () => void }) {
  return (
    <SaveNotice tone="warn">
      <div className="flex flex-wrap items-center gap-1.5">
        <p className="flex-1">Your unsaved changes from before are back.</p>
        <Button className="py-1!" tone="plain" onClick={onDiscard}>
          Discard them
        </Button>
        <Button className="py-1!" tone="plain" onClick={onKeep}>
          Keep
        </Button>
      </div>
    </SaveNotice>
  );
}
