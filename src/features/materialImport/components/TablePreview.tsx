import type { ImportTable } from '../../../../shared/materialImport.ts';
import { formatCount, formatPlain } from '../../../lib/format.ts';
import type { ColumnPlan } from '../model/columnPlan.ts';
import { ColumnHead } from './ColumnHead.tsx';

type TablePreviewProps = { table: ImportTable; plan: ColumnPlan; onPlan: (plan: ColumnPlan) => void };

/** The first and last rows as they were read, under what each column means. */
export function TablePreview({ table, plan, onPlan }: TablePreviewProps) {
  // A short table is shown whole: its last rows are among the first.
  const shown = table.firstRows.at(-1)?.line ?? 0;
  const lastRows = table.lastRows.filter(({ line }) => line > shown);
  const skipped = table.rowCount - table.firstRows.length - lastRows.length;
  const cells = (rows: ImportTable['firstRows']) =>
    rows.map(({ line, cells: values }) => (
      <tr key={line} className="border-t border-line">
        <th scope="row" className="py-1 pr-4 pl-3 text-right font-normal text-muted">
          {line}
        </th>
        {table.columns.map((_, column) => {
          const value = values[column] ?? null;
          return (
            <td
              key={column}
              className={`px-3 py-1 text-right ${plan.roles[column] === 'unused' ? 'text-muted' : ''}`}
            >
              {value === null ? <span className="text-warn">empty</span> : formatPlain(value)}
            </td>
          );
        })}
      </tr>
    ));
  return (
    <div
      tabIndex={0}
      role="region"
      aria-label="First and last rows of the table"
      className="overflow-x-auto rounded-control border border-line"
    >
      <table className="text-left text-note">
        <thead>
          <tr className="align-top">
            <th scope="col" className="py-2.5 pr-4 pl-3 text-right font-medium text-muted">
              line
            </th>
            {table.columns.map((column, place) => (
              <th key={place} scope="col" className="px-2 py-2.5">
                <ColumnHead
                  number={place + 1}
                  column={column}
                  role={plan.roles[place] ?? 'unused'}
                  units={plan.units}
                  onRole={(role) =>
                    onPlan({ ...plan, roles: plan.roles.map((one, at) => (at === place ? role : one)) })
                  }
                  onUnits={(units) => onPlan({ ...plan, units })}
                />
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {cells(table.firstRows)}
          {skipped > 0 ? (
            <tr className="border-t border-line">
              <td colSpan={table.columns.length + 1} className="px-3 py-1 text-muted">
                … {formatCount(skipped)} more rows …
              </td>
            </tr>
          ) : null}
          {cells(lastRows)}
        </tbody>
      </table>
    </div>
  );
}
