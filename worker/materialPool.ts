import type { Issue } from '../shared/error.ts';
import type { Material, MaterialContent } from '../shared/material.ts';
import type { ImportMapping, ImportTable } from '../shared/materialImport.ts';
import type { FitResult } from '../shared/materialFit.ts';
import type { LibrarySolveCase, SolveCase } from '../shared/solve.ts';
import type { ResolvableMaterial } from './dispersion/resolveCase.ts';
import type { FitInput } from './fit/fitMaterial.ts';
import type { ConvertedTable } from './import/convertTable.ts';
import type { ExportedMaterial } from './import/exportedMaterial.ts';
import { runLimited } from './runLimited.ts';
import type { Threads } from './sweep/threads.ts';

/** A formula that somebody wrote may take for ever at each of many wavelengths. */
const CONSTANTS_TIMEOUT_MS = 5_000;
const tooSlow =
  'The constants took longer than 5 s to evaluate: simplify the formula or ask fewer wavelengths.';

const FIT_TIMEOUT_MS = 60_000;
const fitTooSlow =
  'The fit took longer than 60 s: fit fewer points over a shorter range, or fix some parameters.';

/** Far more than the largest table needs. */
const TABLE_TIMEOUT_MS = 60_000;
const tableTooSlow =
  'The table took longer than 60 s to read: keep only the rows and columns that are needed.';
const PROGRESS_MS = 50;

type ReadOptions = {
  /** Called with a fraction that rises to 1. */
  onProgress?: (fraction: number) => void;
  signal?: AbortSignal;
};

/** What is done with constants in threads: nobody's formula and nobody's file may hold up the server's own. */
export type MaterialPool = {
  /**
   * Reads an uploaded file: as a table, and whole where Skewlight exported it.
   *
   * @throws ComputeError `refused` with what was found and the remedy, `cancelled`, `timeout` (60 s) or `crashed`
   */
  readTable(
    bytes: Uint8Array,
    options?: ReadOptions,
  ): Promise<{ table: ImportTable; exported: ExportedMaterial | null }>;
  /**
   * Constants in our convention from a file that was read before.
   *
   * @param indexOf the content of the material that `mapping.indexOf` names
   * @throws ComputeError `refused` with issues whose paths are those of the mapping; else as `readTable`
   */
  convertTable(
    bytes: Uint8Array,
    mapping: ImportMapping,
    indexOf: MaterialContent | null,
  ): Promise<ConvertedTable>;
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
  /**
   * Fits a model to a tabulated constant.
   *
   * @throws ComputeError `refused` with issues whose paths are those of the request, `cancelled`, `timeout` (60 s) or
   *   `crashed`
   */
  fit(input: FitInput, options?: { signal?: AbortSignal }): Promise<FitResult>;
};

/** @param small threads for what is quick; @param large threads that are shared with the sweeps */
export function materialPool({ small, large }: { small: Threads; large: Threads }): MaterialPool {
  const limits = { milliseconds: CONSTANTS_TIMEOUT_MS, message: tooSlow };
  const tableLimits = { milliseconds: TABLE_TIMEOUT_MS, message: tableTooSlow };
  return {
    async readTable(bytes, { onProgress, signal } = {}) {
      const progress = new Float64Array(new SharedArrayBuffer(8));
      const timer = onProgress && watch(progress, onProgress);
      try {
        return await runLimited(large, 'readTable', { bytes, progress }, { ...tableLimits, signal });
      } finally {
        clearInterval(timer);
        if (progress[0] === 1) onProgress?.(1);
      }
    },
    convertTable: (bytes, mapping, indexOf) =>
      runLimited(large, 'convertTable', { bytes, mapping, indexOf }, tableLimits),
    curves: (content) => runLimited(small, 'curves', content, limits),
    checkContent: (content) => runLimited(small, 'checkContent', content, limits),
    fit: (input, { signal } = {}) =>
      runLimited(large, 'fit', input, { milliseconds: FIT_TIMEOUT_MS, message: fitTooSlow, signal }),
    resolve: (cases, materials) => runLimited(small, 'resolve', { cases, materials }, limits),
  };
}

function watch(progress: Float64Array, onProgress: (fraction: number) => void): NodeJS.Timeout {
  let reported = 0;
  return setInterval(() => {
    const [fraction = 0] = progress;
    if (fraction === reported || fraction === 1) return;
    reported = fraction;
    onProgress(fraction);
  }, PROGRESS_MS);
}
