import { useSearchParams } from 'react-router-dom';
import type { Material } from '../../../../shared/material.ts';
import { Select } from '../../../components/Select.tsx';
import { Tabs } from '../../../components/Tabs.tsx';
import { formatRange } from '../../../lib/format.ts';
import { isMagnetoOptic, quantityTexts, spectralQuantities } from '../model/spectralCurves.ts';
import { QuantityPlot } from './QuantityPlot.tsx';
import { spectralAxis, spectralUnits } from './spectralScale.ts';

const tabs = spectralQuantities.map((value) => ({ value, label: quantityTexts[value].label }));
const unitOptions = spectralUnits.map((value) => ({ value, label: spectralAxis[value].label }));

/** The curves of a material; which one, and against what, stands in the address. */
export function SpectrumCard({ material }: { material: Material }) {
  const [search, setSearch] = useSearchParams();
  const quantity = spectralQuantities.find((one) => one === search.get('show')) ?? 'N';
  const unit = spectralUnits.find((one) => one === search.get('axis')) ?? 'nm';
  const put = (key: string, value: string, usual: string) =>
    setSearch(
      (before) => {
        if (value === usual) before.delete(key);
        else before.set(key, value);
        return before;
      },
      { replace: true },
    );
  const rangeNm = isMagnetoOptic(quantity) ? material.voigtRangeNm : material.rangeNm;
  return (
    <section aria-label="Curves" className="card min-w-0 px-4 py-3.5">
      <Tabs
        label="Quantity"
        value={quantity}
        onValueChange={(value) => put('show', value, 'N')}
        tabs={tabs}
        end={
          <>
            <span className="text-note text-muted">{rangeNm ? formatRange(rangeNm, 'nm') : null}</span>
            <Select
              aria-label="Horizontal axis"
              value={unit}
              options={unitOptions}
              onValueChange={(value) => put('axis', value, 'nm')}
            />
          </>
        }
      >
        <div className="mt-2">
          <QuantityPlot material={material} quantity={quantity} unit={unit} />
        </div>
      </Tabs>
    </section>
  );
}
