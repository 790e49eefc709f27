import type { IndexModel, MagnetoOpticLine, Oscillator } from '../../../../shared/dispersion.ts';
import { formatPlain } from '../../../lib/format.ts';

/** A stored number with its name; `value` has its unit and every digit that was entered. */
export type Parameter = { name: string; value: string };

/** Constants in words: the law, then its parameters. */
export type Description = { law: string; parameters: Parameter[] };

function parameter(name: string, value: number, unit = ''): Parameter {
  return { name, value: unit === '' ? formatPlain(value) : `${formatPlain(value)} ${unit}` };
}

/** A parametric model of an index. */
export function describeModel(model: IndexModel): Description {
  switch (model.name) {
    case 'sellmeier':
      return {
        law: 'Sellmeier formula: n² = A + Σ Bⱼ L² / (L² − Cⱼ), k = 0, with L the vacuum wavelength in µm.',
        parameters: [
          parameter('A', model.constant),
          ...model.terms.flatMap(({ b, cUm2 }, position) => [
            parameter(`B${position + 1}`, b),
            parameter(`C${position + 1}`, cUm2, 'µm²'),
          ]),
        ],
      };
    case 'cauchy': {
      const { a, bUm2, cUm4, tail } = model;
      const absorption = tail ? 'k = k₀ exp(s (E − E₀)), with E the photon energy' : 'k = 0';
      return {
        law: `Cauchy formula: n = A + B / L² + C / L⁴ with L the vacuum wavelength in µm; ${absorption}.`,
        parameters: [
          parameter('A', a),
          parameter('B', bUm2, 'µm²'),
          parameter('C', cUm4, 'µm⁴'),
          ...(tail
            ? [
                parameter('k₀', tail.k),
                parameter('s', tail.perEv, 'per eV'),
                parameter('E₀', tail.atEv, 'eV'),
              ]
            : []),
        ],
      };
    }
    case 'oscillators':
      return {
        law: 'Sum of oscillators: ε = N² = ε∞ + the terms below, in the photon energy E.',
        parameters: [
          parameter('ε∞', model.epsInfinity),
          ...model.terms.map((term, position) => describeOscillator(term, position + 1)),
        ],
      };
  }
}

function describeOscillator(term: Oscillator, number: number): Parameter {
  const ev = (value: number) => `${formatPlain(value)} eV`;
  switch (term.kind) {
    case 'drude':
      return {
        name: `${number}. Drude`,
        value: `plasma energy ${ev(term.plasmaEv)}, damping ${ev(term.dampingEv)}`,
      };
    case 'lorentz':
      return {
        name: `${number}. Lorentz`,
        value: `strength ${formatPlain(term.strength)}, centre ${ev(term.centreEv)}, damping ${ev(term.dampingEv)}`,
      };
    case 'tauc-lorentz':
      return {
        name: `${number}. Tauc-Lorentz`,
        value: `amplitude ${ev(term.amplitudeEv)}, gap ${ev(term.gapEv)}, centre ${ev(term.centreEv)}, damping ${ev(term.dampingEv)}`,
      };
  }
}

/** Lines of magneto-optic activity; `of` says whether they add up to Q or to Q times the permittivity. */
export function describeLines(lines: readonly MagnetoOpticLine[], of: 'voigt' | 'gyration'): Description {
  const sum = of === 'voigt' ? 'Q' : 'the gyration g = Q N²';
  return {
    law: `Sum of magneto-optic lines: ${sum} is the sum of the lines below, with F = E + i damping and E the photon energy. A paramagnetic line is amplitude × centre × F / (centre² − F²), a diamagnetic one amplitude × centre³ × F / (centre² − F²)².`,
    parameters: lines.map(({ shape, amplitude, centreEv, dampingEv }, position) => ({
      name: `${position + 1}. ${shape}`,
      value: `amplitude ${formatPlain(amplitude)}, centre ${formatPlain(centreEv)} eV, damping ${formatPlain(dampingEv)} eV`,
    })),
  };
}
