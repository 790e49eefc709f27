/**
 * The memory that the threads of one sweep share with the host.
 *
 *     bytes 0..3    Int32: 1 once the sweep is cancelled (read before every point, or few thousand quick ones)
 *     bytes 4..7    Int32: points done
 *     bytes 8..15   unused, so that the columns stand on 8-byte borders
 *     bytes 16..    Float64 columns of `points` values each: the readings in the order asked
 *
 * Columns and not rows, because that is how results are stored, sent and drawn. Points stand in the order of
 * shared/runAxes.ts. A reading that does not exist at a point is NaN, and so is one that is not computed yet.
 */
const CANCELLED = 0;
const DONE = 1;
const COLUMNS_AT = 16;

export class SharedResult {
  readonly buffer: SharedArrayBuffer;
  readonly columns: Float64Array<SharedArrayBuffer>[];
  readonly #control: Int32Array<SharedArrayBuffer>;

  /** @param buffer made by `SharedResult.allocate` with the same counts */
  constructor(buffer: SharedArrayBuffer, points: number, readings: number) {
    const expected = SharedResult.#byteLength(points, readings);
    if (buffer.byteLength !== expected) {
      throw new RangeError(
        `A shared result of ${points} points and ${readings} readings has ${expected} bytes, got ${buffer.byteLength}.`,
      );
    }
    this.buffer = buffer;
    this.#control = new Int32Array(buffer, 0, 2);
    this.columns = Array.from(
      { length: readings },
      (_, column) => new Float64Array(buffer, COLUMNS_AT + column * points * 8, points),
    );
  }

  static allocate(points: number, readings: number): SharedResult {
    const buffer = new SharedArrayBuffer(SharedResult.#byteLength(points, readings));
    const result = new SharedResult(buffer, points, readings);
    for (const column of result.columns) column.fill(NaN);
    return result;
  }

  static #byteLength(points: number, readings: number): number {
    return COLUMNS_AT + readings * points * 8;
  }

  cancel(): void {
    Atomics.store(this.#control, CANCELLED, 1);
  }

  get cancelled(): boolean {
    return Atomics.load(this.#control, CANCELLED) === 1;
  }

  addDone(points: number): void {
    Atomics.add(this.#control, DONE, points);
  }

  get done(): number {
    return Atomics.load(this.#control, DONE);
  }
}
