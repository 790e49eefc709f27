import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { materialCurvesSchema } from '../../shared/material.ts';
import { loadLibrary } from '../../worker/dispersion/loadLibrary.ts';
import { materialCurves } from '../../worker/dispersion/materialCurves.ts';
import { sampleIndex } from '../../worker/dispersion/sample.ts';

const library = loadLibrary(fileURLToPath(new URL('../../data/library', import.meta.url)));

describe('the shipped library', () => {
  test('holds what a grower of magnetic films needs', () => {
    expect(library.length).toBeGreaterThanOrEqual(40);
    expect(new Set(library.map((entry) => entry.id)).size).toBe(library.length);
    const formulas = new Set(library.map((entry) => entry.formula));
    const wanted =
      'Fe Co Ni NiFe Cr Mn Pd Pt Au Ag Cu Al Ta W Ti V Nb Mo Ir Rh Zr SiO2 Si Ge GaAs GaN Si3N4 Al2O3 AlN MgO MgF2 TiO2 TiN ITO SrTiO3 BK7 H2O YAG C air vacuum';
    expect(wanted.split(' ').filter((formula) => !formulas.has(formula))).toEqual([]);
  });

  test('says of each constant where it comes from and what to beware of', () => {
    for (const { id, content } of library) {
      const { citation, caution, licence, method } = content.indexSource;
      expect(citation, id).toMatch(/\w{3}/);
      expect(method, id).toBeTruthy();
      if (id === 'vacuum') continue;
      expect(caution, id).toBeTruthy();
      expect(licence, id).toContain('CC0');
      expect(citation, id).toMatch(/(19|20)\d\d/);
    }
  });

  test('prefers exactly one source of each substance', () => {
    for (const formula of new Set(library.map((entry) => entry.formula))) {
      const preferred = library.filter((entry) => entry.formula === formula && entry.preferred);
      expect(preferred, formula).toHaveLength(1);
    }
  });

  test('has magneto-optic constants for Fe, Co, Ni and NiFe, none of them passed off as published', () => {
    const magnetoOptic = library.filter(({ content }) => content.voigt !== null);
    expect(new Set(magnetoOptic.map((entry) => entry.formula))).toEqual(new Set(['Fe', 'Co', 'Ni', 'NiFe']));
    for (const { id, notes } of magnetoOptic) {
      expect(notes.join(' '), id).toContain('No complete published spectrum of Q');
    }
    const remembered = magnetoOptic.filter(({ content }) => content.voigt!.kind === 'table');
    expect(remembered).toHaveLength(5);
    for (const { id, content } of remembered) {
      expect(content.voigt, id).toMatchObject({ wavelengthsNm: [632.8] });
      expect(content.voigtSource!.confidence, id).toBe('from memory');
      expect(content.voigtSource!.caution, id).toMatch(/from memory, verify before use/i);
    }
  });

  test('calls its spectra of Q what they are: illustrative models, never preferred', () => {
    const models = library.filter(({ content }) => content.voigt !== null && content.voigt.kind !== 'table');
    expect(models.map(({ formula }) => formula)).toEqual(['Co', 'Fe', 'Ni']);
    for (const { id, name, preferred, content } of models) {
      expect(content.voigt, id).toMatchObject({ kind: 'lines', of: 'gyration' });
      expect(name, id).toMatch(/, illustrative model, not data$/);
      expect(preferred, id).toBe(false);
      expect(content.voigtSource!.confidence, id).toBe('invented for the demo');
      expect(content.voigtSource!.caution, id).toMatch(/^An illustrative model, not data/);
      expect(content.voigtSource!.citation, id).toMatch(/^Invented for the demo.*Magnetics Society of Japan/);
    }
  });

  test('has curves that a plot can show for every entry', () => {
    for (const { id, content } of library) {
      const curves = materialCurvesSchema.parse(materialCurves(content));
      expect(curves.wavelengthsNm.length, id).toBeLessThanOrEqual(400);
      expect(curves.wavelengthsNm.length, id).toBeGreaterThan(100);
      expect(curves.n.length, id).toBe(curves.wavelengthsNm.length);
      expect(Math.min(...curves.k), id).toBeGreaterThanOrEqual(0);
      curves.wavelengthsNm.reduce((before, wavelength) => {
        expect(wavelength, id).toBeGreaterThan(before);
        return wavelength;
      }, 0);
    }
  });

  test('keeps every point of a short table on its curve', () => {
    const cobalt = library.find((entry) => entry.id === 'co-johnson-1974')!.content;
    if (cobalt.index.kind !== 'table') throw new Error('a table was expected');
    const curves = materialCurves(cobalt);
    cobalt.index.wavelengthsNm.forEach((wavelength, i) => {
      const position = curves.wavelengthsNm.indexOf(wavelength);
      expect([curves.n[position], curves.k[position]]).toEqual([
        (cobalt.index as { n: number[] }).n[i],
        (cobalt.index as { k: number[] }).k[i],
      ]);
    });
    const { n, k } = sampleIndex('Co', cobalt.index, [632.8]);
    expect(curves.voigt).toEqual({
      wavelengthsNm: [632.8],
      q: [[0.03, 0.007]],
      index: [[n[0], k[0]]],
    });
  });
});

describe('a broken library file', () => {
  let directory: string;
  beforeEach(() => {
    directory = mkdtempSync(join(tmpdir(), 'library-'));
  });
  afterEach(() => rmSync(directory, { recursive: true }));

  const good = library.find((entry) => entry.id === 'co-johnson-1974')!;
  const loading = (id: string, content: unknown) => {
    writeFileSync(
      join(directory, `${id}.json`),
      typeof content === 'string' ? content : JSON.stringify(content),
    );
    return () => loadLibrary(directory);
  };

  test('is named with what is wrong', () => {
    const index = { kind: 'table', wavelengthsNm: [500, 500, 400], n: [1, 2], k: [1, 2, 3] };
    const load = loading('x', { ...good, content: { ...good.content, index, voigtSource: null } });
    for (const part of [
      'x.json',
      'content.index.n: must have 3 entries, one per wavelength, got 2',
      'content.index.wavelengthsNm[1]: must be greater than the one before, got 500 after 500',
      'content.index.wavelengthsNm[2]: must be greater than the one before, got 400 after 500',
      'content.voigtSource: must be given with voigt',
      'id: must be the name of the file, got co-johnson-1974',
    ]) {
      expect(load).toThrow(part);
    }
  });

  test.each([
    ['text that is not JSON', '{', 'not readable as JSON'],
    ['an unknown key', { ...good, colour: 'blue' }, 'colour: is not a known key'],
    [
      'gain',
      {
        ...good,
        content: { ...good.content, index: { kind: 'table', wavelengthsNm: [1], n: [1], k: [-1] } },
      },
      'content.index.k[0]: must be >= 0, got -1',
    ],
    [
      'a formula with a pole in its range',
      {
        ...good,
        content: {
          ...good.content,
          index: { kind: 'formula', expression: 'sqrt(1 - L)', coefficients: [], rangeNm: [400, 2000] },
        },
      },
      'content.index.expression: the formula sqrt(1 - L) gives n = NaN',
    ],
  ])('is refused: %s', (_what, content, message) => {
    expect(loading('co-johnson-1974', content)).toThrow(message);
  });
});
