import { describe, expect, it } from 'vitest';
import type { StackDocument } from '../../../../shared/stack.ts';
import { buildDocument, buildLayer, buildMaterials } from './stackFixtures.ts';
import { filmVersions, isOutdated, usedVersions, withNewest, withNewestEverywhere } from './versions.ts';

/** Pt has got a version 3, Co a version 2. */
const materials = new Map(
  [...buildMaterials()].map(([id, one]) => [id, { ...one, version: id === 'pt' ? 3 : 2 }]),
);
const pt = { material: 'pt', version: 1 };
const air = { index: 1 };
const mix = (first: StackDocument['substrate'], second: StackDocument['substrate']) => ({
  mixture: {
    model: 'bruggeman' as const,
    fraction: 0.5,
    parts: [first, second] as [typeof first, typeof second],
  },
});

/** Pt stands in every place that a medium can have. */
const film: StackDocument = {
  ...buildDocument(),
  incident: pt,
  layers: [
    {
      id: 'block',
      repeat: 2,
      layers: [
        buildLayer({ medium: mix(pt, air), oxide: { medium: pt, consumedNm: 1, expansion: 1.5 } }),
        buildLayer({ id: 'co', medium: { material: 'co' } }),
      ],
    },
  ],
  substrate: pt,
  backside: { thicknessNm: 5e5, exit: pt },
};

describe('versions of the materials of a film', () => {
  it('are found in every place, each once, and say which is newer', () => {
    const used = filmVersions(film, materials);
    expect(used).toEqual([
      { id: 'pt', version: 1, newest: 3 },
      { id: 'co', version: null, newest: 2 },
    ]);
    expect(used.map(isOutdated)).toEqual([true, false]);
    expect(usedVersions({ material: 'gone', version: 1 }, materials).map(isOutdated)).toEqual([false]);
  });

  it('are taken everywhere, and nothing else is touched', () => {
    const newer = { material: 'pt', version: 3 };
    expect(withNewestEverywhere(film, materials)).toEqual({
      ...film,
      incident: newer,
      layers: [
        {
          id: 'block',
          repeat: 2,
          layers: [
            buildLayer({ medium: mix(newer, air), oxide: { medium: newer, consumedNm: 1, expansion: 1.5 } }),
            buildLayer({ id: 'co', medium: { material: 'co' } }),
          ],
        },
      ],
      substrate: newer,
      backside: { thicknessNm: 5e5, exit: newer },
    });
    expect(withNewestEverywhere(film, materials, 'co')).toEqual(film);
  });

  it('keep what else a medium says', () => {
    const extended = { material: 'co', version: 1, assumeConstant: true };
    expect(withNewest(extended, materials)).toEqual({ ...extended, version: 2 });
    const typed = { index: 2 };
    expect(withNewest(typed, materials)).toBe(typed);
  });
});
