import { useId } from 'react';
import type { ImportTable } from '../../../../shared/materialImport.ts';
import { Select } from '../../../components/Select.tsx';
import { formatNumber } from '../../../lib/format.ts';
import type { ColumnPlan } from '../model/columnPlan.ts';
import { columnRoles, roleLabels, unitKindOf, unitLabels, unitsOf } from '../model/columnRoles.ts';
import type { ColumnRole } from '../model/columnRoles.ts';

const roleOptions = columnRoles.map((role) => ({ value: role, label: roleLabels[role] }));

type Units = ColumnPlan['units'];

type ColumnHeadProps = {
  number: number;
  column: ImportTable['columns'][number];
  role: ColumnRole;
  units: Units;
  onRole: (role: ColumnRole) => void;
  onUnits: (units: Units) => void;
};

/** What a column means and in which unit, above its header and its range. */
export function ColumnHead({ number, column, role, units, onRole, onUnits }: ColumnHeadProps) {
  const id = useId();
  const name = column.header ?? `column ${number}`;
  return (
    <div className="flex min-w-48 flex-col gap-1.5">
      <Select
        aria-label={`Meaning of column ${number}, ${name}`}
        aria-describedby={`${id}-range`}
        value={role}
        options={roleOptions}
        onValueChange={onRole}
        className={role === 'unused' ? 'opacity-75' : ''}
      />
      <UnitSelect number={number} role={role} units={units} onUnits={onUnits} />
      <div className="font-semibold text-ink">{name}</div>
      <div id={`${id}-range`} className="text-small font-normal whitespace-nowrap text-muted">
        {formatNumber(column.least)} to {formatNumber(column.greatest)}
      </div>
    </div>
  );
}

type UnitSelectProps = Pick<ColumnHeadProps, 'number' | 'role' | 'units' | 'onUnits'>;

function UnitSelect({ number, role, units, onUnits }: UnitSelectProps) {
  const label = `Unit of column ${number}`;
  switch (unitKindOf(role)) {
    case null:
      return <div className="flex h-9 items-center text-small font-normal text-muted">no unit</div>;
    case 'spectral':
      return (
        <Select
          aria-label={label}
          value={units.spectral}
          options={unitsOf.spectral.map((unit) => ({ value: unit, label: unitLabels[unit] }))}
          onValueChange={(spectral) => onUnits({ ...units, spectral })}
        />
      );
    case 'conductivity':
      return (
        <Select
          aria-label={label}
          value={units.conductivity}
          options={unitsOf.conductivity.map((unit) => ({ value: unit, label: unitLabels[unit] }))}
          onValueChange={(conductivity) => onUnits({ ...units, conductivity })}
        />
      );
    case 'angle':
      return (
        <Select
          aria-label={label}
          value={units.angle}
          options={unitsOf.angle.map((unit) => ({ value: unit, label: unitLabels[unit] }))}
          onValueChange={(angle) => onUnits({ ...units, angle })}
        />
      );
  }
}
