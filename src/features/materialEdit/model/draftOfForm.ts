import type { Anisotropy, PlainIndex } from '../../../../shared/dispersion.ts';
import type { Issue } from '../../../../shared/error.ts';
import { describeIssues } from '../../../../shared/issues.ts';
import { materialDraftSchema } from '../../../../shared/materialEdit.ts';
import type { MaterialDraft } from '../../../../shared/materialEdit.ts';
import type { MaterialSource } from '../../../../shared/materialSource.ts';
import type {
  AnisotropyForm,
  ContentForm,
  IndexForm,
  PlainIndexForm,
  SourceForm,
  VoigtForm,
} from './form.ts';
import { indexCellPath, readCells, voigtCellPath } from './tableCells.ts';

/** What is sent of a form, or everything that keeps it from being sent; paths as `index.terms[0].b`. */
export type ReadContent =
  { draft: MaterialDraft; issues: readonly Issue[] } | { draft: null; issues: Issue[] };

/**
 * The constants of a form as the API takes them.
 *
 * @param sourcesLater for a look at the curves, which do not depend on where the constants come from
 */
export function readContent(form: ContentForm, { sourcesLater }: { sourcesLater: boolean }): ReadContent {
  const cells: Issue[] = [];
  const source = (fields: SourceForm) => (sourcesLater ? sourceLater : readSource(fields));
  const { index, voigt, anisotropy, thermal } = form;
  const input = {
    index: readIndex(index, 'index', cells),
    indexSource: source(form.indexSource),
    voigt: readVoigt(voigt, cells),
    voigtSource: voigt.kind === 'none' ? null : source(form.voigtSource),
    ...(anisotropy.kind === 'none'
      ? {}
      : {
          anisotropy: readAnisotropy(anisotropy, cells),
          anisotropySource: source(form.anisotropySource),
        }),
    ...(thermal ? { thermal: sourcesLater ? { ...thermal, citation: sourceLater.citation } : thermal } : {}),
  } satisfies MaterialDraft;
  const parsed = materialDraftSchema.safeParse(input);
  if (parsed.success && cells.length === 0) return { draft: parsed.data, issues: [] };
  const named = new Set(cells.map(({ path }) => path));
  const others = parsed.success
    ? []
    : describeIssues(parsed.error, input)
        .map(({ path, message }) => ({ path: fieldPath(path), message }))
        .filter(({ path }) => !named.has(path));
  return { draft: null, issues: [...cells, ...others] };
}

/** A path of the API as the form names its fields: without the envelope, and without the model inside an index. */
export function fieldPath(path: string): string {
  return path.replace(/^content\./, '').replace(/\.model\./, '.');
}

function readIndex(form: IndexForm, path: string, issues: Issue[]): MaterialDraft['index'] {
  switch (form.kind) {
    case 'tensor':
      return {
        kind: 'tensor',
        wavelengthsNm: form.entries.map(({ wavelengthNm }) => wavelengthNm),
        epsilon: form.entries.map(({ epsilon }) => epsilon),
      };
    case 'mixture of':
      return { ...form, parts: [...form.parts] };
    case 'import': {
      const { kind, importId, mapping } = form;
      return { kind, importId, mapping };
    }
    case 'table':
    case 'sellmeier':
    case 'cauchy':
    case 'oscillators':
    case 'formula':
      return readPlainIndex(form, path, issues);
  }
}

/** A plain index as the API takes it; cells that are no numbers are added to `issues` under `path`. */
export function readPlainIndex(form: PlainIndexForm, path: string, issues: Issue[]): PlainIndex {
  switch (form.kind) {
    case 'table': {
      const [wavelengthsNm, n, k] = readCells(form.rows, indexCellPath(path), issues);
      return { kind: 'table', wavelengthsNm, n, k };
    }
    case 'formula':
      return form;
    case 'sellmeier': {
      const { kind, rangeNm, ...model } = form;
      return { kind: 'model', rangeNm, model: { name: kind, ...model } };
    }
    case 'cauchy': {
      const { kind, rangeNm, tail, ...model } = form;
      return { kind: 'model', rangeNm, model: { name: kind, ...model, ...(tail ? { tail } : {}) } };
    }
    case 'oscillators': {
      const { kind, rangeNm, ...model } = form;
      return { kind: 'model', rangeNm, model: { name: kind, ...model } };
    }
  }
}

function readVoigt(form: VoigtForm, issues: Issue[]): MaterialDraft['voigt'] {
  switch (form.kind) {
    case 'none':
      return null;
    case 'table': {
      const [wavelengthsNm, re, im] = readCells(form.rows, voigtCellPath, issues);
      return { kind: 'table', wavelengthsNm, q: re.map((value, row) => [value, im[row] ?? NaN]) };
    }
    case 'import': {
      const { kind, importId, mapping } = form;
      return { kind, importId, mapping };
    }
    case 'lines':
    case 'formula':
    case 'mixture':
      return form;
  }
}

function readAnisotropy(form: Exclude<AnisotropyForm, { kind: 'none' }>, issues: Issue[]): Anisotropy {
  if (form.kind === 'cubic') return form;
  const extraordinary = readPlainIndex(form.extraordinary, 'anisotropy.extraordinary', issues);
  return { ...form, extraordinary };
}

/** Stands in a look at the curves for whatever source will be named. */
const sourceLater: MaterialSource = {
  citation: 'named on saving',
  doi: null,
  licence: null,
  sample: null,
  method: null,
  confidence: 'from memory',
  caution: null,
};

function readSource(form: SourceForm): MaterialSource {
  const known = (text: string) => (text.trim() === '' ? null : text.trim());
  const { citation, doi, licence, sample, temperature, method, confidence, caution } = form;
  return {
    citation: citation.trim(),
    doi: known(doi),
    licence: known(licence),
    sample: known(sample),
    temperature: known(temperature),
    method: known(method),
    confidence,
    caution: known(caution),
  };
}
