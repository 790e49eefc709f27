import { describe, expect, it } from 'vitest';
import {
  filmCautions,
  hasAxes,
  isMagnetic,
  mediumClass,
  mediumName,
  mediumNotes,
  versionKey,
} from './media.ts';
import { buildDocument, buildMaterials } from './stackFixtures.ts';

const materials = buildMaterials();
const co = { material: 'co', version: 1 };

describe('a medium on the drawing', () => {
  it('is named by formula, by the name it was given, or by its constants', () => {
    expect(mediumName(co, materials)).toBe('Co');
    expect(mediumName({ index: [2.3, 4.1], label: 'Co, annealed' }, materials)).toBe('Co, annealed');
    expect(mediumName({ index: [2.3, 4.1] }, materials)).toBe('2.3 + 4.1i');
    expect(mediumName({ index: 1.457 }, materials)).toBe('n 1.457');
    expect(mediumName({ material: 'not loaded' }, materials)).toBe('not loaded');
  });

  it('is coloured by class, typed-in constants by what they are like', () => {
    expect(mediumClass(co, materials)).toBe('magnet');
    expect(mediumClass({ index: [0.18, 3.43] }, materials)).toBe('noble');
    expect(mediumClass({ index: 1.457 }, materials)).toBe('dielectric');
    expect(mediumClass({ index: [3.88, 0.02] }, materials)).toBe('semiconductor');
    expect(mediumClass({ index: [3.5, 3.6] }, materials)).toBe('refractory');
    expect(mediumClass({ index: [2.3, 4.1], voigt: 0.03 }, materials)).toBe('magnet');
  });

  it('is magnetic when there is a Q', () => {
    expect(isMagnetic(co, materials)).toBe(true);
    expect(isMagnetic({ material: 'pt' }, materials)).toBe(false);
    expect(isMagnetic({ index: [2.3, 4.1], voigt: [0.03, 0] }, materials)).toBe(true);
  });
});

describe('a crystal of the library', () => {
  const co2 = materials.get('co')!;
  const crystals = new Map([
    ['plain', { ...co2, voigtRangeNm: null }],
    ['uniaxial', { ...co2, voigtRangeNm: null, anisotropy: 'uniaxial' as const }],
    ['cubic', { ...co2, voigtRangeNm: null, anisotropy: 'cubic' as const }],
    ['tensor', { ...co2, anisotropy: 'tensor' as const }],
  ]);
  const which = (test: (id: string) => boolean) => [...crystals.keys()].filter(test);

  it('has axes to turn, and an m where that does anything', () => {
    expect(which((material) => hasAxes({ material }, crystals))).toEqual(['uniaxial', 'cubic', 'tensor']);
    // A free tensor carries its own magnetization.
    expect(which((material) => isMagnetic({ material }, crystals))).toEqual(['cubic']);
  });

  it('says ε, not n and k, of a tensor that is known at other wavelengths', () => {
    const [note] = mediumNotes({ material: 'tensor' }, crystals, [100, 100], false);
    expect(note?.text).toBe('ε of Co is known for 450–1937 nm, not at 100 nm.');
  });
});

describe('an older version', () => {
  it('is judged by its own range, not by that of the newest', () => {
    const co1 = { ...materials.get('co')!, rangeNm: [600, 700] as [number, number] };
    const both = new Map([...materials, [versionKey('co', 1), co1] as const]);
    const textOf = (version: number) =>
      mediumNotes({ material: 'co', version }, both, [500, 500], false).map(({ text }) => text);
    expect(textOf(1)).toEqual(['n, k of Co is known for 600–700 nm, not at 500 nm.']);
    expect(textOf(2)).toEqual([]);
  });
});

describe('mediumNotes', () => {
  it('names what ends where, and offers to extend a constant of one wavelength', () => {
    expect(mediumNotes({ material: 'pt' }, materials, [100, 100], false)).toEqual([
      {
        tone: 'problem',
        kind: 'range',
        text: 'n, k of Pt is known for 248–2032 nm, not at 100 nm.',
        offer: null,
      },
    ]);
    expect(mediumNotes(co, materials, [500, 700], true)[0]).toMatchObject({
      tone: 'problem',
      text: 'Q of Co is known at 632.8 nm only, not at 500–700 nm.',
      offer: 'assumeConstant',
    });
  });

  it('says so once it is extended, and leaves Q alone where m is 0', () => {
    expect(mediumNotes({ ...co, assumeConstant: true }, materials, [500, 700], true)[0]).toMatchObject({
      tone: 'caution',
      kind: 'extended',
    });
    expect(mediumNotes(co, materials, [500, 700], false)).toEqual([]);
    expect(mediumNotes(co, materials, [632.8, 632.8], true)).toMatchObject([{ kind: 'memory' }]);
  });

  it('says each thing once for the film', () => {
    const document = buildDocument();
    const twice = { ...document, layers: [...document.layers, { ...document.layers[1]!, id: 'co2' }] };
    expect(filmCautions(twice, materials, [632.8, 632.8])).toHaveLength(1);
  });
});
