import { complex, divide, multiply, square, sqrt, subtract, add, abs } from 'mathjs';
import type { Complex } from 'mathjs';
import { describe, expect, test } from 'vitest';
import type { AngleFeatures } from '../../shared/live.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { angleFeatures } from './angleFeatures.ts';
import { AngleReadings } from './angleReadings.ts';

const buildFilm = (overrides: Partial<StackDocument> = {}): StackDocument => ({
  incident: { index: 1 },
  layers: [],
  substrate: { index: 1.5 },
  workingPoint: { wavelengthNm: 632.8, angleDeg: 45, input: 'p', magnetization: { mode: 'drawn' } },
  ...overrides,
});

const featuresOf = (film: StackDocument): AngleFeatures => angleFeatures(film, new Map());

/** Made-up cobalt: constants of the worked example in the solve contract. */
const cobalt = { index: [2.87, 3.36] as [number, number], voigt: [0.0376, 0.0066] as [number, number] };

/** |r_p|^2 of one face by Fresnel's formula (Born & Wolf, Principles of Optics, section 1.5.2), computed by mathjs. */
function fresnelRp([n, k]: readonly [number, number], angleDeg: number): number {
  const angle = (angleDeg * Math.PI) / 180;
  const eps = square(complex(n, k));
  const root = sqrt(complex(eps.re - Math.sin(angle) ** 2, eps.im));
  const first = multiply(eps, Math.cos(angle)) as Complex;
  const ratio = divide(subtract(first, root), add(first, root)) as Complex;
  return Number(abs(ratio)) ** 2;
}

/** The least value by thirds, then by a parabola through points far enough apart for 16 digits. */
function leastByMathjs(index: readonly [number, number]): number {
  let [low, high] = [45, 89.9];
  for (let step = 0; step < 60; step += 1) {
    const [a, b] = [low + (high - low) / 3, high - (high - low) / 3];
    if (fresnelRp(index, a) < fresnelRp(index, b)) high = b;
    else low = a;
  }
  // Richardson: the vertex of the parabola through x - h, x, x + h is off by c h^2, which two widths take away.
  const near = (low + high) / 2;
  const vertex = (h: number) => {
    const [left, middle, right] = [-h, 0, h].map((step) => fresnelRp(index, near + step)) as [
      number,
      number,
      number,
    ];
    return near + (h * (left - right)) / (2 * (left - 2 * middle + right));
  };
  return (4 * vertex(0.05) - vertex(0.1)) / 3;
}

describe('the pseudo-Brewster angle', () => {
  test.each([1.3, 1.5, 2.4, 4])('of glass of index %d is the arc tangent of it', (n) => {
    // Brewster (1815): tan(theta) = n, and nothing of p light is reflected there.
    const found = featuresOf(buildFilm({ substrate: { index: n } })).pseudoBrewster;
    expect(Math.abs(found!.angleDeg - (Math.atan(n) * 180) / Math.PI)).toBeLessThan(1e-7);
    expect(found!.reflectanceP).toBeLessThan(1e-15);
  });

  test.each([
    [2.87, 3.36],
    [0.18, 3.43],
    [1.37, 7.62],
    [3.88, 0.02],
  ] as const)('of a metal of index %d + %di is where Fresnel, by mathjs, reflects least', (n, k) => {
    const found = featuresOf(buildFilm({ substrate: { index: [n, k] } })).pseudoBrewster;
    expect(Math.abs(found!.angleDeg - leastByMathjs([n, k]))).toBeLessThan(1e-7);
    expect(found!.reflectanceP).toBeCloseTo(fresnelRp([n, k], found!.angleDeg), 12);
  });

  test('is none where p light is reflected least at normal incidence', () => {
    // From glass into air R_p falls from 4 % to 0 and rises to 1: an angle. Into the same glass nothing is reflected.
    expect(featuresOf(buildFilm({ incident: { index: 1.5 } })).pseudoBrewster).toBeNull();
    // A quarter wave of sqrt(n) on glass reflects nothing straight on (anti-reflection coating, common practice).
    const n = 2.25;
    const coat = { id: 'coat', medium: { index: Math.sqrt(n) }, thicknessNm: 632.8 / 4 / Math.sqrt(n) };
    const coated = featuresOf(buildFilm({ layers: [coat], substrate: { index: n } }));
    expect(coated.pseudoBrewster === null || coated.pseudoBrewster.angleDeg > 1).toBe(true);
  });
});

