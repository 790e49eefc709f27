import { describeResult, encodeResultHeader } from '../../shared/resultFormat.ts';
import { SOLVER_VERSION } from '../../worker/optics/version.ts';
import type { SweepResult } from '../../worker/sweep/runSweep.ts';
import type { SweepRun } from '../models/run.ts';

/** What one row of run_chunks holds at most. */
export const PIECE_BYTES = 4 * 1024 * 1024;

/** The result file of a run, cut into rows. The pieces are views of the shared columns wherever possible. */
export function* resultPieces(
  run: Pick<SweepRun, 'input' | 'inputSha256'>,
  result: SweepResult,
): Generator<Buffer> {
  const { readings } = run.input;
  const header = encodeResultHeader(
    describeResult(run.input, readings, { solverVersion: SOLVER_VERSION, inputSha256: run.inputSha256 }),
  );
  let waiting: Buffer[] = [Buffer.from(header)];
  let bytes = header.length;
  for (const column of [...result.axes, ...result.columns]) {
    const whole = Buffer.from(column.buffer, column.byteOffset, column.byteLength);
    for (let start = 0; start < whole.length;) {
      const part = whole.subarray(start, start + PIECE_BYTES - bytes);
      waiting.push(part);
      bytes += part.length;
      start += part.length;
      if (bytes === PIECE_BYTES) {
        yield joined(waiting);
        waiting = [];
        bytes = 0;
      }
    }
  }
  if (bytes > 0) yield joined(waiting);
}

/** Bytes cut into rows. */
export function* bytePieces(bytes: Buffer): Generator<Buffer> {
  for (let start = 0; start < bytes.length; start += PIECE_BYTES) {
    yield bytes.subarray(start, start + PIECE_BYTES);
  }
}

function joined(parts: Buffer[]): Buffer {
  return parts.length === 1 ? parts[0]! : Buffer.concat(parts);
}
