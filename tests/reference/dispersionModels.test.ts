import { describe, expect, test } from 'vitest';
import type { IndexModel, MagnetoOpticLine, Oscillator, PlainVoigt } from '../../shared/dispersion.ts';
import { EV_NM, photonEnergyEv } from '../../shared/units.ts';
import { sumOfLines } from '../../worker/dispersion/magnetoOpticLines.ts';
import { DispersionValueError } from '../../worker/dispersion/opticalValue.ts';
import { sampleIndex, sampleVoigt } from '../../worker/dispersion/sample.ts';
import { taucLorentzTerm } from '../../worker/dispersion/taucLorentz.ts';

const rangeNm: [number, number] = [100, 20_000];

function indexOf(model: IndexModel, wavelengthNm: number): [n: number, k: number] {
  const { n, k } = sampleIndex('it', { kind: 'model', rangeNm, model }, [wavelengthNm]);
  return [n[0]!, k[0]!];
}

function permittivityOf(terms: Oscillator[], energyEv: number, epsInfinity = 1): [number, number] {
  const [n, k] = indexOf({ name: 'oscillators', epsInfinity, terms }, photonEnergyEv(energyEv));
  return [n * n - k * k, 2 * n * k];
}

/**
 * Principal value of the integral of h(x) / (x^2 - e^2) from 0 to infinity. That of 1 / (x^2 - e^2) is 0, so h(e) is
 * taken off and nothing singular is left; midpoints between the given energies, at which h may have an edge or peak.
 */
function principalValue(h: (x: number) => number, e: number, edges: number[]): number {
  const points = [...new Set([0, ...edges, e, 20])].sort((a, b) => a - b);
  const atE = h(e);
  const integrand = (x: number) => (h(x) - atE) / (x * x - e * e);
  const steps = 20_000;
  let sum = 0;
  for (let panel = 0; panel + 1 < points.length; panel++) {
    const width = (points[panel + 1]! - points[panel]!) / steps;
    for (let i = 0; i < steps; i++) sum += width * integrand(points[panel]! + (i + 0.5) * width);
  }
  // The rest with x = 20 / t, t from 0 to 1.
  for (let i = 0; i < steps; i++) {
    const t = (i + 0.5) / steps;
    sum += (integrand(20 / t) * 20) / (t * t * steps);
  }
  return sum;
}

describe('transparent models', () => {
  // Coefficients and n_d of N-BK7: SCHOTT optical glass catalogue 2017.
  test('Sellmeier gives n_d, n_F and n_C of BK7', () => {
    const terms = [
      { b: 1.03961212, cUm2: 0.00600069867 },
      { b: 0.231792344, cUm2: 0.0200179144 },
      { b: 1.01046945, cUm2: 103.560653 },
    ];
    const model: IndexModel = { name: 'sellmeier', constant: 1, terms };
    expect(indexOf(model, 587.5618)[0]).toBeCloseTo(1.5168, 5);
    expect(indexOf(model, 486.1327)[0]).toBeCloseTo(1.52238, 5);
    expect(indexOf(model, 656.2725)).toEqual([expect.closeTo(1.51432, 5), 0]);
    expect(() => indexOf({ ...model, terms: [{ b: 1, cUm2: 0.25 }] }, 480)).toThrow(DispersionValueError);
    expect(() => indexOf({ ...model, terms: [{ b: 1, cUm2: 0.25 }] }, 500)).toThrow(/at 500 nm/);
  });

  // a and b of BK7 as in textbooks (Hecht, Optics; from memory); the tail by hand.
  test('Cauchy gives n_d of BK7 to its accuracy, and a tail in k', () => {
    const model: IndexModel = { name: 'cauchy', a: 1.5046, bUm2: 0.0042, cUm4: 0 };
    expect(indexOf(model, 587.5618)).toEqual([expect.closeTo(1.5168, 3), 0]);
    expect(indexOf({ ...model, cUm4: 0.001 }, 500)[0]).toBeCloseTo(1.5046 + 0.0168 + 0.016, 14);
    const tail = { k: 0.01, perEv: 2, atEv: 3 };
    expect(indexOf({ ...model, tail }, EV_NM / 3.5)[1]).toBeCloseTo(0.01 * Math.E, 14);
    expect(() => indexOf({ ...model, bUm2: -4 }, 500)).toThrow(/Cauchy formula gives N = .* at 500 nm/);
  });
});

