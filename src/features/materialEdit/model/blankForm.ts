import type { Complex } from '../../../../shared/complex.ts';
import type {
  AnisotropyForm,
  IndexForm,
  MaterialForm,
  OscillatorForm,
  PlainIndexForm,
  SourceForm,
  VoigtForm,
} from './form.ts';

type RangeNm = [number, number];

/** The visible and the near infrared, where nothing says more. */
const USUAL_RANGE_NM: RangeNm = [400, 1000];

/** The range within which constants hold, as far as the form says; a table's own when it can be read. */
export function rangeOfForm(form: IndexForm | VoigtForm): RangeNm {
  if ('rangeNm' in form) return form.rangeNm;
  if (form.kind !== 'table') return USUAL_RANGE_NM;
  const wavelengths = form.rows.map(([first = '']) => Number.parseFloat(first)).filter((value) => value > 0);
  return wavelengths.length > 1 ? [Math.min(...wavelengths), Math.max(...wavelengths)] : USUAL_RANGE_NM;
}

/** Where a kind of index starts from: plain round numbers that give a curve to look at. */
export function blankPlainIndex(
  kind: PlainIndexForm['kind'],
  rangeNm: RangeNm = USUAL_RANGE_NM,
): PlainIndexForm {
  switch (kind) {
    case 'table':
      return { kind, rows: Array.from({ length: 4 }, () => ['', '', '']) };
    case 'sellmeier':
      return { kind, rangeNm, constant: 1, terms: [{ b: 1, cUm2: 0.01 }] };
    case 'cauchy':
      return { kind, rangeNm, a: 1.5, bUm2: 0.005, cUm4: 0, tail: null };
    case 'oscillators':
      return { kind, rangeNm, epsInfinity: 1, terms: [blankOscillator('lorentz')] };
    case 'formula':
      return { kind, rangeNm, quantity: 'n', expression: 'c1 + c2/L^2', coefficients: [1.5, 0.005] };
  }
}

export function blankOscillator(kind: OscillatorForm['kind']): OscillatorForm {
  switch (kind) {
    case 'drude':
      return { kind, plasmaEv: 9, dampingEv: 0.1 };
    case 'lorentz':
      return { kind, strength: 1, centreEv: 5, dampingEv: 0.5 };
    case 'tauc-lorentz':
      return { kind, amplitudeEv: 50, gapEv: 1.5, centreEv: 4, dampingEv: 2 };
  }
}

export function blankIndex(kind: Exclude<IndexForm['kind'], 'import'>, rangeNm: RangeNm): IndexForm {
  switch (kind) {
    case 'tensor':
      return { kind, entries: [blankTensorEntry(632.8)] };
    case 'mixture of':
      return {
        kind,
        model: 'bruggeman',
        fraction: 0.5,
        parts: [
          { material: '', version: 1 },
          { material: '', version: 1 },
        ],
      };
    case 'table':
    case 'sellmeier':
    case 'cauchy':
    case 'oscillators':
    case 'formula':
      return blankPlainIndex(kind, rangeNm);
  }
}

const zero = (): Complex => [0, 0];

export function blankTensorEntry(
  wavelengthNm: number,
): Extract<IndexForm, { kind: 'tensor' }>['entries'][number] {
  return {
    wavelengthNm,
    epsilon: [
      [[2.25, 0], zero(), zero()],
      [zero(), [2.25, 0], zero()],
      [zero(), zero(), [2.25, 0]],
    ],
  };
}

export function blankVoigt(kind: Exclude<VoigtForm['kind'], 'import'>, rangeNm: RangeNm): VoigtForm {
  switch (kind) {
    case 'none':
    case 'mixture':
      return { kind };
    case 'table':
      return { kind, rows: Array.from({ length: 4 }, () => ['', '', '']) };
    case 'lines':
      return { kind, rangeNm, of: 'gyration', lines: [blankLine()] };
    case 'formula':
      return { kind, rangeNm, expression: 'c1 + c2*i', coefficients: [0.02, 0.005] };
  }
}

export function blankLine(): Extract<VoigtForm, { kind: 'lines' }>['lines'][number] {
  return { shape: 'paramagnetic', amplitude: 0.1, centreEv: 2, dampingEv: 1 };
}

export function blankAnisotropy(kind: AnisotropyForm['kind']): AnisotropyForm {
  switch (kind) {
    case 'none':
      return { kind };
    case 'uniaxial':
      return { kind, extraordinary: blankPlainIndex('table'), axis: [0, 0, 1] };
    case 'cubic':
      return { kind, wavelengthNm: 632.8, g11: zero(), g12: zero(), g44: zero(), azimuthDeg: 0 };
  }
}

export function blankSource(): SourceForm {
  return {
    citation: '',
    doi: '',
    licence: '',
    sample: '',
    temperature: '',
    method: '',
    confidence: 'measured',
    caution: '',
  };
}

export function blankForm(): MaterialForm {
  return {
    name: '',
    formula: '',
    class: 'dielectric',
    notes: '',
    versionNote: '',
    content: {
      index: blankPlainIndex('table'),
      indexSource: blankSource(),
      voigt: { kind: 'none' },
      voigtSource: blankSource(),
      anisotropy: { kind: 'none' },
      anisotropySource: blankSource(),
      thermal: null,
    },
  };
}
