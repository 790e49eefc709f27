import { ArrowDownUp, Plus, X } from 'lucide-react';
import { use, useState } from 'react';
import type { ClipboardEvent } from 'react';
import { Button, IconButton } from '../../../components/Button.tsx';
import { formatCount } from '../../../lib/format.ts';
import { IssueContext } from '../hooks/issueContext.ts';
import { isAscending, rowsOfPaste, sortedRows, usedRows } from '../model/tableCells.ts';

/** Rows on the page at once; thousands of text fields would make every keystroke slow. */
const PAGE_ROWS = 25;

type Props = {
  /** Names the grid, such as "Table of n and k". */
  label: string;
  columns: readonly [string, string, string];
  rows: string[][];
  pathOf: (row: number, column: number) => string;
  onChange: (rows: string[][]) => void;
};

/** A small grid of cells as they are typed. Cells of a spreadsheet are pasted into it from the focused row on. */
export function TableGrid({ label, columns, rows, pathOf, onChange }: Props) {
  const [page, setPage] = useState(0);
  const [pasted, setPasted] = useState<number | null>(null);
  const pages = Math.max(1, Math.ceil(rows.length / PAGE_ROWS));
  const first = Math.min(page, pages - 1) * PAGE_ROWS;
  const issues = use(IssueContext);
  const wrongRow = rows.findIndex((_, row) =>
    columns.some((_, column) => issues.some(({ path }) => path === pathOf(row, column))),
  );
  const elsewhere = wrongRow >= 0 && (wrongRow < first || wrongRow >= first + PAGE_ROWS);

  const paste = (event: ClipboardEvent, row: number) => {
    const cells = rowsOfPaste(event.clipboardData.getData('text'));
    if (cells === null) return;
    event.preventDefault();
    onChange([...rows.slice(0, row), ...cells, ...rows.slice(row + cells.length)]);
    setPasted(cells.length);
  };
  const add = () => {
    onChange([...rows, ['', '', '']]);
    setPage(Math.floor(rows.length / PAGE_ROWS));
  };

  return (
    <div className="flex flex-col gap-2">
      <table aria-label={label} className="w-full max-w-xl border-collapse">
        <thead>
          <tr className="text-left text-note text-muted">
            {columns.map((column) => (
              <th key={column} scope="col" className="px-1 py-1 font-medium">
                {column}
              </th>
            ))}
            <th className="w-9">
              <span className="sr-only">Remove</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.slice(first, first + PAGE_ROWS).map((cells, position) => {
            const row = first + position;
            return (
              <tr key={row} onPaste={(event) => paste(event, row)}>
                {columns.map((column, at) => (
                  <Cell
                    key={column}
                    label={`${column}, row ${row + 1}`}
                    problem={issues.find(({ path }) => path === pathOf(row, at))?.message}
                    text={cells[at] ?? ''}
                    onChange={(text) => onChange(withCell(rows, row, at, text))}
                  />
                ))}
                <td className="py-0.5 align-top">
                  {rows.length > 1 ? (
                    <IconButton
                      label={`Remove row ${row + 1}`}
                      onClick={() => onChange(rows.filter((_, other) => other !== row))}
                    >
                      <X aria-hidden="true" className="size-4" />
                    </IconButton>
                  ) : null}
                </td>
              </tr>
            );
          })}
        </tbody>
      </table>
      {elsewhere ? (
        <p className="text-note text-danger">
          <span aria-hidden="true">▲ </span>
          Row {wrongRow + 1} has a problem.{' '}
          <button
            type="button"
            className="prose-link"
            onClick={() => setPage(Math.floor(wrongRow / PAGE_ROWS))}
          >
            Show it
          </button>
        </p>
      ) : null}
      <div className="flex flex-wrap items-center gap-1.5">
        <Button className="py-1!" icon={<Plus aria-hidden="true" className="size-4" />} onClick={add}>
          Add a row
        </Button>
        {isAscending(rows) ? null : (
          <Button
            className="py-1!"
            icon={<ArrowDownUp aria-hidden="true" className="size-4" />}
            onClick={() => onChange(sortedRows(rows))}
          >
            Sort by wavelength
          </Button>
        )}
        {pages > 1 ? (
          <span className="inline-flex items-center gap-1.5">
            <Button
              className="py-1!"
              tone="plain"
              disabled={first === 0}
              onClick={() => setPage(first / PAGE_ROWS - 1)}
            >
              Earlier rows
            </Button>
            <span className="text-note text-muted">
              {first + 1}–{Math.min(first + PAGE_ROWS, rows.length)} of {formatCount(rows.length)}
            </span>
            <Button
              className="py-1!"
              tone="plain"
              disabled={first + PAGE_ROWS >= rows.length}
              onClick={() => setPage(first / PAGE_ROWS + 1)}
            >
              Later rows
            </Button>
          </span>
        ) : null}
      </div>
      <p role="status" className="text-note text-muted">
        {pasted === null
          ? 'Cells copied from a spreadsheet can be pasted into a row: wavelength in nm first, then the two values; one value alone takes 0 as the second.'
          : `${formatCount(pasted)} ${pasted === 1 ? 'row' : 'rows'} pasted, ${formatCount(usedRows(rows).length)} in all.`}
      </p>
    </div>
  );
}

function withCell(rows: string[][], row: number, column: number, text: string): string[][] {
  return rows.map((cells, at) =>
    at === row ? [0, 1, 2].map((one) => (one === column ? text : (cells[one] ?? ''))) : cells,
  );
}

type CellProps = {
  label: string;
  text: string;
  problem: string | undefined;
  onChange: (text: string) => void;
};

function Cell({ label, text, problem, onChange }: CellProps) {
  return (
    <td className="px-0.5 py-0.5 align-top">
      <input
        type="text"
        inputMode="decimal"
        autoComplete="off"
        aria-label={label}
        aria-invalid={problem ? true : undefined}
        title={problem}
        value={text}
        onChange={(event) => onChange(event.target.value)}
        className="w-full min-w-0 rounded-box border border-edge bg-panel px-2 py-1 text-right aria-invalid:border-danger aria-invalid:ring-1 aria-invalid:ring-danger"
      />
      {problem ? <p className="px-1 text-small text-danger">▲ {problem}</p> : null}
    </td>
  );
}
