import type { Material } from '../../../../shared/material.ts';
import type { PlotAxis, PlotSeries } from '../../../components/plot/plotTypes.ts';

type Curves = Material['curves'];
type Figure = { series: PlotSeries[]; yAxes: PlotAxis[] };

/** n and k, and those along the axis of a uniaxial crystal; k is left out where it is zero throughout. */
export function indexFigure({ wavelengthsNm: x, n, k, extraordinary }: Curves): Figure {
  const second = extraordinary ?? { wavelengthsNm: [], n: [], k: [] };
  const absorbs = k.some((value) => value > 0) || second.k.some((value) => value > 0);
  const series: PlotSeries[] = [{ name: 'n', x, y: n, tone: 'ink', width: 1.6 }];
  if (extraordinary) {
    series.push({
      name: 'n along the axis',
      x: second.wavelengthsNm,
      y: second.n,
      tone: 'ink',
      width: 1,
      symbol: 'open',
    });
  }
  if (!absorbs) return { series, yAxes: [{ label: 'n' }] };
  const kLook = { tone: 'accent', dash: 'dashed', yAxisIndex: 1 } as const;
  series.push({ name: 'k (right scale)', x, y: k, width: 1.6, ...kLook });
  if (extraordinary) {
    series.push({
      name: 'k along the axis',
      x: second.wavelengthsNm,
      y: second.k,
      width: 1,
      symbol: 'open',
      ...kLook,
    });
  }
  return { series, yAxes: [{ label: 'n' }, { label: 'k', include: [0] }] };
}

export function voigtFigure({ wavelengthsNm: x, q }: NonNullable<Curves['voigt']>): Figure {
  return {
    series: [
      { name: 'Re Q', x, y: q.map(([re]) => re), tone: 'magnet', width: 2 },
      { name: 'Im Q', x, y: q.map(([, im]) => im), tone: 'magnet', width: 2, dash: 'dashed' },
    ],
    yAxes: [{ label: 'Q', include: [0] }],
  };
}
