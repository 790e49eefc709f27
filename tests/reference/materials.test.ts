import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import { magnetizationAt } from '../../shared/thermal.ts';
import { photonEnergyEv } from '../../shared/units.ts';
import { loadLibrary } from '../../worker/dispersion/loadLibrary.ts';
import { sampleIndex, sampleVoigt } from '../../worker/dispersion/sample.ts';
import { solvePoint } from './solvePoint.ts';

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

describe('every shipped table is its source', () => {
  // Four points of each table as its source has them, the first and the last among them; the citation stands beside.
  const file = new URL('./library-spot-values.json', import.meta.url);
  const sources = z
    .array(
      z.object({
        id: z.string(),
        citation: z.string(),
        points: z.array(z.tuple([z.number(), z.number(), z.number()])).min(3),
      }),
    )
    .parse(JSON.parse(readFileSync(file, 'utf8')));

  test.each(sources)('$id', ({ id, citation, points }) => {
    const { index, indexSource } = entryOf(id).content;
    expect(indexSource.citation).toBe(citation);
    for (const [wavelengthNm, n, k] of points) expect(indexOf(id, wavelengthNm)).toEqual([n, k]);
    if (index.kind !== 'table') throw new Error('a table was expected');
    expect([index.wavelengthsNm[0], index.wavelengthsNm.at(-1)]).toEqual([points[0]![0], points.at(-1)![0]]);
  });

  test('none is left out, and an illustrative entry has the index of the entry it belongs to', () => {
    const checked = new Set(sources.map(({ id }) => id));
    const others = library.filter(({ id, content }) => content.index.kind === 'table' && !checked.has(id));
    expect(others.map(({ id }) => id)).toEqual(
      ['co', 'fe', 'ni'].map((metal) => `${metal}-illustrative-lines`),
    );
    for (const { id, content } of others) {
      expect(content.index, id).toEqual(entryOf(`${id.slice(0, 2)}-johnson-1974`).content.index);
    }
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
    ['bk7-schott-2017', 1060, 1.50669, 5, 'the same: n_1060'],
    ['sio2-malitson-1965', 1064, 1.4496, 4, 'fused silica, data sheets of makers, from memory'],
    ['quartz-ghosh-1999-o', 589.3, 1.5442, 4, 'crystal quartz n_o, CRC Handbook, from memory'],
    ['sapphire-malitson-1972-o', 632.8, 1.766, 3, 'sapphire n_o, data sheets of makers, from memory'],
    ['mgo-stephens-1952', 589.3, 1.737, 3, 'MgO n_D, CRC Handbook, from memory'],
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

  // D. W. Lynch and W. R. Hunter in Palik, Handbook of Optical Constants of Solids (1985), gold at 635.8 nm, from
  // memory: 0.166 + 3.15i. Sources of gold differ by a tenth in k.
  test.each(['au-johnson-1972', 'au-olmon-2012'])(
    '%s agrees with the handbook of Palik as far as gold does',
    (id) => {
      const [n, k] = indexOf(id, 635.8);
      expect(Math.abs(n - 0.166)).toBeLessThan(0.05);
      expect(Math.abs(k / 3.15 - 1)).toBeLessThan(0.12);
    },
  );

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

describe('illustrative lines of Fe, Co and Ni', () => {
  /** Kerr rotation of the bulk in deg, normal incidence, m into the film. */
  const rotationDeg = (id: string, wavelengthNm: number): number => {
    const { re, im } = voigtOf(id, wavelengthNm);
    const { kerr } = solvePoint({
      wavelengthNm,
      angleDeg: 0,
      incident: { index: 1 },
      layers: [],
      substrate: { index: indexOf(id, wavelengthNm), voigt: [re[0]!, im[0]!], m: [0, 0, 1] },
    });
    return kerr.p!.rotationDeg;
  };

  // Sizes and energies: Magnetics Society of Japan, questions and answers by T. Ishibashi, citing K. Sato, "Hikari to
  // Jiki" (Light and Magnetism). The cobalt peak, 0.62 eV there, is beyond the table of n and k, which ends at 0.640 eV.
  test.each([
    ['fe', 0.87, 0.75],
    ['co', 0.85, 0.665],
    ['ni', 0.19, 3.1],
  ])('%s: the largest polar Kerr rotation is %d deg at %d eV', (metal, peakDeg, peakEv) => {
    const id = `${metal}-illustrative-lines`;
    const curve = Array.from({ length: 400 }, (_, i) => 350 + (i * 1587) / 399).map((wavelengthNm) => ({
      energyEv: photonEnergyEv(wavelengthNm),
      rotation: rotationDeg(id, wavelengthNm),
    }));
    const peak = curve.reduce((most, at) => (Math.abs(at.rotation) > Math.abs(most.rotation) ? at : most));
    expect(Math.abs(peak.rotation) / peakDeg).toBeGreaterThan(0.99);
    expect(Math.abs(peak.rotation) / peakDeg).toBeLessThan(1.01);
    expect(Math.abs(peak.energyEv / peakEv - 1)).toBeLessThan(0.02);
    // The sign of the peak, and that at 632.8 nm, is the one of the constant known at 632.8 nm.
    const known = rotationDeg(`${metal}-johnson-1974`, 632.8);
    expect(Math.sign(peak.rotation)).toBe(Math.sign(known));
    expect(Math.sign(rotationDeg(id, 632.8))).toBe(Math.sign(known));
  });
});

// C. Kittel, Introduction to Solid State Physics, table of ferromagnetic crystals, from memory: saturation magnetization
// in G at room temperature and at 0 K, Curie temperature in K.
test.each([
  ['fe', 1707, 1740, 1043],
  ['co', 1400, 1446, 1388],
  ['ni', 485, 510, 627],
])('the law of %s gives its magnetization at room temperature', (metal, warm, cold, curieK) => {
  for (const id of [`${metal}-johnson-1974`, `${metal}-illustrative-lines`]) {
    const { thermal } = entryOf(id).content;
    expect(thermal!.curieK).toBe(curieK);
    expect(magnetizationAt(293, thermal!)).toBeCloseTo(warm / cold, 3);
    expect(thermal!.citation).toMatch(/Kittel.*from memory.*common practice, no source/);
  }
});
