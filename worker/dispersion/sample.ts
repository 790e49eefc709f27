import type { Complex } from '../../shared/complex.ts';
import type { IndexDispersion, IndexModel, PlainIndex, PlainVoigt } from '../../shared/dispersion.ts';
import type { MaterialContent } from '../../shared/material.ts';
import { photonEnergyEv } from '../../shared/units.ts';
import { over, times } from '../optics/complexNumber.ts';
import { cauchyIndex } from './cauchy.ts';
import { compileFormula } from './formula.ts';
import { sumOfLines } from './magnetoOpticLines.ts';
import { mixedIndex, mixedVoigt } from './mixedParts.ts';
import { finiteVoigt } from './opticalValue.ts';
import { oscillatorsIndex } from './oscillators.ts';
import { dispersionRangeNm } from './range.ts';
import { sellmeierIndex } from './sellmeier.ts';
import type { SampleOptions } from './table.ts';
import { inRange, sampleTable } from './table.ts';
import { meanIndex, sampleTensor } from './tensorTable.ts';

/** Refractive index N = n + ik, one entry per wavelength. */
export type SampledIndex = { n: Float64Array; k: Float64Array };

/** Voigt constant Q in the canonical sign (physics.md section 2), one entry per wavelength. */
export type SampledVoigt = { re: Float64Array; im: Float64Array };

/**
 * Samples a refractive index. Of a tensor it is the root of the mean of the diagonal, which is for plots only.
 *
 * @param name what an error calls the material, such as "Cobalt (co-johnson-1974)"
 * @param wavelengthsNm vacuum wavelengths in nm, in any order
 * @throws DispersionRangeError where the index is not known; DispersionValueError where a formula or model fails
 */
export function sampleIndex(
  name: string,
  dispersion: IndexDispersion,
  wavelengthsNm: ArrayLike<number>,
  options: SampleOptions = {},
): SampledIndex {
  switch (dispersion.kind) {
    case 'table': {
      const { wavelengthsNm: tableNm, n, k } = dispersion;
      const [sampledN, sampledK] = sampleTable(name, tableNm, [n, k], wavelengthsNm, options);
      return { n: sampledN!, k: sampledK! };
    }
    case 'tensor':
      return meanIndex(sampleTensor(name, dispersion, wavelengthsNm, options));
    case 'mixture': {
      const parts = dispersion.parts.map((part) =>
        sampleIndex(partName(part.name, name), part.index, wavelengthsNm, options),
      );
      return mixedIndex(dispersion, parts);
    }
    case 'formula':
    case 'model': {
      const [n, k] = sampleValues(name, dispersionRangeNm(dispersion), valueOf(dispersion), wavelengthsNm);
      return { n, k };
    }
  }
}

/**
 * Samples the Voigt constant of a material; arguments and errors as for `sampleIndex`.
 *
 * @param content Q that is given as a gyration or by the parts of a mixture needs the index
 */
export function sampleVoigt(
  name: string,
  content: Pick<MaterialContent, 'index'> & { voigt: NonNullable<MaterialContent['voigt']> },
  wavelengthsNm: ArrayLike<number>,
  options: SampleOptions = {},
): SampledVoigt {
  const { index, voigt } = content;
  if (voigt.kind !== 'mixture') return samplePlainVoigt(name, index, voigt, wavelengthsNm, options);
  if (index.kind !== 'mixture') throw new Error(`${name}: Q of a mixture without a mixed index`);
  const parts = index.parts.map((part) => {
    const own = partName(part.name, name);
    return {
      ...sampleIndex(own, part.index, wavelengthsNm, options),
      voigt: part.voigt && samplePlainVoigt(own, part.index, part.voigt, wavelengthsNm, options),
    };
  });
  return mixedVoigt(index, parts);
}

function samplePlainVoigt(
  name: string,
  index: IndexDispersion,
  voigt: PlainVoigt,
  wavelengthsNm: ArrayLike<number>,
  options: SampleOptions,
): SampledVoigt {
  const subject = `the Voigt constant of ${name}`;
  const range = dispersionRangeNm(voigt);
  switch (voigt.kind) {
    case 'table': {
      const columns = [voigt.q.map((q) => q[0]), voigt.q.map((q) => q[1])];
      const [re, im] = sampleTable(subject, voigt.wavelengthsNm, columns, wavelengthsNm, options);
      return { re: re!, im: im! };
    }
    case 'formula': {
      const formula = compileFormula(voigt.expression, voigt.coefficients, 'Q');
      const [re, im] = sampleValues(subject, range, formula, wavelengthsNm);
      return { re, im };
    }
    case 'lines': {
      const sum = (wavelengthNm: number) => sumOfLines(voigt.lines, photonEnergyEv(wavelengthNm));
      const [re, im] = sampleValues(subject, range, sum, wavelengthsNm);
      return voigt.of === 'voigt'
        ? { re, im }
        : overPermittivity({ re, im }, sampleIndex(name, index, wavelengthsNm, options), wavelengthsNm);
    }
  }
}

/** Q = g / N^2. */
function overPermittivity(
  { re, im }: SampledVoigt,
  { n, k }: SampledIndex,
  wavelengthsNm: ArrayLike<number>,
): SampledVoigt {
  for (let i = 0; i < re.length; i++) {
    const index: Complex = [n[i]!, k[i]!];
    const q = over([re[i]!, im[i]!], times(index, index));
    [re[i], im[i]] = finiteVoigt('the gyration over N^2', q, wavelengthsNm[i]!);
  }
  return { re, im };
}

/** Formulas compiled before: while a film is edited the same materials are sampled many times a second. */
const compiled = new WeakMap<object, (wavelengthNm: number) => Complex>();

function valueOf(dispersion: Exclude<PlainIndex, { kind: 'table' }>): (wavelengthNm: number) => Complex {
  if (dispersion.kind === 'model') return (wavelengthNm) => modelIndex(dispersion.model, wavelengthNm);
  const { expression, coefficients, quantity } = dispersion;
  const formula = compiled.get(dispersion) ?? compileFormula(expression, coefficients, quantity);
  compiled.set(dispersion, formula);
  return formula;
}

function modelIndex(model: IndexModel, wavelengthNm: number): Complex {
  switch (model.name) {
    case 'sellmeier':
      return sellmeierIndex(model, wavelengthNm);
    case 'cauchy':
      return cauchyIndex(model, wavelengthNm);
    case 'oscillators':
      return oscillatorsIndex(model, wavelengthNm);
  }
}

function sampleValues(
  subject: string,
  [fromNm, toNm]: [number, number],
  valueAt: (wavelengthNm: number) => Complex,
  wavelengthsNm: ArrayLike<number>,
): [re: Float64Array, im: Float64Array] {
  const re = new Float64Array(wavelengthsNm.length);
  const im = new Float64Array(wavelengthsNm.length);
  for (let i = 0; i < re.length; i++) {
    [re[i], im[i]] = valueAt(inRange(subject, fromNm, toNm, wavelengthsNm[i]!));
  }
  return [re, im];
}

function partName(part: string, name: string): string {
  return `${part} in ${name}`;
}
