import { toComplex } from '../../../shared/complex.ts';
import type { ComplexInput, Vector } from '../../../shared/complex.ts';
import type { MediumInput } from '../../../shared/medium.ts';
import { forwardRoot, times } from '../complexNumber.ts';

/**
 * How fast waves turn and fade in a medium, per nm, over all wavelengths of a case and all angles. Bounds, not values:
 * they choose series lengths and steps.
 */
export type MediumPace = {
  /** At most this many radians (or e-foldings) per nm, of either wave. */
  turn: number;
  /** Amplitudes fade at most and at least by so many e-foldings per nm. */
  fadeMost: number;
  fadeLeast: number;
};

/** A medium of scalar eps_d: `samples` holds N and Q (four doubles) per wavelength, or once for all. */
export class FastMedium {
  readonly samples: Float64Array;
  readonly m: Vector;
  readonly gyrotropic: boolean;
  /** mx mz = 0: the quartic has no linear term. */
  readonly even: boolean;
  readonly pace: MediumPace;

  /** True for a medium of scalar eps_d, with or without Q and m. */
  static canTake(input: MediumInput): boolean {
    return (
      input.index !== undefined &&
      input.epsilon === undefined &&
      input.extraordinary === undefined &&
      input.quadratic === undefined
    );
  }

  /**
   * @param input a medium that `canTake` accepts
   * @param wavelengthsNm of the case
   * @param incidentIndex N0 per wavelength, or once
   */
  constructor(input: MediumInput, wavelengthsNm: Float64Array, incidentIndex: Float64Array) {
    this.m = input.m ?? [0, 0, 0];
    const index = samplesOf(input.index ?? 1);
    const voigt = samplesOf(input.voigt ?? 0);
    const { voigtScale = 1 } = input;
    const count = Math.max(index.length, voigt.length);
    this.samples = new Float64Array(4 * count);
    for (let i = 0; i < count; i++) {
      this.samples.set(toComplex(index[index.length === 1 ? 0 : i]!), 4 * i);
      const [re, im] = toComplex(voigt[voigt.length === 1 ? 0 : i]!);
      this.samples.set([re * voigtScale, im * voigtScale], 4 * i + 2);
    }
    this.gyrotropic = this.m.some((part) => part !== 0) && this.samples.some((q, i) => i % 4 > 1 && q !== 0);
    this.even = this.m[0] * this.m[2] === 0;
    this.pace = this.#pace(wavelengthsNm, incidentIndex);
  }

  /** Offset of a wavelength's four doubles in `samples`. */
  offset(wavelengthIndex: number): number {
    return this.samples.length === 4 ? 0 : 4 * wavelengthIndex;
  }

  #pace(wavelengthsNm: Float64Array, incidentIndex: Float64Array): MediumPace {
    const pace = { turn: 0, fadeMost: 0, fadeLeast: Infinity };
    const strength = this.gyrotropic ? Math.hypot(...this.m) : 0;
    for (const [i, wavelengthNm] of wavelengthsNm.entries()) {
      const k0 = (2 * Math.PI) / wavelengthNm;
      const at = this.offset(i);
      const s = this.samples;
      const [re, im] = times([s[at]!, s[at + 1]!], [s[at]!, s[at + 1]!]);
      const n0 = incidentIndex[incidentIndex.length === 1 ? 0 : i]!;
      // eps - xi^2 lies between eps and eps - N0^2; Q moves u by no more than about |Q| |N| |m|.
      const largest = Math.max(Math.hypot(re, im), Math.hypot(re - n0 * n0, im));
      const shift = strength * Math.hypot(s[at + 2]!, s[at + 3]!) * Math.hypot(s[at]!, s[at + 1]!);
      const turn = Math.sqrt(largest + (this.gyrotropic ? n0 * n0 : 0)) + shift;
      pace.turn = Math.max(pace.turn, k0 * turn);
      // Im sqrt(eps - xi^2) grows with xi.
      const most = Math.abs(forwardRoot([re - n0 * n0, im])[1]) + shift;
      pace.fadeMost = Math.max(pace.fadeMost, k0 * most);
      pace.fadeLeast = Math.min(pace.fadeLeast, k0 * Math.max(0, s[at + 1]! - shift));
    }
    return pace;
  }
}

function samplesOf(input: ComplexInput | { samples: ComplexInput[] }): ComplexInput[] {
  return typeof input === 'object' && 'samples' in input ? input.samples : [input];
}
