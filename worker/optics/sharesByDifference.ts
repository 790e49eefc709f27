import type { Complex } from '../../shared/complex.ts';
import type { SolveCase } from '../../shared/solve.ts';
import { minus, scaled } from './complexNumber.ts';
import type { Share } from './contributions.ts';
import { createMatrix2 } from './matrix2.ts';
import { StackSolver } from './stackSolver.ts';

/** Voigt constants are shrunk by this for the difference, which then is the first order to 1e-6 of itself. */
const SHRINK = 1e-3;

/**
 * The layer shares of a stack with anisotropic media, where closed forms end: for each magnetic layer half the
 * change of the reflected amplitudes when its shrunk gyration alone is turned round, grown back.
 */
export function sharesByDifference(
  solver: StackSolver,
  solveCase: SolveCase,
  wavelengthIndex: number,
  angleDeg: number,
): Share[] {
  const { stack } = solver;
  const probe = new StackSolver(solveCase, { ...solver.options, separateLayers: true });
  const kept = createMatrix2();
  const media = [...stack.sequence.map((layer) => layer.medium), stack.substrate];
  return media.map((medium, position): Share => {
    if (!medium.isGyrotropic) return { sp: [0, 0], ps: [0, 0], pp: [0, 0] };
    const amplitudes = (factor: number) => {
      probe.stack.isolateGyration(position, factor);
      return probe.solve(wavelengthIndex, angleDeg).r;
    };
    kept.set(amplitudes(SHRINK));
    const reversed = amplitudes(-SHRINK);
    const half = (i: number): Complex =>
      scaled(minus([kept[i]!, kept[i + 1]!], [reversed[i]!, reversed[i + 1]!]), 0.5 / SHRINK);
    return { sp: half(4), ps: half(2), pp: half(0) };
  });
}
