import type { ImportPreview, ImportTable } from '../../../../shared/materialImport.ts';
import { formatNumber, formatPlain } from '../../../lib/format.ts';
import type { ColumnPlan } from '../model/columnPlan.ts';
import { roleLabels, unitKindOf, unitLabels } from '../model/columnRoles.ts';
import { rowsBeside } from '../model/rowsBeside.ts';

type BesideTableProps = { table: ImportTable; plan: ColumnPlan; preview: ImportPreview };

/** What was entered beside what it became, for the first and last rows, so that a sign or a unit can be checked by eye. */
export function BesideTable({ table, plan, preview }: BesideTableProps) {
  const used = plan.roles.flatMap((role, column) => (role === 'unused' ? [] : [{ role, column }]));
  const spectral = plan.roles.indexOf('spectral');
  const shown = table.firstRows.at(-1)?.line ?? 0;
  const rows = rowsBeside(
    [...table.firstRows, ...table.lastRows.filter(({ line }) => line > shown)],
    { column: spectral, unit: plan.units.spectral },
    preview,
  );
  const headLook = 'px-3 py-1.5 font-medium whitespace-nowrap';
  return (
    <div
      tabIndex={0}
      role="region"
      aria-label="Entered and converted values"
      className="overflow-x-auto rounded-control border border-line"
    >
      <table className="w-full text-right text-note">
        <thead className="text-muted">
          <tr>
            <td />
            <th scope="colgroup" colSpan={used.length} className={`${headLook} text-left`}>
              as entered
            </th>
            <th
              scope="colgroup"
              colSpan={1 + (preview.index ? 2 : 0) + (preview.voigt ? 2 : 0)}
              className={`${headLook} border-l border-line text-left text-ink`}
            >
              as converted
            </th>
          </tr>
          <tr>
            <th scope="col" className={headLook}>
              line
            </th>
            {used.map(({ role, column }) => {
              const kind = unitKindOf(role);
              return (
                <th key={column} scope="col" className={headLook}>
                  {roleLabels[role]}
                  {kind ? ` (${unitLabels[plan.units[kind]]})` : ''}
                </th>
              );
            })}
            <th scope="col" className={`${headLook} border-l border-line`}>
              λ (nm)
            </th>
            {preview.index ? <ConvertedHeads names={['n', 'k']} look={headLook} /> : null}
            {preview.voigt ? <ConvertedHeads names={['Re Q', 'Im Q']} look={headLook} /> : null}
          </tr>
        </thead>
        <tbody>
          {rows.map(({ line, cells, wavelengthNm, index, q }) => (
            <tr key={line} className="border-t border-line">
              <th scope="row" className="px-3 py-1 font-normal text-muted">
                {line}
              </th>
              {used.map(({ column }) => {
                const value = cells[column] ?? null;
                return (
                  <td key={column} className="px-3 py-1">
                    {value === null ? 'empty' : formatPlain(value)}
                  </td>
                );
              })}
              <td className="border-l border-line px-3 py-1">{formatNumber(wavelengthNm, { digits: 6 })}</td>
              {preview.index ? <ConvertedCells values={index ? [index.n, index.k] : null} /> : null}
              {preview.voigt ? <ConvertedCells values={q} /> : null}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function ConvertedHeads({ names, look }: { names: readonly [string, string]; look: string }) {
  return names.map((name) => (
    <th key={name} scope="col" className={look}>
      {name}
    </th>
  ));
}

/** A dash where the preview, which is thinned, does not hold the row. */
function ConvertedCells({ values }: { values: readonly [number, number] | null }) {
  return [0, 1].map((part) => (
    <td key={part} className="px-3 py-1">
      {values ? formatNumber(values[part] ?? NaN, { digits: 6 }) : '–'}
    </td>
  ));
}
