import type { Complex, Vector } from '../../shared/complex.ts';
import { formula } from './formula.ts';

/** The tensors of the conventions page written out once more for the tests, element by element. */

/** eps_d times [[1, iQmz, -iQmy], [-iQmz, 1, iQmx], [iQmy, -iQmx, 1]]. */
export function gyrotropic(index: Complex, voigt: Complex, m: Vector): Complex[][] {
  const [x, y, z] = m;
  return [
    ['n^2', 'n^2 * i * q * z', '-n^2 * i * q * y'],
    ['-n^2 * i * q * z', 'n^2', 'n^2 * i * q * x'],
    ['n^2 * i * q * y', '-n^2 * i * q * x', 'n^2'],
  ].map((row) => row.map((element) => formula(element, { n: index, q: voigt, x, y, z })));
}

/** eps_o (1 - n n^T) + eps_e n n^T for the unit vector n along the axis. */
export function uniaxial(ordinary: Complex, extraordinary: Complex, axis: Vector): Complex[][] {
  const length = Math.hypot(...axis);
  return axis.map((a, i) =>
    axis.map((b, j) =>
      formula('o^2 * (d - w) + e^2 * w', {
        o: ordinary,
        e: extraordinary,
        d: i === j ? 1 : 0,
        w: (a * b) / length ** 2,
      }),
    ),
  );
}
