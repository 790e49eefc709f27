import { describe, expect, it } from 'vitest';
import { exaggeration, incomingRay, outgoingRay, raysApart } from './beamGeometry.ts';

const frame = { width: 372, height: 206, x: 205, surface: 205 };
const angleOf = ({ start, end }: ReturnType<typeof incomingRay>) =>
  (Math.atan2(end.x - start.x, end.y - start.y) * 180) / Math.PI;

describe('the beam', () => {
  it.each([0, 0.5, 30, 60, 89.9])('is drawn at its true angle of %s deg, inside the drawing', (angle) => {
    const ray = incomingRay(angle, frame);
    expect(angleOf(ray)).toBeCloseTo(angle, 9);
    const out = outgoingRay(angle, frame);
    for (const point of [ray.start, out.end]) {
      expect(point.x).toBeGreaterThanOrEqual(0);
      expect(point.x).toBeLessThanOrEqual(frame.width);
      expect(point.y).toBeGreaterThanOrEqual(0);
    }
    expect(out.end.y).toBe(ray.start.y);
  });

  it('is split near normal incidence, where the two rays would cover each other', () => {
    expect(raysApart(0, frame, 0.7, 17)).toBe(17);
    expect(raysApart(60, frame, 0.7, 17)).toBe(3);
  });
});

describe('exaggeration', () => {
  it('is a round number that keeps the ellipse from turning over', () => {
    expect(exaggeration(0.04829, 0.0317)).toBe(500);
    expect(0.04829 * exaggeration(0.04829, 0)).toBeLessThan(45);
    expect(exaggeration(-0.3, 0.1)).toBe(100);
  });

  it('is 1 for angles that are seen as they are, and bounded for none', () => {
    expect(exaggeration(60, -20)).toBe(1);
    expect(exaggeration(0, 0)).toBe(1);
    expect(exaggeration(1e-12, 0)).toBe(10_000);
  });
});
