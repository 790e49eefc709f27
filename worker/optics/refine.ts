import type { SolveCase } from '../../shared/solve.ts';
import { forEachMedium } from '../../shared/solveRules.ts';
import { StackSolver } from './stackSolver.ts';

/** Slices per graded interface, and how much any amplitude still changed when they were doubled. */
export type Refinement = { slices: number; change: number };

/** An amplitude may change by this when slices are doubled. */
const TOLERANCE = 1e-6;
const MOST_SLICES = 256;

/** True when some interface is graded. */
export function isGraded(solveCase: SolveCase): boolean {
  let found = false;
  forEachMedium(solveCase, (medium) => {
    if ('gradedNm' in medium && Number(medium.gradedNm) > 0) found = true;
  });
  return found;
}

/**
 * How many slices the graded interfaces of a case need: doubled until no reflected amplitude changes by more than
 * 1e-6 at the first and last wavelength and angle.
 */
export function refineInterfaces(solveCase: SolveCase): Refinement | null {
  if (!isGraded(solveCase)) return null;
  let slices = 4;
  let before = probe(solveCase, slices);
  for (;;) {
    const after = probe(solveCase, 2 * slices);
    slices *= 2;
    const change = after.reduce((most, value, i) => Math.max(most, Math.abs(value - before[i]!)), 0);
    if (change <= TOLERANCE || slices >= MOST_SLICES) return { slices, change };
    before = after;
  }
}

function probe(solveCase: SolveCase, slices: number): number[] {
  const solver = new StackSolver(solveCase, { slices });
  const { wavelengthsNm, anglesDeg } = solver;
  const ends = (count: number) => (count > 1 ? [0, count - 1] : [0]);
  return ends(wavelengthsNm.length).flatMap((index) =>
    ends(anglesDeg.length).flatMap((angle) => [...solver.solve(index, anglesDeg[angle]!).r]),
  );
}
