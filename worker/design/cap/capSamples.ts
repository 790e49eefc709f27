import { quantileOf, ONE_SIGMA } from '../quantiles.ts';
import type { CapCurves } from './capCurves.ts';

/** Quantiles of the signal at each thickness, for one working point; null where the signal never exists. */
export type Band = { low: (number | null)[]; median: (number | null)[]; high: (number | null)[] };

/**
 * The samples of one candidate in one shared buffer, filled by all threads:
 *
 *     Float64 signals   index ((point * thicknesses) + thickness) * samples + sample, NaN where there is no signal
 *     Uint8   met       index (point * thicknesses + thickness) * samples + sample, 1 where the demands are met there
 */
export class CapSamples {
  readonly buffer: SharedArrayBuffer;
  readonly #signals: Float64Array<SharedArrayBuffer>;
  readonly #met: Uint8Array<SharedArrayBuffer>;
  readonly #points: number;
  readonly #thicknesses: number;
  readonly #samples: number;

  constructor(size: { points: number; thicknesses: number; samples: number }, buffer?: SharedArrayBuffer) {
    const count = size.points * size.thicknesses * size.samples;
    this.buffer = buffer ?? new SharedArrayBuffer(9 * count);
    this.#signals = new Float64Array(this.buffer, 0, count);
    this.#met = new Uint8Array(this.buffer, 8 * count, count);
    this.#points = size.points;
    this.#thicknesses = size.thicknesses;
    this.#samples = size.samples;
  }

  #place(point: number, thickness: number): number {
    return (point * this.#thicknesses + thickness) * this.#samples;
  }

  /** Solves one sample. */
  fill(sample: number, nm: readonly number[], curves: CapCurves): void {
    curves.sample(sample, nm, (point, thickness, signal, isMet) => {
      const at = this.#place(point, thickness) + sample;
      this.#signals[at] = signal;
      this.#met[at] = isMet ? 1 : 0;
    });
  }

  /** Share of the samples that meet all demands at all working points, by thickness. */
  yields(): number[] {
    return Array.from({ length: this.#thicknesses }, (_, thickness) => {
      let met = 0;
      for (let sample = 0; sample < this.#samples; sample += 1) {
        let isMet = 1;
        for (let point = 0; point < this.#points; point += 1) {
          isMet &= this.#met[this.#place(point, thickness) + sample]!;
        }
        met += isMet;
      }
      return met / this.#samples;
    });
  }

  band(point: number): Band {
    const band: Band = { low: [], median: [], high: [] };
    for (let thickness = 0; thickness < this.#thicknesses; thickness += 1) {
      const start = this.#place(point, thickness);
      // A copy, because sort works in place; NaN comes last and is left out.
      const sorted = Float64Array.from(this.#signals.subarray(start, start + this.#samples)).sort();
      const count = sorted.findLastIndex((value) => !Number.isNaN(value)) + 1;
      const known = sorted.subarray(0, count);
      band.low.push(count === 0 ? null : quantileOf(known, ONE_SIGMA.low));
      band.median.push(count === 0 ? null : quantileOf(known, 0.5));
      band.high.push(count === 0 ? null : quantileOf(known, ONE_SIGMA.high));
    }
    return band;
  }
}
