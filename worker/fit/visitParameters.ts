import type { IndexModel, Oscillator, PlainIndex, PlainVoigt } from '../../shared/dispersion.ts';

/** What may be fitted: everything but tables. */
export type FittableIndex = Exclude<PlainIndex, { kind: 'table' }>;
export type FittableVoigt = Exclude<PlainVoigt, { kind: 'table' }>;

/** A parameter of a model, as it is shown and within which bound it is legal. */
export type ParameterSpec = {
  /** Path inside the model, such as `terms[1].centreEv`. */
  name: string;
  /** Empty for plain numbers and for coefficients of a formula. */
  unit: string;
  lower: number;
  /** A value that only says where another one is meant, and would leave both undetermined if it were fitted. */
  reference?: boolean;
};

/** Gets a parameter with its value and gives the value that the copy shall have. */
export type ParameterVisit = (value: number, spec: ParameterSpec) => number;

/** Least centre and damping: both must be > 0. */
const LEAST_EV = 1e-6;
const ANY = -Infinity;

const at = (name: string, unit = '', lower = ANY): ParameterSpec => ({ name, unit, lower });

/** A copy of an index with every parameter replaced by what `visit` gives, in the order in which they stand. */
export function visitIndexParameters(index: FittableIndex, visit: ParameterVisit): FittableIndex {
  return index.kind === 'formula'
    ? { ...index, coefficients: visitCoefficients(index.coefficients, visit) }
    : { ...index, model: visitModel(index.model, visit) };
}

/** The same of a Voigt constant. */
export function visitVoigtParameters(voigt: FittableVoigt, visit: ParameterVisit): FittableVoigt {
  if (voigt.kind === 'formula') {
    return { ...voigt, coefficients: visitCoefficients(voigt.coefficients, visit) };
  }
  const lines = voigt.lines.map(({ shape, amplitude, centreEv, dampingEv }, i) => ({
    shape,
    amplitude: visit(amplitude, at(`lines[${i}].amplitude`)),
    centreEv: visit(centreEv, at(`lines[${i}].centreEv`, 'eV', LEAST_EV)),
    dampingEv: visit(dampingEv, at(`lines[${i}].dampingEv`, 'eV', LEAST_EV)),
  }));
  return { ...voigt, lines };
}

function visitCoefficients(coefficients: number[], visit: ParameterVisit): number[] {
  return coefficients.map((value, position) => visit(value, at(`c${position + 1}`)));
}

function visitModel(model: IndexModel, visit: ParameterVisit): IndexModel {
  switch (model.name) {
    case 'sellmeier':
      return {
        ...model,
        constant: visit(model.constant, at('constant', '', 0)),
        terms: model.terms.map(({ b, cUm2 }, i) => ({
          b: visit(b, at(`terms[${i}].b`)),
          cUm2: visit(cUm2, at(`terms[${i}].cUm2`, 'um^2', 0)),
        })),
      };
    case 'cauchy':
      return {
        ...model,
        a: visit(model.a, at('a', '', 1e-6)),
        bUm2: visit(model.bUm2, at('bUm2', 'um^2')),
        cUm4: visit(model.cUm4, at('cUm4', 'um^4')),
        ...(model.tail ? { tail: visitTail(model.tail, visit) } : {}),
      };
    case 'oscillators':
      return {
        ...model,
        epsInfinity: visit(model.epsInfinity, at('epsInfinity', '', 0)),
        terms: model.terms.map((term, i) => visitOscillator(term, `terms[${i}]`, visit)),
      };
  }
}

type Tail = NonNullable<Extract<IndexModel, { name: 'cauchy' }>['tail']>;

function visitTail({ k, perEv, atEv }: Tail, visit: ParameterVisit): Tail {
  return {
    k: visit(k, at('tail.k', '', 0)),
    perEv: visit(perEv, at('tail.perEv', '1/eV')),
    atEv: visit(atEv, { ...at('tail.atEv', 'eV', LEAST_EV), reference: true }),
  };
}

function visitOscillator(term: Oscillator, path: string, visit: ParameterVisit): Oscillator {
  const ev = (name: string, value: number, lower = LEAST_EV) =>
    visit(value, at(`${path}.${name}`, 'eV', lower));
  switch (term.kind) {
    case 'drude':
      return {
        ...term,
        plasmaEv: ev('plasmaEv', term.plasmaEv, 0),
        dampingEv: ev('dampingEv', term.dampingEv),
      };
    case 'lorentz':
      return {
        ...term,
        strength: visit(term.strength, at(`${path}.strength`, '', 0)),
        centreEv: ev('centreEv', term.centreEv),
        dampingEv: ev('dampingEv', term.dampingEv),
      };
    case 'tauc-lorentz':
      return {
        ...term,
        amplitudeEv: ev('amplitudeEv', term.amplitudeEv, 0),
        gapEv: ev('gapEv', term.gapEv, 0),
        centreEv: ev('centreEv', term.centreEv),
        dampingEv: ev('dampingEv', term.dampingEv),
      };
  }
}
