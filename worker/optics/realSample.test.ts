import { describe, expect, it } from 'vitest';
import type { Complex, Vector } from '../../shared/complex.ts';
import type { MediumInput } from '../../shared/medium.ts';
import type { SolveCase, SolvePoint, StackItemInput } from '../../shared/solve.ts';
import { spreadNodes } from '../../shared/spread.ts';
import { Medium } from './medium.ts';
import { bruggeman, maxwellGarnett } from './mixture.ts';
import { eulerRotation, rotated, rotatedVector } from './rotation.ts';
import { solveCasePoints, solveRequest } from './solveRequest.ts';

const Fe: Complex = [2.87, 3.36];
const feVoigt: Complex = [0.0376, 0.0066];
const Au: Complex = [0.18, 3.43];
const up: Vector = [0, 0, 1];
const square = ([re, im]: Complex): Complex => [re * re - im * im, 2 * re * im];

function caseOf(layers: StackItemInput[], more: Partial<SolveCase> = {}): SolveCase {
  return {
    wavelengthNm: 632.8,
    angleDeg: 50,
    incident: { index: 1 },
    layers,
    substrate: { index: [3.88, 0.02] },
    ...more,
  };
}

const solved = (solveCase: SolveCase): SolvePoint => [...solveCasePoints(solveCase)][0]!;

describe('mixtures', () => {
  // Source: physics.md section 6, the Fe/Au 50:50 figure at 632.8 nm.
  it('mixes the gyration of Fe into Au by Bruggeman: g = -0.2195 - 0.2553i', () => {
    const medium = new Medium({
      mixture: {
        model: 'bruggeman',
        fraction: 0.5,
        parts: [{ index: Fe, voigt: feVoigt, m: up }, { index: Au }],
      },
    });
    medium.load(0);
    const [qRe, qIm] = medium.voigt;
    const [eRe, eIm] = medium.permittivity!;
    expect(-(qRe * eIm + qIm * eRe)).toBeCloseTo(-0.2195, 4);
    expect(qRe * eRe - qIm * eIm).toBeCloseTo(-0.2553, 4);
  });

  // Source: Bruggeman's equation itself (Ann. Phys. 416, 636 (1935), from memory).
  it.each([0, 0.2, 0.5, 0.8, 1])('solves Bruggeman equation at fraction %d', (fraction) => {
    const [first, second] = [square(Fe), square(Au)];
    const { permittivity } = bruggeman(first, second, fraction);
    const term = (part: Complex, share: number): Complex => {
      const [aRe, aIm] = [part[0] - permittivity[0], part[1] - permittivity[1]];
      const [bRe, bIm] = [part[0] + 2 * permittivity[0], part[1] + 2 * permittivity[1]];
      const size = bRe * bRe + bIm * bIm;
      return [(share * (aRe * bRe + aIm * bIm)) / size, (share * (aIm * bRe - aRe * bIm)) / size];
    };
    const [a, b] = [term(first, 1 - fraction), term(second, fraction)];
    expect(a[0] + b[0]).toBeCloseTo(0, 12);
    expect(a[1] + b[1]).toBeCloseTo(0, 12);
    expect(permittivity[1]).toBeGreaterThan(0);
  });

  it('is the positive root where both media are real: air and glass half and half', () => {
    const { permittivity } = bruggeman([1, 0], [2.25, 0], 0.5);
    expect(permittivity[1]).toBe(0);
    expect(permittivity[0]).toBeGreaterThan(1);
    expect(permittivity[0]).toBeLessThan(2.25);
  });

  // Source: g = g_i d eps_eff / d eps_i (physics.md section 6), the derivative by differences.
  it('takes the weight of a Maxwell Garnett inclusion from the derivative', () => {
    const [host, inclusion] = [square([1.46, 0]), square(Fe)];
    const h = 1e-6;
    const plus = maxwellGarnett(host, [inclusion[0] + h, inclusion[1]], 0.3).permittivity;
    const minus = maxwellGarnett(host, [inclusion[0] - h, inclusion[1]], 0.3).permittivity;
    const { weights } = maxwellGarnett(host, inclusion, 0.3);
    expect(weights[1][0]).toBeCloseTo((plus[0] - minus[0]) / (2 * h), 8);
    expect(weights[1][1]).toBeCloseTo((plus[1] - minus[1]) / (2 * h), 8);
  });

  it('is the pure media at its ends, m included', () => {
    const mixed = (fraction: number): MediumInput => ({
      mixture: { model: 'bruggeman', fraction, parts: [{ index: Au }, { index: Fe, voigt: feVoigt, m: up }] },
    });
    const pure = solved(caseOf([{ thicknessNm: 10, index: Fe, voigt: feVoigt, m: up }]));
    expect(solved(caseOf([{ thicknessNm: 10, ...mixed(1) }])).r!.sp[0]).toBeCloseTo(pure.r!.sp[0], 14);
    expect(solved(caseOf([{ thicknessNm: 10, ...mixed(0) }])).r!.sp).toEqual([0, 0]);
  });

  it('keeps two directions of m apart', () => {
    const parts = (a: Vector, b: Vector): MediumInput => ({
      mixture: {
        model: 'bruggeman',
        fraction: 0.5,
        parts: [
          { index: Fe, voigt: feVoigt, m: a },
          { index: Fe, voigt: feVoigt, m: b },
        ],
      },
    });
    // Half of the same metal along z and half along x is that metal with m = (z + x) / 2.
    const mixed = solved(caseOf([{ thicknessNm: 10, ...parts(up, [1, 0, 0]) }]));
    const mean = solved(caseOf([{ thicknessNm: 10, index: Fe, voigt: feVoigt, m: [0.5, 0, 0.5] }]));
    expect(mixed.r!.sp[0]).toBeCloseTo(mean.r!.sp[0], 14);
    expect(mixed.r!.ps[1]).toBeCloseTo(mean.r!.ps[1], 14);
  });
});

