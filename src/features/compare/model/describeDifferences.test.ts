import { describe, expect, it } from 'vitest';
import type { SweepAxis, UsedMaterial } from '../../../../shared/run.ts';
import type { StackDocument, StackLayer } from '../../../../shared/stack.ts';
import type { ComparedInput } from './comparedInput.ts';
import { describeDifferences } from './describeDifferences.ts';

const angle: SweepAxis = { kind: 'angle', from: 0, to: 85, points: 171, spacing: 'linear' };

function used(id: string, formula: string, version = 1, name = `${formula} film`): UsedMaterial {
  const indexSource: UsedMaterial['indexSource'] = {
    citation: 'typed for this test',
    doi: null,
    licence: null,
    sample: null,
    method: null,
    confidence: 'from memory',
    caution: null,
  };
  return {
    id,
    version,
    name,
    formula,
    class: 'noble',
    indexSource,
    voigtSource: null,
    rangeNm: [300, 900],
    voigtRangeNm: null,
    assumedConstant: false,
  };
}

const materials = [used('pt', 'Pt'), used('co', 'Co'), used('ta', 'Ta'), used('si', 'Si')];

const cap: StackLayer = { id: 'cap', medium: { material: 'pt', version: 1 }, thicknessNm: 2 };
const magnet: StackLayer = {
  id: 'magnet',
  medium: { material: 'co', version: 1 },
  thicknessNm: 0.8,
  m: [0, 0, 1],
};
const buffer: StackLayer = {
  id: 'buffer',
  medium: { material: 'ta', version: 1 },
  thicknessNm: 4,
  note: 'buffer',
};

function build(overrides: Partial<StackDocument> = {}, rest: Partial<ComparedInput> = {}): ComparedInput {
  return {
    document: {
      incident: { index: 1 },
      layers: [cap, magnet, buffer],
      substrate: { material: 'si', version: 1 },
      workingPoint: { wavelengthNm: 632.8, angleDeg: 45, input: 'p', magnetization: { mode: 'drawn' } },
      ...overrides,
    },
    swept: [angle],
    materials,
    readings: ['rotationP', 'rotationS'],
    ...rest,
  };
}

function point(overrides: Partial<StackDocument['workingPoint']>): Partial<StackDocument> {
  return { workingPoint: { ...build().document.workingPoint, ...overrides } };
}

const said = (...inputs: ComparedInput[]) => describeDifferences(inputs).map((phrases) => phrases.join(', '));

