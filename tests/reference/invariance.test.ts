import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Complex } from '../../shared/complex.ts';
import type { MediumInput } from '../../shared/medium.ts';
import type { LayerInput, SolveCase, StackItemInput } from '../../shared/solve.ts';
import {
  angle,
  between,
  complexWithin,
  decades,
  incidentIndex,
  magneticMetal,
  magnetization,
  metalIndex,
  passiveMedium,
  runs,
  thickness,
  wavelength,
} from './arbitraryStack.ts';
import { gyrotropic } from './plainTensor.ts';
import type { CoherentPoint } from './solvePoint.ts';
import { distance, size, solvePoint } from './solvePoint.ts';

// The same stack written in two ways has the same answer. No source needed.

const layer: fc.Arbitrary<LayerInput> = fc
  .tuple(passiveMedium, thickness)
  .map(([medium, thicknessNm]) => ({ ...medium, thicknessNm }));
const layers = fc.array(layer, { minLength: 1, maxLength: 3 });
const setting = fc.tuple(wavelength, angle, incidentIndex, metalIndex);

type Setting = [wavelengthNm: number, angleDeg: number, index: number, substrate: Complex];

function solved([wavelengthNm, angleDeg, index, substrate]: Setting, items: StackItemInput[]): CoherentPoint {
  const stack: SolveCase = {
    wavelengthNm,
    angleDeg,
    incident: { index },
    layers: items,
    substrate: { index: substrate },
  };
  return solvePoint(stack);
}

/** r and t agree absolutely, and the conversion relative to itself. */
function expectSame(a: CoherentPoint, b: CoherentPoint, tolerance = 1e-12): void {
  for (const element of ['pp', 'ps', 'sp', 'ss'] as const) {
    expect(distance(a.r[element], b.r[element])).toBeLessThan(tolerance);
    if (a.t && b.t) {
      expect(distance(a.t[element], b.t[element])).toBeLessThan(tolerance * (1 + size(a.t[element])));
    }
  }
  expect(a.t === null).toBe(b.t === null);
}

/** For stacks whose conversion is all magnetic: also within 1e-9 of its own size. */
function expectSameSignal(a: CoherentPoint, b: CoherentPoint): void {
  const allowed = 1e-9 * (size(a.r.sp) + size(a.r.ps)) + 1e-280;
  expect(distance(a.r.sp, b.r.sp)).toBeLessThan(allowed);
  expect(distance(a.r.ps, b.r.ps)).toBeLessThan(allowed);
}

const weakMagnet: fc.Arbitrary<MediumInput> = fc
  .tuple(
    metalIndex,
    decades(1e-15, 1e-2),
    magnetization.filter(([, , z]) => Math.abs(z) > 0.01),
  )
  .map(([index, q, m]) => ({ index, voigt: [q, -0.3 * q], m }));

describe('a layer', () => {
  test('cut in two changes nothing', () => {
    fc.assert(
      fc.property(setting, layers, fc.nat(2), between(0, 1), (one, stack, position, share) => {
        const at = Math.min(position, stack.length - 1);
        const cut = stack.flatMap((item, i) =>
          i === at
            ? [
                { ...item, thicknessNm: item.thicknessNm * share },
                { ...item, thicknessNm: item.thicknessNm * (1 - share) },
              ]
            : [item],
        );
        expectSame(solved(one, stack), solved(one, cut), 1e-11);
      }),
      runs(300),
    );
  });

  test('of thickness 0 changes nothing, wherever it stands', () => {
    fc.assert(
      fc.property(setting, layers, passiveMedium, fc.nat(3), (one, stack, medium, position) => {
        const added = [...stack];
        added.splice(Math.min(position, stack.length), 0, { ...medium, thicknessNm: 0 });
        expectSame(solved(one, stack), solved(one, added), 1e-11);
      }),
      runs(300),
    );
  });

  test('of a weak magnet, cut or beside a zero layer, keeps the digits of its tiny signal', () => {
    fc.assert(
      fc.property(setting, weakMagnet, decades(0.3, 60), (one, medium, thicknessNm) => {
        const whole = solved(one, [{ ...medium, thicknessNm }]);
        const half = { ...medium, thicknessNm: thicknessNm / 2 };
        expectSameSignal(whole, solved(one, [half, { ...medium, m: [0, 0, 0.5], thicknessNm: 0 }, half]));
      }),
      runs(200),
    );
  });

  test('of the substrate’s own medium changes nothing', () => {
    fc.assert(
      fc.property(wavelength, angle, passiveMedium, thickness, (wavelengthNm, angleDeg, medium, d) => {
        const shared = { wavelengthNm, angleDeg, incident: { index: 1 }, substrate: medium };
        const bare = solvePoint({ ...shared, layers: [] });
        const layered = solvePoint({ ...shared, layers: [{ ...medium, thicknessNm: d }] });
        for (const element of ['pp', 'ps', 'sp', 'ss'] as const) {
          expect(distance(bare.r[element], layered.r[element])).toBeLessThan(1e-11);
        }
      }),
      runs(300),
    );
  });
});