describe('oscillators', () => {
  // Drude: eps = 1 - wp^2 / (w^2 + i g w), Ashcroft and Mermin, Solid State Physics, eq. (1.37) and after.
  test('Drude: a metal below its plasma energy, transparent above', () => {
    const metal: Oscillator[] = [{ kind: 'drude', plasmaEv: 9, dampingEv: 0.07 }];
    const [re, im] = permittivityOf(metal, 2);
    expect(re).toBeCloseTo(1 - 81 / (4 + 0.07 ** 2), 12);
    expect(im).toBeCloseTo((81 * 0.07) / (2 * (4 + 0.07 ** 2)), 12);
    expect(Math.abs(permittivityOf(metal, 9)[0])).toBeLessThan(1e-4);
    expect(permittivityOf(metal, 11)[0]).toBeGreaterThan(0.3);
  });

  // Lorentz: Born and Wolf, sec. 2.3.4; at the centre f E0 / G in Im, statically f in Re.
  test('Lorentz: its strength statically, all imaginary at its centre, nothing far above', () => {
    const line: Oscillator[] = [{ kind: 'lorentz', strength: 2, centreEv: 4, dampingEv: 0.5 }];
    expect(permittivityOf(line, 4)).toEqual([expect.closeTo(1, 12), expect.closeTo(16, 12)]);
    expect(permittivityOf(line, 0.1)[0]).toBeCloseTo(3 + 2 * (0.1 / 4) ** 2, 4);
    expect(permittivityOf(line, 12)[1]).toBeLessThan(0.1);
  });

  test('terms add up to epsInfinity', () => {
    const terms: Oscillator[] = [
      { kind: 'drude', plasmaEv: 3, dampingEv: 0.2 },
      { kind: 'lorentz', strength: 1.5, centreEv: 3, dampingEv: 1 },
      { kind: 'tauc-lorentz', amplitudeEv: 40, gapEv: 1.5, centreEv: 4, dampingEv: 2 },
    ];
    const alone = terms.map((term) => permittivityOf([term], 2.5));
    const [re, im] = permittivityOf(terms, 2.5, 2);
    expect(re).toBeCloseTo(2 + alone.reduce((sum, eps) => sum + eps[0] - 1, 0), 12);
    expect(im).toBeCloseTo(
      alone.reduce((sum, eps) => sum + eps[1], 0),
      12,
    );
  });
});

describe('Tauc-Lorentz', () => {
  const build = (amplitudeEv: number, gapEv: number, centreEv: number, dampingEv: number) => ({
    kind: 'tauc-lorentz' as const,
    amplitudeEv,
    gapEv,
    centreEv,
    dampingEv,
  });
  // Parameters of the size of those of amorphous silicon in the paper; a narrow line; no gap; a centre below the gap.
  const oscillators = [
    build(122, 1.2, 3.45, 2.54),
    build(30, 2, 5, 0.6),
    build(50, 0, 3, 1),
    build(80, 3, 2.5, 1),
  ];

  // Jellison and Modine, Appl. Phys. Lett. 69, 371 (1996), eq. (4).
  test.each(oscillators)('absorbs as eq. (4) says, and not below the gap: %j', (oscillator) => {
    const { amplitudeEv: a, gapEv, centreEv: e0, dampingEv: c } = oscillator;
    expect(taucLorentzTerm(oscillator, gapEv || 1e-9)[1]).toBeCloseTo(0, 6);
    expect(taucLorentzTerm(oscillator, gapEv * 0.7 || 1e-9)[1]).toBeCloseTo(0, 6);
    for (const e of [gapEv + 0.1, gapEv + 1, 6]) {
      const lorentz = (a * e0 * c * e) / (Math.pow(e ** 2 - e0 ** 2, 2) + (c * e) ** 2);
      expect(taucLorentzTerm(oscillator, e)[1]).toBeCloseTo(lorentz * ((e - gapEv) / e) ** 2, 10);
    }
  });

  // eps1 = (2 / pi) P int x eps2(x) / (x^2 - E^2) dx: the same paper, eq. (5).
  test.each(oscillators)('has the real part of its Kramers-Kronig integral: %j', (oscillator) => {
    const h = (x: number) => x * taucLorentzTerm(oscillator, x)[1];
    for (const e of [0.3, 1.1, 2.4, oscillator.centreEv, oscillator.gapEv || 0.5, 5, 9]) {
      const integral =
        (2 / Math.PI) * principalValue(h, e, [oscillator.gapEv, oscillator.centreEv].filter(Boolean));
      expect(taucLorentzTerm(oscillator, e)[0]).toBeCloseTo(integral, 4);
    }
  });

  test('refuses an overdamped oscillator', () => {
    expect(() => taucLorentzTerm(build(10, 1, 2, 4), 3)).toThrow(
      'needs a damping below twice its centre energy (4 eV), got 4 eV',
    );
  });
});

