import { describe, expect, test } from 'vitest';
import type { ReadingSource } from './readings.ts';
import { readingDefinitions, readingOf } from './readings.ts';
import { readingNames } from './run.ts';
import { EV_NM, foldDegrees, photonEnergyEv } from './units.ts';

const angles = (rotationDeg: number, ellipticityDeg: number) => ({ rotationDeg, ellipticityDeg });

/** Turns any polarization by so many degrees, from p toward s. */
function turned(angleDeg: number): number[][] {
  const [c, s] = [Math.cos((angleDeg * Math.PI) / 90), Math.sin((angleDeg * Math.PI) / 90)];
  return [
    [1, 0, 0, 0.1],
    [0, c, -s, 0],
    [0, s, c, 0],
    [0, 0, 0, 1],
  ];
}

function source(change: Partial<ReadingSource> = {}): ReadingSource {
  return {
    R: { p: 0.4, s: 0.6 },
    T: { p: 0.1, s: 0.2 },
    A: { p: 0.5, s: 0.2 },
    kerr: { p: angles(0.3, -0.1), s: angles(0.2, 0.05) },
    r: { sp: [3e-3, 4e-3], ps: [0, -2e-3] },
    faraday: { p: angles(0.05, 0.01), s: angles(0.06, 0.02) },
    ceiling: { stack: 0.01, material: 0.02, shareReached: 0.25 },
    // An ideal mirror that turns light by 5 deg.
    mueller: turned(5),
    ...change,
  };
}

describe('readings', () => {
  const zero = source({
    kerr: { p: angles(0.1, 0.2), s: angles(-0.1, 0) },
    faraday: { p: angles(0.03, 0.01), s: angles(0.06, 0.02) },
    mueller: turned(2),
  });
  const reversed = source({ R: { p: 0.2, s: 0.6 }, kerr: { p: angles(-0.1, 0.1), s: angles(0, -0.2) } });

  test.each([
    ['rotationP', 0.2],
    ['rotationS', 0.3],
    ['ellipticityP', -0.3],
    ['ellipticityS', 0.05],
    ['reflectanceP', 0.4],
    ['reflectanceS', 0.6],
    ['transmittanceP', 0.1],
    ['transmittanceS', 0.2],
    ['absorptanceP', 0.5],
    ['absorptanceS', 0.2],
    ['crossSp', 5e-3],
    ['crossPs', 2e-3],
    ['contrastP', 0.2 / 0.6],
    ['contrastS', 0],
    ['ceilingShare', 0.25],
    ['stackCeiling', 0.01],
    ['oddRotationP', 0.2],
    ['oddEllipticityS', 0.125],
    ['evenRotationP', 0],
    ['evenEllipticityS', -0.075],
    ['faradayRotationP', 0.02],
    ['faradayEllipticityS', 0],
    ['polarPart', Math.hypot(3e-3, 2e-3) / 2],
    ['longitudinalPart', Math.hypot(3e-3, 6e-3) / 2],
    ['circularContrast', 0.1],
    ['rotationAtAzimuth', 3],
    ['ellipticityAtAzimuth', 0],
  ] as const)('%s', (name, value) => {
    expect(readingOf(name, source(), zero, reversed, 30)).toBeCloseTo(value, 13);
  });

  test('every reading has a definition and a value', () => {
    for (const name of readingNames) {
      expect(readingOf(name, source(), zero, reversed)).toBeTypeOf('number');
      const { label, symbol, anchor } = readingDefinitions[name];
      expect([label, symbol, anchor].every((text) => text.length > 0)).toBe(true);
    }
  });

  test('a rotation across the fold is the small one', () => {
    const given = source({ kerr: { p: angles(-89.9, 0), s: null } });
    const plain = source({ kerr: { p: angles(89.9, 0), s: null } });
    expect(readingOf('rotationP', given, plain, given)).toBeCloseTo(0.2, 12);
  });

  test('a beam too weak for a polarization has none, at m or at m = 0', () => {
    const dark = source({ kerr: { p: null, s: null } });
    expect(readingOf('rotationP', dark, zero, dark)).toBeNull();
    expect(readingOf('ellipticityS', source(), dark, dark)).toBeNull();
  });

  test('no reflectance, no contrast', () => {
    const dark = source({ R: { p: 0, s: 0 } });
    expect(readingOf('contrastP', dark, dark, dark)).toBeNull();
  });

  test('no amplitude where intensities add', () => {
    const incoherent = source({ r: null });
    expect(readingOf('crossSp', incoherent, incoherent, incoherent)).toBeNull();
    expect(readingOf('reflectanceP', incoherent, incoherent, incoherent)).toBe(0.4);
  });
});

describe('units', () => {
  test.each([
    [0, 0],
    [90, 90],
    [-90, 90],
    [91, -89],
    [180, 0],
    [-179.8, 0.2],
    [270, 90],
    [-45, -45],
  ])('%d deg folds to %d', (angleDeg, folded) => {
    expect(foldDegrees(angleDeg)).toBeCloseTo(folded, 12);
  });

  test('hc/e in eV nm (CODATA 2018: h, c and e are exact)', () => {
    const exact = ((6.62607015e-34 * 299792458) / 1.602176634e-19) * 1e9;
    expect(EV_NM).toBeCloseTo(exact, 6);
    expect(photonEnergyEv(photonEnergyEv(632.8))).toBeCloseTo(632.8, 10);
    expect(photonEnergyEv(632.8)).toBeCloseTo(1.9593, 4);
  });
});
