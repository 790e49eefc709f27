import { COLOURS } from './mapColours.ts';
import type { ColourDomain } from './mapRange.ts';
import type { MapData } from './mapTypes.ts';

/**
 * The map as a picture of one pixel a value, both axes rising (to the right and upward). A value that does not exist
 * is transparent: what lies below the picture shows there.
 *
 * @returns red, green, blue and alpha a byte each, row by row from the top
 */
export function mapPixels(
  { x, y, values }: MapData,
  { low, high }: ColourDomain,
  table: Uint8ClampedArray,
): Uint8ClampedArray<ArrayBuffer> {
  const [width, height] = [x.length, y.length];
  const pixels = new Uint8ClampedArray(4 * width * height);
  const perValue = COLOURS / (high - low);
  const backwards = width > 1 && x[0]! > x[width - 1]!;
  const upward = height > 1 && y[0]! > y[height - 1]!;
  let at = 0;
  for (let row = 0; row < height; row++) {
    const start = (upward ? row : height - 1 - row) * width;
    for (let column = 0; column < width; column++, at += 4) {
      const value = values[start + (backwards ? width - 1 - column : column)]!;
      if (Number.isNaN(value)) continue;
      const colour = 3 * Math.min(COLOURS - 1, Math.max(0, Math.floor((value - low) * perValue)));
      pixels[at] = table[colour]!;
      pixels[at + 1] = table[colour + 1]!;
      pixels[at + 2] = table[colour + 2]!;
      pixels[at + 3] = 255;
    }
  }
  return pixels;
}
