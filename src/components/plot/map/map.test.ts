import { describe, expect, it } from 'vitest';
import { contourLines } from './contourLines.ts';
import { colourTable, COLOURS } from './mapColours.ts';
import { mapPixels } from './mapPixels.ts';
import { colourDomain, extremesOf } from './mapRange.ts';
import { describeMap, mapCsv } from './mapText.ts';

const tokens = {
  rotation: '#1e5aa8',
  ellipticity: '#b04c10',
  reflectance: '#6a6f7c',
  ink: '#1b1f2a',
  magnet: '#7c3f5c',
  accent: '#0e5a6b',
  muted: '#616672',
  line: '#e4dfd5',
  panel: '#ffffff',
};
const dark = { ...tokens, panel: '#1b1f27', accent: '#6cc0cf', rotation: '#7fb2f0', ellipticity: '#f0a068' };

/** Relative luminance of an entry (IEC 61966-2-1 weights), enough to see that a scale rises or falls. */
function luminance(table: Uint8ClampedArray, index: number): number {
  const [r, g, b] = [0, 1, 2].map((part) => (table[3 * index + part]! / 255) ** 2.2);
  return 0.2126 * r! + 0.7152 * g! + 0.0722 * b!;
}

describe('the colours of a map', () => {
  it.each([
    ['light', tokens, -1],
    ['dark', dark, 1],
  ] as const)('run evenly away from the panel in the %s theme', (_, theme, sense) => {
    const table = colourTable(theme, false);
    for (let index = 8; index < COLOURS; index += 8) {
      expect(sense * (luminance(table, index) - luminance(table, index - 8))).toBeGreaterThan(0);
    }
  });

  it('have the panel in the middle of a signed quantity, blue below and orange above', () => {
    const table = colourTable(tokens, true);
    expect(luminance(table, COLOURS / 2)).toBeGreaterThan(0.95);
    const [red, , blue] = table.subarray(3 * 64, 3 * 64 + 3);
    expect(blue).toBeGreaterThan(red!);
    const [redAbove, , blueAbove] = table.subarray(3 * 192, 3 * 192 + 3);
    expect(redAbove).toBeGreaterThan(blueAbove!);
  });
});

describe('the range of a map', () => {
  it('is symmetric about zero where both signs occur, and leaves gaps out', () => {
    const data = { x: [0, 1, 2], y: [0, 1], values: [NaN, -1, 0, 4, 2, NaN] };
    const extremes = extremesOf(data);
    expect(extremes).toEqual({ least: { ix: 1, iy: 0, value: -1 }, most: { ix: 0, iy: 1, value: 4 } });
    expect(colourDomain(extremes)).toEqual({ low: -4, high: 4, signed: true });
  });

  it('exists for a map without a value and for a constant one', () => {
    expect(extremesOf({ x: [0], y: [0], values: [NaN] })).toBeNull();
    const { low, high } = colourDomain(extremesOf({ x: [0, 1], y: [0], values: [3, 3] }));
    expect(low).toBeLessThan(3);
    expect(high).toBeGreaterThan(3);
  });
});

describe('the picture of a map', () => {
  const table = colourTable(tokens, false);
  const alphas = (pixels: Uint8ClampedArray) => Array.from(pixels).filter((_, index) => index % 4 === 3);

  it('has the first row at the bottom and holes where there is no value', () => {
    const data = { x: [0, 1], y: [0, 1], values: [NaN, 0, 1, 1] };
    expect(alphas(mapPixels(data, { low: 0, high: 1, signed: false }, table))).toEqual([255, 255, 0, 255]);
  });

  it('rises to the right and upward whichever way the axes were swept', () => {
    const domain = { low: 0, high: 3, signed: false };
    const rising = mapPixels({ x: [0, 1], y: [0, 1], values: [0, 1, 2, 3] }, domain, table);
    const falling = mapPixels({ x: [1, 0], y: [1, 0], values: [3, 2, 1, 0] }, domain, table);
    expect(falling).toEqual(rising);
  });
});

describe('contours', () => {
  const n = 41;
  const axis = Array.from({ length: n }, (_, index) => index);
  const cone = axis.flatMap((y) => axis.map((x) => Math.hypot(x - 20, y - 20)));

  it('of a cone are circles, to the straight cut of a cell', () => {
    const [circle] = contourLines({ x: axis, y: axis, values: cone }, [10]);
    expect(circle!.segments.length).toBeGreaterThan(4 * 40);
    for (let at = 0; at < circle!.segments.length; at += 2) {
      const [x, y] = [circle!.segments[at]!, circle!.segments[at + 1]!];
      expect(Math.abs(Math.hypot(x - 20, y - 20) - 10)).toBeLessThan(0.03);
    }
  });

  it('stop at a hole instead of running round it', () => {
    const values = cone.map((value) => (value > 10.5 ? NaN : value));
    const levels = contourLines({ x: axis, y: axis, values }, [15]);
    expect(levels[0]!.segments).toEqual([]);
  });

  it('join the corners of a saddle that the middle belongs to', () => {
    const [line] = contourLines({ x: [0, 1], y: [0, 1], values: [2, 0, 0, 2] }, [0.5]);
    expect(line!.segments).toEqual([0.75, 0, 1, 0.25, 0.25, 1, 0, 0.75]);
  });
});

describe('a map in words', () => {
  const axes = {
    x: { label: 'angle (deg)', format: (value: number) => `${value}°` },
    y: { label: 'wavelength (nm)', format: (value: number) => `${value} nm` },
    value: { label: 'mdeg', format: (value: number) => `${value} mdeg` },
  };
  const data = { x: [0, 30], y: [500, 600], values: [1, 2, 3, NaN] };

  it('says its extremes with their places', () => {
    expect(describeMap('rotation', data, axes, extremesOf(data))).toBe(
      'rotation over angle (deg) and wavelength (nm): least 1 mdeg at 0°, 500 nm, largest 3 mdeg at 0°, 600 nm.',
    );
  });

  it('is a table with the second axis down', () => {
    expect(mapCsv(data, axes)).toBe('wavelength (nm) \\ angle (deg),0,30\n500,1,2\n600,3,\n');
  });
});
