import { useMemo } from 'react';
import type { CapDesign, CapResult } from '../../../../shared/capDesign.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import { usePlotHeight } from '../../../components/plot/usePlotHeight.ts';
import { Select } from '../../../components/Select.tsx';
import { formatNumber } from '../../../lib/format.ts';
import { capSeries } from '../model/capSeries.ts';
import type { DesignView } from '../model/designView.ts';
import { axisLabel, capQuantity, capQuantityNames, unitLabel } from '../model/quantities.ts';
import { CapWindows } from './CapWindows.tsx';
import { PointSelect } from './PointSelect.tsx';

type Props = {
  input: CapDesign;
  result: CapResult;
  view: DesignView;
  onView: (change: Partial<DesignView>) => void;
};

const xAxis = {
  label: 'thickness of the cap (nm)',
  format: (value: number) => `${formatNumber(value, { digits: 4 })} nm`,
};

/** One quantity of every candidate against the thickness, and below it where the demands hold. */
export function CapPlot({ input, result, view, onView }: Props) {
  const { pointId, quantity } = view;
  const height = usePlotHeight(380);
  const look = capQuantity(quantity, input.signal);
  const series = useMemo(
    () => capSeries(input, result, pointId, quantity),
    [input, result, pointId, quantity],
  );
  const yAxes = useMemo(() => [{ label: unitLabel(capQuantity(quantity, input.signal)) }], [quantity, input]);
  const label = input.points.find(({ id }) => id === pointId)?.label ?? '';
  return (
    <section aria-label="Curves">
      <LinePlot
        series={series}
        xAxis={xAxis}
        yAxes={yAxes}
        height={height}
        ariaLabel={`${look.label} against the thickness of the cap at ${label}`}
        controls={
          <>
            <Select
              aria-label="Quantity shown"
              value={quantity}
              options={capQuantityNames.map((name) => ({
                value: name,
                label:
                  name === 'signal'
                    ? `signal: ${capQuantity(name, input.signal).label}, with band`
                    : axisLabel(capQuantity(name, input.signal)),
              }))}
              onValueChange={(chosen) => onView({ quantity: chosen })}
            />
            <PointSelect
              points={input.points}
              value={pointId}
              onChange={(chosen) => onView({ pointId: chosen })}
            />
          </>
        }
        below={(layout) => <CapWindows result={result} layout={layout} />}
      />
    </section>
  );
}
