import type { Material, MaterialSummary } from '../../../../shared/material.ts';
import type { ImportTable } from '../../../../shared/materialImport.ts';
import { Field } from '../../../components/Field.tsx';
import { NumberInput } from '../../../components/NumberInput.tsx';
import { formatFormula } from '../../../lib/format.ts';
import type { ColumnPlan } from '../model/columnPlan.ts';
import { quantitiesOf } from '../model/columnPlan.ts';
import { IndexOfField } from './IndexOfField.tsx';
import { TablePreview } from './TablePreview.tsx';

type ColumnStepProps = {
  table: ImportTable;
  plan: ColumnPlan;
  problems: readonly string[];
  target: Material | null;
  materials: readonly MaterialSummary[];
  onPlan: (plan: ColumnPlan) => void;
};

/** What each column is, in which unit, and what the columns need besides. */
export function ColumnStep({ table, plan, problems, target, materials, onPlan }: ColumnStepProps) {
  const { index, voigt } = quantitiesOf(plan);
  return (
    <div className="flex flex-col gap-3">
      <p className="max-w-prose text-muted">
        {table.suggestion
          ? 'Filled in from the headers and the values. Check each: a wrong unit gives wrong constants without an error.'
          : 'The headers do not say what the columns are. Choose it for each that is to be used.'}
      </p>
      <TablePreview table={table} plan={plan} onPlan={onPlan} />
      {voigt === 'Kerr angles' ? (
        <Field
          label="Index of the medium the light came from"
          hint="1 for air or vacuum; that of the glass where the film was seen through its substrate."
          className="max-w-80"
        >
          {(control) => (
            <NumberInput
              {...control}
              value={plan.incidentIndex}
              min={1}
              max={10}
              step={0.01}
              onChange={(incidentIndex) => onPlan({ ...plan, incidentIndex })}
            />
          )}
        </Field>
      ) : null}
      {index === null && voigt !== null ? (
        target ? (
          <p className="text-muted">
            The table has no n and k: N is that of {formatFormula(target.formula)}, {target.name}, version{' '}
            {target.version}.
          </p>
        ) : (
          <IndexOfField
            materials={materials}
            value={plan.indexOf}
            onChange={(indexOf) => onPlan({ ...plan, indexOf })}
          />
        )
      ) : null}
      <div role="status">
        {problems.length > 0 ? (
          <ul className="flex max-w-prose flex-col gap-1 text-note text-danger">
            {problems.map((problem) => (
              <li key={problem}>
                <span aria-hidden="true">▲ </span>
                {problem}
              </li>
            ))}
          </ul>
        ) : null}
      </div>
    </div>
  );
}
