import type { ImportTable } from '../../../../shared/materialImport.ts';
import { formatCount } from '../../../lib/format.ts';

const delimiters: Record<ImportTable['delimiter'], string> = {
  comma: 'commas',
  semicolon: 'semicolons',
  tab: 'tabs',
  space: 'spaces',
};

/** How the table was read, in a line, and its comments. */
export function TableFacts({ table }: { table: ImportTable }) {
  const { rowCount, delimiter, decimal, headerLine, comments } = table;
  return (
    <div className="flex flex-col gap-1.5">
      <p>
        {formatCount(rowCount)} rows, {delimiters[delimiter]} between the columns, decimal {decimal},{' '}
        {headerLine === null ? 'no header' : `header in line ${headerLine}`}.
      </p>
      {comments.length > 0 ? (
        <details>
          <summary className="w-fit text-accent">
            {comments.length === 1 ? 'One comment line' : `${comments.length} comment lines`}
          </summary>
          <pre className="mt-1.5 max-h-48 overflow-auto rounded-control bg-paper px-3 py-2 text-note whitespace-pre-wrap">
            {comments.join('\n')}
          </pre>
        </details>
      ) : null}
    </div>
  );
}
