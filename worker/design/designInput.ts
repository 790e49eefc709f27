import type { DesignInput } from '../../shared/design.ts';
import type { ResolvableMaterial } from '../dispersion/resolveCase.ts';

/**
 * Everything that determines the outcome of a design question. Plain data: it crosses into worker threads as JSON.
 * Every medium that names a material names its version too, and `materials` holds all of them.
 */
export type DesignWork = { design: DesignInput; materials: ResolvableMaterial[] };

/** One piece of a design calculation for one thread. */
export type DesignStep =
  | { kind: 'cap bare' }
  | { kind: 'cap samples'; candidateId: string; from: number; to: number; samples: SharedArrayBuffer }
  | {
      kind: 'cap outcome';
      candidateId: string;
      samples: SharedArrayBuffer;
      bare: (number | null)[];
    }
  | { kind: 'tolerance samples'; from: number; to: number; samples: SharedArrayBuffer }
  | { kind: 'tolerance derivatives'; point: number; from: number; to: number }
  | { kind: 'tolerance outcome' | 'tolerance bands'; samples: SharedArrayBuffer }
  /** Thicknesses of the variables of each film. */
  | { kind: 'optimise films' | 'optimise readings'; nm: number[][] }
  | { kind: 'optimise start'; nm: number[] };

/** What a thread needs for one step; the buffers are shared, not copied. */
export type DesignTask = {
  designId: number;
  /** The DesignWork as JSON in UTF-8: read once in each thread. */
  work: SharedArrayBuffer;
  /** Int32: 0 done so far in the work's own unit, 1 whether it was cancelled. */
  flags: SharedArrayBuffer;
  step: DesignStep;
};
