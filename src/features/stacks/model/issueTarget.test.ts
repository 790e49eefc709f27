import { describe, expect, it } from 'vitest';
import { issueTarget } from './issueTarget.ts';
import { buildBlock, buildDocument, buildLayer } from './stackFixtures.ts';

const document = buildDocument({
  layers: [buildLayer({ id: 'a' }), buildBlock([buildLayer({ id: 'b' }), buildLayer({ id: 'c' })])],
});

describe('issueTarget', () => {
  it.each([
    ['cases[0].layers[0].thicknessNm', { place: 'layer', id: 'a', field: 'thicknessNm' }],
    ['cases[2].layers[1].layers[1].material', { place: 'layer', id: 'c', field: 'material' }],
    ['document.layers[1].repeat', { place: 'layer', id: 'block', field: 'repeat' }],
    ['cases[0].substrate.index', { place: 'substrate', field: 'index' }],
    ['document.substrateM', { place: 'substrate', field: 'm' }],
    ['cases[1].incident', { place: 'incident', field: '' }],
    ['cases[0].angleDeg', { place: 'point', field: 'angleDeg' }],
    ['document.workingPoint.wavelengthNm', { place: 'point', field: 'wavelengthNm' }],
    ['cases[0].layers[7].thicknessNm', { place: 'page', field: 'cases[0].layers[7].thicknessNm' }],
    ['name', { place: 'page', field: 'name' }],
  ])('finds %s', (path, target) => {
    expect(issueTarget(document, path)).toEqual(target);
  });
});
