import { describe, expect, it } from 'vitest';
import { toSolveCase } from '../../shared/stackCase.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { buildDocument } from '../../tests/factories.ts';
import { documentPath } from './runPaths.ts';

const document: StackDocument = buildDocument({
  layers: [
    {
      id: 'film',
      medium: { index: [2.2, 4.1], voigt: [0.03, 0.01] },
      thicknessNm: 5,
      m: [0, 0, 1],
      oxide: { medium: { index: 2.2 }, consumedNm: 1, expansion: 1.5 },
      dead: { topNm: 0.1, bottomNm: 0.2 },
    },
    {
      id: 'block',
      repeat: 2,
      layers: [
        { id: 'inner', medium: { index: 1.4 }, thicknessNm: 1, dead: { topNm: 0, bottomNm: 0.3 } },
        { id: 'last', medium: { index: 1.6 }, thicknessNm: 1 },
      ],
    },
  ],
});

describe('documentPath', () => {
  it.each([
    ['layers[0].index', 'document.layers[0].oxide.medium.index'],
    ['layers[1].voigt', 'document.layers[0].medium.voigt'],
    ['layers[2].thicknessNm', 'document.layers[0].thicknessNm'],
    ['layers[3]', 'document.layers[0].medium'],
    ['layers[4].repeat', 'document.layers[1].repeat'],
    ['layers[4].layers[1].m', 'document.layers[1].layers[0].m'],
    ['layers[4].layers[2].material', 'document.layers[1].layers[1].medium'],
    ['cases[0].incident.index.samples[3]', 'document.incident.index.samples[3]'],
    ['substrate.m', 'document.substrateM'],
    ['wavelengthNm[2]', 'document.workingPoint.wavelengthNm'],
  ])('%s is %s', (inCase, expected) => {
    expect(documentPath(inCase, document)).toBe(expected);
  });

  it('knows every layer that the case has', () => {
    const { layers } = toSolveCase(document, 633, 0);
    layers.forEach((item, index) => {
      const last = index === layers.length - 1;
      expect(documentPath(`layers[${index}].thicknessNm`, document)).toBe(
        `document.layers[${last ? 1 : 0}].thicknessNm`,
      );
      expect('layers' in item).toBe(last);
    });
  });
});
