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
  const { index } = material.content;
  const absorbs = useMemo(() => k.some((value) => value > 0), [k]);
  const series = useMemo<PlotSeries[]>(() => {
    // What the source tabulates is marked on the curve that joins it; a formula has no points of its own.
    const tabulated = (values: 'n' | 'k') =>
      index.kind === 'table' ? { points: onSpectralAxis(unit, index.wavelengthsNm, index[values]) } : {};
    const curves: PlotSeries[] = [
      { name: 'n', ...onSpectralAxis(unit, wavelengthsNm, n), ...tabulated('n'), tone: 'ink', width: 1.6 },
    ];
    if (absorbs) {
      curves.push({
        name: 'k (right scale)',
        ...onSpectralAxis(unit, wavelengthsNm, k),
        ...tabulated('k'),
        tone: 'accent',
        width: 1.6,
        dash: 'dashed',
        yAxisIndex: 1,
      });
    }
    return curves;
  }, [unit, wavelengthsNm, n, k, index, absorbs]);
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
