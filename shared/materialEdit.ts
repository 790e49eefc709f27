import { z } from 'zod';
import {
  anisotropySchema,
  indexDispersionSchema,
  mixtureModels,
  voigtDispersionSchema,
} from './dispersion.ts';
import { LIMITS } from './limits.ts';
import { importMappingSchema } from './materialImport.ts';
import { materialClasses } from './material.ts';
import { sourceSchema } from './materialSource.ts';
import { strictObject } from './strictObject.ts';
import { thermalLawSchema } from './thermal.ts';

/** Making and changing materials. A change of constants is always a new version. */

/** Constants taken from an import of the same group. */
const imported = strictObject({
  kind: z.literal('import'),
  importId: z.string(),
  mapping: importMappingSchema,
});

/** A mixture of two materials by id; the server puts in the parts whole. */
const mixtureOf = strictObject({
  kind: z.literal('mixture of'),
  model: z.enum(mixtureModels),
  fraction: z.number().min(0).max(1),
  parts: z
    .array(strictObject({ material: z.string(), version: z.int().min(1) }))
    .length(2, { error: 'must be two materials' }),
});

/** Constants as they are sent: `import` and `mixture of` become tables and whole mixtures on the server. */
export const materialDraftSchema = strictObject({
  index: z.discriminatedUnion('kind', [...indexDispersionSchema.options, imported, mixtureOf]),
  indexSource: sourceSchema,
  voigt: z.discriminatedUnion('kind', [...voigtDispersionSchema.options, imported]).nullable(),
  voigtSource: sourceSchema.nullable(),
  anisotropy: anisotropySchema.optional(),
  anisotropySource: sourceSchema.optional(),
  thermal: thermalLawSchema.optional(),
});

export type MaterialDraft = z.infer<typeof materialDraftSchema>;

const naming = {
  name: z.string().trim().min(1, { error: 'must not be empty' }).max(LIMITS.nameLength),
  formula: z.string().trim().min(1, { error: 'must not be empty' }).max(40),
  class: z.enum(materialClasses),
  notes: z.array(z.string().trim().min(1).max(LIMITS.noteLength)).max(20),
};

export const createMaterialSchema = strictObject({
  ...naming,
  notes: naming.notes.default([]),
  /** Left out when `exportedBy` names the import of a file that Skewlight exported. */
  content: materialDraftSchema.optional(),
  exportedBy: z.string().optional(),
}).superRefine(({ content, exportedBy }, context) => {
  if ((content === undefined) === (exportedBy === undefined)) {
    context.addIssue({ code: 'custom', path: ['content'], message: 'give either content or exportedBy' });
  }
});

/** What a material is called; its constants stay as they are. */
export const renameMaterialSchema = strictObject({
  name: naming.name.optional(),
  formula: naming.formula.optional(),
  class: naming.class.optional(),
  notes: naming.notes.optional(),
});

/** `version` is the one the edit started from: over somebody else's newer one it is a conflict (409). */
export const createMaterialVersionSchema = strictObject({
  version: z.int().min(1),
  /** Why, for those who read the history. */
  note: z.string().max(LIMITS.noteLength).default(''),
  content: materialDraftSchema,
});

export const materialVersionSchema = z.object({
  version: z.int(),
  madeAt: z.iso.datetime(),
  /** Null for the shipped library. */
  author: z.string().nullable(),
  note: z.string(),
  /** What differs from the version before, in sentences. */
  changes: z.array(z.string()),
});

export const materialVersionListSchema = z.object({ versions: z.array(materialVersionSchema) });

/** Where a material is used; while there is anything it cannot be deleted. */
export const materialUsesSchema = z.object({
  stacks: z.array(z.object({ id: z.string(), name: z.string(), versions: z.array(z.int()) })),
  runs: z.array(z.object({ id: z.string(), name: z.string(), versions: z.array(z.int()) })),
  designs: z.array(z.object({ id: z.string(), name: z.string(), versions: z.array(z.int()) })),
  materials: z.array(z.object({ id: z.string(), name: z.string(), versions: z.array(z.int()) })),
});

/** What constants look like before they are kept; nothing is stored. */
export const previewMaterialSchema = strictObject({ content: materialDraftSchema });

export type CreateMaterial = z.input<typeof createMaterialSchema>;
export type CreateMaterialVersion = z.input<typeof createMaterialVersionSchema>;
export type MaterialVersion = z.infer<typeof materialVersionSchema>;
export type MaterialUses = z.infer<typeof materialUsesSchema>;
