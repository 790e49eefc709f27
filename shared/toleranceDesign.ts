import { z } from 'zod';
import {
  demandsSchema,
  designPointsSchema,
  pointReadingsSchema,
  signalNames,
  toleranceSchema,
} from './designPoint.ts';
import { stackDocumentSchema } from './stack.ts';
import { strictObject } from './strictObject.ts';

/** How far readings move when the film is not what was drawn, and how many films would meet the demands. */

/** Derivatives alone, answered at once. */
export const sensitivityRequestSchema = strictObject({
  document: stackDocumentSchema,
  points: designPointsSchema,
});

const derivative = z.number().nullable();

/** One parameter of the film: a layer's thickness (per nm), n or k of a material (per 1), Re Q or Im Q (per 1). */
export const sensitivitySchema = z.object({
  pointId: z.string(),
  parameter: z.enum(['thickness', 'n', 'k', 'Re Q', 'Im Q']),
  /** The layer of a thickness; the materialKeyOf of a constant. */
  of: z.string(),
  label: z.string(),
  value: z.number(),
  /** d reading / d parameter. */
  derivative: z.object({
    rotationDeg: derivative,
    ellipticityDeg: derivative,
    amplitude: derivative,
    contrast: derivative,
    reflectance: derivative,
  }),
});

export const sensitivityAnswerSchema = z.object({
  readings: z.array(z.object({ pointId: z.string(), readings: pointReadingsSchema })),
  sensitivities: z.array(sensitivitySchema),
});

export const toleranceDesignSchema = strictObject({
  kind: z.literal('tolerance'),
  document: stackDocumentSchema,
  points: designPointsSchema,
  signal: z.enum(signalNames),
  demands: demandsSchema.omit({ mostSlopePercentPerNm: true }),
  tolerance: toleranceSchema,
});

/** Of one reading over all samples in which it exists. */
const distributionSchema = z.object({
  mean: z.number(),
  deviation: z.number(),
  /** At 2.275, 15.865, 50, 84.135 and 97.725 percent: two and one sigma of a normal distribution. */
  quantiles: z.array(z.number()).length(5),
  /** Bins of equal width between the least and the greatest sample. */
  histogram: z.object({ from: z.number(), to: z.number(), counts: z.array(z.int()) }),
  samples: z.int(),
});

const shareSchema = z.object({
  share: z.number(),
  /** 95 % interval of the share (Wilson). */
  low: z.number(),
  high: z.number(),
});

export const toleranceResultSchema = z.object({
  kind: z.literal('tolerance'),
  points: z.array(
    z.object({
      pointId: z.string(),
      nominal: pointReadingsSchema,
      distributions: z.object({
        rotationDeg: distributionSchema.nullable(),
        ellipticityDeg: distributionSchema.nullable(),
        amplitude: distributionSchema.nullable(),
        contrast: distributionSchema.nullable(),
        reflectance: distributionSchema.nullable(),
      }),
    }),
  ),
  /** Films that meet all demands at all points; null when no demand was made. */
  yield: shareSchema.nullable(),
  /** Films that meet each demand alone. */
  byDemand: z.array(z.object({ demand: z.string(), share: z.number() })),
  sensitivities: z.array(sensitivitySchema),
  samples: z.int(),
  seed: z.int(),
});

export type SensitivityRequest = z.infer<typeof sensitivityRequestSchema>;
export type SensitivityAnswer = z.infer<typeof sensitivityAnswerSchema>;
export type Sensitivity = z.infer<typeof sensitivitySchema>;
export type Distribution = z.infer<typeof distributionSchema>;
export type ToleranceDesign = z.infer<typeof toleranceDesignSchema>;
export type ToleranceResult = z.infer<typeof toleranceResultSchema>;
