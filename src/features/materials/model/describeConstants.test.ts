import { describe, expect, it } from 'vitest';
import { describeFormula } from './describeFormula.ts';
import { describeLines, describeModel } from './describeModel.ts';

describe('describeModel', () => {
  it('names the parameters of a Sellmeier formula with their units', () => {
    const { law, parameters } = describeModel({
      name: 'sellmeier',
      constant: 1,
      terms: [
        { b: 1.039, cUm2: 0.006 },
        { b: 0.2, cUm2: 0.02 },
      ],
    });
    expect(law).toMatch(/^Sellmeier formula: n² = /);
    expect(parameters.map(({ name, value }) => `${name} ${value}`)).toEqual([
      'A 1',
      'B1 1.039',
      'C1 0.006 µm²',
      'B2 0.2',
      'C2 0.02 µm²',
    ]);
  });

  it('says that a Cauchy formula without a tail does not absorb', () => {
    const plain = { name: 'cauchy', a: 1.5, bUm2: 0.01, cUm4: 0 } as const;
    expect(describeModel(plain).law).toMatch(/k = 0\.$/);
    const tail = { k: 0.1, perEv: 2, atEv: 3 };
    expect(describeModel({ ...plain, tail }).parameters.at(-1)).toEqual({ name: 'E₀', value: '3 eV' });
  });

  it('lists oscillators and lines in their order', () => {
    const { parameters } = describeModel({
      name: 'oscillators',
      epsInfinity: 2,
      terms: [
        { kind: 'drude', plasmaEv: 9, dampingEv: 0.07 },
        { kind: 'tauc-lorentz', amplitudeEv: 100, gapEv: 1.1, centreEv: 3.5, dampingEv: 2 },
      ],
    });
    expect(parameters.map(({ name }) => name)).toEqual(['ε∞', '1. Drude', '2. Tauc-Lorentz']);
    const lines = describeLines(
      [{ shape: 'diamagnetic', amplitude: -0.02, centreEv: 2, dampingEv: 0.5 }],
      'gyration',
    );
    expect(lines.law).toContain('g = Q N²');
    expect(lines.parameters[0]?.value).toBe('amplitude −0.02, centre 2 eV, damping 0.5 eV');
  });
});

describe('describeFormula', () => {
  it('explains only the letters that stand in it', () => {
    expect(describeFormula({ expression: 'c1 + c2/L^2', coefficients: [1.5, 0.01] }, 'n')).toEqual({
      law: 'n = c1 + c2/L^2; L is the vacuum wavelength in µm, k = 0.',
      parameters: [
        { name: 'c1', value: '1.5' },
        { name: 'c2', value: '0.01' },
      ],
    });
    expect(describeFormula({ expression: 'exp(-E)', coefficients: [] }, 'eps').law).toBe(
      'ε = N² = exp(-E); E is the photon energy in eV.',
    );
  });
});
