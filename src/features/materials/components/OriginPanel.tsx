import { Download, TriangleAlert } from 'lucide-react';
import type { MaterialContent } from '../../../../shared/material.ts';
import type { ImportOrigin, ImportWarning } from '../../../../shared/materialImport.ts';
import { formatCount } from '../../../lib/format.ts';

type Origin = NonNullable<MaterialContent['origin']>;

/** How constants came out of a file: what was said about its columns, and everything that was noticed then. */
export function OriginPanel({ origin }: { origin: Origin }) {
  return (
    <div className="flex flex-col gap-4">
      {importsOf(origin).map(({ what, origin: one }) => (
        <OneOrigin key={what} what={what} origin={one} />
      ))}
    </div>
  );
}

/** Index and Q that came from one file in one import are told once. */
function importsOf({ index, voigt }: Origin): { what: string; origin: ImportOrigin }[] {
  if (index && voigt && JSON.stringify(index) === JSON.stringify(voigt)) {
    return [{ what: 'n, k and Q', origin: index }];
  }
  return [
    ...(index ? [{ what: 'n and k', origin: index }] : []),
    ...(voigt ? [{ what: 'Q', origin: voigt }] : []),
  ];
}

function OneOrigin({ what, origin }: { what: string; origin: ImportOrigin }) {
  const { fileName, rows, sha256, importId, sentences, warnings } = origin;
  return (
    <div className="flex flex-col gap-2">
      <p>
        {what} from <span className="font-semibold wrap-anywhere">{fileName}</span>, {formatCount(rows)} rows.{' '}
        <a
          className="prose-link inline-flex items-center gap-1"
          href={`/api/v1/imports/${importId}/file`}
          download
        >
          <Download size={14} aria-hidden />
          The file as it came
        </a>
      </p>
      <ul className="flex list-disc flex-col gap-0.5 pl-5">
        {sentences.map((sentence) => (
          <li key={sentence}>{sentence}</li>
        ))}
      </ul>
      {warnings.length > 0 ? (
        <ul aria-label={`Warnings when ${what} was imported`} className="flex flex-col gap-1.5">
          {warnings.map((warning) => (
            <WarningLine key={`${warning.code} ${warning.message}`} warning={warning} />
          ))}
        </ul>
      ) : (
        <p className="text-muted">Nothing looked doubtful when it was imported.</p>
      )}
      <p className="text-small text-muted">
        SHA-256 of the file <code className="wrap-anywhere select-all">{sha256}</code>
      </p>
    </div>
  );
}

function WarningLine({ warning: { message, lines } }: { warning: ImportWarning }) {
  return (
    <li className="flex gap-2 rounded-control bg-warn-soft px-3 py-1.5 text-warn">
      <TriangleAlert aria-hidden="true" className="mt-0.5 size-4 shrink-0" />
      <span className="min-w-0">
        {message}
        {lines.length > 0 ? ` ${lines.length === 1 ? 'Line' : 'Lines'} ${lines.join(', ')}.` : ''}
      </span>
    </li>
  );
}
