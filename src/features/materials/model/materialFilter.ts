import { materialClasses } from '../../../../shared/material.ts';
import type { MaterialClass, MaterialSummary } from '../../../../shared/material.ts';
import { confidences } from '../../../../shared/materialSource.ts';
import type { Confidence } from '../../../../shared/materialSource.ts';

/** Whether Q is asked for: at all, over the whole range asked for, or not at all. */
export const voigtChoices = ['any', 'known', 'over the range', 'unknown'] as const;
type VoigtChoice = (typeof voigtChoices)[number];

export const places = ['all', 'group', 'shipped'] as const;
type Place = (typeof places)[number];

export type MaterialFilter = {
  /** Words that must all occur in name, formula or citation. */
  words: string;
  class: MaterialClass | 'all';
  /** Wavelengths, nm, for which n and k must be known; null for an end that does not matter. */
  fromNm: number | null;
  toNm: number | null;
  voigt: VoigtChoice;
  place: Place;
  /** Of n and k, or of Q. */
  confidence: Confidence | 'all';
};

export const noFilter: MaterialFilter = {
  words: '',
  class: 'all',
  fromNm: null,
  toNm: null,
  voigt: 'any',
  place: 'all',
  confidence: 'all',
};

export function filterMaterials(
  materials: readonly MaterialSummary[],
  filter: MaterialFilter,
): MaterialSummary[] {
  const words = filter.words.toLowerCase().split(/\s+/).filter(Boolean);
  return materials.filter((material) => {
    const text = `${material.name} ${material.formula} ${material.citation} ${material.id}`.toLowerCase();
    return (
      words.every((word) => text.includes(word)) &&
      (filter.class === 'all' || material.class === filter.class) &&
      covers(material.rangeNm, filter) &&
      fitsVoigt(material.voigtRangeNm, filter) &&
      (filter.place === 'all' || (material.groupId === null) === (filter.place === 'shipped')) &&
      (filter.confidence === 'all' ||
        material.confidence === filter.confidence ||
        material.voigtConfidence === filter.confidence)
    );
  });
}

/** Whether a range reaches both ends asked for, whichever of them is the longer wavelength. */
function covers(rangeNm: readonly [number, number], { fromNm, toNm }: MaterialFilter): boolean {
  return [fromNm, toNm].every((end) => end === null || (rangeNm[0] <= end && end <= rangeNm[1]));
}

function fitsVoigt(voigtRangeNm: readonly [number, number] | null, filter: MaterialFilter): boolean {
  switch (filter.voigt) {
    case 'any':
      return true;
    case 'known':
      return voigtRangeNm !== null;
    case 'over the range':
      return voigtRangeNm !== null && covers(voigtRangeNm, filter);
    case 'unknown':
      return voigtRangeNm === null;
  }
}

/** Names of the filter in an address. */
const keys = {
  words: 'q',
  class: 'class',
  fromNm: 'from',
  toNm: 'to',
  voigt: 'voigt',
  place: 'in',
  confidence: 'confidence',
} as const;

/** Reads a filter out of an address. Nonsense counts as not asked. */
export function readFilter(search: URLSearchParams): MaterialFilter {
  const get = (field: keyof MaterialFilter) => search.get(keys[field]);
  const wavelength = (field: 'fromNm' | 'toNm') => {
    const value = Number(get(field) ?? NaN);
    return Number.isFinite(value) && value > 0 ? value : null;
  };
  const oneOf = <Choice extends string>(choices: readonly Choice[], field: keyof MaterialFilter) =>
    choices.find((one) => one === get(field));
  return {
    words: get('words') ?? '',
    class: oneOf(materialClasses, 'class') ?? 'all',
    fromNm: wavelength('fromNm'),
    toNm: wavelength('toNm'),
    voigt: oneOf(voigtChoices, 'voigt') ?? 'any',
    place: oneOf(places, 'place') ?? 'all',
    confidence: oneOf(confidences, 'confidence') ?? 'all',
  };
}

/** Writes it back; what is not asked is left out. */
export function writeFilter(filter: MaterialFilter): URLSearchParams {
  const search = new URLSearchParams();
  for (const field of Object.keys(keys) as (keyof typeof keys)[]) {
    const value = filter[field];
    if (value !== null && value !== noFilter[field]) search.set(keys[field], String(value));
  }
  return search;
}
