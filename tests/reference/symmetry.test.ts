import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Complex, Vector } from '../../shared/complex.ts';
import type { SolveCase } from '../../shared/solve.ts';
import {
  angle,
  axis,
  between,
  complexWithin,
  decades,
  incidentIndex,
  magnetization,
  metalIndex,
  runs,
  thickness,
  wavelength,
} from './arbitraryStack.ts';
import type { CoherentPoint } from './solvePoint.ts';
import { distance, size, solvePoint } from './solvePoint.ts';

// Symmetries of stacks of gyrotropic layers. Polar and longitudinal: mirror planes of the stack; reciprocity:
// reversal of light together with that of m (Onsager), turned by 180 deg about z.

type Film = { index: Complex; voigt: Complex; m: Vector; thicknessNm: number };

const voigt = fc.oneof(
  complexWithin(0.1),
  complexWithin(1),
  decades(1e-15, 1e-3).map((q): Complex => [q, -0.4 * q]),
);
const film: fc.Arbitrary<Film> = fc.record({
  index: metalIndex,
  voigt,
  m: magnetization,
  thicknessNm: thickness,
});
const films = fc.array(film, { minLength: 1, maxLength: 4 });

type Setting = [wavelengthNm: number, angleDeg: number, index: number, layers: Film[], substrate: Complex];

/** All layers along one direction: the stack's only magnetization axis. */
function solved(
  [wavelengthNm, angleDeg, index, layers, substrate]: Setting,
  turn: (m: Vector) => Vector,
): CoherentPoint {
  const stack: SolveCase = {
    wavelengthNm,
    angleDeg,
    incident: { index },
    layers: layers.map((layer) => ({ ...layer, m: turn(layer.m) })),
    substrate: { index: substrate, voigt: [0.02, 0.01], m: turn([0.3, -0.5, 0.6]) },
  };
  return solvePoint(stack);
}

const setting = fc.tuple(wavelength, angle, incidentIndex, films, metalIndex);

/** Relative to the signal itself, so that a tiny Q counts as much as a large one. */
function relativeDifference(a: Complex, b: Complex): number {
  const scale = Math.max(size(a), size(b));
  return scale === 0 ? 0 : distance(a, b) / scale;
}

const negative = ([re, im]: Complex): Complex => [-re, -im];

describe('to all orders in Q', () => {
  test('polar: r_sp = r_ps', () => {
    fc.assert(
      fc.property(setting, (one) => {
        const { r } = solved(one, (m) => [0, 0, m[2]]);
        expect(relativeDifference(r.sp, r.ps)).toBeLessThan(1e-9);
      }),
      runs(200),
    );
  });

  test('longitudinal: r_sp = -r_ps', () => {
    fc.assert(
      fc.property(setting, (one) => {
        const { r } = solved(one, (m) => [m[0], 0, 0]);
        expect(relativeDifference(r.sp, negative(r.ps))).toBeLessThan(1e-9);
      }),
      runs(200),
    );
  });

  test('transverse: no conversion, and s light does not feel the sign of m', () => {
    fc.assert(
      fc.property(setting, (one) => {
        const up = solved(one, (m) => [0, m[1], 0]);
        const down = solved(one, (m) => [0, -m[1], 0]);
        expect([up.r.sp, up.r.ps]).toEqual([
          [0, 0],
          [0, 0],
        ]);
        expect(distance(up.r.ss, down.r.ss)).toBeLessThan(1e-13);
      }),
      runs(200),
    );
  });

  test('reciprocity: r_ps(mx, my, mz) = -r_sp(mx, my, -mz)', () => {
    fc.assert(
      fc.property(setting, (one) => {
        const given = solved(one, (m) => m);
        const turned = solved(one, ([x, y, z]) => [x, y, -z]);
        // Polar and longitudinal parts may cancel, so the scale is that of both conversions together.
        const scale = size(given.r.sp) + size(given.r.ps) + size(turned.r.sp);
        expect(distance(given.r.ps, negative(turned.r.sp))).toBeLessThan(1e-9 * scale);
        expect(distance(given.r.pp, turned.r.pp)).toBeLessThan(1e-12);
        expect(distance(given.r.ss, turned.r.ss)).toBeLessThan(1e-12);
      }),
      runs(200),
    );
  });

  test('mirror in the plane of incidence: (mx, my, mz) to (-mx, my, -mz) turns the sign of the conversion', () => {
    fc.assert(
      fc.property(setting, (one) => {
        const given = solved(one, (m) => m);
        const mirrored = solved(one, ([x, y, z]) => [-x, y, -z]);
        const scale = size(given.r.sp) + size(given.r.ps);
        expect(distance(given.r.sp, negative(mirrored.r.sp))).toBeLessThan(1e-9 * scale);
        expect(distance(given.r.ps, negative(mirrored.r.ps))).toBeLessThan(1e-9 * scale);
      }),
      runs(200),
    );
  });
});

describe('at normal incidence, turning the whole stack about z by an angle turns the Jones matrix', () => {
  const uniaxial = fc.record({
    index: metalIndex,
    extraordinary: metalIndex,
    axis,
    voigt: complexWithin(0.05),
    m: magnetization,
    thicknessNm: thickness,
  });

  test('magnetic uniaxial layers', () => {
    fc.assert(
      fc.property(
        wavelength,
        fc.array(uniaxial, { minLength: 1, maxLength: 3 }),
        between(-180, 180),
        (wavelengthNm, layers, turnDeg) => {
          const cos = Math.cos((turnDeg * Math.PI) / 180);
          const sin = Math.sin((turnDeg * Math.PI) / 180);
          const turn = ([x, y, z]: Vector): Vector => [cos * x - sin * y, sin * x + cos * y, z];
          const stack = (change: (v: Vector) => Vector) =>
            solvePoint({
              wavelengthNm,
              angleDeg: 0,
              incident: { index: 1 },
              layers: layers.map((layer) => ({ ...layer, axis: change(layer.axis), m: change(layer.m) })),
              substrate: { index: [3.88, 0.02] },
            }).r;
          const given = stack((v) => v);
          // p_r = -x: in the fixed frame (x, y) the matrix is [[-pp, -ps], [sp, ss]].
          const lab = (r: typeof given) => [negative(r.pp), negative(r.ps), r.sp, r.ss] as const;
          const [xx, xy, yx, yy] = lab(given);
          const mix = (...terms: [number, Complex][]): Complex =>
            terms.reduce<Complex>((sum, [w, z]) => [sum[0] + w * z[0], sum[1] + w * z[1]], [0, 0]);
          const expected = [
            mix([cos * cos, xx], [-cos * sin, xy], [-cos * sin, yx], [sin * sin, yy]),
            mix([cos * sin, xx], [cos * cos, xy], [-sin * sin, yx], [-cos * sin, yy]),
            mix([cos * sin, xx], [-sin * sin, xy], [cos * cos, yx], [-cos * sin, yy]),
            mix([sin * sin, xx], [cos * sin, xy], [cos * sin, yx], [cos * cos, yy]),
          ];
          lab(stack(turn)).forEach((value, i) => {
            expect(distance(value, expected[i] ?? [NaN, NaN])).toBeLessThan(1e-12);
          });
        },
      ),
      runs(100),
    );
  });
});
