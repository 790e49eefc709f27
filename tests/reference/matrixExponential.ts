import { complex, expm, matrix, multiply } from 'mathjs';
import type { Matrix } from 'mathjs';
import { Matrix as RealMatrix, solve } from 'ml-matrix';
import type { Complex } from '../../shared/complex.ts';
import { formula, toPair } from './formula.ts';

/**
 * A second solver for the tests, which shares nothing with the first: the 4x4 matrix of Berreman (J. Opt. Soc. Am.
 * 62, 502 (1972)), its exponential by mathjs, and the boundary conditions as 8 real linear equations by ml-matrix.
 * It multiplies transfer matrices, so its stacks must be thin enough not to overflow.
 */
export type PlainLayer = { thicknessNm: number; epsilon: Complex[][] };

export type PlainStack = {
  wavelengthNm: number;
  angleDeg: number;
  incidentIndex: number;
  layers: PlainLayer[];
  /** N of an isotropic substrate. */
  substrateIndex: Complex;
};

type Amplitudes = { pp: Complex; ps: Complex; sp: Complex; ss: Complex };

/** Rows of D as printed in Berreman's paper, for psi = (Ex, Hy, Ey, -Hx). */
const ROWS = [
  ['-x * zx / zz', '1 - x^2 / zz', '-x * zy / zz', '0'],
  ['xx - xz * zx / zz', '-x * xz / zz', 'xy - xz * zy / zz', '0'],
  ['0', '0', '0', '1'],
  ['yx - yz * zx / zz', '-x * yz / zz', 'yy - yz * zy / zz - x^2', '0'],
];

function layerMatrix(epsilon: Complex[][], xi: number): Complex[][] {
  const scope: Record<string, number | Complex> = { x: xi };
  for (const [i, row] of ['x', 'y', 'z'].entries()) {
    for (const [j, column] of ['x', 'y', 'z'].entries()) scope[row + column] = epsilon[i]?.[j] ?? 0;
  }
  return ROWS.map((row) => row.map((element) => formula(element, scope)));
}

/** exp(-i k0 d D): fields at the upper face from those at the lower one. */
function upward({ epsilon, thicknessNm }: PlainLayer, xi: number, k0: number): Matrix {
  const d = k0 * thicknessNm;
  const exponent = layerMatrix(epsilon, xi).map((row) => row.map(([re, im]) => complex(im * d, -re * d)));
  return expm(matrix(exponent));
}

/** Column vectors of the beams outside, physics of an isotropic medium: p+ (c, N, 0, 0), s+ (0, 0, 1, N c). */
function beams(index: Complex, q: Complex, sign: 1 | -1): [p: Complex[], s: Complex[]] {
  const zero: Complex = [0, 0];
  const signed = (z: Complex): Complex => [sign * z[0], sign * z[1]];
  return [
    [signed(formula('q / n', { q, n: index })), index, zero, zero],
    [zero, zero, [1, 0], signed(q)],
  ];
}

/** r and t of a stack on an isotropic substrate. */
export function solveByExponentials(stack: PlainStack): { r: Amplitudes; t: Amplitudes } {
  const theta = (stack.angleDeg * Math.PI) / 180;
  const n0: Complex = [stack.incidentIndex, 0];
  const xi = stack.incidentIndex * Math.sin(theta);
  const q0: Complex = [stack.incidentIndex * Math.cos(theta), 0];
  const root = formula('sqrt(n^2 - x^2)', { n: stack.substrateIndex, x: xi });
  const qs: Complex = root[1] < 0 || (root[1] === 0 && root[0] < 0) ? [-root[0], -root[1]] : root;
  let transfer = matrix([
    [1, 0, 0, 0],
    [0, 1, 0, 0],
    [0, 0, 1, 0],
    [0, 0, 0, 1],
  ]);
  for (const layer of stack.layers) {
    transfer = multiply(transfer, upward(layer, xi, (2 * Math.PI) / stack.wavelengthNm));
  }
  const inside = beams(stack.substrateIndex, qs, 1).map((beam) =>
    multiply(transfer, matrix(beam.map(([re, im]) => complex(re, im)))),
  );
  const element = (beam: Matrix, row: number): Complex => toPair(beam.get([row]));
  const back = beams(n0, q0, -1);
  // Unknowns r_p, r_s, t_p, t_s: incident + r = transfer t.
  const coefficients = [0, 1, 2, 3].map((row) => [
    ...back.map((beam) => beam[row] ?? [0, 0]),
    ...inside.map((beam) => {
      const [re, im] = element(beam, row);
      return [-re, -im] satisfies Complex;
    }),
  ]) as Complex[][];
  const [p, s] = beams(n0, q0, 1).map((beam) => solveReal(coefficients, beam)) as [Complex[], Complex[]];
  const at = (x: Complex[], i: number): Complex => x[i] ?? [NaN, NaN];
  return {
    r: { pp: at(p, 0), sp: at(p, 1), ps: at(s, 0), ss: at(s, 1) },
    t: { pp: at(p, 2), sp: at(p, 3), ps: at(s, 2), ss: at(s, 3) },
  };
}

/** Solves A x = -b for complex A and b as [Re A, -Im A; Im A, Re A] [Re x; Im x] = -[Re b; Im b]. */
function solveReal(a: Complex[][], b: Complex[]): Complex[] {
  const n = b.length;
  const upper = a.map((row) => [...row.map(([re]) => re), ...row.map(([, im]) => -im)]);
  const lower = a.map((row) => [...row.map(([, im]) => im), ...row.map(([re]) => re)]);
  const right = [...b.map(([re]) => -re), ...b.map(([, im]) => -im)];
  const x = solve(new RealMatrix([...upper, ...lower]), RealMatrix.columnVector(right));
  return Array.from({ length: n }, (_, i) => [x.get(i, 0), x.get(i + n, 0)]);
}
