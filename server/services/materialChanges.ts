import { isDeepStrictEqual } from 'node:util';
import type { IndexDispersion, VoigtDispersion } from '../../shared/dispersion.ts';
import type { MaterialContent } from '../../shared/material.ts';
import type { MaterialSource } from '../../shared/materialSource.ts';
import { indexRangeNm, voigtRangeNm } from '../../worker/dispersion/range.ts';

type Dispersion = IndexDispersion | VoigtDispersion;

/** How the ways in which constants are given are called in a sentence. */
const kindNames: Record<Dispersion['kind'], string> = {
  table: 'a table',
  formula: 'a formula',
  model: 'a model',
  tensor: 'a free tensor',
  mixture: 'a mixture',
  lines: 'lines',
};

/** What differs between a version and the one before, in sentences; empty for the same content. */
export function materialChanges(before: MaterialContent, after: MaterialContent): string[] {
  return [
    ...constantChanges('n and k', before.index, after.index),
    ...rangeChange('n and k', indexRangeNm(before), indexRangeNm(after)),
    ...sourceChanges('n and k', before.indexSource, after.indexSource),
    ...voigtChanges(before, after),
    ...partChange('The anisotropy', before.anisotropy, after.anisotropy),
    ...sourceChanges('the anisotropy', before.anisotropySource, after.anisotropySource),
    ...partChange('The law of m(T)', before.thermal, after.thermal),
    ...originChanges(before, after),
  ];
}

function voigtChanges(before: MaterialContent, after: MaterialContent): string[] {
  if (before.voigt === null && after.voigt === null) return [];
  if (before.voigt === null) return ['Q was added.'];
  if (after.voigt === null) return ['Q was taken away.'];
  return [
    ...constantChanges('Q', before.voigt, after.voigt),
    ...rangeChange('Q', voigtRangeNm(before), voigtRangeNm(after)),
    ...sourceChanges('Q', before.voigtSource, after.voigtSource),
  ];
}

function constantChanges(what: string, before: Dispersion, after: Dispersion): string[] {
  if (isDeepStrictEqual(before, after)) return [];
  if (before.kind !== after.kind) {
    return [`${upper(what)}: ${kindNames[after.kind]} in place of ${kindNames[before.kind]}.`];
  }
  if ('wavelengthsNm' in before && 'wavelengthsNm' in after) return [tableChange(what, before, after)];
  if (before.kind === 'formula' && after.kind === 'formula' && before.expression !== after.expression) {
    return [`${upper(what)}: the formula is now ${after.expression}.`];
  }
  if (before.kind === 'mixture' && after.kind === 'mixture') return mixtureChange(before, after);
  const { rangeNm: _before, ...valuesBefore } = { rangeNm: null, ...before };
  const { rangeNm: _after, ...valuesAfter } = { rangeNm: null, ...after };
  if (isDeepStrictEqual(valuesBefore, valuesAfter)) return [];
  return [`${upper(what)}: the parameters of ${kindNames[after.kind].replace(/^an? /, 'the ')} changed.`];
}

type Table = Extract<Dispersion, { wavelengthsNm: number[] }>;

/** How many points came, went and changed their value; points are the same by their wavelength. */
function tableChange(what: string, before: Table, after: Table): string {
  const former = new Map(before.wavelengthsNm.map((nm, place) => [nm, valueAt(before, place)]));
  let added = 0;
  let changed = 0;
  after.wavelengthsNm.forEach((nm, place) => {
    const value = former.get(nm);
    if (value === undefined) added += 1;
    else if (!isDeepStrictEqual(value, valueAt(after, place))) changed += 1;
  });
  const removed = before.wavelengthsNm.length - (after.wavelengthsNm.length - added);
  const parts = [
    [changed, 'changed'],
    [added, 'added'],
    [removed, 'taken away'],
  ] as const;
  const said = parts.filter(([count]) => count > 0).map(([count, verb]) => `${count} ${verb}`);
  return `${upper(what)}: of the table's points ${said.join(', ')}; ${after.wavelengthsNm.length} now.`;
}

function valueAt(table: Table, place: number): unknown {
  if ('epsilon' in table) return table.epsilon[place];
  return 'q' in table ? table.q[place] : [table.n[place], table.k[place]];
}

function mixtureChange(
  before: Dispersion & { kind: 'mixture' },
  after: Dispersion & { kind: 'mixture' },
): string[] {
  if (!('parts' in before) || !('parts' in after)) return [];
  const names = (mixture: typeof after) =>
    mixture.parts.map(({ name, version }) => `${name} (version ${version})`).join(' and ');
  return [
    ...(before.fraction === after.fraction
      ? []
      : [`The fraction of the second part went from ${before.fraction} to ${after.fraction}.`]),
    ...(before.model === after.model ? [] : [`The mixing rule is now that of ${after.model}.`]),
    ...(isDeepStrictEqual(before.parts, after.parts) ? [] : [`The mixture is now of ${names(after)}.`]),
  ];
}

function rangeChange(
  what: string,
  before: [number, number] | null,
  after: [number, number] | null,
): string[] {
  if (before === null || after === null || isDeepStrictEqual(before, after)) return [];
  return [
    `${upper(what)} known from ${after[0]} to ${after[1]} nm, before from ${before[0]} to ${before[1]} nm.`,
  ];
}

function sourceChanges(
  what: string,
  before: MaterialSource | null | undefined,
  after: MaterialSource | null | undefined,
): string[] {
  if (!before || !after) return [];
  const fields = [...new Set([...Object.keys(before), ...Object.keys(after)])] as (keyof MaterialSource)[];
  const changed = fields.filter((field) => (before[field] ?? null) !== (after[field] ?? null));
  return changed.length === 0 ? [] : [`Said of the source of ${what} anew: ${changed.join(', ')}.`];
}

function partChange(what: string, before: object | undefined, after: object | undefined): string[] {
  if (isDeepStrictEqual(before, after)) return [];
  if (!before) return [`${what} was added.`];
  return [after ? `${what} changed.` : `${what} was taken away.`];
}

function originChanges(before: MaterialContent, after: MaterialContent): string[] {
  return (['index', 'voigt'] as const).flatMap((constant) => {
    const [former, now] = [before.origin?.[constant], after.origin?.[constant]];
    if (!now || isDeepStrictEqual(former, now)) return [];
    return [`${constant === 'index' ? 'n and k' : 'Q'} imported from ${now.fileName} (${now.rows} rows).`];
  });
}

const upper = (text: string) => `${text.charAt(0).toUpperCase()}${text.slice(1)}`;