test('a uniform medium reflects nothing, whatever its thickness', () => {
  for (const angleDeg of [0, 30, 89.9]) {
    const { r, t, R, T } = solvePoint({
      wavelengthNm: 500,
      angleDeg,
      incident: { index: 1.52 },
      layers: [{ thicknessNm: 1234, index: 1.52 }],
      substrate: { index: 1.52 },
    });
    expect(size(r.pp) + size(r.ss)).toBeLessThan(1e-12);
    expect(R.p + R.s).toBeLessThan(1e-24);
    expect([T.p, T.s]).toEqual([expect.closeTo(1, 13), expect.closeTo(1, 13)]);
    const phase = ((2 * Math.PI * 1234) / 500) * 1.52 * Math.cos((angleDeg * Math.PI) / 180);
    expect(t && distance(t.ss, [Math.cos(phase), Math.sin(phase)])).toBeLessThan(1e-11);
  }
});

describe('a repeated block', () => {
  const inner = fc.array(layer, { minLength: 1, maxLength: 2 });

  test('equals its layers written out', () => {
    fc.assert(
      fc.property(setting, inner, fc.integer({ min: 0, max: 6 }), layer, (one, block, repeat, cap) => {
        const written = Array.from({ length: repeat }, () => block).flat();
        const folded = solved(one, [cap, { repeat, layers: block }]);
        expectSame(folded, solved(one, [cap, ...written]), 1e-13);
      }),
      runs(150),
    );
  });

  test('inside blocks inside a block, too', () => {
    fc.assert(
      fc.property(setting, layer, layer, layer, (one, a, b, c) => {
        const nested: StackItemInput[] = [
          { repeat: 2, layers: [a, { repeat: 2, layers: [b, { repeat: 3, layers: [c] }] }] },
        ];
        const deepest = [b, c, c, c];
        const middle = [a, ...deepest, ...deepest];
        expectSame(solved(one, nested), solved(one, [...middle, ...middle]), 1e-13);
      }),
      runs(100),
    );
  });
});

describe('a medium written in two ways', () => {
  test('index, voigt and m, or the tensor they stand for', () => {
    fc.assert(
      fc.property(setting, magneticMetal, thickness, (one, medium, thicknessNm) => {
        const { index, voigt, m } = medium;
        if (!Array.isArray(index) || !Array.isArray(voigt) || !m) throw new Error('not a magnetic metal');
        const rows = gyrotropic(index, voigt, m);
        const row = (i: number): [Complex, Complex, Complex] => {
          const [x, y, z] = rows[i] ?? [];
          if (!x || !y || !z) throw new Error('not a 3x3 tensor');
          return [x, y, z];
        };
        const tensor = {
          epsilon: [row(0), row(1), row(2)] as [
            ReturnType<typeof row>,
            ReturnType<typeof row>,
            ReturnType<typeof row>,
          ],
        };
        expectSame(
          solved(one, [{ ...medium, thicknessNm }]),
          solved(one, [{ ...tensor, thicknessNm }]),
          1e-11,
        );
      }),
      runs(200),
    );
  });

  test('an isotropic tensor, an extraordinary index equal to the ordinary one, Q = 0, or the index alone', () => {
    fc.assert(
      fc.property(setting, metalIndex, complexWithin(0.1), thickness, (one, index, voigt, thicknessNm) => {
        const [n, k] = index;
        const e: Complex = [n * n - k * k, 2 * n * k];
        const plain = solved(one, [{ index, thicknessNm }]);
        for (const medium of [
          {
            epsilon: [
              [e, 0, 0],
              [0, e, 0],
              [0, 0, e],
            ],
          },
          { index, extraordinary: index, axis: [1, 2, 3] },
          { index, voigt: 0, m: [0, 0, 1] },
          { index, voigt, m: [0, 0, 0] },
          { index, voigt },
          { index, quadratic: { g11: 0, g12: 0, g44: 0, azimuthDeg: 20 }, m: [0, 1, 0] },
        ] satisfies MediumInput[]) {
          expectSame(plain, solved(one, [{ ...medium, thicknessNm }]), 1e-13);
        }
      }),
      runs(100),
    );
  });

  test('samples that repeat one value, or the value alone', () => {
    const value = { index: [2.25, 4.07], voigt: [0.03, 0.01] } satisfies MediumInput;
    const shared = { wavelengthNm: [500, 600], angleDeg: [0, 60], incident: { index: 1 } };
    const m: [number, number, number] = [0, 0, 1];
    const solvedAt = (film: LayerInput, wavelengthNm: number, angleDeg: number) =>
      solvePoint({ ...shared, wavelengthNm, angleDeg, layers: [film], substrate: { index: 1.5 } });
    const single = solvedAt({ ...value, m, thicknessNm: 8 }, 600, 60);
    const sampled = solvedAt(
      { index: { samples: [[2.25, 4.07]] }, voigt: { samples: [[0.03, 0.01]] }, m, thicknessNm: 8 },
      600,
      60,
    );
    expect(sampled).toEqual(single);
  });
});
