import { describe, expect, it } from 'vitest';
import type { Complex } from '../../shared/complex.ts';
import type { SolveCase, SolvePoint } from '../../shared/solve.ts';
import { solveCasePoints } from './solveRequest.ts';

const Pt: Complex = [2.33, 4.14];

/** An oblique stack with three different directions of m, a repeated magnet and a magnetic substrate. */
function stack(scale: number, spacer: SolveCase['substrate'] = { index: 1.5 }): SolveCase {
  const q = (re: number, im: number): Complex => [re * scale, im * scale];
  return {
    wavelengthNm: 632.8,
    angleDeg: 55,
    incident: { index: 1.33 },
    layers: [
      { thicknessNm: 3, index: Pt },
      { thicknessNm: 10, index: [2.87, 3.36], voigt: q(0.0376, 0.0066), m: [0.48, 0.6, 0.64] },
      {
        repeat: 3,
        layers: [
          { thicknessNm: 8, index: [2.25, 4.07], voigt: q(0.03, 0.01), m: [-0.48, 0.6, 0.64] },
          { thicknessNm: 40, ...spacer },
        ],
      },
    ],
    substrate: { index: [2.87, 3.36], voigt: q(0.0376, 0.0066), m: [1, 0, 0] },
    outputs: ['mueller', 'faraday', 'contributions', 'depth', 'ceiling'],
  };
}

const solved = (solveCase: SolveCase): SolvePoint => [...solveCasePoints(solveCase)][0]!;
const distance = (a: Complex, b: Complex) => Math.hypot(a[0] - b[0], a[1] - b[1]);

const uniaxial: SolveCase['substrate'] = { index: 1.5, extraordinary: 1.7, axis: [0.3, 0.5, 0.7] };

describe('layer shares', () => {
  // Source: physics.md section 5; first-order perturbation theory leaves an error of second order in Q.
  it.each([
    ['closed form', undefined],
    ['differences, for an anisotropic spacer', uniaxial],
  ])('sum to the exact answer within second order in Q (%s)', (_, spacer) => {
    for (const key of ['sp', 'ps', 'pp'] as const) {
      const errorAt = (scale: number) => {
        const { total, exact } = solved(stack(scale, spacer)).contributions!;
        return distance(total[key], exact[key]);
      };
      expect(errorAt(0.1) / errorAt(0.01)).toBeGreaterThan(95);
    }
  });

  it('shows each repeat and the substrate, at its depth', () => {
    const { layers } = solved(stack(1)).contributions!;
    expect(layers.map(({ path, position, depthNm }) => [path, position, depthNm])).toEqual([
      ['layers[1]', 1, 3],
      ['layers[2].layers[0]', 2, 13],
      ['layers[2].layers[0]', 4, 61],
      ['layers[2].layers[0]', 6, 109],
      ['substrate', 8, 157],
    ]);
  });

  it('agree between closed form and differences of full solves', () => {
    const closed = solved(stack(1)).contributions!;
    // A spacer that is uniaxial in name only takes the way of anisotropic stacks.
    const byDifference = solved(stack(1, { index: 1.5, extraordinary: 1.5, axis: [0, 0, 1] })).contributions!;
    closed.layers.forEach((share, index) => {
      expect(distance(share.sp, byDifference.layers[index]!.sp)).toBeLessThan(1e-8);
      expect(distance(share.pp, byDifference.layers[index]!.pp)).toBeLessThan(1e-8);
    });
  });
});

describe('depth profile', () => {
  const integral = (point: SolvePoint, density: (index: number) => number, layers: number) => {
    const { depthNm, position } = point.depth!;
    let sum = 0;
    for (let i = 1; i < depthNm.length; i++) {
      if (position[i] !== position[i - 1] || position[i]! >= layers) continue;
      sum += ((depthNm[i]! - depthNm[i - 1]!) * (density(i) + density(i - 1))) / 2;
    }
    return sum;
  };

  // Source: conservation of energy.
  it('absorbs what reflection and transmission leave', () => {
    const point = solved(stack(1));
    for (const polarization of ['p', 's'] as const) {
      const absorbed = integral(point, (i) => point.depth!.absorbedPerNm[polarization][i]!, 8);
      expect(absorbed).toBeCloseTo(point.A[polarization], 3);
    }
  });

  // Source: physics.md section 5; the integrand's integral is the share. The adjoint field serves the second case.
  it.each([undefined, uniaxial])('has a signal density that integrates to the layer shares', (spacer) => {
    const point = solved({ ...stack(1, spacer), substrate: { index: [3.88, 0.02] } });
    const total = point.contributions!.total.sp;
    expect(integral(point, (i) => point.depth!.signalPerNm[i]![0], 8)).toBeCloseTo(total[0], 5);
    expect(integral(point, (i) => point.depth!.signalPerNm[i]![1], 8)).toBeCloseTo(total[1], 5);
  });

  it('starts at the field of the incident side: |E_s| = |1 + r_ss| at the top', () => {
    const point = solved(stack(0));
    const [re, im] = point.r!.ss;
    expect(point.depth!.field.s[0]).toBeCloseTo(Math.hypot(1 + re, im), 12);
  });
});

