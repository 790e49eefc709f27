import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';
import { loadLibrary } from '../../worker/dispersion/loadLibrary.ts';
import { sampleIndex, sampleVoigt } from '../../worker/dispersion/sample.ts';

const library = loadLibrary(fileURLToPath(new URL('../../data/library', import.meta.url)));

function entryOf(id: string) {
  const entry = library.find((candidate) => candidate.id === id);
  if (!entry) throw new Error(`no entry ${id}`);
  return entry;
}

function indexOf(id: string, wavelengthNm: number): [n: number, k: number] {
  const { n, k } = sampleIndex(id, entryOf(id).content.index, [wavelengthNm]);
  return [n[0]!, k[0]!];
}

function voigtOf(id: string, wavelengthNm: number) {
  const { index, voigt } = entryOf(id).content;
  if (!voigt) throw new Error(`no Voigt constant of ${id}`);
  return sampleVoigt(id, { index, voigt }, [wavelengthNm]);
}

describe('tabulated points come back as printed', () => {
  test.each([
    ['au-johnson-1972', 616.8, 0.21, 3.272, 'Johnson and Christy, Phys. Rev. B 6, 4370 (1972), 2.01 eV'],
    ['au-johnson-1972', 548.6, 0.43, 2.455, 'the same, 2.26 eV'],
    ['ag-johnson-1972', 616.8, 0.06, 4.152, 'the same, 2.01 eV'],
    ['ag-johnson-1972', 520.9, 0.05, 3.324, 'the same, 2.38 eV'],
    ['cu-johnson-1972', 616.8, 0.3, 3.205, 'the same, 2.01 eV'],
    ['co-johnson-1974', 617, 2.19, 4.11, 'Johnson and Christy, Phys. Rev. B 9, 5056 (1974), 2.01 eV'],
    ['co-johnson-1974', 199, 1.29, 1.71, 'the same, the first point shipped'],
    ['co-johnson-1974', 1937, 3.87, 7.79, 'the same, 0.64 eV, the last point'],
    ['si-aspnes-1983', 619.9, 3.906, 0.022, 'Aspnes and Studna, Phys. Rev. B 27, 985 (1983), 2.0 eV'],
    ['si-aspnes-1983', 590.4, 3.969, 0.03, 'the same, 2.1 eV'],
    ['ge-aspnes-1983', 619.9, 5.588, 0.933, 'the same, 2.0 eV'],
  ])('%s at %d nm', (id, wavelengthNm, n, k) => {
    expect(indexOf(id, wavelengthNm)).toEqual([n, k]);
  });
});

describe('dispersion formulas give the index printed elsewhere', () => {
  // Digits: the last printed one, so half a unit of it is the tolerance.
  test.each([
    ['sio2-malitson-1965', 632.8, 1.45702, 5, 'Malitson, J. Opt. Soc. Am. 55, 1205 (1965)'],
    ['sio2-malitson-1965', 587.5618, 1.45846, 5, 'fused silica n_d, handbook value, from memory'],
    ['bk7-schott-2017', 587.5618, 1.5168, 5, 'data sheet N-BK7, SCHOTT: n_d'],
    ['bk7-schott-2017', 486.1327, 1.52238, 5, 'the same: n_F'],
    ['bk7-schott-2017', 656.2725, 1.51432, 5, 'the same: n_C'],
    ['mgf2-dodge-1984-o', 589.3, 1.3777, 4, 'Dodge, Appl. Opt. 23, 1980 (1984), ordinary'],
    ['sapphire-malitson-1972-o', 589.3, 1.768, 3, 'sapphire n_o, handbook value, from memory'],
    ['mgo-stephens-1952', 632.8, 1.735, 3, 'Stephens and Malitson, J. Res. NBS 49, 249 (1952)'],
    ['rutile-devore-1951-o', 589.3, 2.613, 3, 'Devore, J. Opt. Soc. Am. 41, 416 (1951)'],
    ['yag-zelmon-1998', 632.8, 1.8295, 4, 'Zelmon et al., Appl. Opt. 37, 4933 (1998)'],
    ['srtio3-bond-1965', 632.8, 2.388, 3, 'Bond, J. Appl. Phys. 36, 1674 (1965)'],
    ['water-daimon-2007', 589.3, 1.3333, 4, 'Daimon and Masumura, Appl. Opt. 46, 3811 (2007)'],
    ['air-ciddor-1996', 589.3, 1.000277, 6, 'Ciddor, Appl. Opt. 35, 1566 (1996)'],
  ])('%s at %d nm: %d', (id, wavelengthNm, n, digits) => {
    const [sampled, k] = indexOf(id, wavelengthNm);
    expect(sampled).toBeCloseTo(n, digits);
    expect(k).toBe(0);
  });

  test('vacuum is exactly 1', () => {
    for (const wavelengthNm of [1, 632.8, 10600]) expect(indexOf('vacuum', wavelengthNm)).toEqual([1, 0]);
  });
});

