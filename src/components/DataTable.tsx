import {
  createColumnHelper,
  createSortedRowModel,
  rowSortingFeature,
  sortFns,
  tableFeatures,
  useTable,
} from '@tanstack/react-table';
import { ArrowDown, ArrowUp } from 'lucide-react';
import { useMemo } from 'react';
import type { ReactNode } from 'react';

export type Column<Row> = {
  id: string;
  header: string;
  /** What the column sorts by, and prints when there is no `cell`. */
  value: (row: Row) => string | number | null;
  cell?: (row: Row) => ReactNode;
  align?: 'start' | 'end';
  sortable?: boolean;
  /** A header only for screen readers, such as that of the actions. */
  hideHeader?: boolean;
};

type DataTableProps<Row> = {
  /** Names the table; read by screen readers, not shown. */
  caption: string;
  /** The first column names its row. Keep the array stable between renders. */
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** In place of the table when there are no rows. */
  empty: ReactNode;
  initialSort?: { id: string; descending: boolean };
};

const features = tableFeatures({
  rowSortingFeature,
  sortedRowModel: createSortedRowModel(),
  sortFns,
});

/** Texts by the rules of language, numbers by size, unknown values last in both directions. */
function compare(a: string | number, b: string | number): number {
  if (typeof a === 'number' && typeof b === 'number') return a - b;
  return String(a).localeCompare(String(b), 'en', { numeric: true });
}

/**
 * A sortable table. On a phone each row becomes a block with the column names before the values; the roles keep it
 * a table for screen readers then.
 */
export function DataTable<Row extends object>({
  caption,
  columns,
  rows,
  rowKey,
  empty,
  initialSort,
}: DataTableProps<Row>) {
  const definitions = useMemo(() => {
    const helper = createColumnHelper<typeof features, Row>();
    return helper.columns(
      columns.map((column) =>
        helper.accessor((row) => column.value(row) ?? undefined, {
          id: column.id,
          header: column.header,
          enableSorting: column.sortable ?? true,
          sortUndefined: 'last',
          sortFn: (a, b, id) => compare(a.getValue<string | number>(id), b.getValue<string | number>(id)),
        }),
      ),
    );
  }, [columns]);
  const data = useMemo(() => [...rows], [rows]);
  const table = useTable({
    features,
    columns: definitions,
    data,
    getRowId: rowKey,
    enableSortingRemoval: false,
    initialState: { sorting: initialSort ? [{ id: initialSort.id, desc: initialSort.descending }] : [] },
  });
  const columnOf = (id: string) => columns.find((column) => column.id === id);

  if (rows.length === 0) return empty;
  return (
    <table role="table" className="w-full border-collapse text-left max-md:block">
      <caption className="sr-only">{caption}</caption>
      <thead role="rowgroup" className="max-md:sr-only">
        <tr role="row" className="border-b border-line">
          {(table.getHeaderGroups()[0]?.headers ?? []).map((header) => {
            const column = columnOf(header.column.id);
            const sorted = header.column.getIsSorted();
            return (
              <th
                key={header.id}
                role="columnheader"
                scope="col"
                aria-sort={sorted === 'asc' ? 'ascending' : sorted === 'desc' ? 'descending' : undefined}
                className={`px-3 py-2 text-note font-medium text-muted ${column?.align === 'end' ? 'text-right' : ''}`}
              >
                {header.column.getCanSort() ? (
                  <button
                    type="button"
                    onClick={header.column.getToggleSortingHandler()}
                    className={`inline-flex items-center gap-1 font-medium hover:text-ink ${sorted ? 'text-ink' : ''}`}
                  >
                    {column?.header}
                    {sorted === 'asc' ? <ArrowUp aria-hidden="true" className="size-3" /> : null}
                    {sorted === 'desc' ? <ArrowDown aria-hidden="true" className="size-3" /> : null}
                  </button>
                ) : (
                  <span className={column?.hideHeader ? 'sr-only' : ''}>{column?.header}</span>
                )}
              </th>
            );
          })}
        </tr>
      </thead>
      <tbody role="rowgroup" className="max-md:block">
        {table.getRowModel().rows.map((row) => (
          <tr
            key={row.id}
            role="row"
            className="border-b border-line last:border-b-0 hover:bg-accent-soft/40 max-md:relative max-md:block max-md:py-2.5"
          >
            {columns.map((column, position) => (
              <BodyCell key={column.id} column={column} row={row.original} isName={position === 0} />
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

/** On a phone the name stands on a line of its own and the rest flows under it, each value behind its column's name. */
function BodyCell<Row>({ column, row, isName }: { column: Column<Row>; row: Row; isName: boolean }) {
  const content = column.cell ? column.cell(row) : (column.value(row) ?? '–');
  const align = column.align === 'end' ? 'md:text-right' : '';
  if (isName) {
    return (
      <th
        role="rowheader"
        scope="row"
        className={`px-3 py-2 align-middle font-semibold wrap-anywhere max-md:block max-md:pt-0 max-md:pr-14 max-md:pb-1 ${align}`}
      >
        {content}
      </th>
    );
  }
  if (column.hideHeader) {
    return (
      <td
        role="cell"
        className={`px-3 py-1 align-middle max-md:absolute max-md:top-1.5 max-md:right-1 max-md:p-0 ${align}`}
      >
        {content}
      </td>
    );
  }
  return (
    <td
      role="cell"
      className={`px-3 py-2 align-middle max-md:inline-flex max-md:max-w-full max-md:items-baseline max-md:gap-1.5 max-md:py-0 max-md:pr-1 ${align}`}
    >
      <span aria-hidden="true" className="shrink-0 text-note text-muted md:hidden">
        {column.header}
      </span>
      {content}
    </td>
  );
}
