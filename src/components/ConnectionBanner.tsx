import { CloudOff } from 'lucide-react';
import type { Connection } from '../lib/connection.ts';

/** Stands under the header while the server or its database is away, and goes when it is back. */
export function ConnectionBanner({ connection }: { connection: Connection }) {
  return (
    <div role="status">
      {connection === 'ok' ? null : (
        <p className="flex items-center gap-2 border-b border-line bg-warn-soft px-4 py-2 text-note text-warn sm:px-6">
          <CloudOff aria-hidden="true" className="size-4 shrink-0" />
          {connection === 'unreachable'
            ? 'The server cannot be reached. What is on screen stays; changes cannot be saved. Trying again every few seconds.'
            : 'The server or its database is not available. What is on screen stays; changes cannot be saved. Trying again every few seconds.'}
        </p>
      )}
    </div>
  );
}
