import { z } from 'zod';
import { complexPairSchema } from './complex.ts';
import { anisotropySchema, indexDispersionSchema, voigtDispersionSchema } from './dispersion.ts';
import { importOriginSchema } from './materialImport.ts';
import { sourceSchema } from './materialSource.ts';
import { confidences } from './materialSource.ts';
import { thermalLawSchema } from './thermal.ts';
import { strictObject } from './strictObject.ts';

/** The classes that colour the cross-section. */
export const materialClasses = ['magnet', 'noble', 'refractory', 'dielectric', 'semiconductor'] as const;
export type MaterialClass = (typeof materialClasses)[number];

/** One version of a material as stored: everything a solve needs and where it comes from. Never changed. */
export const materialContentSchema = strictObject({
  index: indexDispersionSchema,
  indexSource: sourceSchema,
  voigt: voigtDispersionSchema.nullable(),
  voigtSource: sourceSchema.nullable(),
  anisotropy: anisotropySchema.optional(),
  anisotropySource: sourceSchema.optional(),
  /** How the magnetization falls with temperature, as a helper for layers of this material. */
  thermal: thermalLawSchema.optional(),
  /** What was entered, where the constants came from a file. */
  origin: strictObject({
    index: importOriginSchema.optional(),
    voigt: importOriginSchema.optional(),
  }).optional(),
});

export const materialSummarySchema = z.object({
  id: z.string(),
  version: z.int(),
  name: z.string().meta({ description: 'such as "Cobalt"' }),
  formula: z.string().meta({ description: 'such as "Co"; what the cross-section prints' }),
  class: z.enum(materialClasses),
  /** Null for the shipped library, which every group can use. */
  groupId: z.string().nullable(),
  rangeNm: z.tuple([z.number(), z.number()]),
  /** Wavelengths for which Q is known: null without magneto-optic data, equal ends for a single wavelength. */
  voigtRangeNm: z.tuple([z.number(), z.number()]).nullable(),
  /** The source to prefer where several describe the same substance. */
  preferred: z.boolean(),
  citation: z.string(),
  confidence: z.enum(confidences),
  voigtConfidence: z.enum(confidences).nullable(),
  /** How n and k, and Q, are given. */
  indexKind: z.string(),
  voigtKind: z.string().nullable(),
  anisotropy: z.enum(['uniaxial', 'cubic', 'tensor']).nullable(),
  updatedAt: z.iso.datetime(),
});

/** Curves for the material page, sampled by the server within the table's range. */
export const materialCurvesSchema = z.object({
  wavelengthsNm: z.array(z.number()),
  n: z.array(z.number()),
  k: z.array(z.number()),
  voigt: z
    .object({
      wavelengthsNm: z.array(z.number()),
      q: z.array(complexPairSchema),
      /** N at these wavelengths, with which eps_xy = i Q N^2; null where the index is not known there. */
      index: z.array(complexPairSchema.nullable()),
    })
    .nullable(),
  /** The extraordinary index of a uniaxial crystal. */
  extraordinary: z
    .object({ wavelengthsNm: z.array(z.number()), n: z.array(z.number()), k: z.array(z.number()) })
    .nullable(),
});

export const materialSchema = materialSummarySchema.extend({
  content: materialContentSchema,
  curves: materialCurvesSchema,
  notes: z.array(z.string()),
  /** The newest version; `version` may be an older one. */
  newestVersion: z.int(),
  /** Who made this version; null for the shipped library. */
  author: z.string().nullable(),
  madeAt: z.iso.datetime(),
});

export const materialListSchema = z.object({ materials: z.array(materialSummarySchema) });

export type MaterialContent = z.infer<typeof materialContentSchema>;
export type MaterialSummary = z.infer<typeof materialSummarySchema>;
export type Material = z.infer<typeof materialSchema>;

/** A file of data/library: what the seeder writes into the database under the same id. */
export const libraryEntrySchema = strictObject({
  id: z.string().regex(/^[a-z0-9-]+$/),
  name: z.string(),
  formula: z.string(),
  class: z.enum(materialClasses),
  preferred: z.boolean(),
  notes: z.array(z.string()),
  content: materialContentSchema,
});

export type LibraryEntry = z.infer<typeof libraryEntrySchema>;
