import type { Complex } from '../../shared/complex.ts';
import type { ImportMapping, SignHabits } from '../../shared/materialImport.ts';
import { over, scaled, times } from '../optics/complexNumber.ts';
import { kerrRatio, voigtOfKerr } from './bulkKerr.ts';

type VoigtMapping = NonNullable<ImportMapping['voigt']>;

/** How one row becomes Q in our convention; null where no Q is found. */
export type ToVoigt = (entered: Complex, index: Complex | null, wavelengthNm: number) => Complex | null;

/** Vacuum permittivity, F/m (CODATA 2018), and the speed of light in nm/s. */
const EPSILON_0 = 8.8541878128e-12;
const LIGHT_NM_PER_S = 299_792_458e9;

/** One unit in radians. */
const radians = { deg: Math.PI / 180, mdeg: Math.PI / 180_000, mrad: 1e-3, rad: 1, arcmin: Math.PI / 10_800 };
/** A polarization turned by 45 degrees or more, or circular, is no angle of a bulk Kerr effect. */
const LARGEST_ANGLE = Math.PI / 4;

/** The conversion for what the columns hold and the habits of the source (physics.md section 2), and it in words. */
export function canonicalVoigt(
  mapping: VoigtMapping,
  habits: SignHabits,
): { toVoigt: ToVoigt; sentences: string[] } {
  const { toVoigt, sentences } = conversionOf(mapping, habits);
  if (habits.magnetization === 'into the film') return { toVoigt, sentences };
  return {
    toVoigt: (...row) => {
      const q = toVoigt(...row);
      return q && negative(q);
    },
    sentences: [...sentences, `${reversed(mapping.from)}: Q was multiplied by -1.`],
  };
}

function conversionOf(mapping: VoigtMapping, habits: SignHabits): { toVoigt: ToVoigt; sentences: string[] } {
  const isOther = habits.time === 'exp(+iwt)';
  const inOurTime = (value: Complex): Complex => (isOther ? conjugate(value) : value);
  const conjugated = (name: string) =>
    isOther ? [`The source uses exp(+iwt): the complex conjugate of ${name} was taken.`] : [];
  const fromElement = 'Q = eps_xy / (i eps_d) with eps_d = N^2.';
  switch (mapping.from) {
    case 'Q': {
      const isNegative = habits.voigtSign === '-iQ';
      // exp(+iwt) with +iQ: eps_xy = conj(iQ eps_d) = -i conj(Q) conj(eps_d), hence -conj(Q).
      const sign = isNegative === isOther ? 1 : -1;
      return {
        toVoigt: (entered) => scaledPlain(inOurTime(entered), sign),
        sentences: [describeHabit(habits, isOther, sign)],
      };
    }
    case 'eps_xy':
      return {
        toVoigt: (entered, index) => index && voigtOfElement(inOurTime(entered), index),
        sentences: [...conjugated('eps_xy'), fromElement],
      };
    case 'sigma_xy': {
      // eps_xy = i sigma_xy / (eps0 w) in SI, 4 pi i sigma_xy / w in Gaussian units.
      const factor = mapping.unit === 'S/m' ? 1 / EPSILON_0 : 4 * Math.PI;
      const formula = mapping.unit === 'S/m' ? 'i sigma_xy / (eps0 w)' : '4 pi i sigma_xy / w';
      return {
        toVoigt: (entered, index, wavelengthNm) => {
          const omega = (2 * Math.PI * LIGHT_NM_PER_S) / wavelengthNm;
          const element = times([0, factor / omega], inOurTime(entered));
          return index && voigtOfElement(element, index);
        },
        sentences: [
          ...conjugated('sigma_xy'),
          `eps_xy = ${formula} (sigma_xy in ${mapping.unit}). ${fromElement}`,
        ],
      };
    }
    case 'Kerr angles': {
      const unit = radians[mapping.unit];
      const turn = unit * senseOf(habits.rotation);
      const open = unit * senseOf(habits.ellipticity);
      return {
        toVoigt: ([rotation, ellipticity], index) => {
          const [phi, chi] = [rotation * turn, ellipticity * open];
          if (!index || Math.abs(phi) >= LARGEST_ANGLE || Math.abs(chi) >= LARGEST_ANGLE) return null;
          return voigtOfKerr(kerrRatio(phi, chi), index, mapping.incidentIndex);
        },
        sentences: [
          `Kerr rotation and ellipticity in ${mapping.unit} of the bulk at normal incidence, from a medium of index ${mapping.incidentIndex}, became Q by the exact formula, solved by Newton's method.`,
          ...(habits.rotation === 'clockwise'
            ? ['A positive rotation of the source is clockwise: its sign was changed.']
            : []),
          ...(habits.ellipticity === 'clockwise'
            ? ['A positive ellipticity of the source turns clockwise: its sign was changed.']
            : []),
        ],
      };
    }
  }
}

/**
 * A tensor follows its own axes: turning z and m around together changes nothing in it, so only m against z counts. A
 * Kerr angle is seen from outside, so there m against the film does.
 */
function reversed(from: VoigtMapping['from']): string {
  return from === 'Kerr angles'
    ? 'The +m of the source points out of the film, ours into it'
    : 'The +m of the source points along -z of the axes of its tensor, ours along +z';
}

function describeHabit({ time, voigtSign }: SignHabits, isOther: boolean, sign: number): string {
  const taken = `${sign < 0 ? '-' : ''}${isOther ? 'conj(Q)' : 'Q'}`;
  if (taken === 'Q') return 'Q was taken as it is (exp(-iwt), eps_xy = +iQ eps_d).';
  return `The source uses ${time} with eps_xy = ${voigtSign} eps_d: ${taken} was taken for Q.`;
}

function senseOf(sense: SignHabits['rotation']): 1 | -1 {
  return sense === 'counter-clockwise' ? 1 : -1;
}

function voigtOfElement(element: Complex, index: Complex): Complex {
  const [re, im] = over(element, times(index, index));
  return [im + 0, -re + 0];
}

// Adding 0 turns -0 into 0: a value that is not there has no sign.
const conjugate = ([re, im]: Complex): Complex => [re, -im + 0];
const negative = ([re, im]: Complex): Complex => [-re + 0, -im + 0];
const scaledPlain = (value: Complex, sign: number): Complex =>
  sign < 0 ? negative(value) : scaled(value, 1);
