import type { Complex } from '../../shared/complex.ts';
import type { Anisotropy } from '../../shared/dispersion.ts';
import type { MaterialContent } from '../../shared/material.ts';
import type { LibraryMediumInput, MediumInput } from '../../shared/medium.ts';
import { DispersionValueError } from './opticalValue.ts';
import { DispersionRangeError, isSameWavelength } from './range.ts';
import { sampleIndex, sampleVoigt } from './sample.ts';
import { inTensorState, sampleTensor } from './tensorTable.ts';

/** The keys of a medium that a material gives. */
export type MaterialConstants = Pick<
  MediumInput,
  'index' | 'voigt' | 'extraordinary' | 'axis' | 'quadratic' | 'epsilon'
>;

export type MaterialUse = Pick<LibraryMediumInput, 'tensorState'> & {
  assumeConstant: boolean;
  /** m is there and not zero: without it Q and the second order are left out, and their ranges do not bind. */
  magnetized: boolean;
};

/**
 * The constants of a material at one wavelength, or one sample per wavelength of a list.
 *
 * @param name what a message calls the material
 * @param messages takes everything that keeps the material from being used at these wavelengths
 */
export function materialConstants(
  name: string,
  { index, voigt, anisotropy }: MaterialContent,
  wavelengthNm: number | number[],
  { assumeConstant, magnetized, tensorState }: MaterialUse,
  messages: string[],
): MaterialConstants {
  const wavelengthsNm = [wavelengthNm].flat();
  const options = { assumeConstant };
  const asInput = <Value>(values: Value[]) =>
    typeof wavelengthNm === 'number' ? values[0]! : { samples: values };
  const constants: MaterialConstants = {};

  collect(messages, () => {
    if (index.kind === 'tensor') {
      const tensors = sampleTensor(name, index, wavelengthsNm, options);
      constants.epsilon = asInput(tensors.map((tensor) => inTensorState(tensor, tensorState)));
    } else {
      const { n, k } = sampleIndex(name, index, wavelengthsNm, options);
      constants.index = asInput(pairs(n, k));
    }
  });
  if (anisotropy?.kind === 'uniaxial') {
    collect(messages, () => {
      const subject = `the extraordinary index of ${name}`;
      const { n, k } = sampleIndex(subject, anisotropy.extraordinary, wavelengthsNm, options);
      constants.extraordinary = asInput(pairs(n, k));
      constants.axis = anisotropy.axis;
    });
  }
  if (!magnetized) return constants;
  if (anisotropy?.kind === 'cubic') {
    collect(messages, () => {
      constants.quadratic = quadraticOf(name, anisotropy, wavelengthsNm, assumeConstant);
    });
  }
  if (voigt !== null) {
    collect(messages, () => {
      const { re, im } = sampleVoigt(name, { index, voigt }, wavelengthsNm, options);
      constants.voigt = asInput(pairs(re, im));
    });
  }
  return constants;
}

/** The second order in m, known at one wavelength. */
function quadraticOf(
  name: string,
  { wavelengthNm, g11, g12, g44, azimuthDeg }: Extract<Anisotropy, { kind: 'cubic' }>,
  wavelengthsNm: readonly number[],
  assumeConstant: boolean,
): NonNullable<MaterialConstants['quadratic']> {
  const other = wavelengthsNm.find((asked) => !isSameWavelength(asked, wavelengthNm));
  if (other !== undefined && !assumeConstant) {
    throw new DispersionRangeError(`the second order in m of ${name}`, [wavelengthNm, wavelengthNm], other);
  }
  return { g11, g12, g44, azimuthDeg };
}

function pairs(re: Float64Array, im: Float64Array): Complex[] {
  return Array.from(re, (value, position): Complex => [value, im[position]!]);
}

/** Runs one sampling; what is wrong with the material at these wavelengths becomes a message, the rest is thrown. */
function collect(messages: string[], sample: () => void): void {
  try {
    sample();
  } catch (error) {
    if (!(error instanceof DispersionRangeError || error instanceof DispersionValueError)) throw error;
    if (!messages.includes(error.message)) messages.push(error.message);
  }
}