describe('sign changes', () => {
  const longitudinal = buildFilm({
    layers: [{ id: 'film', medium: cobalt, thicknessNm: 500, m: [1, 0, 0] }],
    substrate: { index: [3.88, 0.02] },
  });

  test.each([
    ['longitudinal', longitudinal],
    [
      'polar',
      {
        ...longitudinal,
        layers: [{ id: 'film', medium: cobalt, thicknessNm: 500, m: [0, 0, 1] as [number, number, number] }],
      },
    ],
  ])('of %s cobalt are those that a scan a hundred times finer sees, to its step', (_name, film) => {
    const { signChanges } = featuresOf(film);
    const readings = ['rotationP', 'ellipticityP', 'rotationS', 'ellipticityS'] as const;
    const scan = new AngleReadings(film, new Map(), readings);
    const step = 0.003;
    let before = scan.at(step / 2);
    const seen: { reading: string; angleDeg: number; rising: boolean }[] = [];
    for (let angle = step * 1.5; angle < 89.95; angle += step) {
      const here = scan.at(angle);
      for (const reading of readings) {
        const [a, b] = [before[reading], here[reading]];
        if (a * b < 0 && Math.abs(a - b) < 45)
          seen.push({ reading, angleDeg: angle - step / 2, rising: b > a });
      }
      before = here;
    }
    expect(seen.length).toBeGreaterThan(0);
    expect(signChanges).toHaveLength(seen.length);
    for (const { reading, angleDeg, rising } of seen) {
      const same = signChanges.filter((one) => one.reading === reading && one.rising === rising);
      expect(same.some((one) => Math.abs(one.angleDeg - angleDeg) <= step)).toBe(true);
    }
    // A bracket of 1e-9 deg about each holds both signs.
    for (const { reading, angleDeg, rising } of signChanges) {
      const [below, above] = [scan.at(angleDeg - 1e-9)[reading], scan.at(angleDeg + 1e-9)[reading]];
      expect([below < 0, above > 0]).toEqual([rising, rising]);
    }
  });

  test('are none where symmetry forbids an angle at all: purely transverse magnetization', () => {
    // physics.md section 1: m along y leaves p and s apart.
    const film = {
      ...longitudinal,
      layers: [{ ...longitudinal.layers[0]!, m: [0, 1, 0] as [number, number, number] }],
    };
    expect(featuresOf(film).signChanges).toEqual([]);
  });

  test('are not where the rotation is folded or has a pole: a weak magnet on a lossless Brewster angle', () => {
    // r_pp passes through 0 at atan(n) and r_sp does not: the rotation leaves by +-90 deg and comes back from the
    // other side (physics.md section 4, fold).
    const garnet = { index: 2.3, voigt: [1e-4, 0] as [number, number] };
    const film = buildFilm({ substrate: garnet, substrateM: [0, 0, 1] });
    const brewster = (Math.atan(2.3) * 180) / Math.PI;
    const { signChanges } = featuresOf(film);
    const there = signChanges.filter(({ angleDeg }) => Math.abs(angleDeg - brewster) < 0.01);
    const scan = new AngleReadings(film, new Map(), ['rotationP', 'ellipticityP']);
    for (const { reading, angleDeg } of there) {
      expect(
        Math.abs(scan.at(angleDeg)[reading === 'rotationP' ? 'rotationP' : 'ellipticityP']),
      ).toBeLessThan(1e-3);
    }
    expect(there.filter(({ reading }) => reading === 'rotationP')).toEqual([]);
  });
});
