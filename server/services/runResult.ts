import { QueryTypes } from 'sequelize';
import type { ReadingName } from '../../shared/run.ts';
import { axisValueCount, columnsOffset } from '../../shared/resultFormat.ts';
import { axesOf, pointCountOf } from '../../shared/runAxes.ts';
import { conflict, invalid } from '../errors.ts';
import { PIECE_BYTES } from '../jobs/resultPieces.ts';
import type { Models } from '../models/models.ts';
import type { SweepRun } from '../models/run.ts';

const BYTES_PER_VALUE = 8;
/** Enough for the preamble of the result format. */
const PREAMBLE_BYTES = 16;

/** The stored numbers of one run, read column by column and never as a whole. */
export class RunResult {
  readonly run: SweepRun;
  readonly #models: Models;
  readonly #columnsAt: number;

  private constructor(models: Models, run: SweepRun, columnsAt: number) {
    this.#models = models;
    this.run = run;
    this.#columnsAt = columnsAt;
  }

  /** @throws Refusal 409 while there are no numbers */
  static async open(models: Models, run: SweepRun): Promise<RunResult> {
    if (run.state !== 'done') throw conflict(`The run is ${run.state}: it has no numbers.`);
    const start = await readBytes(models, run.id, 0, PREAMBLE_BYTES);
    return new RunResult(models, run, columnsOffset(toArrayBuffer(start), Number.MAX_SAFE_INTEGER));
  }

  get pointCount(): number {
    return pointCountOf(this.run.input);
  }

  /** Float64 bytes of the values of all axes, one after the other. */
  readAxisBytes(): Promise<Buffer> {
    const length = axisValueCount(this.run.input) * BYTES_PER_VALUE;
    return readBytes(this.#models, this.run.id, this.#columnsAt, length);
  }

  /** The values of each axis, innermost first. */
  async readAxes(): Promise<Float64Array[]> {
    const bytes = toArrayBuffer(await this.readAxisBytes());
    let at = 0;
    return axesOf(this.run.input).map(({ axis }) => {
      const values = new Float64Array(bytes, at, axis.points);
      at += axis.points * BYTES_PER_VALUE;
      return values;
    });
  }

  /** Float64 bytes of a reading, from point `start` on. */
  async readBytes(reading: ReadingName, start: number, count: number): Promise<Buffer> {
    const { readings } = this.run.input;
    const before = axisValueCount(this.run.input) + readings.indexOf(reading) * this.pointCount + start;
    const offset = this.#columnsAt + before * BYTES_PER_VALUE;
    return readBytes(this.#models, this.run.id, offset, count * BYTES_PER_VALUE);
  }

  async readValues(reading: ReadingName, start: number, count: number): Promise<Float64Array> {
    return new Float64Array(toArrayBuffer(await this.readBytes(reading, start, count)));
  }
}

/**
 * The readings of a run to hand out, in the order asked.
 *
 * @throws Refusal 422 for one that this run does not store
 */
export function chooseReadings(run: SweepRun, wanted: ReadingName[] | undefined): ReadingName[] {
  const { readings } = run.input;
  const missing = (wanted ?? []).filter((name) => !readings.includes(name));
  if (missing.length > 0) {
    throw invalid([
      { path: 'readings', message: `this run has no ${missing.join(', ')}; it has ${readings.join(', ')}` },
    ]);
  }
  return wanted ?? readings;
}

/** A stretch of the result file; the database cuts it out of the stored pieces. */
async function readBytes(models: Models, runId: string, offset: number, length: number): Promise<Buffer> {
  const parts: Buffer[] = [];
  for (let at = offset; at < offset + length;) {
    const position = Math.floor(at / PIECE_BYTES);
    const within = at - position * PIECE_BYTES;
    const wanted = Math.min(offset + length - at, PIECE_BYTES - within);
    const [row] = await models.sequelize.query<{ bytes: Buffer }>(
      'SELECT substring(bytes FROM $3 FOR $4) AS bytes FROM run_chunks WHERE run_id = $1 AND position = $2',
      { type: QueryTypes.SELECT, bind: [runId, position, within + 1, wanted] },
    );
    if (row?.bytes.length !== wanted) {
      throw new Error(
        `Piece ${position} of run ${runId} is missing or shorter than ${within + wanted} bytes.`,
      );
    }
    parts.push(row.bytes);
    at += wanted;
  }
  return parts.length === 1 ? parts[0]! : Buffer.concat(parts);
}

/** A copy that starts on an 8-byte border, which a Buffer need not. */
function toArrayBuffer(bytes: Buffer): ArrayBuffer {
  return Uint8Array.from(bytes).buffer;
}
