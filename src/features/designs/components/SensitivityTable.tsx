import { useMemo } from 'react';
import type { Sensitivity, ToleranceDesign } from '../../../../shared/toleranceDesign.ts';
import { DataTable } from '../../../components/DataTable.tsx';
import type { Column } from '../../../components/DataTable.tsx';
import { Select } from '../../../components/Select.tsx';
import { formatNumber } from '../../../lib/format.ts';
import { axisLabel, printQuantity, readingQuantities } from '../model/quantities.ts';
import { spreadReadings } from '../model/readingNames.ts';
import type { SpreadReading } from '../model/readingNames.ts';
import { sigmaOf } from '../model/sigma.ts';

type Props = {
  input: ToleranceDesign;
  sensitivities: readonly Sensitivity[];
  pointId: string;
  reading: SpreadReading;
  onReading: (reading: SpreadReading) => void;
};

/** What a reading hangs on: its derivative by each thickness and constant, and what one stated sigma makes of it. */
export function SensitivityTable({ input, sensitivities, pointId, reading, onReading }: Props) {
  const rows = useMemo(
    () => sensitivities.filter((one) => one.pointId === pointId),
    [sensitivities, pointId],
  );
  const columns = useMemo(() => columnsOf(input, reading), [input, reading]);
  return (
    <section aria-labelledby="sensitivity-heading">
      <div className="mb-2 flex flex-wrap items-center gap-x-4 gap-y-2">
        <h2 id="sensitivity-heading" className="text-lead">
          Sensitivity
        </h2>
        <Select
          aria-label="Reading of the sensitivities"
          value={reading}
          options={spreadReadings.map((name) => ({
            value: name,
            label: axisLabel(readingQuantities[name]),
          }))}
          onValueChange={onReading}
        />
      </div>
      <div className="card">
        <DataTable
          caption={`Sensitivity of the ${readingQuantities[reading].label}`}
          columns={columns}
          rows={rows}
          rowKey={({ parameter, of }) => `${parameter} ${of}`}
          empty={null}
          initialSort={{ id: 'sigma', descending: true }}
        />
      </div>
    </section>
  );
}

function columnsOf(input: ToleranceDesign, reading: SpreadReading): Column<Sensitivity>[] {
  const look = readingQuantities[reading];
  const perSigma = (one: Sensitivity) => {
    const slope = one.derivative[reading];
    return slope === null ? null : slope * sigmaOf(one, input);
  };
  return [
    { id: 'parameter', header: 'Parameter', value: ({ label }) => label },
    {
      id: 'value',
      header: 'Value',
      align: 'end',
      value: ({ value }) => value,
      cell: ({ parameter, value }) => formatNumber(value) + (parameter === 'thickness' ? ' nm' : ''),
    },
    {
      id: 'derivative',
      header: 'Derivative',
      align: 'end',
      value: (one) => sizeOf(one.derivative[reading]),
      cell: (one) =>
        printQuantity({ ...look, signed: true }, one.derivative[reading]) +
        (one.derivative[reading] === null ? '' : one.parameter === 'thickness' ? ' per nm' : ' per 1'),
    },
    {
      id: 'sigma',
      header: 'Per stated sigma',
      align: 'end',
      value: (one) => sizeOf(perSigma(one)),
      cell: (one) => printQuantity({ ...look, signed: true }, perSigma(one), 3),
    },
  ];
}

/** Sorted by size: a fall matters as much as a rise. */
function sizeOf(value: number | null): number | null {
  return value === null ? null : Math.abs(value);
}
