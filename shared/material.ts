import { z } from 'zod';
import { complexPairSchema } from './complex.ts';
import { strictObject } from './strictObject.ts';

/** The classes that colour the cross-section. */
export const materialClasses = ['magnet', 'noble', 'refractory', 'dielectric', 'semiconductor'] as const;
export type MaterialClass = (typeof materialClasses)[number];

/** How far a constant can be trusted; shown wherever the constant is used. */
export const confidences = ['measured', 'fitted', 'from memory', 'invented for the demo'] as const;

export const sourceSchema = strictObject({
  citation: z.string(),
  doi: z.string().nullable(),
  licence: z.string().nullable(),
  sample: z.string().nullable(),
  method: z.string().nullable(),
  confidence: z.enum(confidences),
  /** What a reader must know before use, in a sentence. */
  caution: z.string().nullable(),
});

const wavelengthsNm = z.array(z.number().positive()).min(1);

/** Refractive index against wavelength: a table in ascending wavelength, a formula, or one point. */
export const indexDispersionSchema = z.discriminatedUnion('kind', [
  strictObject({
    kind: z.literal('table'),
    wavelengthsNm,
    n: z.array(z.number().min(0)),
    k: z.array(z.number().min(0)),
  }),
  strictObject({
    kind: z.literal('formula'),
    /** An expression for n (lossless) in the wavelength L in micrometres and the coefficients c1, c2, ... */
    expression: z.string(),
    coefficients: z.array(z.number()),
    rangeNm: z.tuple([z.number().positive(), z.number().positive()]),
  }),
]);

/** Voigt constant Q in the canonical sign against wavelength; one entry means known at one wavelength only. */
export const voigtDispersionSchema = strictObject({
  kind: z.literal('table'),
  wavelengthsNm,
  q: z.array(complexPairSchema),
});

/** One version of a material as stored: everything a solve needs and where it comes from. */
export const materialContentSchema = strictObject({
  index: indexDispersionSchema,
  indexSource: sourceSchema,
  voigt: voigtDispersionSchema.nullable(),
  voigtSource: sourceSchema.nullable(),
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
});

/** Curves for the material page, sampled by the server within the table's range. */
export const materialCurvesSchema = z.object({
  wavelengthsNm: z.array(z.number()),
  n: z.array(z.number()),
  k: z.array(z.number()),
  voigt: z.object({ wavelengthsNm: z.array(z.number()), q: z.array(complexPairSchema) }).nullable(),
});

export const materialSchema = materialSummarySchema.extend({
  content: materialContentSchema,
  curves: materialCurvesSchema,
  notes: z.array(z.string()),
});

export const materialListSchema = z.object({ materials: z.array(materialSummarySchema) });

export type MaterialSource = z.infer<typeof sourceSchema>;
export type IndexDispersion = z.infer<typeof indexDispersionSchema>;
export type VoigtDispersion = z.infer<typeof voigtDispersionSchema>;
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
