import { z } from 'zod';
import { plainIndexSchema, plainVoigtSchema } from './dispersion.ts';
import { strictObject } from './strictObject.ts';

/** A fit of a model to the tabulated points of a material. */
export const fitMaterialSchema = strictObject({
  material: z.string(),
  version: z.int().min(1),
  /** Which table is fitted, and with what: a `model` or `formula` of the index, `lines` or `formula` of Q. */
  target: z.enum(['index', 'voigt']),
  start: z.union([plainIndexSchema, plainVoigtSchema], { error: 'must be a model, lines or a formula' }),
  /** Parameters that stay at their start value, by name as in the answer. */
  fixed: z.array(z.string()).default([]),
  /** Points outside are left out; the start's own range when absent. */
  rangeNm: z.tuple([z.number().positive(), z.number().positive()]).optional(),
});

const points = z.array(z.number());

export const fitResultSchema = z.object({
  /** The model with fitted values, ready to be kept; its range is that of the fitted points. */
  fitted: z.union([plainIndexSchema, plainVoigtSchema]),
  parameters: z.array(
    z.object({
      name: z.string().meta({ description: 'such as terms[1].centreEv' }),
      unit: z.string(),
      value: z.number(),
      /** One standard deviation from the scatter of the residuals; null where fixed or not determined. */
      uncertainty: z.number().nullable(),
      fixed: z.boolean(),
    }),
  ),
  /** Tabulated less fitted, in the quantity that was compared (n and k, or Re Q and Im Q). */
  residuals: z.object({ wavelengthsNm: points, first: points, second: points }),
  /** Root mean square of all residuals. */
  deviation: z.number(),
  points: z.int(),
  iterations: z.int(),
  /** Pairs of parameters that the data hardly tell apart, and the like. */
  remarks: z.array(z.string()),
});

export type FitMaterial = z.input<typeof fitMaterialSchema>;
export type FitResult = z.infer<typeof fitResultSchema>;
