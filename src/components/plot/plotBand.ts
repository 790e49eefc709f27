import type { PlotLayout } from './plotLayout.ts';
import { toPixel } from './plotScale.ts';
import type { PlotTokens } from './plotTokens.ts';
import type { PlotSeries } from './plotTypes.ts';

/**
 * The band of a curve: a grey tint with thin edges, under all curves. Each stretch without gaps is one polygon, in
 * pixels, so that it agrees with the overlay.
 */
export function bandOption(
  series: PlotSeries,
  index: number,
  layout: PlotLayout,
  tokens: PlotTokens,
): object[] {
  const stretches = bandPolygons(series, layout);
  if (stretches.length === 0) return [];
  return [
    {
      type: 'custom',
      id: `band ${index}`,
      name: `${series.name} (band)`,
      yAxisIndex: series.yAxisIndex ?? 0,
      // The polygons are given in pixels; the data only say how many there are.
      data: stretches.map(() => [layout.x.min, layout.y[series.yAxisIndex ?? 0]!.min]),
      renderItem: ({ dataIndex }: { dataIndex: number }) => ({
        type: 'polygon',
        shape: { points: stretches[dataIndex] },
        style: {
          fill: tokens.muted,
          fillOpacity: 0.13,
          stroke: tokens.muted,
          strokeOpacity: 0.7,
          lineWidth: 0.8,
        },
      }),
      clip: true,
      silent: true,
      z: 1,
    },
  ];
}

/** Upper edge forth and lower edge back, for each run of samples that have both. */
export function bandPolygons({ x, band, yAxisIndex = 0 }: PlotSeries, layout: PlotLayout): number[][][] {
  const scale = layout.y[yAxisIndex];
  if (!band || !scale) return [];
  const pixel = (value: number) => toPixel(scale, scale.log ? Math.abs(value) : value);
  const polygons: number[][][] = [];
  let upper: number[][] = [];
  let lower: number[][] = [];
  const close = () => {
    if (upper.length > 1) polygons.push([...upper, ...lower.reverse()]);
    [upper, lower] = [[], []];
  };
  for (let index = 0; index < x.length; index++) {
    const [low, high] = [pixel(band.low[index]!), pixel(band.high[index]!)];
    if (!Number.isFinite(low) || !Number.isFinite(high)) {
      close();
      continue;
    }
    const at = toPixel(layout.x, x[index]!);
    upper.push([at, high]);
    lower.push([at, low]);
  }
  close();
  return polygons;
}
