import type { CapDesign, CapResult } from '../../../../shared/capDesign.ts';
import type { PlotSeries } from '../../../components/plot/plotTypes.ts';
import { bareValue, capCurve, capQuantity, printQuantity } from './quantities.ts';
import type { CapQuantityName } from './quantities.ts';

/** Told apart on a grey print: three dashes, then the same with open markers, then thinner. */
const dashes = ['solid', 'dashed', 'dotted'] as const;

/** How the curve of a candidate is drawn, by its place in the question. */
export function capLook(position: number): Pick<PlotSeries, 'dash' | 'width' | 'symbol'> {
  return {
    dash: dashes[position % 3]!,
    symbol: Math.floor(position / 3) % 2 === 1 ? 'open' : 'none',
    width: position < 6 ? 2.2 : 1.3,
  };
}

/**
 * One curve a candidate at one working point, with the tolerance band where the quantity is the signal, and the film
 * without a cap as a level line.
 */
export function capSeries(
  input: CapDesign,
  result: CapResult,
  pointId: string,
  name: CapQuantityName,
): PlotSeries[] {
  const quantity = capQuantity(name, input.signal);
  const scaled = (values: readonly (number | null)[]) =>
    Float64Array.from(values, (value) => (value === null ? NaN : value * quantity.scale));
  const x = result.thicknessNm;
  const format = (value: number) => printQuantity({ ...quantity, scale: 1 }, value);
  const curves = result.candidates.flatMap((candidate, position): PlotSeries[] => {
    const point = candidate.points.find((one) => one.pointId === pointId);
    if (!point) return [];
    return [
      {
        name: candidate.label,
        x,
        y: scaled(capCurve(candidate, point, name)),
        tone: quantity.tone,
        format,
        ...capLook(position),
        ...(name === 'signal'
          ? { band: { low: scaled(point.signalLow), high: scaled(point.signalHigh) } }
          : {}),
      },
    ];
  });
  const bare = bareValue(
    result.bare.find((one) => one.pointId === pointId),
    name,
  );
  if (bare === null) return curves;
  const level = bare * quantity.scale;
  return [...curves, { name: 'no cap', x, y: x.map(() => level), tone: 'reflectance', width: 1, format }];
}
