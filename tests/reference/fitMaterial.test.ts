import { Matrix, solve } from 'ml-matrix';
import { describe, expect, test } from 'vitest';
import type { PlainIndex, PlainVoigt } from '../../shared/dispersion.ts';
import type { MaterialContent } from '../../shared/material.ts';
import type { FitResult } from '../../shared/materialFit.ts';
import { fitResultSchema } from '../../shared/materialFit.ts';
import { sampleIndex, sampleVoigt } from '../../worker/dispersion/sample.ts';
import { fitMaterial } from '../../worker/fit/fitMaterial.ts';
import { buildContent } from './fitContent.ts';

type Oscillators = Extract<PlainIndex, { kind: 'model' }>;

const grid = (fromNm: number, toNm: number, points: number) =>
  Array.from({ length: points }, (_, i) => fromNm + ((toNm - fromNm) * i) / (points - 1));

/** The table that a model gives at these wavelengths. */
function tableOf(model: PlainIndex, wavelengthsNm: number[]): MaterialContent {
  const { n, k } = sampleIndex('model', model, wavelengthsNm);
  return buildContent({ index: { kind: 'table', wavelengthsNm, n: [...n], k: [...k] } });
}

function voigtTableOf(voigt: PlainVoigt, index: PlainIndex, wavelengthsNm: number[]): MaterialContent {
  const { re, im } = sampleVoigt('model', { index, voigt }, wavelengthsNm);
  const q = wavelengthsNm.map((_, i): [number, number] => [re[i]!, im[i]!]);
  return buildContent({ index, voigt: { kind: 'table', wavelengthsNm, q } });
}

/** Every value agrees with the true one to a fraction of 1e-8. */
function expectRecovered(result: FitResult, truth: number[]): void {
  fitResultSchema.parse(result);
  expect(result.parameters).toHaveLength(truth.length);
  truth.forEach((value, i) => {
    const { name, value: fitted } = result.parameters[i]!;
    expect(Math.abs(fitted - value), name).toBeLessThanOrEqual(1e-8 * Math.abs(value));
  });
}

const rangeNm: [number, number] = [300, 1900];

