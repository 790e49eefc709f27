import { useMemo } from 'react';
import { readingDefinitions } from '../../../shared/readings.ts';
import type { ReadingName } from '../../../shared/run.ts';
import { LinePlot } from '../../components/plot/LinePlot.tsx';
import type { PlotSeries } from '../../components/plot/plotTypes.ts';
import { oneReading } from '../../components/plot/readingSeries.ts';
import { effectInWords } from './effectInWords.ts';

type Props = {
  reading: ReadingName;
  /** Wavelengths, nm, ascending. */
  grid: readonly number[];
  /** With A and with B; angles in degrees. */
  values: readonly [ArrayLike<number>, ArrayLike<number>];
  names: readonly [string, string];
  workingNm: number;
};

const xAxis = {
  label: 'vacuum wavelength (nm)',
  format: (value: number) => `${Number(value.toPrecision(5))} nm`,
};

/** One reading of a film with A (heavier line) and with B (thinner, open markers), and their difference. */
export function EffectPlot({ reading, grid, values, names, workingNm }: Props) {
  const drawn = useMemo(() => {
    const [a, b] = values.map((one) => oneReading(reading, one, 'mdeg', false));
    if (!a || !b) return null;
    const [ya, yb] = [a.values, b.values];
    const series: PlotSeries[] = [
      { ...a.look, name: `A ${names[0]}`, x: grid, y: ya, width: 2.4 },
      { ...b.look, name: `B ${names[1]}`, x: grid, y: yb, width: 1.3, symbol: 'open' },
      {
        name: 'B − A',
        x: grid,
        y: Array.from(ya, (value, index) => (yb[index] ?? NaN) - value),
        tone: 'reflectance',
        dash: 'dotted',
        width: 1.6,
      },
    ];
    return { series, yAxes: [a.axis] };
  }, [reading, grid, values, names]);
  if (!drawn) return null;
  const { label } = readingDefinitions[reading];
  return (
    <div className="min-w-0">
      <h3 className="text-body">{label}</h3>
      <LinePlot
        series={drawn.series}
        xAxis={xAxis}
        yAxes={drawn.yAxes}
        height={300}
        marker={workingNm}
        ariaLabel={`${label} of the stack with either material against wavelength`}
        fileName={`compare-stack-${reading}`}
      />
      <p className="mt-1">{effectInWords({ reading, grid, values, names, workingNm })}</p>
    </div>
  );
}
