import type { DesignResult } from '../../shared/design.ts';
import type { ResolvableMaterial } from '../../worker/dispersion/resolveCase.ts';
import type { ComputePool } from '../../worker/pool.ts';
import type { PartialResult } from '../../worker/sweep/runSweep.ts';
import type { Run } from '../models/run.ts';
import { isDesignRun, isSweepRun } from '../models/run.ts';
import { designBytes } from './designBytes.ts';
import { bytePieces, resultPieces } from './resultPieces.ts';

/** What a host is told while it computes. */
export type ComputeWatch = {
  signal: AbortSignal;
  onProgress: (done: number, total: number) => void;
  /** The numbers of a sweep as they come in, once. */
  onStart: (soFar: PartialResult) => void;
  /** What a design question has found so far, over and over. */
  onPartial: (soFar: DesignResult) => void;
};

/** What is stored of a calculation that came to its end. */
export type ComputedRun = { seconds: number; bytes: number; pieces: () => Iterable<Buffer> };

/**
 * Computes a sweep or answers a design question.
 *
 * @throws ComputeError of the pool
 */
export async function computeRun(
  pool: Pick<ComputePool, 'sweep' | 'design'>,
  run: Run,
  materials: ResolvableMaterial[],
  { onPartial, onStart, ...watch }: ComputeWatch,
): Promise<ComputedRun> {
  if (isDesignRun(run)) {
    const { design } = run.input;
    const { result, seconds } = await pool.design({ design, materials }, { ...watch, onPartial });
    const bytes = designBytes(result);
    return { seconds, bytes: bytes.length, pieces: () => bytePieces(bytes) };
  }
  if (!isSweepRun(run)) throw new Error('Nobody knows how to compute this kind of run.');
  const result = await pool.sweep({ ...run.input, materials }, { ...watch, onStart });
  return {
    seconds: result.seconds,
    bytes: 8 * result.points * result.columns.length,
    pieces: () => resultPieces(run, result),
  };
}
