import { describe, expect, it } from 'vitest';
import type { IndexDispersion, VoigtDispersion } from '../../../../shared/dispersion.ts';
import type { MaterialContent } from '../../../../shared/material.ts';
import { ownHabits } from '../../../../shared/materialImport.ts';
import { blankForm, blankIndex, blankVoigt } from './blankForm.ts';
import { readContent } from './draftOfForm.ts';
import { formOfMaterial } from './formOfMaterial.ts';
import { buildContent, buildMaterial, buildSource } from './materialFixtures.ts';
import { readForm } from './readForm.ts';

// What is stored must come through the form unchanged. No physics here; the numbers are arbitrary.

function throughForm(content: MaterialContent) {
  const form = formOfMaterial(buildMaterial({ content }));
  const read = readContent(form.content, { sourcesLater: false });
  expect(read.issues).toEqual([]);
  return read.draft;
}

const rangeNm: [number, number] = [400, 900];

const indices: Record<string, IndexDispersion> = {
  table: { kind: 'table', wavelengthsNm: [400, 0.1 + 0.2 + 500], n: [1 / 3, 2], k: [1e-9, 0] },
  formula: { kind: 'formula', expression: 'c1', coefficients: [1.5], rangeNm, quantity: 'eps' },
  sellmeier: {
    kind: 'model',
    rangeNm,
    model: { name: 'sellmeier', constant: 1, terms: [{ b: 1.1, cUm2: 0.01 }] },
  },
  cauchy: { kind: 'model', rangeNm, model: { name: 'cauchy', a: 1.5, bUm2: 0.004, cUm4: 1e-4 } },
  'cauchy with a tail': {
    kind: 'model',
    rangeNm,
    model: { name: 'cauchy', a: 1.5, bUm2: 0, cUm4: 0, tail: { k: 0.01, perEv: 2, atEv: 3 } },
  },
  oscillators: {
    kind: 'model',
    rangeNm,
    model: {
      name: 'oscillators',
      epsInfinity: 1.2,
      terms: [
        { kind: 'drude', plasmaEv: 9, dampingEv: 0.07 },
        { kind: 'lorentz', strength: 1, centreEv: 3, dampingEv: 0.4 },
        { kind: 'tauc-lorentz', amplitudeEv: 80, gapEv: 1.2, centreEv: 3.5, dampingEv: 2 },
      ],
    },
  },
  tensor: {
    kind: 'tensor',
    wavelengthsNm: [633],
    // prettier-ignore
    epsilon: [
      [
        [[4, 1], [0, 0.1], [0, 0]],
        [[0, -0.1], [4, 1], [0, 0]],
        [[0, 0], [0, 0], [5, 0]],
      ],
    ],
  },
};

const voigts: Record<string, VoigtDispersion> = {
  table: { kind: 'table', wavelengthsNm: [500, 600], q: [[0.02, -0.003], [1 / 7, 0]] }, // prettier-ignore
  formula: { kind: 'formula', expression: 'c1*i', coefficients: [0.02], rangeNm },
  lines: {
    kind: 'lines',
    rangeNm,
    of: 'gyration',
    lines: [{ shape: 'diamagnetic', amplitude: -0.1, centreEv: 2, dampingEv: 0.3 }],
  },
};

describe('a stored version through the form', () => {
  it.each(Object.entries(indices))('keeps an index given by %s', (_, index) => {
    expect(throughForm(buildContent({ index }))).toEqual(buildContent({ index }));
  });

  it.each(Object.entries(voigts))('keeps a Q given by %s', (_, voigt) => {
    const content = buildContent({ voigt, voigtSource: buildSource({ confidence: 'from memory' }) });
    expect(throughForm(content)).toEqual(content);
  });

  it('keeps anisotropy and the law of temperature', () => {
    const content = buildContent({
      anisotropy: { kind: 'uniaxial', extraordinary: { ...buildContent().index, kind: 'table', wavelengthsNm: [5], n: [1], k: [0] }, axis: [0, 0.6, 0.8] }, // prettier-ignore
      anisotropySource: buildSource(),
      thermal: { curieK: 1388, a: 1.5, b: 0.36, citation: 'somebody' },
    });
    expect(throughForm(content)).toEqual(content);
    const cubic = buildContent({
      anisotropy: { kind: 'cubic', wavelengthNm: 633, g11: [1, 2], g12: [3, 4], g44: [5, 6], azimuthDeg: 30 },
      anisotropySource: buildSource(),
    });
    expect(throughForm(cubic)).toEqual(cubic);
  });

  it('names the parts of a mixture, and the import of imported constants, instead of sending them again', () => {
    const part = (material: string) => ({ material, version: 2, name: material, index: { ...indices['cauchy'], kind: 'table' as const, wavelengthsNm: [1], n: [1], k: [0] }, voigt: null }); // prettier-ignore
    const mixture: IndexDispersion = { kind: 'mixture', model: 'bruggeman', fraction: 0.3, parts: [part('a'), part('b')] }; // prettier-ignore
    const mapping = { spectral: { column: 0, unit: 'nm' as const }, index: { from: 'n, k' as const, n: 1, k: 2 }, voigt: null, indexOf: null, habits: ownHabits }; // prettier-ignore
    const origin = { importId: 'i1', fileName: 'a.csv', sha256: '', rows: 7, mapping, sentences: [], warnings: [] }; // prettier-ignore
    expect(throughForm(buildContent({ index: mixture }))?.index).toEqual({
      kind: 'mixture of',
      model: 'bruggeman',
      fraction: 0.3,
      parts: [
        { material: 'a', version: 2 },
        { material: 'b', version: 2 },
      ],
    });
    expect(throughForm(buildContent({ origin: { index: origin } }))?.index).toEqual({
      kind: 'import',
      importId: 'i1',
      mapping,
    });
  });
});

describe('what is wrong with a form', () => {
  it('is said all at once, each at its path', () => {
    const form = blankForm();
    form.content.index = { kind: 'table', rows: [['500', '1,5', 'x'], ['600', '', '0']] }; // prettier-ignore
    form.content.voigt = {
      kind: 'lines',
      rangeNm,
      of: 'voigt',
      lines: [{ shape: 'paramagnetic', amplitude: 1, centreEv: -1, dampingEv: 1 }],
    };
    const read = readForm(form);
    const found =
      read.body === null ? new Map(read.issues.map(({ path, message }) => [path, message])) : null;
    expect(found?.get('name')).toContain('must not be empty');
    expect(found?.get('formula')).toContain('must not be empty');
    expect(found?.get('indexSource.citation')).toContain('must not be empty');
    expect(found?.get('voigtSource.citation')).toContain('must not be empty');
    expect(found?.get('index.k[0]')).toBe('must be a number, got "x"');
    expect(found?.get('index.n[1]')).toBe('must be filled in');
    expect(found?.get('voigt.lines[0].centreEv')).toBe('must be > 0, got -1');
    expect(found?.size).toBe(7);
  });

  it('is nothing where a kind starts, but for what only a person can say', () => {
    for (const kind of ['sellmeier', 'cauchy', 'oscillators', 'formula', 'tensor'] as const) {
      for (const voigt of ['none', 'lines', 'formula'] as const) {
        const { content } = blankForm();
        const start = { ...content, index: blankIndex(kind, rangeNm), voigt: blankVoigt(voigt, rangeNm) };
        expect(readContent(start, { sourcesLater: true }).issues, `${kind}, ${voigt}`).toEqual([]);
      }
    }
  });
});
