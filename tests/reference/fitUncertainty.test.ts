import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';
import type { IndexModel, PlainIndex } from '../../shared/dispersion.ts';
import { loadLibrary } from '../../worker/dispersion/loadLibrary.ts';
import { sampleIndex } from '../../worker/dispersion/sample.ts';
import { fitMaterial } from '../../worker/fit/fitMaterial.ts';
import { buildContent } from './fitContent.ts';

/** Normally distributed numbers, the same ones each time: Box and Muller (1958) on the generator of mulberry32. */
function seededNormal(seed: number): () => number {
  let state = seed;
  const uniform = () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return (((mixed ^ (mixed >>> 14)) >>> 0) + 0.5) / 4294967296;
  };
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
}

const rangeNm: [number, number] = [400, 1600];
const oscillators = (terms: Extract<IndexModel, { name: 'oscillators' }>['terms']): PlainIndex => ({
  kind: 'model',
  rangeNm,
  model: { name: 'oscillators', epsInfinity: 2, terms },
});

test('the uncertainty is the scatter of the values over 200 repetitions with seeded noise', () => {
  const truth = oscillators([
    { kind: 'drude', plasmaEv: 8, dampingEv: 0.1 },
    { kind: 'lorentz', strength: 1.5, centreEv: 3, dampingEv: 0.7 },
  ]);
  const wavelengthsNm = Array.from({ length: 30 }, (_, i) => 400 + (1200 / 29) * i);
  const { n, k } = sampleIndex('model', truth, wavelengthsNm);
  const noise = seededNormal(7);
  const noisy = (column: Float64Array) => Array.from(column, (value) => value + 0.01 * noise());
  const repetitions = Array.from({ length: 200 }, () => {
    const index: PlainIndex = { kind: 'table', wavelengthsNm, n: noisy(n), k: noisy(k) };
    return fitMaterial({ target: 'index', start: truth, content: buildContent({ index }) }).parameters;
  });
  const mean = (values: number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;
  for (const [i, { name }] of repetitions[0]!.entries()) {
    const values = repetitions.map((parameters) => parameters[i]!.value);
    const middle = mean(values);
    const scatter = Math.sqrt(mean(values.map((value) => (value - middle) ** 2)));
    // 200 repetitions give the scatter to 5 % (1/sqrt(2 * 200)); the two must agree within 15 %.
    const predicted = mean(repetitions.map((parameters) => parameters[i]!.uncertainty!));
    expect(Math.abs(predicted / scatter - 1), name).toBeLessThan(0.15);
  }
});

test('gold of Johnson and Christy below its interband edge is a Drude metal with one interband line', () => {
  const gold = loadLibrary(fileURLToPath(new URL('../../data/library', import.meta.url))).find(
    ({ id }) => id === 'au-johnson-1972',
  )!;
  const { parameters, deviation, points } = fitMaterial({
    target: 'index',
    start: oscillators([
      { kind: 'drude', plasmaEv: 8, dampingEv: 0.1 },
      { kind: 'lorentz', strength: 1, centreEv: 3, dampingEv: 0.7 },
    ]),
    rangeNm: [500, 1950],
    content: gold.content,
  });
  const of = (name: string) => parameters.find((parameter) => parameter.name === name)!;
  // P. B. Johnson and R. W. Christy, Phys. Rev. B 6, 4370 (1972), table II, from memory: optical mass 0.99 and
  // relaxation time 9.3 fs of gold, which is a plasma energy of 9.06 eV and a damping of 0.071 eV.
  expect(Math.abs(of('terms[0].plasmaEv').value - 9.06)).toBeLessThan(0.3);
  expect(Math.abs(of('terms[0].dampingEv').value - 0.071)).toBeLessThan(0.02);
  // Over its 15 points k goes from 1.8 to 13: what is left is a small part of it.
  expect(points).toBe(15);
  expect(deviation).toBeLessThan(0.1);
});

describe('what the data do not say is said', () => {
  const content = (index: PlainIndex) => {
    const wavelengthsNm = Array.from({ length: 40 }, (_, i) => 400 + 30 * i);
    const { n, k } = sampleIndex('model', index, wavelengthsNm);
    const noise = seededNormal(3);
    const noisy = Array.from(n, (value) => value + 0.001 * noise());
    return buildContent({ index: { kind: 'table', wavelengthsNm, n: noisy, k: [...k] } });
  };

  test('two parameters of which only the product counts have no uncertainty, the third has', () => {
    const formula = (coefficients: number[]): PlainIndex => ({
      kind: 'formula',
      expression: 'c1 + c2*c3/L^2',
      coefficients,
      rangeNm,
    });
    const { parameters, remarks } = fitMaterial({
      target: 'index',
      start: formula([1.2, 0.1, 0.3]),
      content: content(formula([1.5, 0.2, 0.1])),
    });
    expect(parameters.map(({ uncertainty }) => uncertainty === null)).toEqual([false, true, true]);
    expect(parameters[1]!.value * parameters[2]!.value).toBeCloseTo(0.02, 3);
    expect(remarks).toContain('Not determined by these points: c2, c3. Fix one of them, or use fewer terms.');
  });

  test('parameters that do nearly the same are named as a pair', () => {
    const formula = (coefficients: number[]): PlainIndex => ({
      kind: 'formula',
      expression: 'c1 + c2/L^2 + c3/L^2.2',
      coefficients,
      rangeNm,
    });
    const { parameters, remarks } = fitMaterial({
      target: 'index',
      start: formula([1.2, 0.1, 0.3]),
      content: content(formula([1.5, 0.02, 0.01])),
    });
    expect(parameters.every(({ uncertainty }) => uncertainty !== null)).toBe(true);
    expect(remarks.join(' ')).toMatch(/c2 and c3 can hardly be told apart \(correlation -(0\.999|1\.000)\)/);
  });

  test('a term that the data do not want ends at its limit', () => {
    const line = { kind: 'lorentz', strength: 1, centreEv: 3.5, dampingEv: 0.3 } as const;
    const { parameters, remarks } = fitMaterial({
      target: 'index',
      start: oscillators([line, { kind: 'drude', plasmaEv: 1, dampingEv: 0.1 }]),
      fixed: ['terms[1].dampingEv'],
      content: content({
        kind: 'formula',
        quantity: 'eps',
        // What no Drude term may be: its part of the permittivity with the other sign of its real part.
        expression: '2 + 3.5^2/(3.5^2 - E^2 - i*0.3*E) + 0.5/E^2',
        coefficients: [],
        rangeNm,
      }),
    });
    expect(parameters[4]).toMatchObject({ name: 'terms[1].plasmaEv', value: 0, uncertainty: null });
    expect(remarks.join(' ')).toContain('terms[1].plasmaEv stands at its limit 0');
  });

  test('a real index leaves the absorption of the table over', () => {
    const wavelengthsNm = [400, 500, 600, 700];
    const index: PlainIndex = {
      kind: 'table',
      wavelengthsNm,
      n: [1.52, 1.51, 1.505, 1.502],
      k: [0.02, 0.01, 0, 0],
    };
    const { remarks, residuals } = fitMaterial({
      target: 'index',
      start: { kind: 'model', rangeNm, model: { name: 'cauchy', a: 1.5, bUm2: 0, cUm4: 0 } },
      fixed: ['cUm4'],
      content: buildContent({ index }),
    });
    expect(residuals.second).toEqual([0.02, 0.01, 0, 0]);
    expect(remarks).toEqual([
      'The model has no absorption: only n was compared; k of the table reaches 0.02.',
    ]);
  });
});