// Source of the expected values: the model itself, at other parameters than the start.
describe('a fit finds the parameters that made the table', () => {
  test('Sellmeier: fused silica of Malitson, J. Opt. Soc. Am. 55, 1205 (1965)', () => {
    const model = (b: number[], c: number[]): PlainIndex => ({
      kind: 'model',
      rangeNm: [250, 3000],
      model: {
        name: 'sellmeier',
        constant: 1,
        terms: b.map((value, i) => ({ b: value, cUm2: c[i]! })),
      },
    });
    const [b, c] = [
      [0.6961663, 0.4079426, 0.8974794],
      [0.0684043 ** 2, 0.1162414 ** 2, 9.896161 ** 2],
    ];
    const result = fitMaterial({
      target: 'index',
      start: model([0.8, 0.3, 1], [0.004, 0.016, 80]),
      fixed: ['constant'],
      content: tableOf(model(b, c), grid(250, 3000, 80)),
    });
    expectRecovered(result, [1, ...b.flatMap((value, i) => [value, c[i]!])]);
    expect(result.parameters[0]).toMatchObject({ name: 'constant', fixed: true, uncertainty: null });
    expect(result.parameters[2]).toMatchObject({ name: 'terms[0].cUm2', unit: 'um^2', fixed: false });
  });

  test('Cauchy with an absorption tail, whose reference energy stays', () => {
    const model = (a: number, bUm2: number, cUm4: number, k: number, perEv: number): PlainIndex => ({
      kind: 'model',
      rangeNm,
      model: { name: 'cauchy', a, bUm2, cUm4, tail: { k, perEv, atEv: 3 } },
    });
    const result = fitMaterial({
      target: 'index',
      start: model(1.3, 0, 0, 0.01, 1),
      content: tableOf(model(1.45, 0.012, 2e-4, 0.02, 1.7), grid(300, 1900, 50)),
    });
    expectRecovered(result, [1.45, 0.012, 2e-4, 0.02, 1.7, 3]);
    expect(result.parameters.at(-1)).toMatchObject({ name: 'tail.atEv', fixed: true });
    expect(result.remarks).toContain('tail.atEv only says where tail.k is meant; it stays as it is.');
  });

  const metal = (values: number[]): Oscillators => ({
    kind: 'model',
    rangeNm,
    model: {
      name: 'oscillators',
      epsInfinity: values[0]!,
      terms: [
        { kind: 'drude', plasmaEv: values[1]!, dampingEv: values[2]! },
        { kind: 'lorentz', strength: values[3]!, centreEv: values[4]!, dampingEv: values[5]! },
      ],
    },
  });

  test('Drude and Lorentz', () => {
    const truth = [2.5, 8.6, 0.07, 1.2, 3.1, 0.9];
    const result = fitMaterial({
      target: 'index',
      start: metal([1, 7, 0.2, 0.5, 2.7, 0.5]),
      content: tableOf(metal(truth), grid(300, 1900, 60)),
    });
    expectRecovered(result, truth);
    expect(result.deviation).toBeLessThan(1e-10);
    expect(result.parameters.map(({ name, unit }) => `${name} ${unit}`.trim())).toEqual([
      'epsInfinity',
      'terms[0].plasmaEv eV',
      'terms[0].dampingEv eV',
      'terms[1].strength',
      'terms[1].centreEv eV',
      'terms[1].dampingEv eV',
    ]);
  });

  test('Tauc-Lorentz', () => {
    const film = (values: number[]): Oscillators => ({
      kind: 'model',
      rangeNm: [200, 1000],
      model: {
        name: 'oscillators',
        epsInfinity: values[0]!,
        terms: [
          {
            kind: 'tauc-lorentz',
            amplitudeEv: values[1]!,
            gapEv: values[2]!,
            centreEv: values[3]!,
            dampingEv: values[4]!,
          },
        ],
      },
    });
    const truth = [1.2, 120, 1.3, 3.5, 2.2];
    const content = tableOf(film(truth), grid(200, 1000, 80));
    expectRecovered(fitMaterial({ target: 'index', start: film([1, 90, 1.5, 3.8, 1.8]), content }), truth);
  });

  test.each<[string, 'n' | 'N' | 'eps']>([
    ['c1 + c2/L^2', 'n'],
    ['c1 + c2/L^2 + i*c3*L', 'N'],
    ['c1 + c2*i/E - c3/E^2', 'eps'],
  ])('the formula %s of %s', (expression, quantity) => {
    const truth = quantity === 'n' ? [1.5, 0.02] : [1.5, 0.02, 0.3];
    const formula = (coefficients: number[]): PlainIndex => ({
      kind: 'formula',
      expression,
      coefficients,
      rangeNm,
      quantity,
    });
    const start = truth.map((value) => value * 1.4);
    const content = tableOf(formula(truth), grid(300, 1900, 30));
    expectRecovered(fitMaterial({ target: 'index', start: formula(start), content }), truth);
  });

  test.each(['voigt', 'gyration'] as const)('lines of the %s', (of) => {
    const lines = (values: number[]): PlainVoigt => ({
      kind: 'lines',
      rangeNm,
      of,
      lines: [
        { shape: 'paramagnetic', amplitude: values[0]!, centreEv: values[1]!, dampingEv: values[2]! },
        { shape: 'diamagnetic', amplitude: values[3]!, centreEv: values[4]!, dampingEv: values[5]! },
      ],
    });
    const truth = [0.03, 1.1, 0.4, -0.004, 2.8, 0.6];
    const index = metal([2.5, 8.6, 0.07, 1.2, 3.1, 0.9]);
    const result = fitMaterial({
      target: 'voigt',
      start: lines([0.02, 1.3, 0.5, -0.003, 2.6, 0.5]),
      content: voigtTableOf(lines(truth), index, grid(320, 1850, 60)),
    });
    expectRecovered(result, truth);
    expect(result.fitted).toMatchObject({ kind: 'lines', rangeNm: [320, 1850], of });
  });

  test('a formula of Q', () => {
    const formula = (coefficients: number[]): PlainVoigt => ({
      kind: 'formula',
      expression: 'c1*L + i*c2*L^2',
      coefficients,
      rangeNm,
    });
    const content = voigtTableOf(formula([0.04, -0.01]), metal([2, 8, 0.1, 1, 3, 1]), grid(300, 1900, 20));
    expectRecovered(fitMaterial({ target: 'voigt', start: formula([0, 0]), content }), [0.04, -0.01]);
  });
});

test('where the model is linear, values and uncertainties are those of the normal equations (ml-matrix)', () => {
  const wavelengthsNm = grid(400, 1000, 25);
  // No table of anything: a smooth curve with wiggles that a parabola cannot follow.
  const n = wavelengthsNm.map((nm, i) => 1.6 - 2e-4 * (nm - 400) + 0.003 * Math.sin(1.7 * i));
  const k = n.map(() => 0);
  const { parameters } = fitMaterial({
    target: 'index',
    start: {
      kind: 'formula',
      expression: 'c1 + c2*L + c3*L^2',
      coefficients: [1, 0, 0],
      rangeNm: [400, 1000],
    },
    content: buildContent({ index: { kind: 'table', wavelengthsNm, n, k } }),
  });
  const design = new Matrix(wavelengthsNm.map((nm) => [1, nm / 1000, (nm / 1000) ** 2]));
  const direct = solve(design, Matrix.columnVector(n));
  const residuals = Matrix.sub(Matrix.columnVector(n), design.mmul(direct));
  const variance = residuals.norm('frobenius') ** 2 / (n.length - 3);
  const covariance = solve(design.transpose().mmul(design), Matrix.eye(3)).mul(variance);
  parameters.forEach(({ value, uncertainty }, i) => {
    // The sum of squares is flat at its least: there the last digits of it leave 1e-8 of the uncertainty open.
    expect(Math.abs(value - direct.get(i, 0))).toBeLessThan(1e-6 * uncertainty!);
    expect(uncertainty! / Math.sqrt(covariance.get(i, i))).toBeCloseTo(1, 6);
  });
});
