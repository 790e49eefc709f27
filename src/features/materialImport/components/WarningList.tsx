import { TriangleAlert } from 'lucide-react';
import type { ImportWarning } from '../../../../shared/materialImport.ts';

/** Things to look at, with the lines of the file they are about. Nothing was changed because of them. */
export function WarningList({ label, warnings }: { label: string; warnings: readonly ImportWarning[] }) {
  if (warnings.length === 0) return null;
  return (
    <ul aria-label={label} className="flex flex-col gap-1.5">
      {warnings.map(({ code, message, lines }) => (
        <li
          key={`${code} ${message}`}
          className="flex gap-2 rounded-control bg-warn-soft px-3 py-2 text-note text-warn"
        >
          <TriangleAlert aria-hidden="true" className="mt-0.5 size-4 shrink-0" />
          <span>
            {message}
            {lines.length > 0 ? (
              <span className="block">
                {lines.length === 1 ? 'Line' : 'Lines'} {lines.join(', ')}
              </span>
            ) : null}
          </span>
        </li>
      ))}
    </ul>
  );
}
