import { useMemo } from 'react';
import type { Material } from '../../../../shared/material.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import type { PlotSeries } from '../../../components/plot/plotTypes.ts';
import { onSpectralAxis, spectralLabels } from './spectralScale.ts';
import type { SpectralUnit } from './spectralScale.ts';

const nonNegative = { label: 'n, k', include: [0] };

/** n and k as a solve interpolates them. */
export function IndexPlot({ material, unit }: { material: Material; unit: SpectralUnit }) {
  const { wavelengthsNm, n, k } = material.curves;
  const series = useMemo<PlotSeries[]>(
    () => [
      { name: 'n', ...onSpectralAxis(unit, wavelengthsNm, n), tone: 'ink', width: 2 },
      { name: 'k', ...onSpectralAxis(unit, wavelengthsNm, k), tone: 'accent', width: 2, dash: 'dashed' },
    ],
    [unit, wavelengthsNm, n, k],
  );
  const xAxis = useMemo(() => ({ label: spectralLabels[unit] }), [unit]);
  const yAxes = useMemo(() => [nonNegative], []);
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
