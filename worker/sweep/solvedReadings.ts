import { outputFor } from '../../shared/readings.ts';
import type { ReadingSource } from '../../shared/readings.ts';
import type { ReadingName } from '../../shared/run.ts';
import { baseFields, hasScalarDiagonals } from '../optics/baseFields.ts';
import type { CompiledStack } from '../optics/compiledStack.ts';
import { ceiling } from '../optics/contributions.ts';
import { muellerOf } from '../optics/mueller.ts';
import type { Jones } from '../optics/observables.ts';
import { kerrAngles } from '../optics/observables.ts';
import type { SolvedPoint } from '../optics/stackSolver.ts';

/** Index of the real part in `r` and `t` (pp, ps, sp, ss as re, im). */
const PS = 2;
const SP = 4;
const SS = 6;

/** Below this amplitude of r_pp or r_ss the stack at m = 0 may reflect nothing at all, and has no polarization. */
const WEAK_REFLECTION = 0.1;
/** ... and of t_pp or t_ss: behind a thick metal only the last digits tell a beam from none. */
const WEAK_TRANSMISSION = 1e-10;

/** What the readings of a sweep need of a point beside r, R and the Kerr angles. */
export type PartsNeeded = { faraday: boolean; ceiling: boolean; mueller: boolean; transmission: boolean };

export function partsNeeded(readings: readonly ReadingName[]): PartsNeeded {
  const outputs = new Set(readings.map(outputFor));
  return {
    faraday: outputs.has('faraday'),
    ceiling: outputs.has('ceiling'),
    mueller: outputs.has('mueller'),
    transmission: readings.some((name) => /^(transmittance|absorptance|faraday)/.test(name)),
  };
}

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
  faraday: ReadingSource['faraday'];
  mueller: ReadingSource['mueller'];
  ceiling: ReadingSource['ceiling'];
  readonly #parts: PartsNeeded;

  constructor(parts: PartsNeeded) {
    this.#parts = parts;
  }

  /** Refers to the point, which the solver overwrites at the next one. */
  take(point: SolvedPoint): this {
    this.R = point.R;
    this.T = point.T;
    this.A = point.A;
    this.kerr = point.kerr;
    this.takeAmplitudes(point.r, point.t);
    return this;
  }

  takeAmplitudes(r: Jones, t: Jones | null): void {
    this.r.sp[0] = r[SP]!;
    this.r.sp[1] = r[SP + 1]!;
    this.r.ps[0] = r[PS]!;
    this.r.ps[1] = r[PS + 1]!;
    if (this.#parts.faraday) this.faraday = t && { p: kerrAngles(t, 'p'), s: kerrAngles(t, 's') };
    if (this.#parts.mueller) {
      const mueller = muellerOf(r);
      this.mueller = [0, 4, 8, 12].map((start) => [...mueller.subarray(start, start + 4)]);
    }
  }

  /** @param stack the case that was solved, in the given state */
  takeCeiling(stack: CompiledStack, wavelengthIndex: number, angleDeg: number): void {
    if (!this.#parts.ceiling) return;
    stack.load(wavelengthIndex);
    const bound = hasScalarDiagonals(stack)
      ? ceiling(baseFields(stack, wavelengthIndex, angleDeg))
      : { stack: null, material: null };
    const { material } = bound;
    this.ceiling = { ...bound, shareReached: material === null ? null : Math.hypot(...this.r.sp) / material };
  }
}

const straight = { rotationDeg: 0, ellipticityDeg: 0 };

/** What a stack that cannot turn p or s light shows at m = 0, as far as the angles use it. */
export const unturned: ReadingSource = {
  r: { sp: [0, 0], ps: [0, 0] },
  R: { p: 0, s: 0 },
  T: { p: 0, s: 0 },
  A: { p: 0, s: 0 },
  kerr: { p: straight, s: straight },
  faraday: { p: straight, s: straight },
};

/** Whether the beams of a point are so weak that the stack at m = 0 may have none. */
export function isWeak(r: Jones, t: Jones | null, { faraday }: PartsNeeded): boolean {
  if (weakest(r) < WEAK_REFLECTION) return true;
  return faraday && t !== null && weakest(t) < WEAK_TRANSMISSION;
}

function weakest(jones: Jones): number {
  const pp = jones[0]! ** 2 + jones[1]! ** 2;
  const ss = jones[SS]! ** 2 + jones[SS + 1]! ** 2;
  return Math.sqrt(Math.min(pp, ss));
}
