import type { Complex, Vector } from '../../shared/complex.ts';
import type { MediumInput } from '../../shared/medium.ts';
import type { LayerInput, SolveCase, StackItemInput } from '../../shared/solve.ts';

/** Random numbers that are the same in every run (mulberry32, public domain, T. Ettinger). */
export function randomNumbers(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

/** Stacks of scalar media over the range that films have, and well beyond. */
export class RandomStacks {
  readonly #next: () => number;

  constructor(seed: number) {
    this.#next = randomNumbers(seed);
  }

  between(min: number, max: number): number {
    return min + (max - min) * this.#next();
  }

  decades(min: number, max: number): number {
    return Math.exp(this.between(Math.log(min), Math.log(max)));
  }

  pick<Value>(values: readonly Value[]): Value {
    return values[Math.floor(this.#next() * values.length)]!;
  }

  magnetization(): Vector {
    const special = this.#next();
    if (special < 0.2)
      return this.pick<Vector>([
        [0, 0, 1],
        [0, 0, -1],
      ]);
    if (special < 0.3)
      return this.pick<Vector>([
        [1, 0, 0],
        [0, 1, 0],
      ]);
    const z = this.between(-1, 1);
    const azimuth = this.between(0, 2 * Math.PI);
    const length = this.between(0.1, 1);
    const plane = Math.sqrt(1 - z * z);
    return [length * plane * Math.cos(azimuth), length * plane * Math.sin(azimuth), length * z];
  }

  metal(): Complex {
    return [this.between(0.05, 4), this.between(0.5, 6)];
  }

  /** Q of any size from 1e-15 to 0.3, in any phase. */
  voigt(): Complex {
    const size = this.pick([this.decades(1e-15, 0.3), this.decades(1e-3, 0.1)]);
    const phase = this.between(0, 2 * Math.PI);
    return [size * Math.cos(phase), size * Math.sin(phase)];
  }

  medium(): MediumInput {
    const kind = this.#next();
    if (kind < 0.25) return { index: this.between(1, 3.5) };
    if (kind < 0.5) return { index: this.metal() };
    if (kind < 0.9) return { index: this.metal(), voigt: this.voigt(), m: this.magnetization() };
    return { index: this.between(1.5, 2.5), voigt: [this.decades(1e-6, 0.05), 0], m: this.magnetization() };
  }

  layer(): LayerInput {
    const thicknessNm = this.pick([
      this.decades(0.1, 10),
      this.decades(0.1, 10),
      this.decades(10, 300),
      this.decades(300, 3_000),
    ]);
    return { ...this.medium(), thicknessNm };
  }

  items(): StackItemInput[] {
    const items: StackItemInput[] = Array.from({ length: Math.floor(this.between(0, 6)) }, () =>
      this.layer(),
    );
    if (this.#next() < 0.3) {
      const layers = Array.from({ length: this.pick([1, 2, 2, 3]) }, () => ({
        ...this.medium(),
        thicknessNm: this.decades(0.2, 3),
      }));
      items.splice(Math.floor(this.between(0, items.length)), 0, {
        repeat: Math.floor(this.decades(1, 40)),
        layers,
      });
    }
    return items;
  }

  /** @param anglesDeg of the case; random ones are added */
  solveCase(anglesDeg: number[] = []): SolveCase {
    const angles = Array.from({ length: 3 }, () => this.between(0, 89.9));
    return {
      wavelengthNm: this.between(300, 1600),
      angleDeg: [...anglesDeg, ...angles],
      incident: { index: this.pick([1, 1, 1.33, 1.515, 2.5]) },
      layers: this.items(),
      substrate: this.medium(),
    };
  }
}
