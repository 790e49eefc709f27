import { describe, expect, test } from 'vitest';
import type { LayerInput } from '../../shared/solve.ts';
import { formula } from './formula.ts';
import { size, solvePoint, solvePoints } from './solvePoint.ts';

// Published results for stacks without magnetism. "From memory" says that the source was not at hand.

const degrees = (angle: number) => (angle * 180) / Math.PI;
const quarterWave = (index: number, wavelengthNm: number): LayerInput => ({
  index,
  thicknessNm: wavelengthNm / (4 * index),
});

test('a quarter wave of MgF2 1.38 on 1.52 reflects 0.012601 (Macleod, Thin-Film Optical Filters, from memory)', () => {
  const { R } = solvePoint({
    wavelengthNm: 550,
    angleDeg: 0,
    incident: { index: 1 },
    layers: [quarterWave(1.38, 550)],
    substrate: { index: 1.52 },
  });
  expect(R.p).toBeCloseTo(0.012601, 6);
  expect(R.s).toBeCloseTo(0.012601, 6);
  // The closed form behind the printed number: ((n0 ns - n1^2) / (n0 ns + n1^2))^2.
  expect(R.p).toBeCloseTo(((1.52 - 1.38 ** 2) / (1.52 + 1.38 ** 2)) ** 2, 14);
});

describe('(HL)^N H of ZnS 2.3 and cryolite 1.35 on 1.52 (Born and Wolf, sec. 1.6.5, from memory)', () => {
  test.each([
    [0, 0.3065],
    [1, 0.6722],
    [2, 0.8724],
    [3, 0.9541],
    [4, 0.9839],
  ])('N = %d reflects %d', (repeat, reflectance) => {
    const { R } = solvePoint({
      wavelengthNm: 546,
      angleDeg: 0,
      incident: { index: 1 },
      layers: [{ repeat, layers: [quarterWave(2.3, 546), quarterWave(1.35, 546)] }, quarterWave(2.3, 546)],
      substrate: { index: 1.52 },
    });
    expect(R.s).toBeCloseTo(reflectance, 4);
  });
});

test.each([48 + 37 / 60, 54 + 37 / 60])(
  'a Fresnel rhomb of 1.51 turns the phase by 45 deg at %f deg (Born and Wolf, sec. 1.5.4, from memory)',
  (angleDeg) => {
    const { r, R } = solvePoint({
      wavelengthNm: 589.3,
      angleDeg,
      incident: { index: 1.51 },
      layers: [],
      substrate: { index: 1 },
    });
    expect([R.p, R.s]).toEqual([expect.closeTo(1, 13), expect.closeTo(1, 13)]);
    // The book has r_pp = -r_ss at normal incidence, as we do.
    const phase = formula('arg(p / s)', { p: r.pp, s: r.ss })[0];
    // The angles are printed to one minute of arc, which is 0.02 deg of phase.
    expect(Math.abs(Math.abs(degrees(phase)) - 45)).toBeLessThan(0.03);
  },
);

test('the surface plasmon of 75 nm Ag under a prism has its minimum near 42.76 deg (Raether 1988, from memory)', () => {
  const points = solvePoints({
    wavelengthNm: 632.8,
    angleDeg: Array.from({ length: 2001 }, (_, i) => 42 + i / 1000),
    incident: { index: 1.515 },
    layers: [{ thicknessNm: 75, index: formula('sqrt(e)', { e: [-18.3, 0.5] }) }],
    substrate: { index: 1 },
  });
  const lowest = points.reduce((best, point) => (point.R.p < best.R.p ? point : best));
  expect(Math.abs(lowest.angleDeg - 42.76)).toBeLessThan(0.01);
  expect(lowest.R.p).toBeLessThan(0.9);
  expect(lowest.R.s).toBeGreaterThan(0.95);
});

test('Si 3.882 + 0.019i at 70 deg has Psi 10.57 and Delta 179.23 deg (common practice, no source)', () => {
  const { r } = solvePoint({
    wavelengthNm: 632.8,
    angleDeg: 70,
    incident: { index: 1 },
    layers: [],
    substrate: { index: [3.882, 0.019] },
  });
  expect(degrees(Math.atan(size(r.pp) / size(r.ss)))).toBeCloseTo(10.57, 2);
  // Delta = -arg(r_pp / r_ss) for the time factor exp(-iwt).
  expect(-degrees(formula('arg(p / s)', { p: r.pp, s: r.ss })[0])).toBeCloseTo(179.23, 2);
});

test('total reflection begins at the angle of Snell', () => {
  const critical = degrees(Math.asin(1 / 1.52));
  const [below, above] = solvePoints({
    wavelengthNm: 500,
    angleDeg: [critical - 1e-3, critical + 1e-3],
    incident: { index: 1.52 },
    layers: [],
    substrate: { index: 1 },
  });
  expect(below?.R.s).toBeLessThan(0.98);
  expect(below?.T.s).toBeGreaterThan(0.02);
  expect(above?.R.s).toBeCloseTo(1, 13);
  expect(above?.T.s).toBeCloseTo(0, 13);
});
