import { describe, expect, it } from 'vitest';
import { buildDocument, buildMaterials } from './stackFixtures.ts';
import { axisOf, readView, writeView } from './viewState.ts';
import type { ViewState } from './viewState.ts';

const saved = buildDocument().workingPoint;
const read = (search: string) => readView(new URLSearchParams(search), saved);

describe('the view in the address', () => {
  it('is empty for the stack as it opens', () => {
    expect(writeView(read(''), saved).toString()).toBe('');
    expect(read('').point).toEqual(saved);
  });

  it('goes there and back whole', () => {
    const view: ViewState = {
      point: {
        wavelengthNm: 532,
        angleDeg: 12.5,
        input: 's',
        magnetization: { mode: 'direction', m: [0.6, 0, 0.8] },
      },
      kind: 'thickness',
      axis: { kind: 'thickness', layerId: 'co', from: 0.1, to: 20, points: 5000, spacing: 'log' },
      isMap: true,
      second: {
        kind: 'direction',
        plane: 'yz',
        layerId: 'co',
        from: -90,
        to: 90,
        points: 50,
        spacing: 'linear',
      },
      family: { kind: 'repeat', blockId: 'block', from: 1, to: 9, points: 5, spacing: 'linear' },
      reading: 'ellipticityS',
      shown: ['rotation', 'cross'],
      light: 'ps',
      log: true,
      unit: 'mrad',
    };
    expect(readView(new URLSearchParams(writeView(view, saved).toString()), saved)).toEqual(view);
  });

  it('falls back part by part where the address makes no sense', () => {
    const view = read(
      'wl=-5&angle=95&input=x&m=2,2,2&axis=sideways&from=0&to=200&points=10&unit=furlong&show=nothing',
    );
    expect(view.point).toEqual(saved);
    expect(view.kind).toBe('angle');
    expect(view.axis).toBeNull();
    expect(view.unit).toBe('mdeg');
    expect(read('angle=45&wl=').point).toEqual({ ...saved, angleDeg: 45 });
  });
});

describe('axisOf', () => {
  const document = buildDocument();
  const materials = buildMaterials();

  it('takes a default that the constants and the layers allow', () => {
    expect(axisOf({ kind: 'wavelength', axis: null }, document, materials)).toMatchObject({
      from: 450,
      to: 800,
    });
    expect(axisOf({ kind: 'thickness', axis: null }, document, materials)).toMatchObject({
      layerId: 'pt',
      from: 0,
      to: 10,
    });
    expect(axisOf({ kind: 'thickness', axis: null }, { ...document, layers: [] }, materials)).toBeNull();
  });

  it('lets go of a layer that was removed', () => {
    const axis = {
      kind: 'thickness',
      layerId: 'gone',
      from: 0,
      to: 1,
      points: 9,
      spacing: 'linear',
    } as const;
    expect(axisOf({ kind: 'thickness', axis }, document, materials)).toMatchObject({ layerId: 'pt' });
  });
});
