import { z } from 'zod';
import { materialClasses } from '../../../../shared/material.ts';
import { renameMaterialSchema } from '../../../../shared/materialEdit.ts';
import { confidences, sourceSchema } from '../../../../shared/materialSource.ts';

/** The form that names a material and says where its constants come from: texts, empty where nothing was said. */

const sourceFormSchema = z.object({
  citation: z.string(),
  doi: z.string(),
  licence: z.string(),
  sample: z.string(),
  temperature: z.string(),
  method: z.string(),
  confidence: z.union([z.enum(confidences), z.literal('')]),
  caution: z.string(),
});

export const namingFormSchema = z.object({
  name: z.string(),
  formula: z.string(),
  class: z.union([z.enum(materialClasses), z.literal('')]),
  /** One note a line. */
  notes: z.string(),
  /** Why a new version is made. */
  versionNote: z.string(),
  /** Q has a source of its own, not that of n and k. */
  apart: z.boolean(),
  content: z.object({ indexSource: sourceFormSchema, voigtSource: sourceFormSchema }),
});

export type NamingForm = z.infer<typeof namingFormSchema>;
type SourceForm = z.infer<typeof sourceFormSchema>;

/** What the form asks for: a new version has its name already, an exported file its sources. */
export type Asked = { name: boolean; indexSource: boolean; voigtSource: boolean };

const emptySource: SourceForm = {
  citation: '',
  doi: '',
  licence: '',
  sample: '',
  temperature: '',
  method: '',
  confidence: '',
  caution: '',
};

export const emptyNaming: NamingForm = {
  name: '',
  formula: '',
  class: '',
  notes: '',
  versionNote: '',
  apart: false,
  content: { indexSource: emptySource, voigtSource: emptySource },
};

/** The sources that the form shows: one stands for both unless they are told apart. */
export function shownSources({ indexSource, voigtSource }: Asked, apart: boolean) {
  return { indexSource, voigtSource: voigtSource && (apart || !indexSource) };
}

const orNull = (text: string) => (text.trim() === '' ? null : text.trim());

/** The source as it is sent; `confidence` is empty only where the form refuses it. */
export function sourceOf(form: SourceForm) {
  return {
    citation: form.citation.trim(),
    // A link to the registry is how most people have a DOI at hand.
    doi: orNull(form.doi.trim().replace(/^(https?:\/\/(dx\.)?doi\.org\/|doi:\s*)/i, '')),
    licence: orNull(form.licence),
    sample: orNull(form.sample),
    temperature: orNull(form.temperature),
    method: orNull(form.method),
    confidence: form.confidence,
    caution: orNull(form.caution),
  };
}

export function namesOf(form: NamingForm) {
  return {
    name: form.name.trim(),
    formula: form.formula.trim(),
    class: form.class,
    notes: form.notes.split('\n').flatMap((line) => orNull(line) ?? []),
  };
}

const unchosen: Record<string, string> = {
  class: 'must be chosen: it colours the layer in the drawing of a stack',
  confidence: 'must be chosen: how far can the numbers be trusted?',
};

/** The form held against the shared schemas, each problem at its field. */
export function namingRules(asked: Asked) {
  return namingFormSchema.superRefine((form, context) => {
    const hold = (schema: z.ZodType, value: unknown, at: readonly string[]) => {
      for (const issue of schema.safeParse(value).error?.issues ?? []) {
        const field = String(issue.path[0]);
        context.addIssue({
          code: 'custom',
          path: [...at, field],
          message: unchosen[field] ?? issue.message,
        });
      }
    };
    if (asked.name) hold(renameMaterialSchema, namesOf(form), []);
    const shown = shownSources(asked, form.apart);
    if (shown.indexSource) {
      hold(sourceSchema, sourceOf(form.content.indexSource), ['content', 'indexSource']);
    }
    if (shown.voigtSource) {
      hold(sourceSchema, sourceOf(form.content.voigtSource), ['content', 'voigtSource']);
    }
  });
}
