import type { ReadingSource } from '../../shared/readings.ts';
import type { SolvedPoint } from '../optics/stackSolver.ts';

/** Index of the real part in `r` (pp, ps, sp, ss as re, im). */
const PS = 2;
const SP = 4;

/** Below this amplitude of r_pp or r_ss the stack at m = 0 may reflect nothing at all, and has no polarization. */
const WEAK_AMPLITUDE = 0.1;

/**
 * One solved point as `shared/readings.ts` reads it. One object serves a whole sweep: a million points must not
 * make millions of objects.
 */
export class SolvedReadings implements ReadingSource {
  readonly r: NonNullable<ReadingSource['r']> = { sp: [0, 0], ps: [0, 0] };
  R: ReadingSource['R'] = { p: 0, s: 0 };
  T: ReadingSource['T'] = { p: 0, s: 0 };
  A: ReadingSource['A'] = { p: 0, s: 0 };
  kerr: ReadingSource['kerr'] = { p: null, s: null };

  /** Refers to the point, which the solver overwrites at the next one. */
  take(point: SolvedPoint): this {
    this.r.sp[0] = point.r[SP]!;
    this.r.sp[1] = point.r[SP + 1]!;
    this.r.ps[0] = point.r[PS]!;
    this.r.ps[1] = point.r[PS + 1]!;
    this.R = point.R;
    this.T = point.T;
    this.A = point.A;
    this.kerr = point.kerr;
    return this;
  }
}

/** What a stack that cannot turn p or s light shows at m = 0, as far as the Kerr angles use it. */
export const unturned: ReadingSource = {
  r: { sp: [0, 0], ps: [0, 0] },
  R: { p: 0, s: 0 },
  T: { p: 0, s: 0 },
  A: { p: 0, s: 0 },
  kerr: { p: { rotationDeg: 0, ellipticityDeg: 0 }, s: { rotationDeg: 0, ellipticityDeg: 0 } },
};

export function reflectsWeakly(point: SolvedPoint): boolean {
  const { r } = point;
  return Math.min(Math.hypot(r[0]!, r[1]!), Math.hypot(r[6]!, r[7]!)) < WEAK_AMPLITUDE;
}
