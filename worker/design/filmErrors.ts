import type { Tolerance } from '../../shared/designPoint.ts';
import { materialKeyOf } from '../../shared/designPoint.ts';
import type { StackLayer, StackMedium } from '../../shared/stack.ts';
import type { ConstantFactors } from './frozenFilm.ts';
import { normalNumbers } from './randomErrors.ts';

/** One film as it might come out: factors on the thicknesses and constants of the one that was drawn. */
export type DrawnErrors = {
  /** By layer id. May be negative for wild errors: such a layer counts as absent. */
  thickness: ReadonlyMap<string, number>;
  /** By `materialKeyOf`; null when no constant is off. */
  constants: ReadonlyMap<string, ConstantFactors> | null;
};

type MaterialErrors = { key: string; rate: number; random: number; index: number; voigt: number };

/**
 * The errors of a tolerance, drawn for one film after the other. Numbers are drawn in a fixed order (rates of the
 * materials, random errors of the layers, constants), so a film with further layers at the end of the list keeps what
 * the others are: candidates are compared on the same films.
 */
export class FilmErrors {
  readonly #seed: number;
  readonly #layers: { id: string; material: MaterialErrors }[];
  readonly #materials: MaterialErrors[];
  /** In the order in which their constants are drawn. */
  readonly #scaled: MaterialErrors[];
  readonly #scalesConstants: boolean;

  /**
   * @param layers every layer that can be off by itself, in a lasting order
   * @param others media that are not layers, such as the substrate: only their constants can be off
   */
  constructor(tolerance: Tolerance, layers: readonly StackLayer[], others: readonly StackMedium[] = []) {
    const materials = new Map<string, MaterialErrors>();
    const errorsOf = (medium: StackMedium): MaterialErrors => {
      const key = materialKeyOf(medium);
      const known = materials.get(key);
      if (known) return known;
      const own = tolerance.materials.find(({ material }) => material === key);
      const errors = {
        key,
        rate: (own?.ratePercent ?? tolerance.ratePercent) / 100,
        random: (own?.randomPercent ?? tolerance.randomPercent) / 100,
        index: (own?.indexPercent ?? tolerance.indexPercent) / 100,
        voigt: (own?.voigtPercent ?? tolerance.voigtPercent) / 100,
      };
      materials.set(key, errors);
      return errors;
    };
    this.#seed = tolerance.seed;
    this.#layers = layers.map(({ id, medium }) => ({ id, material: errorsOf(medium) }));
    const beside = others.map(errorsOf);
    this.#materials = [...materials.values()];
    this.#scaled = [...new Set([...beside, ...this.#materials])];
    this.#scalesConstants = this.#materials.some(({ index, voigt }) => index > 0 || voigt > 0);
  }

  /** @param sample number of the film; the same number gives the same film */
  draw(sample: number): DrawnErrors {
    const next = [0, 1, 2].map((stream) => normalNumbers(this.#seed, 3 * sample + stream));
    const [nextRate, nextRandom, nextConstant] = [next[0]!, next[1]!, next[2]!];
    const rates = new Map(this.#materials.map(({ key, rate }) => [key, rate * nextRate()]));
    const thickness = new Map(
      this.#layers.map(({ id, material }) => [
        id,
        1 + rates.get(material.key)! + material.random * nextRandom(),
      ]),
    );
    if (!this.#scalesConstants) return { thickness, constants: null };
    const constants = new Map<string, ConstantFactors>(
      this.#scaled.map(({ key, index, voigt }) => {
        // A negative n or k means nothing; errors so large are cut off at a tenth.
        const n = Math.max(0.1, 1 + index * nextConstant());
        const k = Math.max(0.1, 1 + index * nextConstant());
        const q = 1 + voigt * nextConstant();
        return [key, { n, k, q: [q, q] }];
      }),
    );
    return { thickness, constants };
  }

  /** One standard deviation of a layer's thickness as a fraction of it. */
  relativeDeviation(layerId: string): number {
    const layer = this.#layers.find(({ id }) => id === layerId);
    return layer ? Math.hypot(layer.material.rate, layer.material.random) : 0;
  }
}