describe('between the points, at 632.8 nm', () => {
  // Values as used at the bench, common practice; each must follow from the shipped table.
  test.each([
    ['au-johnson-1972', 0.18, 3.43],
    ['ag-johnson-1972', 0.056, 4.28],
    ['cr-johnson-1974', 3.14, 3.31],
    ['ni-johnson-1974', 1.99, 4.11],
    ['pt-rakic-1998', 2.33, 4.15],
    ['si-aspnes-1983', 3.882, 0.019],
    ['nife-tikuisis-2017', 2.38, 3.94],
  ])('%s is close to %d + %di', (id, n, k) => {
    const [sampledN, sampledK] = indexOf(id, 632.8);
    expect(Math.abs(sampledN - n)).toBeLessThan(0.01);
    expect(Math.abs(sampledK - k)).toBeLessThan(0.03);
  });

  test('two sources of silicon agree at 600 nm', () => {
    const [aspnes, green] = [indexOf('si-aspnes-1983', 600), indexOf('si-green-2008', 600)];
    expect(Math.abs(aspnes[0] - green[0])).toBeLessThan(0.02);
    expect(Math.abs(aspnes[1] - green[1])).toBeLessThan(0.01);
  });

  test('the two sources of platinum differ by about 20 % in k, as their cautions say', () => {
    const ratio = indexOf('pt-tselin-2024', 632.8)[1] / indexOf('pt-rakic-1998', 632.8)[1];
    expect(ratio).toBeGreaterThan(1.15);
    expect(ratio).toBeLessThan(1.25);
    for (const id of ['pt-tselin-2024', 'pt-rakic-1998']) {
      expect(entryOf(id).content.indexSource.caution).toContain('20 %');
    }
  });
});

describe('Voigt constants', () => {
  test('iron is the value of physics: 0.0376 + 0.0066i at 632.8 nm, from memory of the work of Zak et al.', () => {
    const { re, im } = voigtOf('fe-johnson-1974', 632.8);
    expect([re[0], im[0]]).toEqual([0.0376, 0.0066]);
  });

  // |N Q / (N^2 - 1)| is the modulus of the complex polar Kerr angle of the bulk to first order in Q; the sizes
  // are known to about a factor of 1.5: from memory.
  test.each([
    ['fe-johnson-1974', 0.49],
    ['co-johnson-1974', 0.35],
    ['ni-johnson-1974', 0.15],
    ['nife-tikuisis-2017', 0.17],
  ])('%s gives a bulk polar Kerr angle of about %d deg', (id, expectedDeg) => {
    const [n, k] = indexOf(id, 632.8);
    const { re, im } = voigtOf(id, 632.8);
    const kerr = (Math.hypot(n, k) * Math.hypot(re[0]!, im[0]!)) / Math.hypot(n * n - k * k - 1, 2 * n * k);
    const kerrDeg = (kerr * 180) / Math.PI;
    expect(kerrDeg).toBeGreaterThan(expectedDeg / 1.5);
    expect(kerrDeg).toBeLessThan(expectedDeg * 1.5);
  });
});
