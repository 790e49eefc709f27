import type { PlotAxis } from '../plotTypes.ts';
import type { Extremes } from './mapRange.ts';
import type { MapData, MapPlace } from './mapTypes.ts';

export type MapAxes = { x: PlotAxis; y: PlotAxis; value: PlotAxis };

/** A value as read out, with its unit. */
export function printValue(axis: PlotAxis, value: number): string {
  if (Number.isNaN(value)) return 'no value';
  return (axis.format ?? ((number: number) => String(Number(number.toPrecision(5)))))(value);
}

/** Where a point of the grid lies: `30°, 632.8 nm`. */
export function printPlace(data: MapData, axes: MapAxes, { ix, iy }: MapPlace): string {
  return `${printValue(axes.x, data.x[ix] ?? NaN)}, ${printValue(axes.y, data.y[iy] ?? NaN)}`;
}

/** The map in a sentence: its least and largest value with their places. */
export function describeMap(name: string, data: MapData, axes: MapAxes, extremes: Extremes | null): string {
  if (extremes === null) return `${name}: no values yet.`;
  const { least, most } = extremes;
  return (
    `${name} over ${axes.x.label} and ${axes.y.label}: ` +
    `least ${printValue(axes.value, least.value)} at ${printPlace(data, axes, least)}, ` +
    `largest ${printValue(axes.value, most.value)} at ${printPlace(data, axes, most)}.`
  );
}

/** A table with the second axis down and the first across, an empty field where there is no value. */
export function mapCsv(data: MapData, axes: MapAxes): string {
  const { x, y, values } = data;
  const quote = (text: string) => (/[",\n]/.test(text) ? `"${text.replace(/"/g, '""')}"` : text);
  const rows = [[quote(`${axes.y.label} \\ ${axes.x.label}`), ...Array.from(x, String)].join(',')];
  for (let iy = 0; iy < y.length; iy++) {
    const cells = Array.from(x, (_, ix) => {
      const value = values[iy * x.length + ix]!;
      return Number.isNaN(value) ? '' : String(value);
    });
    rows.push([String(y[iy]), ...cells].join(','));
  }
  return rows.join('\n') + '\n';
}
