import type {
  Anisotropy,
  IndexDispersion,
  PlainIndex,
  PlainVoigt,
  VoigtDispersion,
} from '../../../../shared/dispersion.ts';
import type { Material } from '../../../../shared/material.ts';
import type { ImportOrigin } from '../../../../shared/materialImport.ts';
import type { MaterialSource } from '../../../../shared/materialSource.ts';
import { blankSource } from './blankForm.ts';
import type {
  AnisotropyForm,
  FormOf,
  ImportedForm,
  IndexForm,
  MaterialForm,
  PlainIndexForm,
  SourceForm,
  VoigtForm,
} from './form.ts';

/** A stored version as a form, so that it can be changed or copied. */
export function formOfMaterial(material: Material): MaterialForm {
  const { name, formula, notes, content } = material;
  const { origin } = content;
  return {
    name,
    formula,
    class: material.class,
    notes: notes.join('\n'),
    versionNote: '',
    content: {
      index: origin?.index ? importedForm(origin.index) : indexForm(content.index),
      indexSource: sourceForm(content.indexSource),
      voigt: origin?.voigt ? importedForm(origin.voigt) : voigtForm(content.voigt),
      voigtSource: content.voigtSource ? sourceForm(content.voigtSource) : blankSource(),
      anisotropy: content.anisotropy ? anisotropyForm(content.anisotropy) : { kind: 'none' },
      anisotropySource: content.anisotropySource ? sourceForm(content.anisotropySource) : blankSource(),
      thermal: content.thermal ?? null,
    },
  };
}

/** The import is named again rather than its rows sent: they may be many, and the way they were read stays known. */
function importedForm({ importId, fileName, rows, mapping }: ImportOrigin): ImportedForm {
  return { kind: 'import', importId, fileName, rows, mapping };
}

/** A table as cells that can be typed over, digit for digit. */
export function tableForm(...columns: (readonly number[])[]): FormOf<PlainIndexForm, 'table'> {
  const [first = []] = columns;
  return { kind: 'table', rows: first.map((_, row) => columns.map((column) => String(column[row]))) };
}

export function plainIndexForm(index: PlainIndex): PlainIndexForm {
  switch (index.kind) {
    case 'table':
      return tableForm(index.wavelengthsNm, index.n, index.k);
    case 'formula':
      return { ...index, quantity: index.quantity ?? 'n' };
    case 'model': {
      const { rangeNm, model } = index;
      switch (model.name) {
        case 'sellmeier':
          return { kind: 'sellmeier', rangeNm, constant: model.constant, terms: model.terms };
        case 'cauchy': {
          const { a, bUm2, cUm4, tail = null } = model;
          return { kind: 'cauchy', rangeNm, a, bUm2, cUm4, tail };
        }
        case 'oscillators':
          return { kind: 'oscillators', rangeNm, epsInfinity: model.epsInfinity, terms: model.terms };
      }
    }
  }
}

function indexForm(index: IndexDispersion): IndexForm {
  switch (index.kind) {
    case 'tensor': {
      const { wavelengthsNm, epsilon } = index;
      const entries = epsilon.map((tensor, at) => ({
        wavelengthNm: wavelengthsNm[at] ?? 0,
        epsilon: tensor,
      }));
      return { kind: 'tensor', entries };
    }
    case 'mixture': {
      const [first, second] = index.parts.map(({ material, version }) => ({ material, version }));
      const none = { material: '', version: 1 };
      const { model, fraction } = index;
      return { kind: 'mixture of', model, fraction, parts: [first ?? none, second ?? none] };
    }
    case 'table':
    case 'formula':
    case 'model':
      return plainIndexForm(index);
  }
}

export function plainVoigtForm(voigt: PlainVoigt): FormOf<VoigtForm, 'table' | 'lines' | 'formula'> {
  if (voigt.kind !== 'table') return voigt;
  return tableForm(
    voigt.wavelengthsNm,
    voigt.q.map(([re]) => re),
    voigt.q.map(([, im]) => im),
  );
}

function voigtForm(voigt: VoigtDispersion | null): VoigtForm {
  if (voigt === null) return { kind: 'none' };
  return voigt.kind === 'mixture' ? voigt : plainVoigtForm(voigt);
}

function anisotropyForm(anisotropy: Anisotropy): AnisotropyForm {
  return anisotropy.kind === 'cubic'
    ? anisotropy
    : { ...anisotropy, extraordinary: plainIndexForm(anisotropy.extraordinary) };
}

export function sourceForm(source: MaterialSource): SourceForm {
  const { citation, doi, licence, sample, temperature, method, confidence, caution } = source;
  return {
    citation,
    doi: doi ?? '',
    licence: licence ?? '',
    sample: sample ?? '',
    temperature: temperature ?? '',
    method: method ?? '',
    confidence,
    caution: caution ?? '',
  };
}
