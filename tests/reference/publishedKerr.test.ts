import { describe, expect, test } from 'vitest';
import type { Complex, Vector } from '../../shared/complex.ts';
import type { MediumInput } from '../../shared/medium.ts';
import type { CoherentPoint } from './solvePoint.ts';
import { formula } from './formula.ts';
import { distance, size, solvePoint } from './solvePoint.ts';

// Published magneto-optic results. The values for Fe stand in the papers named; where the paper itself was not at
// hand the test says "from memory".

const IRON: Complex = [2.87, 3.36];
const IRON_VOIGT: Complex = [0.0376, 0.0066];

const iron = (m: Vector, voigt: Complex = IRON_VOIGT): MediumInput => ({ index: IRON, voigt, m });

function bulk(substrate: MediumInput, angleDeg: number, n0 = 1, wavelengthNm = 632.8): CoherentPoint {
  return solvePoint({ wavelengthNm, angleDeg, incident: { index: n0 }, layers: [], substrate });
}

const degrees = (angle: Complex): Complex => [(angle[0] * 180) / Math.PI, (angle[1] * 180) / Math.PI];

test('polar Kerr angle of bulk Fe (Zak, Moog, Liu, Bader, Phys. Rev. B 43, 6423 (1991), from memory)', () => {
  const { r, kerr } = bulk(iron([0, 0, 1]), 0);
  const angle = degrees(formula('a / b', { a: r.sp, b: r.pp }));
  expect(angle[0]).toBeCloseTo(0.331, 3);
  expect(angle[1]).toBeCloseTo(0.362, 3);
  expect(size(angle)).toBeCloseTo(0.49, 2);
  expect(kerr.p?.rotationDeg).toBeCloseTo(0.331, 3);
  expect(kerr.p?.ellipticityDeg).toBeCloseTo(0.362, 3);
});

describe('bulk Fe at 60 deg, first order in Q (You and Shin, J. Appl. Phys. 84, 541 (1998), from memory)', () => {
  // The printed values are first order in Q; the odd part of two opposite solves is first order to Q^2.
  test.each<[string, Vector, Complex]>([
    ['polar', [0, 0, 1], [0.5211, 0.2782]],
    ['longitudinal', [1, 0, 0], [0.1066, -0.0441]],
  ])('%s', (_geometry, m, expected) => {
    const scale = 1e-3;
    const { r } = bulk(iron(m, [IRON_VOIGT[0] * scale, IRON_VOIGT[1] * scale]), 60);
    const angle = degrees(formula('a / b / s', { a: r.sp, b: r.pp, s: scale }));
    expect(angle[0]).toBeCloseTo(expected[0], 4);
    expect(angle[1]).toBeCloseTo(expected[1], 4);
  });

  test('the closed forms of the same paper', () => {
    // From air, with c and c1 the cosines outside and inside and s1 = sin(theta) / N:
    // polar r_sp = i c N Q / ((N c + c1)(c + N c1)), longitudinal r_sp = that times s1 / c1.
    const theta = Math.PI / 3;
    const scope = { n: IRON, q: IRON_VOIGT, c: Math.cos(theta), s: Math.sin(theta) };
    const polar = formula(
      `c1 = sqrt(1 - (s / n)^2)
       i * c * n * q / ((n * c + c1) * (c + n * c1))`,
      scope,
    );
    const tiny: Complex = [IRON_VOIGT[0] * 1e-6, IRON_VOIGT[1] * 1e-6];
    const ours = formula('a * 1e6', { a: bulk(iron([0, 0, 1], tiny), 60).r.sp });
    expect(distance(ours, polar)).toBeLessThan(1e-8 * size(polar));
    const longitudinal = formula(
      `c1 = sqrt(1 - (s / n)^2)
       p * (s / n) / c1`,
      { ...scope, p: polar },
    );
    const along = formula('a * 1e6', { a: bulk(iron([1, 0, 0], tiny), 60).r.sp });
    expect(distance(along, longitudinal)).toBeLessThan(1e-8 * size(longitudinal));
  });
});

describe('the thin-film limit (Zak et al., above; Qiu and Bader, Rev. Sci. Instrum. 71, 1243 (2000), from memory)', () => {
  // Polar, normal incidence, film of thickness d on a substrate N_s in air: to first order in d and Q
  // r_sp = (i k0 / 2) d (i Q N^2) (-1) t^2, where t = 2 / (1 + N_s) is the field at the surface.
  const exactOver = (thicknessNm: number) => {
    const { r } = solvePoint({
      wavelengthNm: 632.8,
      angleDeg: 0,
      incident: { index: 1 },
      layers: [
        { thicknessNm, index: IRON, voigt: [IRON_VOIGT[0] * 1e-4, IRON_VOIGT[1] * 1e-4], m: [0, 0, 1] },
      ],
      substrate: { index: [3.88, 0.02] },
    });
    const limit = formula('i * k * d / 2 * i * q * n^2 * (-1) * (2 / (1 + ns))^2', {
      k: (2 * Math.PI) / 632.8,
      d: thicknessNm,
      q: [IRON_VOIGT[0] * 1e-4, IRON_VOIGT[1] * 1e-4],
      n: IRON,
      ns: [3.88, 0.02],
    });
    return distance(r.sp, limit) / size(limit);
  };

  test('relative error vanishes like d', () => {
    const errors = [1e-1, 1e-2, 1e-3, 1e-4].map((d) => exactOver(d) / d);
    expect(errors[0]).toBeLessThan(1);
    for (const slope of errors.slice(1)) expect(slope / errors[3]!).toBeCloseTo(1, 1);
  });
});