describe('graded interfaces', () => {
  const sharp: StackItemInput[] = [
    { thicknessNm: 3, index: Au },
    { thicknessNm: 10, index: Fe, voigt: feVoigt, m: up },
  ];
  const graded = (gradedNm: number): StackItemInput[] => [sharp[0]!, { ...sharp[1]!, gradedNm }];

  it('states its slices and is refined until doubling them changes less than 1e-6', () => {
    const { graded: refinement } = solveRequest({ cases: [caseOf(graded(2))] }).results[0]!;
    expect(refinement!.slices).toBeGreaterThanOrEqual(8);
    expect(refinement!.change).toBeLessThanOrEqual(1e-6);
  });

  it('tends to the sharp interface as its width vanishes', () => {
    const difference = (gradedNm: number) =>
      Math.abs(solved(caseOf(graded(gradedNm))).r!.pp[0] - solved(caseOf(sharp)).r!.pp[0]);
    expect(difference(0.01)).toBeLessThan(1e-4);
    expect(difference(0.01)).toBeLessThan(difference(1) / 20);
  });

  it('works between repeats of a block and on the substrate', () => {
    const block: StackItemInput = { repeat: 2, layers: graded(1) };
    const written = [...graded(1), ...graded(1)];
    // The first layer of the block has no graded top, so both ways of writing mean the same stack.
    expect(solved(caseOf([block])).r).toEqual(solved(caseOf(written)).r);
    const onSubstrate = caseOf(sharp, { substrate: { index: [3.88, 0.02], gradedNm: 2 } });
    expect(solved(onSubstrate).r!.pp[0]).not.toBeCloseTo(solved(caseOf(sharp)).r!.pp[0], 6);
  });
});

