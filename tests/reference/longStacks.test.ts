import { describe, expect, test } from 'vitest';
import type { LayerInput, StackItemInput } from '../../shared/solve.ts';
import { distance, size, solvePoint } from './solvePoint.ts';

// Stacks of many layers: no overflow, no growing error, no stack overflow of the program. Without a source.

const solved = (layers: StackItemInput[], substrate: number | [number, number] = 1.5) =>
  solvePoint({
    wavelengthNm: 633,
    angleDeg: 30,
    incident: { index: 1 },
    layers,
    substrate: { index: substrate },
  });

const cobalt: LayerInput = { thicknessNm: 0.4, index: [2.25, 4.07], voigt: [0.03, 0.01], m: [0, 0, 1] };
const platinum: LayerInput = { thicknessNm: 1, index: [2.33, 4.14] };

test('a block repeated 1000 times reflects as one repeated 999 times', () => {
  const repeated = (repeat: number) => solved([{ repeat, layers: [cobalt, platinum] }]);
  const [most, fewer] = [repeated(1000), repeated(999)];
  for (const element of ['pp', 'ps', 'sp', 'ss'] as const) {
    expect(distance(most.r[element], fewer.r[element])).toBeLessThan(1e-14);
  }
  expect(size(most.r.sp)).toBeGreaterThan(1e-4);
});

test('1000 lossless periods keep R + T = 1', () => {
  const { R, T } = solved([
    {
      repeat: 1000,
      layers: [
        { thicknessNm: 70, index: 2.3 },
        { thicknessNm: 93, index: 2.2, voigt: 1e-3, m: [0.48, 0.6, 0.64] },
      ],
    },
  ]);
  expect(Math.abs(R.p + T.p - 1)).toBeLessThan(1e-10);
  expect(Math.abs(R.s + T.s - 1)).toBeLessThan(1e-10);
});

describe('300 different layers', () => {
  const layers = Array.from({ length: 300 }, (_, i): LayerInput => {
    const n = 1.4 + 0.9 * Math.abs(Math.sin(i * 1.7));
    return i % 3 === 0
      ? { thicknessNm: 20 + (i % 7), index: n, voigt: 1e-3 * Math.cos(i), m: [0.48, 0.6, 0.64] }
      : { thicknessNm: 15 + (i % 11), index: n };
  });

  test('lose nothing', () => {
    const { R, T } = solved(layers);
    expect(Math.abs(R.p + T.p - 1)).toBeLessThan(1e-12);
    expect(Math.abs(R.s + T.s - 1)).toBeLessThan(1e-12);
  });

  test('of vanishing thickness are not there', () => {
    const thin = layers.map((layer) => ({ ...layer, thicknessNm: 0 }));
    const [none, bare] = [solved(thin), solved([])];
    expect(distance(none.r.pp, bare.r.pp)).toBeLessThan(1e-12);
    expect(distance(none.r.ss, bare.r.ss)).toBeLessThan(1e-12);
  });
});

test('100,000 layers are solved', () => {
  const slice: LayerInput = { ...cobalt, thicknessNm: 50 / 100_000 };
  const cut = solved([{ repeat: 100, layers: [{ repeat: 1000, layers: [slice] }] }]);
  const whole = solved([{ ...cobalt, thicknessNm: 50 }]);
  for (const element of ['pp', 'ps', 'sp', 'ss'] as const) {
    expect(distance(cut.r[element], whole.r[element])).toBeLessThan(1e-8);
  }
});
