import fc from 'fast-check';
import { EigenvalueDecomposition, Matrix } from 'ml-matrix';
import { describe, expect, test } from 'vitest';
import type { Complex, Vector } from '../../shared/complex.ts';
import type { MediumInput } from '../../shared/medium.ts';
import { Medium } from './medium.ts';
import type { Tensor } from './tensor.ts';
import {
  addGyration,
  addUniaxial,
  createTensor,
  element,
  gainOf,
  isMultipleOfIdentity,
  isPassive,
  setScalar,
} from './tensor.ts';

// Tensors of the conventions page, section 2; eigenvalues by ml-matrix.

const part = fc.double({ min: -3, max: 3, noNaN: true });
const anyTensor = fc.array(part, { minLength: 18, maxLength: 18 }).map((values) => Float64Array.from(values));

/** Smallest eigenvalue of (eps - eps^H) / 2i as one of the real symmetric 6x6 matrix [Re, -Im; Im, Re]. */
function smallestLoss(tensor: Tensor): number {
  const rows = Array.from({ length: 6 }, (_, i) =>
    Array.from({ length: 6 }, (_, j) => {
      const [row, column] = [i % 3, j % 3];
      const [a, b] = [element(tensor, row, column), element(tensor, column, row)];
      const re = (a[1] + b[1]) / 2;
      const im = (b[0] - a[0]) / 2;
      if (i < 3 === j < 3) return re;
      return i < 3 ? -im : im;
    }),
  );
  return Math.min(...new EigenvalueDecomposition(new Matrix(rows)).realEigenvalues);
}

describe('passivity', () => {
  test('isPassive is the sign of the smallest eigenvalue of the loss, and gainOf its size', () => {
    let passive = 0;
    fc.assert(
      fc.property(anyTensor, fc.double({ min: 0, max: 12, noNaN: true }), (tensor, loss) => {
        for (const i of [1, 9, 17]) tensor[i] = tensor[i]! + loss;
        const smallest = smallestLoss(tensor);
        if (Math.abs(smallest) < 1e-6) return;
        if (smallest > 0) passive++;
        expect(isPassive(tensor)).toBe(smallest > 0);
        expect(gainOf(tensor)).toBeCloseTo(Math.max(0, -smallest), 8);
      }),
      { numRuns: 500, seed: 3 },
    );
    expect(passive).toBeGreaterThan(50);
  });

  test('for a scalar eps_d it is |m| |Im(Q eps_d)| <= Im eps_d', () => {
    const eps: Complex = [-3, 2];
    const of = (imaginary: number) => {
      const tensor = createTensor();
      setScalar(tensor, eps);
      // Q eps_d = i times the number given
      const s = eps[0] ** 2 + eps[1] ** 2;
      addGyration(tensor, eps, [(imaginary * eps[1]) / s, (imaginary * eps[0]) / s], [0.48, 0.6, 0.64]);
      return isPassive(tensor);
    };
    expect([of(1.999), of(-1.999), of(2.001), of(-2.001)]).toEqual([true, true, false, false]);
  });

  test('no loss at all is passive', () => {
    const tensor = createTensor();
    setScalar(tensor, [2.25, 0]);
    addGyration(tensor, [2.25, 0], [0.3, 0], [0, 0, 1]);
    expect([isPassive(tensor), gainOf(tensor)]).toEqual([true, 0]);
  });
});

