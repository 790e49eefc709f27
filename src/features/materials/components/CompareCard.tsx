import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { Material } from '../../../../shared/material.ts';
import { Select } from '../../../components/Select.tsx';
import { Tabs } from '../../../components/Tabs.tsx';
import { comparedNames } from '../model/comparedNames.ts';
import { differenceModes } from '../model/compareCurves.ts';
import { quantityTexts, spectralQuantities } from '../model/spectralCurves.ts';
import { CompareCurves } from './CompareCurves.tsx';
import { spectralAxis, spectralUnits } from './spectralScale.ts';

const tabs = spectralQuantities.map((value) => ({ value, label: quantityTexts[value].label }));
const unitOptions = spectralUnits.map((value) => ({ value, label: spectralAxis[value].label }));
const modeTexts = {
  percent: 'B against A in percent',
  ratio: 'ratio B / A',
  difference: 'difference B − A',
} as const;
const modeOptions = differenceModes.map((value) => ({ value, label: modeTexts[value] }));

/** Two materials over each other; what is shown and how stands in the address. */
export function CompareCard({ a, b }: { a: Material; b: Material }) {
  const [search, setSearch] = useSearchParams();
  const materials = useMemo(() => [a, b] as const, [a, b]);
  const names = useMemo(() => comparedNames(a, b), [a, b]);
  const quantity = spectralQuantities.find((one) => one === search.get('show')) ?? 'N';
  const unit = spectralUnits.find((one) => one === search.get('axis')) ?? 'nm';
  const mode = differenceModes.find((one) => one === search.get('difference')) ?? 'percent';
  const put = (key: string, value: string) =>
    setSearch(
      (before) => {
        before.set(key, value);
        return before;
      },
      { replace: true },
    );
  return (
    <section aria-label="Curves of both" className="card min-w-0 px-4 py-3.5">
      <Tabs
        label="Quantity"
        value={quantity}
        onValueChange={(value) => put('show', value)}
        tabs={tabs}
        end={
          <span className="flex flex-wrap gap-2">
            <Select
              aria-label="Difference shown"
              value={mode}
              options={modeOptions}
              onValueChange={(value) => put('difference', value)}
            />
            <Select
              aria-label="Horizontal axis"
              value={unit}
              options={unitOptions}
              onValueChange={(value) => put('axis', value)}
            />
          </span>
        }
      >
        <div className="mt-2 grid grid-cols-1 gap-x-6 gap-y-5 lg:grid-cols-2">
          {([0, 1] as const).map((part) => (
            <CompareCurves key={part} {...{ materials, names, quantity, part, mode, unit }} />
          ))}
        </div>
      </Tabs>
    </section>
  );
}