describe('ceiling', () => {
  // Source: amorphous rare-earth film of Mansuripur, Appl. Phys. Lett. 49, 19 (1986), from memory: 0.011126.
  it('is |Q eps_d| / (2 Im eps_d) of the material', () => {
    const epsilon: Complex = [-4.898, 19.415];
    const size = Math.hypot(...epsilon);
    const n = Math.sqrt((size + epsilon[0]) / 2);
    const index: Complex = [n, epsilon[1] / (2 * n)];
    // Q = eps_xy / (i eps_d)
    const [re, im] = [0.006, -0.432];
    const voigt: Complex = [
      (re * epsilon[0] + im * epsilon[1]) / size ** 2,
      (im * epsilon[0] - re * epsilon[1]) / size ** 2,
    ];
    const point = solved({
      wavelengthNm: 632.8,
      angleDeg: 0,
      incident: { index: 1 },
      layers: [{ thicknessNm: 20, index, voigt, m: [0, 0, 1] }],
      substrate: { index: [0.06, 4.2] },
      outputs: ['ceiling'],
    });
    expect(point.ceiling!.material).toBeCloseTo(0.011126, 6);
    const sp = Math.hypot(...point.r!.sp);
    expect(point.ceiling!.shareReached).toBeCloseTo(sp / point.ceiling!.material!, 12);
    expect(sp).toBeLessThan(point.ceiling!.stack!);
  });

  it('bounds r_sp of the whole stack and is null where a magnet does not absorb', () => {
    const { ceiling, r } = solved(stack(0.01));
    expect(Math.hypot(...r!.sp)).toBeLessThan(ceiling!.stack!);
    const garnet = { thicknessNm: 500, index: 2.2, voigt: 1e-4, m: [0, 0, 1] as [number, number, number] };
    const lossless = solved({ ...stack(0), layers: [garnet] });
    expect(lossless.ceiling).toEqual({ stack: null, material: null, shareReached: null });
  });
});

describe('Mueller and Faraday outputs', () => {
  // Source: definition in physics.md section 4, applied to the circular state (1, i)/sqrt 2 by Jones algebra.
  it('acts on circular light as the Jones matrix does', () => {
    const { mueller, r } = solved(stack(1));
    const mul = (a: Complex, b: Complex): Complex => [a[0] * b[0] - a[1] * b[1], a[0] * b[1] + a[1] * b[0]];
    const i: Complex = [0, Math.SQRT1_2];
    const out = ([p, s]: [Complex, Complex]): Complex => {
      const [a, b] = [[p[0] * Math.SQRT1_2, p[1] * Math.SQRT1_2], mul(s, i)] as [Complex, Complex];
      return [a[0] + b[0], a[1] + b[1]];
    };
    const ep = out([r!.pp, r!.ps]);
    const es = out([r!.sp, r!.ss]);
    const stokes = mueller!.map((row) => row[0]! + row[3]!);
    expect(stokes[0]).toBeCloseTo(ep[0] ** 2 + ep[1] ** 2 + es[0] ** 2 + es[1] ** 2, 14);
    expect(stokes[1]).toBeCloseTo(ep[0] ** 2 + ep[1] ** 2 - es[0] ** 2 - es[1] ** 2, 14);
    expect(stokes[2]).toBeCloseTo(2 * (ep[0] * es[0] + ep[1] * es[1]), 14);
    expect(stokes[3]).toBeCloseTo(2 * (ep[0] * es[1] - ep[1] * es[0]), 14);
  });

  // Source: pi n Q d / lambda, Zvezdin & Kotov 1997, from memory: n 2.2, Q 7.46e-5, 1 mm, 1064 nm, 27.765 deg.
  it('gives the Faraday rotation of a garnet in matched media', () => {
    const point = solved({
      wavelengthNm: 1064,
      angleDeg: 0,
      incident: { index: 2.2 },
      layers: [{ thicknessNm: 1e6, index: 2.2, voigt: 7.46e-5, m: [0, 0, 1] }],
      substrate: { index: 2.2 },
      outputs: ['faraday'],
    });
    expect(Math.abs(point.faraday!.p!.rotationDeg)).toBeCloseTo(27.765, 3);
  });
});
