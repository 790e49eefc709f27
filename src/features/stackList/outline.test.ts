import { describe, expect, it } from 'vitest';
import type { MaterialSummary } from '../../../shared/material.ts';
import { stackDocumentSchema } from '../../../shared/stack.ts';
import type { StackDocument, StackItem } from '../../../shared/stack.ts';
import { outlineOf } from './outline.ts';
import { documentOf, stackTemplates } from './templates.ts';

function buildMaterial(id: string, overrides: Partial<MaterialSummary> = {}): MaterialSummary {
  return {
    id,
    version: 1,
    name: id,
    formula: id,
    class: 'noble',
    groupId: null,
    rangeNm: [200, 2000],
    voigtRangeNm: null,
    preferred: false,
    citation: 'invented for this test',
    confidence: 'invented for the demo',
    voigtConfidence: null,
    indexKind: 'table',
    voigtKind: null,
    anisotropy: null,
    updatedAt: '2026-03-01T09:00:00.000Z',
    ...overrides,
  };
}

const library = [
  buildMaterial('pt-old', { formula: 'Pt' }),
  buildMaterial('pt', { formula: 'Pt', preferred: true, version: 3 }),
  buildMaterial('co-plain', { formula: 'Co', class: 'magnet', preferred: true }),
  buildMaterial('co', { formula: 'Co', class: 'magnet', voigtRangeNm: [632.8, 632.8] }),
  buildMaterial('ta', { formula: 'Ta', class: 'refractory' }),
  buildMaterial('silica', { formula: 'SiO2', class: 'dielectric' }),
  buildMaterial('si', { formula: 'Si', class: 'semiconductor' }),
];

const layer = (id: string, material: string, thicknessNm: number): StackItem => ({
  id,
  medium: { material },
  thicknessNm,
});

const stackOf = (layers: StackItem[]): StackDocument => ({ ...documentOf('blank', library), layers });

describe('documentOf', () => {
  it.each(stackTemplates)('makes a document that the server takes: %s', (template) => {
    expect(stackDocumentSchema.safeParse(documentOf(template, library)).success).toBe(true);
  });

  it('takes the preferred source, and for the magnet one whose Voigt constant is known', () => {
    const { layers } = documentOf('pt-co-pt', library);
    const materials = layers.map((item) => ('medium' in item ? item.medium.material : null));
    expect(materials).toEqual(['pt', 'co', 'pt', 'ta', 'silica']);
    expect(layers[0]).toMatchObject({ medium: { version: 3 } });
    expect(layers[1]).toMatchObject({ m: [0, 0, 1] });
  });

  it('passes over a preferred source that is not known at the working point or not over the visible range', () => {
    const narrow = buildMaterial('ta-ir', { formula: 'Ta', preferred: true, rangeNm: [667, 2000] });
    const red = buildMaterial('ta-red', { formula: 'Ta', preferred: true, rangeNm: [600, 700] });
    const { layers } = documentOf('pt-co-pt', [narrow, red, ...library]);
    expect(layers[3]).toMatchObject({ medium: { material: 'ta' } });
  });

  it('names what the library lacks', () => {
    const withoutTa = library.filter((material) => material.id !== 'ta');
    expect(() => documentOf('pt-co-pt', withoutTa)).toThrow('no Ta at 632.8 nm');
  });
});

describe('outlineOf', () => {
  it('says the layers in a line, from the surface to the substrate', () => {
    const outline = outlineOf(documentOf('pt-co-pt', library), library);
    expect(outline.text).toBe('Pt 3 / Co 1 / Pt 5 / Ta 5 / SiO₂ 100 on Si');
    expect(outline.bands.map((band) => band.magnetic)).toEqual([false, true, false, false, false]);
    expect(outline.substrate.class).toBe('semiconductor');
  });

  it('writes a block once and draws it as often as it stands', () => {
    const block: StackItem = { id: 'b', repeat: 3, layers: [layer('x', 'co', 0.4), layer('y', 'pt', 1)] };
    const outline = outlineOf(stackOf([block]), library);
    expect(outline.text).toBe('[Co 0.4 / Pt 1] × 3 on Si');
    expect(outline.bands.map((band) => band.label)).toEqual(['Co', 'Pt', 'Co', 'Pt', 'Co', 'Pt']);
  });

  it('stays small for a stack of a million layers', () => {
    const inner: StackItem = { id: 'i', repeat: 1000, layers: [layer('x', 'co', 0.4)] };
    const outline = outlineOf(stackOf([{ id: 'o', repeat: 1000, layers: [inner] }]), library);
    expect(outline.bands.length).toBe(60);
  });

  it('names typed-in media by their label and materials it does not know by their id', () => {
    const typed: StackItem = { id: 't', medium: { index: [2, 1], label: 'my oxide' }, thicknessNm: 2 };
    expect(outlineOf(stackOf([typed, layer('u', 'gone', 1)]), library).text).toBe(
      'my oxide 2 / gone 1 on Si',
    );
  });
});
