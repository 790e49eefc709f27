import type { Complex, ComplexInput, Vector } from '../../shared/complex.ts';
import { toComplex } from '../../shared/complex.ts';
import type { MediumInput, TensorInput } from '../../shared/medium.ts';
import { minus, plus, times } from './complexNumber.ts';
import type { Geometry } from './geometry.ts';
import type { QuadraticConstants, Tensor } from './tensor.ts';
import {
  addGyration,
  addQuadratic,
  addUniaxial,
  createTensor,
  isMultipleOfIdentity,
  scaleAntisymmetricPart,
  setScalar,
} from './tensor.ts';

/** One value for all wavelengths, or one per wavelength. */
type Sampled<Value> = Value[];

export function samplesOf<Input, Value>(
  input: Input | { samples: Input[] } | undefined,
  convert: (value: Input) => Value,
): Sampled<Value> | null {
  if (input === undefined) return null;
  if (typeof input === 'object' && input !== null && 'samples' in input) return input.samples.map(convert);
  return [convert(input)];
}

export function sampleAt<Value>(samples: Sampled<Value>, wavelengthIndex: number): Value {
  return samples.length === 1 ? samples[0]! : samples[wavelengthIndex]!;
}

/**
 * A medium of a solve case, ready to give its permittivity at one wavelength after another.
 *
 * `load` fills `tensor` and the flags; they describe the last loaded wavelength.
 */
export class Medium {
  readonly tensor: Tensor = createTensor();
  /** The tensor is a multiple of the unit tensor. */
  isotropic = true;
  /** All diagonal elements are eps_d and the rest is the gyration of Q m: the weak magnet of most stacks. */
  scalarDiagonal = true;
  /** N where the diagonal is scalar; null for a medium given as a tensor. */
  index: Complex | null = null;

  /** N^2, the part of the diagonal that Q multiplies; null for a medium given as a tensor. */
  permittivity: Complex | null = null;
  /** Q at the loaded wavelength; 0 without magneto-optic data. */
  voigt: Complex = [0, 0];
  readonly m: Vector;
  /** The part of the tensor that is odd in m counts this many times; for taking layers apart. */
  gyrationScale = 1;

  readonly #input: MediumInput;
  readonly #index: Sampled<Complex> | null;
  readonly #voigt: Sampled<Complex> | null;
  readonly #extraordinary: Sampled<Complex> | null;
  readonly #epsilon: Sampled<Tensor> | null;
  readonly #axis: Vector | null;
  readonly #quadratic: QuadraticConstants | null;

  /** @param input a medium that has passed `mediumSchema` */
  constructor(input: MediumInput) {
    this.#input = input;
    this.#index = samplesOf(input.index, toComplex);
    this.#voigt = samplesOf(input.voigt, toComplex);
    this.#extraordinary = samplesOf(input.extraordinary, toComplex);
    this.#epsilon = samplesOf(input.epsilon, tensorFrom);
    this.m = input.m ?? [0, 0, 0];
    this.#axis = input.axis ?? null;
    this.#quadratic = input.quadratic ? quadraticFrom(input.quadratic) : null;
  }

  /** A medium that is this tensor, at whatever wavelength; the tensor is copied. */
  static fromTensor(tensor: Tensor): Medium {
    const medium = new Medium({ index: 1 });
    medium.tensor.set(tensor);
    medium.index = null;
    medium.scalarDiagonal = false;
    medium.isotropic = isMultipleOfIdentity(tensor);
    return medium;
  }

  /** The same constants with a state of their own. */
  copy(): Medium {
    return new Medium(this.#input);
  }

  /** Some constant is given per wavelength. */
  get isSampled(): boolean {
    return [this.#index, this.#voigt, this.#extraordinary, this.#epsilon].some(
      (samples) => (samples?.length ?? 0) > 1,
    );
  }

  /** The tensor has a part that is odd in m. */
  get isGyrotropic(): boolean {
    return this.#epsilon !== null || (this.#voigt !== null && this.m.some((component) => component !== 0));
  }

  load(wavelengthIndex: number): void {
    if (this.#epsilon) {
      this.tensor.set(sampleAt(this.#epsilon, wavelengthIndex));
      if (this.gyrationScale !== 1) scaleAntisymmetricPart(this.tensor, this.gyrationScale);
      this.index = null;
      this.scalarDiagonal = false;
      this.isotropic = isMultipleOfIdentity(this.tensor);
      return;
    }
    const index = sampleAt(this.#index ?? [], wavelengthIndex);
    const permittivity = times(index, index);
    setScalar(this.tensor, permittivity);
    this.index = index;
    this.permittivity = permittivity;
    this.scalarDiagonal = true;
    if (this.#extraordinary && this.#axis) {
      const extraordinary = sampleAt(this.#extraordinary, wavelengthIndex);
      addUniaxial(this.tensor, index, extraordinary, this.#axis);
      this.scalarDiagonal = false;
    }
    if (this.#quadratic) {
      addQuadratic(this.tensor, this.#quadratic, this.m);
      this.scalarDiagonal = false;
    }
    if (this.#voigt) {
      this.voigt = sampleAt(this.#voigt, wavelengthIndex);
      addGyration(this.tensor, permittivity, this.voigt, this.m, this.gyrationScale);
    }
    this.isotropic = isMultipleOfIdentity(this.tensor);
  }

  /**
   * eps_yy - xi^2. Far from normal incidence it is written with xi^2 = N0^2 - q0^2 as (N - N0)(N + N0) + q0^2, so
   * that nothing cancels near grazing incidence in a layer that has the index of the incident medium.
   */
  yyLessXi2({ n0, xi, q0 }: Geometry): Complex {
    if (xi < q0) return [this.tensor[8]! - xi * xi, this.tensor[9]!];
    if (this.index && (this.scalarDiagonal || this.isotropic)) {
      const incident: Complex = [n0, 0];
      return plus(times(minus(this.index, incident), plus(this.index, incident)), [q0 * q0, 0]);
    }
    return [this.tensor[8]! - n0 * n0 + q0 * q0, this.tensor[9]!];
  }
}

function tensorFrom(rows: TensorInput): Tensor {
  return Float64Array.from(rows.flatMap((row) => row.flatMap((value) => toComplex(value))));
}

function quadraticFrom(input: NonNullable<MediumInput['quadratic']>): QuadraticConstants {
  const complex = (value: ComplexInput) => toComplex(value);
  return {
    g11: complex(input.g11),
    g12: complex(input.g12),
    g44: complex(input.g44),
    azimuthDeg: input.azimuthDeg ?? 0,
  };
}
