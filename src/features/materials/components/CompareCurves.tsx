import { useMemo } from 'react';
import type { Material } from '../../../../shared/material.ts';
import { LinePlot } from '../../../components/plot/LinePlot.tsx';
import type { PlotSeries } from '../../../components/plot/plotTypes.ts';
import { formatNumber } from '../../../lib/format.ts';
import { differencesOf, farthestApart, overlapOf } from '../model/compareCurves.ts';
import type { DifferenceMode, Overlap } from '../model/compareCurves.ts';
import { curveOf, quantityTexts } from '../model/spectralCurves.ts';
import type { SpectralQuantity } from '../model/spectralCurves.ts';
import { onSpectralAxis, spectralAxis } from './spectralScale.ts';
import type { SpectralUnit } from './spectralScale.ts';

const modeLabels: Record<DifferenceMode, string> = { percent: '%', ratio: 'B / A', difference: 'B − A' };

type Props = {
  materials: readonly [Material, Material];
  names: readonly [string, string];
  quantity: SpectralQuantity;
  part: 0 | 1;
  mode: DifferenceMode;
  unit: SpectralUnit;
};

/** One part of a quantity of two materials over each other, with the second against the first on the right scale. */
export function CompareCurves({ materials, names, quantity, part, mode, unit }: Props) {
  const curves = useMemo(
    () =>
      materials.map((material) => {
        const curve = curveOf(material, quantity);
        return (
          curve &&
          onSpectralAxis(
            unit,
            curve.wavelengthsNm,
            curve.values.map((value) => value[part]),
          )
        );
      }),
    [materials, quantity, part, unit],
  );
  const [a = null, b = null] = curves;
  const overlap = useMemo(() => (a && b ? overlapOf(a, b) : null), [a, b]);
  const series = useMemo(() => {
    const drawn: PlotSeries[] = [];
    if (a) drawn.push({ ...a, name: names[0], tone: 'ink', width: 1.8 });
    if (b) drawn.push({ ...b, name: names[1], tone: 'accent', width: 1.8, dash: 'dashed' });
    if (overlap && overlap.x.length > 1) {
      drawn.push({
        name: `${modeLabels[mode]} (right scale)`,
        x: overlap.x,
        y: differencesOf(overlap, mode),
        tone: 'reflectance',
        width: 1.4,
        dash: 'dotted',
        yAxisIndex: 1,
      });
    }
    return drawn;
  }, [a, b, overlap, names, mode]);
  const symbol = quantityTexts[quantity].parts[part];
  const yAxes = useMemo(
    () => [{ label: symbol }, { label: modeLabels[mode], include: [mode === 'ratio' ? 1 : 0] }],
    [symbol, mode],
  );
  const xAxis = spectralAxis[unit];
  return (
    <div className="min-w-0">
      <h3 className="text-body">{symbol}</h3>
      {series.length > 0 ? (
        <LinePlot
          series={series}
          xAxis={xAxis}
          yAxes={yAxes}
          height={300}
          ariaLabel={`${symbol} of ${names.join(' and ')} against ${xAxis.label}`}
          fileName={`compare-${quantity}-${part}`}
        />
      ) : null}
      <p className="mt-1 text-note text-muted">
        {overlap ? inWords(overlap, symbol, names, unit) : missing(names, [a, b], symbol)}
      </p>
    </div>
  );
}

function inWords(
  overlap: Overlap,
  symbol: string,
  names: readonly [string, string],
  unit: SpectralUnit,
): string {
  const index = farthestApart(overlap);
  if (index === null) return `${symbol} of both is known nowhere together.`;
  const [a, b] = [overlap.a[index] ?? NaN, overlap.b[index] ?? NaN];
  const share = (100 * (b - a)) / Math.abs(a);
  const percent = a * b > 0 ? `, ${formatNumber(share, { digits: 2, signed: true })} %` : '';
  const at = `${formatNumber(overlap.x[index] ?? NaN)} ${unit}`;
  const verb = overlap.x.length > 1 ? 'differs most at' : 'can be compared at one place only,';
  return `${symbol} ${verb} ${at}: ${formatNumber(a)} (${names[0]}) and ${formatNumber(b)} (${names[1]})${percent}.`;
}

function missing(names: readonly [string, string], curves: readonly unknown[], symbol: string): string {
  const without = names.filter((_, position) => curves[position] === null);
  return without.length > 0
    ? `No Q is known for ${without.join(' and ')}, so there is nothing to compare.`
    : `${symbol} of the two is known for no common wavelength.`;
}
