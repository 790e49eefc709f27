import type { MapData, MapPlace } from './mapTypes.ts';

export type Extreme = MapPlace & { value: number };
export type Extremes = { least: Extreme; most: Extreme };

/** Lowest and highest value with their places; null while there is none. */
export function extremesOf({ x, values }: MapData): Extremes | null {
  let low = -1;
  let high = -1;
  for (let index = 0; index < values.length; index++) {
    const value = values[index]!;
    if (Number.isNaN(value)) continue;
    if (low < 0 || value < values[low]!) low = index;
    if (high < 0 || value > values[high]!) high = index;
  }
  if (low < 0) return null;
  const at = (index: number): Extreme => ({
    ix: index % x.length,
    iy: Math.floor(index / x.length),
    value: values[index]!,
  });
  return { least: at(low), most: at(high) };
}

/** Ends of a colour scale. A quantity of both signs has its zero in the middle, so that the sign is seen. */
export type ColourDomain = { low: number; high: number; signed: boolean };

export function colourDomain(extremes: Extremes | null): ColourDomain {
  if (extremes === null) return { low: 0, high: 1, signed: false };
  const { least, most } = extremes;
  if (least.value < 0 && most.value > 0) {
    const size = Math.max(-least.value, most.value);
    return { low: -size, high: size, signed: true };
  }
  // Differences below this are the rounding of doubles and would be drawn as a picture of noise.
  const flat = most.value - least.value <= 1e-12 * Math.abs(most.value);
  const room = flat ? Math.abs(most.value) * 0.1 || 1 : 0;
  return { low: least.value - room, high: most.value + room, signed: false };
}
