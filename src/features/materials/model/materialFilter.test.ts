import { describe, expect, it } from 'vitest';
import { buildSummary } from '../materialFixtures.ts';
import { filterMaterials, noFilter, readFilter, writeFilter } from './materialFilter.ts';
import type { MaterialFilter } from './materialFilter.ts';

const library = [
  buildSummary('co', {
    name: 'Cobalt',
    formula: 'Co',
    class: 'magnet',
    rangeNm: [188, 1937],
    voigtRangeNm: [632.8, 632.8],
    voigtConfidence: 'from memory',
  }),
  buildSummary('cr', { name: 'Chromium', formula: 'Cr', class: 'refractory', citation: 'Example 1974' }),
  buildSummary('mn', {
    name: 'Manganese',
    formula: 'Mn',
    class: 'magnet',
    groupId: 'g',
    citation: 'Example 1974',
    confidence: 'fitted',
    rangeNm: [400, 900],
    voigtRangeNm: [400, 900],
    voigtConfidence: 'measured',
  }),
];
const found = (change: Partial<MaterialFilter>) =>
  filterMaterials(library, { ...noFilter, ...change }).map((material) => material.id);

describe('filterMaterials', () => {
  it('shows everything when nothing is asked', () => {
    expect(found({})).toEqual(['co', 'cr', 'mn']);
  });

  it('wants every word, in name, formula or source, in any case', () => {
    expect(found({ words: 'example 1974' })).toEqual(['cr', 'mn']);
    expect(found({ words: ' MANG  1974 ' })).toEqual(['mn']);
    expect(found({ words: 'cobalt 1974' })).toEqual([]);
  });

  it('wants n and k at both ends of a range, in either order', () => {
    expect(found({ fromNm: 300, toNm: 800 })).toEqual(['co', 'cr']);
    expect(found({ fromNm: 1950, toNm: 800 })).toEqual(['cr']);
    expect(found({ toNm: 800 })).toEqual(['co', 'cr', 'mn']);
  });

  it('tells a Q that is known somewhere from one known over the range', () => {
    expect(found({ voigt: 'known', fromNm: 450, toNm: 850 })).toEqual(['co', 'mn']);
    expect(found({ voigt: 'over the range', fromNm: 450, toNm: 850 })).toEqual(['mn']);
    expect(found({ voigt: 'unknown' })).toEqual(['cr']);
  });

  it('tells the group from the shipped library and joins class and confidence', () => {
    expect(found({ place: 'group' })).toEqual(['mn']);
    expect(found({ place: 'shipped', class: 'magnet' })).toEqual(['co']);
    expect(found({ confidence: 'measured' })).toEqual(['co', 'cr', 'mn']);
    expect(found({ confidence: 'from memory' })).toEqual(['co']);
  });
});

describe('the filter in an address', () => {
  it('comes back as it was', () => {
    const filter: MaterialFilter = {
      words: 'pt 1998',
      class: 'noble',
      fromNm: 400.5,
      toNm: 900,
      voigt: 'over the range',
      place: 'group',
      confidence: 'from memory',
    };
    expect(readFilter(new URLSearchParams(writeFilter(filter).toString()))).toEqual(filter);
  });

  it('leaves out what is not asked, and reads nonsense as not asked', () => {
    expect(writeFilter(noFilter).toString()).toBe('');
    expect(readFilter(new URLSearchParams('class=planet&from=-3&to=x&voigt=perhaps'))).toEqual(noFilter);
  });
});