describe('transverse magnetization of bulk Fe (Zvezdin and Kotov, Modern Magnetooptics, 1997, from memory)', () => {
  test('contrast 0.015155 at 65 deg', () => {
    const [up, down] = [bulk(iron([0, 1, 0]), 65), bulk(iron([0, -1, 0]), 65)];
    const contrast = (up.R.p - down.R.p) / (up.R.p + down.R.p);
    expect(Math.abs(contrast)).toBeCloseTo(0.015155, 6);
    expect(up.R.s).toBeCloseTo(down.R.s, 14);
    expect([up.r.sp, up.r.ps]).toEqual([
      [0, 0],
      [0, 0],
    ]);
  });

  test('p light has kz^2 = eps (1 - Q^2) - xi^2', () => {
    // r_pp of the half space from its surface impedance z = Ex / Hy for m = +y, where eps_xz = -i Q eps.
    const angleDeg = 65;
    const theta = (angleDeg * Math.PI) / 180;
    const expected = formula(
      `e = n^2
       u = sqrt(e * (1 - q^2) - x^2)
       z = (u - i * q * x) / (e * (1 - q^2))
       (c - z) / (c + z)`,
      { n: IRON, q: IRON_VOIGT, x: Math.sin(theta), c: Math.cos(theta) },
    );
    expect(distance(bulk(iron([0, 1, 0]), angleDeg).r.pp, expected)).toBeLessThan(1e-14);
  });
});

test('Faraday rotation pi n Q d / lambda = 27.765 deg of a garnet in a matched medium (closed form)', () => {
  const point = solvePoint({
    wavelengthNm: 1064,
    angleDeg: 0,
    incident: { index: 2.2 },
    layers: [{ thicknessNm: 1e6, index: 2.2, voigt: 7.46e-5, m: [0, 0, 1] }],
    substrate: { index: 2.2 },
  });
  expect(point.t).not.toBeNull();
  if (!point.t) return;
  // In matched media t_sp / t_pp = tan(rotation) exactly; positive Q turns from p toward s for m = +z.
  const [rotation, ellipticity] = formula('a / b', { a: point.t.sp, b: point.t.pp });
  const rotationDeg = (Math.atan(rotation) * 180) / Math.PI;
  expect(rotationDeg).toBeCloseTo(27.765, 3);
  expect(rotationDeg).toBeCloseTo((180 * 2.2 * 7.46e-5 * 1e6) / 1064, 6);
  expect(Math.abs(ellipticity)).toBeLessThan(1e-7);
});

describe('Voigt geometry: m along x, normal incidence (exact)', () => {
  const index: Complex = [2.1, 0.3];
  const voigt: Complex = [0.2, 0.05];
  const { r, t } = solvePoint({
    wavelengthNm: 700,
    angleDeg: 0,
    incident: { index: 1 },
    layers: [{ thicknessNm: 150, index, voigt, m: [1, 0, 0] }],
    substrate: { index: 1.5 },
  });
  const plain = (film: Complex) =>
    solvePoint({
      wavelengthNm: 700,
      angleDeg: 0,
      incident: { index: 1 },
      layers: [{ thicknessNm: 150, index: film }],
      substrate: { index: 1.5 },
    });

  test('s light sees eps (1 - Q^2), p light eps', () => {
    const s = plain(formula('n * sqrt(1 - q^2)', { n: index, q: voigt }));
    expect(distance(r.ss, s.r.ss)).toBeLessThan(1e-14);
    expect(t && s.t && distance(t.ss, s.t.ss)).toBeLessThan(1e-14);
    expect(distance(r.pp, plain(index).r.pp)).toBeLessThan(1e-14);
    expect([size(r.sp), size(r.ps)]).toEqual([0, 0]);
  });
});

describe('bulk ratio kappa = i (rho(Q) - rho(-Q)) / (rho(Q) + rho(-Q)), exact at normal incidence', () => {
  test.each<[number, Complex, Complex]>([
    [1, IRON, IRON_VOIGT],
    [1.5, [2.25, 4.07], [0.03, 0.01]],
    [1, [0.9, 1.9], [0.4, -0.3]],
    [2.2, [3.1, 0.4], [1e-9, 2e-9]],
  ])('from %f into N = %j, Q = %j', (n0, index, voigt) => {
    const { r } = bulk({ index, voigt, m: [0, 0, 1] }, 0, n0);
    const scope = { n0, n: index, q: voigt };
    const expected = formula(
      `a = n * sqrt(1 + q)
       b = n * sqrt(1 - q)
       p = (n0 - a) / (n0 + a)
       m = (n0 - b) / (n0 + b)
       i * (p - m) / (p + m)`,
      scope,
    );
    const kappa = formula('a / b', { a: r.sp, b: r.pp });
    // mathjs loses digits where the two rho almost coincide.
    expect(distance(kappa, expected)).toBeLessThan(1e-13 + 1e-12 * size(expected));
    const first = formula('i * n0 * n * q / (n^2 - n0^2)', scope);
    expect(distance(kappa, first)).toBeLessThan(4 * size(voigt) ** 2);
  });
});
