import { describe, expect, it } from 'vitest';
import { fromPixel, toPixel, zoomWindow } from './plotScale.ts';

const linear = { min: 0, max: 90, from: 50, to: 500, log: false };
const log = { min: 0.1, max: 1000, from: 50, to: 450, log: true };

describe('plot scale', () => {
  it('goes to the pixel and back', () => {
    expect(toPixel(linear, 45)).toBe(275);
    expect(fromPixel(linear, 275)).toBe(45);
    expect(toPixel(log, 10)).toBeCloseTo(250);
    expect(fromPixel(log, 250)).toBeCloseTo(10);
  });

  it('runs upward on the screen when the pixels do', () => {
    expect(toPixel({ min: 0, max: 1, from: 260, to: 20, log: false }, 1)).toBe(20);
  });
});

describe('zoomWindow', () => {
  it('keeps the value under the pointer where it is', () => {
    expect(zoomWindow([0, 90], [0, 90], 30, 0.5, false)).toEqual([15, 60]);
  });

  it('never shows more than there is', () => {
    expect(zoomWindow([15, 60], [0, 90], 30, 10, false)).toEqual([0, 90]);
    const [low, high] = zoomWindow([0, 10], [0, 90], 9, 2, false);
    expect([low, high]).toEqual([0, 20]);
  });

  it('halves the decades on a log axis', () => {
    const [low, high] = zoomWindow([1, 10_000], [1, 10_000], 100, 0.5, true);
    expect(low).toBeCloseTo(10);
    expect(high).toBeCloseTo(1000);
  });
});