describe('what differs between the inputs of runs', () => {
  it('is nothing for the same input, whatever it is called and whichever light the page shows', () => {
    const renamed = { ...cap, id: 'other', note: 'cap' };
    expect(said(build(), build({ ...point({ input: 's' }), layers: [renamed, magnet, buffer] }))).toEqual([
      '',
      '',
    ]);
  });

  it('names a thickness with its layer, and nothing that is alike', () => {
    const thicker = { ...cap, thicknessNm: 3 };
    expect(said(build(), build({ layers: [thicker, magnet, buffer] }))).toEqual([
      'Pt cap 2 nm',
      'Pt cap 3 nm',
    ]);
  });

  it('takes a cap of another material for the cap, in films that share no id', () => {
    const other: StackLayer[] = [
      { ...cap, id: 'a', medium: { material: 'ta', version: 1 } },
      { ...magnet, id: 'b' },
      { ...buffer, id: 'c' },
    ];
    expect(said(build(), build({ layers: other }))).toEqual(['Pt cap', 'Ta cap']);
    const thicker = other.map((layer) => (layer.id === 'a' ? { ...layer, thicknessNm: 3 } : layer));
    expect(said(build(), build({ layers: thicker }))).toEqual(['Pt cap 2 nm', 'Ta cap 3 nm']);
  });

  it('says of a film without a layer that it has none', () => {
    expect(said(build(), build({ layers: [magnet, buffer] }))).toEqual(['Pt cap 2 nm', 'no Pt cap']);
  });

  it('tells versions of a material once, not at each layer', () => {
    const newer = materials.map((one) => (one.id === 'co' ? used('co', 'Co', 2) : one));
    const layers = [cap, { ...magnet, medium: { material: 'co', version: 2 } }, buffer];
    expect(said(build(), build({ layers }, { materials: newer }))).toEqual([
      'version 1 of Co',
      'version 2 of Co',
    ]);
  });

  it('tells two sources of one substance by their names', () => {
    const other = [...materials, used('pt-b', 'Pt', 1, 'Pt, sputtered')];
    const layers = [{ ...cap, medium: { material: 'pt-b', version: 1 } }, magnet, buffer];
    expect(said(build(), build({ layers }, { materials: other }))).toEqual([
      'Pt (Pt film) cap',
      'Pt (Pt, sputtered) cap',
    ]);
    const thicker = layers.map((layer) => (layer.id === 'cap' ? { ...layer, thicknessNm: 3 } : layer));
    expect(said(build(), build({ layers: thicker }, { materials: other }))).toEqual([
      'Pt (Pt film) cap 2 nm',
      'Pt (Pt, sputtered) cap 3 nm',
    ]);
  });

  it('tells typed-in constants of one label by their numbers', () => {
    const typed = (index: [number, number]) => [{ ...cap, medium: { index, label: 'Pt' } }, magnet, buffer];
    expect(said(build({ layers: typed([2.3, 4.1]) }), build({ layers: typed([2.4, 4.1]) }))).toEqual([
      'Pt (2.3 + 4.1i) cap',
      'Pt (2.4 + 4.1i) cap',
    ]);
  });

  it('names the working point only where the axis does not sweep it', () => {
    const at = point({ angleDeg: 30, wavelengthNm: 800 });
    expect(said(build(), build(at))).toEqual(['632.8 nm', '800 nm']);
    const wavelength: SweepAxis = { ...angle, kind: 'wavelength', from: 400, to: 900 };
    expect(said(build({}, { swept: [wavelength] }), build(at, { swept: [wavelength] }))).toEqual([
      '45°',
      '30°',
    ]);
  });

  it('does not count the thickness of the swept layer, but which layer it is', () => {
    const sweep = (layerId: string): SweepAxis => ({ ...angle, kind: 'thickness', layerId, from: 0, to: 10 });
    const thicker = { layers: [{ ...cap, thicknessNm: 7 }, magnet, buffer] };
    expect(said(build({}, { swept: [sweep('cap')] }), build(thicker, { swept: [sweep('cap')] }))).toEqual([
      '',
      '',
    ]);
    expect(said(build({}, { swept: [sweep('cap')] }), build({}, { swept: [sweep('buffer')] }))).toEqual([
      'Pt cap swept, Ta buffer 4 nm',
      'Pt cap 2 nm, Ta buffer swept',
    ]);
  });

  it('names m, and not the m that a direction replaces', () => {
    const alongX: [number, number, number] = [1, 0, 0];
    const tilted = { layers: [cap, { ...magnet, m: alongX }, buffer] };
    expect(said(build(), build(tilted))).toEqual(['m of Co along +z', 'm of Co along +x']);
    const replaced = point({ magnetization: { mode: 'direction', m: [0, 1, 0] } });
    expect(said(build(replaced), build({ ...tilted, ...replaced }))).toEqual(['', '']);
    expect(said(build(), build(replaced))[1]).toBe('m along +y');
  });

  it('names the input azimuth only where a stored reading depends on it', () => {
    const turned = point({ inputAzimuthDeg: 20 });
    expect(said(build(), build(turned))).toEqual(['', '']);
    const readings = ['rotationAtAzimuth' as const];
    expect(said(build({}, { readings }), build(turned, { readings }))).toEqual([
      'input azimuth 0°',
      'input azimuth 20°',
    ]);
  });

  it('names substrate, repeats, averages, range and points', () => {
    const block = (repeat: number) => ({ layers: [cap, { id: 'block', repeat, layers: [magnet, buffer] }] });
    expect(said(build(block(4)), build(block(6)))).toEqual(['4 × Co/Ta', '6 × Co/Ta']);
    expect(said(build(), build({ substrate: { index: 1.457, label: 'SiO2' } }))).toEqual([
      'on Si',
      'on SiO2',
    ]);
    expect(said(build(), build({ spread: { shape: 'normal', divergenceDeg: 1 } }))).toEqual([
      'not averaged',
      'averaged over 1° of angle',
    ]);
    expect(said(build(), build({}, { swept: [{ ...angle, to: 60, points: 61 }] }))).toEqual([
      '0–85°, 171 points',
      '0–60°, 61 points',
    ]);
  });

  it('names the order of the same layers', () => {
    expect(said(build(), build({ layers: [buffer, magnet, cap] }))[1]).toContain(
      'Ta buffer / Co / Pt from the light',
    );
  });

  it('states for three runs every key in which any two differ', () => {
    const thicker = { layers: [{ ...cap, thicknessNm: 3 }, magnet, buffer] };
    expect(said(build(), build(thicker), build(point({ wavelengthNm: 800 })))).toEqual([
      'Pt cap 2 nm, 632.8 nm',
      'Pt cap 3 nm, 632.8 nm',
      'Pt cap 2 nm, 800 nm',
    ]);
  });
});
