import { useMemo } from 'react';
import type { Material } from '../../../../shared/material.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import type { PlotSeries } from '../../../components/plot/plotTypes.ts';
import { onSpectralAxis, spectralLabels } from './spectralScale.ts';
import type { SpectralUnit } from './spectralScale.ts';

/** Two scales: beside the k of a metal, or that of a glass, the run of n would be a flat line on one. */
const nAxis = { label: 'n' };
const kAxis = { label: 'k', include: [0] };

/** n and k as a solve interpolates them; k is left out where it is zero throughout. */
export function IndexPlot({ material, unit }: { material: Material; unit: SpectralUnit }) {
  const { wavelengthsNm, n, k } = material.curves;
  const absorbs = useMemo(() => k.some((value) => value > 0), [k]);
  const series = useMemo<PlotSeries[]>(() => {
    const curves: PlotSeries[] = [
      { name: 'n', ...onSpectralAxis(unit, wavelengthsNm, n), tone: 'ink', width: 2 },
    ];
    if (absorbs) {
      curves.push({
        name: 'k (right scale)',
        ...onSpectralAxis(unit, wavelengthsNm, k),
        tone: 'accent',
        width: 2,
        dash: 'dashed',
        yAxisIndex: 1,
      });
    }
    return curves;
  }, [unit, wavelengthsNm, n, k, absorbs]);
  const xAxis = useMemo(() => ({ label: spectralLabels[unit] }), [unit]);
  const yAxes = useMemo(() => (absorbs ? [nAxis, kAxis] : [nAxis]), [absorbs]);
  return (
    <LinePlot
      series={series}
      xAxis={xAxis}
      yAxes={yAxes}
      height={300}
      ariaLabel={`n and k of ${material.name} against ${spectralLabels[unit]}`}
      fileName={`${material.id}-index`}
    />
  );
}