describe('magneto-optic lines', () => {
  const shapes: MagnetoOpticLine[] = [
    { shape: 'paramagnetic', amplitude: 0.3, centreEv: 2, dampingEv: 0.4 },
    { shape: 'diamagnetic', amplitude: -0.02, centreEv: 3.1, dampingEv: 0.3 },
  ];

  // A gyration is the transform of a real response: g(-E) = -conj g(E) (Landau and Lifshitz, ECM, sec. 82 and 101).
  test.each(shapes)('are odd in the photon energy: %j', (line) => {
    for (const e of [0.2, 2, 5]) {
      const [re, im] = sumOfLines([line], e);
      const mirrored = sumOfLines([line], -e);
      expect(mirrored[0]).toBeCloseTo(-re, 14);
      expect(mirrored[1]).toBeCloseTo(im, 14);
    }
  });

  // Re g(E) = (2 E / pi) P int Im g(x) / (x^2 - E^2) dx, Im g being even: the same source.
  test.each(shapes)('are causal: %j', (line) => {
    const h = (x: number) => sumOfLines([line], x)[1];
    for (const e of [0.4, 1.7, 2, 3.1, 4.5, 8]) {
      const integral = ((2 * e) / Math.PI) * principalValue(h, e, [line.centreEv]);
      expect(sumOfLines([line], e)[0]).toBeCloseTo(integral, 5);
    }
  });

  // By hand: at the centre F = E0 + iG gives E0^2 - F^2 = G^2 - 2 i E0 G.
  test('have the value of their formula at the centre, and add up', () => {
    const f = [2, 0.4];
    const d = [0.16, -1.6];
    const para = [
      (0.6 * (f[0]! * d[0]! + f[1]! * d[1]!)) / (0.16 ** 2 + 1.6 ** 2),
      (0.6 * (f[1]! * d[0]! - f[0]! * d[1]!)) / (0.16 ** 2 + 1.6 ** 2),
    ];
    const [re, im] = sumOfLines([shapes[0]!], 2);
    expect([re, im]).toEqual([expect.closeTo(para[0]!, 14), expect.closeTo(para[1]!, 14)]);
    const both = sumOfLines(shapes, 2);
    const other = sumOfLines([shapes[1]!], 2);
    expect(both[0]).toBeCloseTo(re + other[0], 14);
    expect(both[1]).toBeCloseTo(im + other[1], 14);
  });

  test('of a gyration give Q = g / N^2, and of Q themselves', () => {
    const index = { kind: 'table' as const, wavelengthsNm: [400, 800], n: [2, 2], k: [1, 1] };
    const voigt = (of: 'voigt' | 'gyration'): PlainVoigt => ({ kind: 'lines', of, rangeNm, lines: shapes });
    const [re, im] = sumOfLines(shapes, photonEnergyEv(500));
    const q = sampleVoigt('it', { index, voigt: voigt('voigt') }, [500]);
    expect([q.re[0], q.im[0]]).toEqual([re, im]);
    const fromGyration = sampleVoigt('it', { index, voigt: voigt('gyration') }, [500]);
    // (3 + 4i) Q = g
    expect(3 * fromGyration.re[0]! - 4 * fromGyration.im[0]!).toBeCloseTo(re, 14);
    expect(4 * fromGyration.re[0]! + 3 * fromGyration.im[0]!).toBeCloseTo(im, 14);
    expect(() => sampleVoigt('it', { index, voigt: voigt('gyration') }, [300])).toThrow(
      'it is known from 400 to 800 nm; 300 nm was asked',
    );
  });
});
