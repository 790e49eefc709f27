/** Points of one compiled stack, lists in step. */
export type PointBatch = {
  /** Position among the wavelengths of the case. */
  wavelengthIndex: Int32Array;
  anglesDeg: Float64Array;
  /** Of the swept layer, where there is one. */
  thicknessNm: Float64Array | null;
};

/** Room for a batch, so that a sweep of a million points makes no arrays of them. */
export class BatchRoom {
  readonly #wavelengthIndex: Int32Array;
  readonly #anglesDeg: Float64Array;
  readonly #thicknessNm: Float64Array;
  #count = 0;

  constructor(capacity: number) {
    this.#wavelengthIndex = new Int32Array(capacity);
    this.#anglesDeg = new Float64Array(capacity);
    this.#thicknessNm = new Float64Array(capacity);
  }

  get count(): number {
    return this.#count;
  }

  clear(): void {
    this.#count = 0;
  }

  add(wavelengthIndex: number, angleDeg: number, thicknessNm: number): void {
    this.#wavelengthIndex[this.#count] = wavelengthIndex;
    this.#anglesDeg[this.#count] = angleDeg;
    this.#thicknessNm[this.#count] = thicknessNm;
    this.#count += 1;
  }

  /** What was added since `clear`, as views. */
  batch(withThickness: boolean): PointBatch {
    return {
      wavelengthIndex: this.#wavelengthIndex.subarray(0, this.#count),
      anglesDeg: this.#anglesDeg.subarray(0, this.#count),
      thicknessNm: withThickness ? this.#thicknessNm.subarray(0, this.#count) : null,
    };
  }
}
