import type { Issue } from '../shared/error.ts';
import type { Material, MaterialContent } from '../shared/material.ts';
import type { LibrarySolveCase, SolveCase } from '../shared/solve.ts';
import type { ResolvableMaterial } from './dispersion/resolveCase.ts';
import { runLimited } from './runLimited.ts';
import type { Threads } from './sweep/threads.ts';

/** A formula that somebody wrote may take for ever at each of many wavelengths. */
const CONSTANTS_TIMEOUT_MS = 5_000;
const tooSlow =
  'The constants took longer than 5 s to evaluate: simplify the formula or ask fewer wavelengths.';

/** What is done with constants in threads: nobody's formula and nobody's file may hold up the server's own. */
export type MaterialPool = {
  /**
   * Curves for the plot of a material.
   *
   * @throws ComputeError `refused`, `timeout` (5 s) or `crashed`
   */
  curves(content: MaterialContent): Promise<Material['curves']>;
  /** What the schema of a material cannot say; empty when all is well. Throws as `curves`. */
  checkContent(content: MaterialContent): Promise<Issue[]>;
  /**
   * Cases with numbers in place of library ids.
   *
   * @param materials by `${id}@${version}`
   * @throws ComputeError `refused` with issues such as `cases[0].layers[1].material`; else as `curves`
   */
  resolve(
    cases: LibrarySolveCase[],
    materials: ReadonlyMap<string, ResolvableMaterial>,
  ): Promise<SolveCase[]>;
};

/** @param small threads for what is quick; @param large threads that are shared with the sweeps */
export function materialPool({ small }: { small: Threads; large: Threads }): MaterialPool {
  const limits = { milliseconds: CONSTANTS_TIMEOUT_MS, message: tooSlow };
  return {
    curves: (content) => runLimited(small, 'curves', content, limits),
    checkContent: (content) => runLimited(small, 'checkContent', content, limits),
    resolve: (cases, materials) => runLimited(small, 'resolve', { cases, materials }, limits),
  };
}