describe('building', () => {
  test('m = +z gives eps_xy = i Q eps_d and eps_yx = -i Q eps_d, and so on in turn', () => {
    const eps: Complex = [3, 1];
    const q: Complex = [0.1, 0.02];
    // i Q eps_d = i (0.1 + 0.02i)(3 + i) = -0.16 + 0.28i
    const expected: Complex = [-0.16, 0.28];
    const cases: [Vector, [number, number]][] = [
      [
        [0, 0, 1],
        [0, 1],
      ],
      [
        [1, 0, 0],
        [1, 2],
      ],
      [
        [0, 1, 0],
        [2, 0],
      ],
    ];
    for (const [m, [row, column]] of cases) {
      const tensor = createTensor();
      addGyration(tensor, eps, q, m);
      expect(element(tensor, row, column)).toEqual(expected.map((x) => expect.closeTo(x, 15) as number));
      expect(element(tensor, column, row)).toEqual(expected.map((x) => expect.closeTo(-x, 15) as number));
      expect(tensor.filter((value) => value !== 0)).toHaveLength(4);
    }
  });

  test('a uniaxial tensor has eps_e along the axis, of whatever length, and eps_o across it', () => {
    const tensor = createTensor();
    setScalar(tensor, [4, 0]);
    addUniaxial(tensor, [2, 0], [3, 0], [0, 3, 4]);
    const along = [0, 0.6, 0.8];
    const across = [0, -0.8, 0.6];
    const applied = (v: number[]) =>
      [0, 1, 2].map((row) => v.reduce((sum, x, column) => sum + x * element(tensor, row, column)[0], 0));
    expect(applied(along)).toEqual(along.map((x) => expect.closeTo(9 * x, 13) as number));
    expect(applied(across)).toEqual(across.map((x) => expect.closeTo(4 * x, 13) as number));
    expect(element(tensor, 0, 0)).toEqual([4, 0]);
  });

  describe('second order in m of a cubic crystal, of a medium of index 1', () => {
    const tensorOf = (m: Vector, azimuthDeg: number, voigt: Complex = [0, 0]) => {
      const quadratic = {
        g11: [1, 0.1],
        g12: [2, 0.2],
        g44: [4, 0.4],
        azimuthDeg,
      } satisfies MediumInput['quadratic'];
      const medium = new Medium({ index: 1, voigt, m, quadratic });
      medium.load(0);
      return medium.tensor;
    };

    test('G11 along m, G12 across, 2 G44 between, with the crystal along the axes', () => {
      const tensor = tensorOf([0.6, 0.8, 0], 0);
      const wanted: [number, number, number, number][] = [
        [0, 0, 1 + 0.36 + 2 * 0.64, 0.036 + 0.2 * 0.64],
        [1, 1, 1 + 0.64 + 2 * 0.36, 0.064 + 0.2 * 0.36],
        [2, 2, 1 + 2, 0.2],
        [0, 1, 8 * 0.48, 0.8 * 0.48],
        [1, 0, 8 * 0.48, 0.8 * 0.48],
        [0, 2, 0, 0],
      ];
      for (const [row, column, re, im] of wanted) {
        const found = element(tensor, row, column);
        expect(Math.hypot(found[0] - re, found[1] - im)).toBeLessThan(1e-14);
      }
    });

    test('turning crystal and m together turns the tensor', () => {
      const [c, s] = [Math.cos(0.5), Math.sin(0.5)];
      const turned = tensorOf([c * 0.3 - s * 0.5, s * 0.3 + c * 0.5, 0.7], (0.5 * 180) / Math.PI);
      const plain = tensorOf([0.3, 0.5, 0.7], 0);
      const rotation = new Matrix([
        [c, -s, 0],
        [s, c, 0],
        [0, 0, 1],
      ]);
      for (const part of [0, 1] as const) {
        const real = (tensor: Tensor) =>
          new Matrix([0, 1, 2].map((i) => [0, 1, 2].map((j) => element(tensor, i, j)[part])));
        const difference = Matrix.sub(rotation.mmul(real(plain)).mmul(rotation.transpose()), real(turned));
        expect(difference.norm('frobenius')).toBeLessThan(1e-14);
      }
    });

    test('a cubic crystal with G11 = G12 + 2 G44 looks the same at every azimuth', () => {
      const isotropic = (azimuthDeg: number) => {
        const quadratic = { g11: 5, g12: 1, g44: 2, azimuthDeg };
        const medium = new Medium({ index: 1, m: [0.3, 0.5, 0.7], quadratic });
        medium.load(0);
        return medium.tensor;
      };
      const [plain, turned] = [isotropic(0), isotropic(33)];
      plain.forEach((value, i) => expect(turned[i]).toBeCloseTo(value, 13));
    });

    test('m to -m transposes the tensor: even in the second order, odd in the first', () => {
      const [up, down] = [
        tensorOf([0.3, 0.5, 0.7], 20, [0.1, 0.1]),
        tensorOf([-0.3, -0.5, -0.7], 20, [0.1, 0.1]),
      ];
      for (const i of [0, 1, 2]) {
        for (const j of [0, 1, 2]) {
          const [a, b] = [element(up, i, j), element(down, j, i)];
          expect(Math.hypot(a[0] - b[0], a[1] - b[1])).toBeLessThan(1e-14);
        }
      }
    });
  });

  test('only an exact multiple of the unit tensor is one', () => {
    const tensor = createTensor();
    setScalar(tensor, [2, 1]);
    expect(isMultipleOfIdentity(tensor)).toBe(true);
    tensor[2] = Number.MIN_VALUE;
    expect(isMultipleOfIdentity(tensor)).toBe(false);
  });
});
