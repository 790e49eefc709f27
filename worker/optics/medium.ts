import type { Complex, ComplexInput, Vector } from '../../shared/complex.ts';
import { toComplex } from '../../shared/complex.ts';
import type { MediumInput, MixtureInput, TensorInput } from '../../shared/medium.ts';
import { forwardRoot, minus, over, plus, scaled, times } from './complexNumber.ts';
import type { Geometry } from './geometry.ts';
import { bruggeman, maxwellGarnett } from './mixture.ts';
import type { Rotation } from './rotation.ts';
import { composed, eulerRotation, rotated, rotatedVector } from './rotation.ts';
import type { QuadraticConstants, Tensor } from './tensor.ts';
import {
  addGyration,
  addQuadratic,
  addUniaxial,
  createTensor,
  isMultipleOfIdentity,
  mirror,
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

/** One of two mixed media. */
type Part = { index: Sampled<Complex>; voigt: Sampled<Complex> | null; m: Vector };

/**
 * A medium of a solve case, ready to give its permittivity at one wavelength after another.
 *
 * `load` fills the public fields; they describe the last loaded wavelength.
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
  /** Q; 0 without magneto-optic data. */
  voigt: Complex = [0, 0];
  m: Vector;
  /** The part of the tensor that is odd in m counts this many times; for taking layers apart. */
  gyrationScale = 1;
  /** The tensor is mirrored in the film plane, as light from below sees it. */
  mirrored = false;

  readonly input: MediumInput;
  readonly #index: Sampled<Complex> | null;
  readonly #voigt: Sampled<Complex> | null;
  readonly #extraordinary: Sampled<Complex> | null;
  readonly #epsilon: Sampled<Tensor> | null;
  readonly #orientation: Rotation | null;
  readonly #parts: Part[] | null;

  /** @param input a medium that has passed `mediumSchema` */
  constructor(input: MediumInput) {
    this.input = input;
    this.#index = samplesOf(input.index, toComplex);
    this.#voigt = samplesOf(input.voigt, scaledVoigt(input));
    this.#extraordinary = samplesOf(input.extraordinary, toComplex);
    this.#epsilon = samplesOf(input.epsilon, tensorFrom);
    this.m = input.m ?? [0, 0, 0];
    this.#orientation = input.orientationDeg ? eulerRotation(input.orientationDeg) : null;
    this.#parts = input.mixture?.parts.map(partFrom) ?? null;
  }

  /** A medium that is this tensor, at whatever wavelength; the tensor is copied. */
  static fromTensor(tensor: Tensor): Medium {
    const medium = new Medium({ index: 1 });
    medium.#takeTensor(tensor);
    return medium;
  }

  /** The same constants with a state of their own. */
  copy(): Medium {
    return new Medium(this.input);
  }

  /** Some constant is given per wavelength. */
  get isSampled(): boolean {
    const own = [this.#index, this.#voigt, this.#extraordinary, this.#epsilon];
    const mixed = this.#parts?.flatMap((part) => [part.index, part.voigt]) ?? [];
    return [...own, ...mixed].some((samples) => (samples?.length ?? 0) > 1);
  }

  /** The tensor has a part that is odd in m. */
  get isGyrotropic(): boolean {
    if (this.#parts) return this.#parts.some(({ voigt, m }) => voigt !== null && isNonZero(m));
    return this.#epsilon !== null || (this.#voigt !== null && isNonZero(this.m));
  }

  load(wavelengthIndex: number): void {
    if (this.#epsilon) {
      const given = sampleAt(this.#epsilon, wavelengthIndex);
      const tensor = this.#orientation ? rotated(given, this.#orientation) : given.slice();
      if (this.gyrationScale !== 1) scaleAntisymmetricPart(tensor, this.gyrationScale);
      this.#takeTensor(tensor);
    } else if (this.#parts) {
      this.#mix(this.#parts, wavelengthIndex);
    } else {
      const voigt = this.#voigt ? sampleAt(this.#voigt, wavelengthIndex) : null;
      this.#takeIndex(sampleAt(this.#index ?? [], wavelengthIndex), voigt, wavelengthIndex);
    }
    if (this.mirrored) mirror(this.tensor);
    this.isotropic = isMultipleOfIdentity(this.tensor);
  }

  #takeTensor(tensor: Tensor): void {
    this.tensor.set(tensor);
    this.index = null;
    this.permittivity = null;
    this.scalarDiagonal = false;
    this.isotropic = isMultipleOfIdentity(tensor);
  }

  #takeIndex(index: Complex, voigt: Complex | null, wavelengthIndex: number): void {
    const { quadratic, axis } = this.input;
    const permittivity = times(index, index);
    setScalar(this.tensor, permittivity);
    this.index = index;
    this.permittivity = permittivity;
    this.scalarDiagonal = true;
    if (this.#extraordinary && axis) {
      const turned = this.#orientation ? rotatedVector(axis, this.#orientation) : axis;
      addUniaxial(this.tensor, index, sampleAt(this.#extraordinary, wavelengthIndex), turned);
      this.scalarDiagonal = false;
    }
    if (quadratic) {
      addQuadratic(this.tensor, quadraticFrom(quadratic, this.#orientation), this.m);
      this.scalarDiagonal = false;
    }
    if (voigt) {
      this.voigt = voigt;
      addGyration(this.tensor, permittivity, voigt, this.m, this.gyrationScale);
    }
  }

  /** Two parts: one Q and m where only one direction of m is at work, else the tensor. */
  #mix(parts: Part[], wavelengthIndex: number): void {
    const permittivities = parts.map(({ index }) => {
      const n = sampleAt(index, wavelengthIndex);
      return times(n, n);
    });
    const { model, fraction } = this.input.mixture!;
    const mix = model === 'bruggeman' ? bruggeman : maxwellGarnett;
    const mixed = mix(permittivities[0]!, permittivities[1]!, fraction);
    // Q eps of the mixture, part by part: the factor i is the same throughout.
    const strengths = parts.map(({ voigt }, i): Complex =>
      voigt ? times(mixed.weights[i]!, times(sampleAt(voigt, wavelengthIndex), permittivities[i]!)) : [0, 0],
    );
    const active = parts.filter(({ voigt, m }) => voigt !== null && isNonZero(m));
    const m = active[0]?.m ?? [0, 0, 0];
    const isOneDirection = active.every((part) => part.m.every((component, i) => component === m[i]));
    this.#takeIndex(forwardRoot(mixed.permittivity), null, wavelengthIndex);
    if (isOneDirection) {
      this.m = m;
      this.voigt = over(
        strengths.reduce(
          (sum, strength, i) => (active.includes(parts[i]!) ? plus(sum, strength) : sum),
          [0, 0],
        ),
        mixed.permittivity,
      );
      addGyration(this.tensor, mixed.permittivity, this.voigt, m, this.gyrationScale);
      return;
    }
    parts.forEach((part, i) => addGyration(this.tensor, [1, 0], strengths[i]!, part.m, this.gyrationScale));
    this.#takeTensor(this.tensor.slice());
  }

  /**
   * eps_yy - xi^2 (position 1) or eps_zz - xi^2 (position 2). Far from normal incidence it is written with
   * xi^2 = N0^2 - q0^2 as (N - N0)(N + N0) + q0^2, so that nothing cancels near grazing incidence in a layer that has
   * the index of the incident medium.
   */
  diagonalLessXi2(position: 1 | 2, { n0, xi, q0 }: Geometry): Complex {
    const i = 8 * position;
    if (xi < q0) return [this.tensor[i]! - xi * xi, this.tensor[i + 1]!];
    if (this.index && (this.scalarDiagonal || this.isotropic)) {
      const incident: Complex = [n0, 0];
      return plus(times(minus(this.index, incident), plus(this.index, incident)), [q0 * q0, 0]);
    }
    return [this.tensor[i]! - n0 * n0 + q0 * q0, this.tensor[i + 1]!];
  }
}

/** Q as it counts: times `voigtScale`. */
function scaledVoigt({ voigtScale = 1 }: Pick<MediumInput, 'voigtScale'>): (value: ComplexInput) => Complex {
  return (value) => scaled(toComplex(value), voigtScale);
}

function tensorFrom(rows: TensorInput): Tensor {
  return Float64Array.from(rows.flatMap((row) => row.flatMap((value) => toComplex(value))));
}

function partFrom(input: MixtureInput['parts'][0]): Part {
  return {
    index: samplesOf(input.index, toComplex) ?? [],
    voigt: samplesOf(input.voigt, scaledVoigt(input)),
    m: input.m ?? [0, 0, 0],
  };
}

function isNonZero(m: Vector): boolean {
  return m.some((component) => component !== 0);
}

function quadraticFrom(
  input: NonNullable<MediumInput['quadratic']>,
  orientation: Rotation | null,
): QuadraticConstants {
  const azimuth = eulerRotation([input.azimuthDeg ?? 0, 0, 0]);
  return {
    g11: toComplex(input.g11),
    g12: toComplex(input.g12),
    g44: toComplex(input.g44),
    crystal: orientation ? composed(orientation, azimuth) : azimuth,
  };
}