describe('averages', () => {
  const film: StackItemInput[] = [
    { thicknessNm: 300, index: 1.5 },
    { thicknessNm: 10, index: Fe, voigt: feVoigt, m: up },
  ];

  it('adds intensities with the stated weights', () => {
    const angles = [40, 50, 60];
    const weights = [0.25, 0.5, 0.25];
    const average = solved(caseOf(film, { angleDeg: angles, average: { angleWeights: weights } }));
    const single = angles.map((angleDeg) => solved(caseOf(film, { angleDeg })));
    const mean = single.reduce((sum, point, i) => sum + weights[i]! * point.R.p, 0);
    expect(average.R.p).toBeCloseTo(mean, 14);
    expect(average.angleDeg).toBe(50);
    expect(average.r).toBeNull();
    expect(average.degreeOfPolarization!.p).toBeLessThan(1);
  });

  it('scales all thicknesses by a common factor', () => {
    const average = solved(
      caseOf(film, {
        average: {
          thickness: [
            { factor: 0.9, weight: 0.5 },
            { factor: 1.1, weight: 0.5 },
          ],
        },
      }),
    );
    const at = (factor: number) =>
      solved(
        caseOf(
          film.map((item) => ('layers' in item ? item : { ...item, thicknessNm: item.thicknessNm * factor })),
        ),
      );
    expect(average.R.s).toBeCloseTo((at(0.9).R.s + at(1.1).R.s) / 2, 14);
    expect(average.T.p).toBeCloseTo((at(0.9).T.p + at(1.1).T.p) / 2, 14);
  });

  // Source: moments of the normal and the uniform distribution.
  it.each(['normal', 'uniform'] as const)('has nodes with the moments of a %s distribution', (shape) => {
    const nodes = spreadNodes(10, 2, shape);
    const moment = (power: number) =>
      nodes.reduce((sum, { value, weight }) => sum + weight * (value - 10) ** power, 0);
    expect(moment(0)).toBeCloseTo(1, 12);
    expect(moment(1)).toBeCloseTo(0, 12);
    expect(moment(2)).toBeCloseTo(4, 9);
    expect(moment(4)).toBeCloseTo(shape === 'normal' ? 48 : 28.8, 8);
  });
});

describe('turned crystals', () => {
  it('turns an optic axis as it turns a tensor', () => {
    const orientationDeg: Vector = [20, 35, 50];
    const axis: Vector = [0.2, 0.1, 1];
    const turned = rotatedVector(axis, eulerRotation(orientationDeg));
    const byOrientation = solved(
      caseOf([{ thicknessNm: 80, index: 1.6, extraordinary: 1.8, axis, orientationDeg }]),
    );
    const byAxis = solved(caseOf([{ thicknessNm: 80, index: 1.6, extraordinary: 1.8, axis: turned }]));
    expect(byOrientation.r!.sp[0]).toBeCloseTo(byAxis.r!.sp[0], 14);
    const medium = new Medium({ index: 1.6, extraordinary: 1.8, axis });
    medium.load(0);
    const rows = (tensor: Float64Array) =>
      [0, 1, 2].map((i) =>
        [0, 1, 2].map((j): Complex => [tensor[6 * i + 2 * j]!, tensor[6 * i + 2 * j + 1]!]),
      );
    const asTensor = (tensor: Float64Array) =>
      rows(tensor) as unknown as NonNullable<Extract<MediumInput['epsilon'], unknown[]>>;
    const byTensor = solved(caseOf([{ thicknessNm: 80, epsilon: asTensor(medium.tensor), orientationDeg }]));
    const rotatedBefore = rotated(medium.tensor, eulerRotation(orientationDeg));
    const plain = solved(caseOf([{ thicknessNm: 80, epsilon: asTensor(rotatedBefore) }]));
    expect(byTensor.r!.sp[0]).toBeCloseTo(byAxis.r!.sp[0], 13);
    expect(byTensor.r!.ps[1]).toBeCloseTo(plain.r!.ps[1], 14);
  });

  it('turns the axes of a cubic crystal about z like its azimuth', () => {
    const film = (more: object): StackItemInput => ({
      thicknessNm: 10,
      index: Fe,
      m: [0.6, 0.8, 0],
      quadratic: { g11: [-0.03, -0.1], g12: [0.04, 0.02], g44: [0.07, -0.1], ...more },
    });
    const byAzimuth = solved(caseOf([film({ azimuthDeg: 30 })]));
    const byOrientation = solved(caseOf([{ ...film({}), orientationDeg: [30, 0, 0] }]));
    expect(byOrientation.r!.sp[0]).toBeCloseTo(byAzimuth.r!.sp[0], 14);
    expect(Math.abs(byAzimuth.r!.sp[0])).toBeGreaterThan(1e-6);
  });
});
