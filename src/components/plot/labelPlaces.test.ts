import { describe, expect, it } from 'vitest';
import { placeLabels } from './labelPlaces.ts';

const frame = { left: 50, right: 650, top: 20, bottom: 260 };
const line = (from: number, to: number, textWidth = 60) => {
  const x = Array.from({ length: 61 }, (_, index) => 50 + index * 10);
  return { x, y: x.map((_, index) => from + ((to - from) * index) / 60), textWidth };
};

describe('placeLabels', () => {
  it('keeps names clear of the other curve and of each other', () => {
    const [rising, falling] = placeLabels([line(250, 30), line(30, 250)], frame);
    expect(rising).not.toBeNull();
    expect(falling).not.toBeNull();
    for (const [place, other] of [
      [rising!, (x: number) => 30 + ((x - 50) / 600) * 220],
      [falling!, (x: number) => 250 - ((x - 50) / 600) * 220],
    ] as const) {
      for (const x of [place.x - 30, place.x, place.x + 30]) {
        const y = other(x);
        expect(y < place.y - 14 || y > place.y).toBe(true);
      }
    }
    const apart = Math.abs(rising!.x - falling!.x) >= 60 || Math.abs(rising!.y - falling!.y) >= 14;
    expect(apart).toBe(true);
  });

  it('stays inside the frame', () => {
    const [place] = placeLabels([line(22, 22)], frame);
    expect(place).toMatchObject({ above: false });
    expect(place!.y).toBeLessThanOrEqual(frame.bottom);
  });

  it('gives no place to a curve without values', () => {
    expect(placeLabels([{ x: [60, 70], y: [NaN, NaN], textWidth: 40 }], frame)).toEqual([null]);
  });
});
