import { z } from 'zod';
import { designPointsSchema, pointReadingsSchema } from './designPoint.ts';
import { LIMITS } from './limits.ts';
import { stackDocumentSchema } from './stack.ts';
import { strictObject } from './strictObject.ts';

/** Thicknesses within bounds for a stated goal: a global search, then a local one. */

/**
 * What is sought, of the light of each working point; with several points the worst one counts.
 * `insensitivity`: the least change of the rotation per nm of one layer, relative to the rotation.
 */
export const goalQuantities = [
  'rotation',
  'ellipticity',
  'amplitude',
  'contrast',
  'zero ellipticity',
  'insensitivity',
  'least reflectance',
] as const;
export type GoalQuantity = (typeof goalQuantities)[number];

export const goalSchema = strictObject({
  quantity: z.enum(goalQuantities),
  /** Of `insensitivity`: the layer whose thickness must matter least. */
  layerId: z.string().optional(),
  /** Films that reflect less are not considered; the angles of a film that reflects nothing mean nothing. */
  leastReflectance: z.number().min(0).max(1).optional(),
}).superRefine(({ quantity, layerId }, context) => {
  if ((quantity === 'insensitivity') !== (layerId !== undefined)) {
    context.addIssue({
      code: 'custom',
      path: ['layerId'],
      message: 'must be given for insensitivity, and only then',
    });
  }
});

export const optimiseDesignSchema = strictObject({
  kind: z.literal('optimise'),
  document: stackDocumentSchema,
  variables: z
    .array(
      strictObject({
        layerId: z.string(),
        fromNm: z.number().min(0),
        toNm: z.number().positive().max(LIMITS.designThicknessNm),
      }).refine(({ fromNm, toNm }) => fromNm < toNm, {
        path: ['toNm'],
        error: 'must be greater than fromNm',
      }),
    )
    .min(1)
    .max(LIMITS.designVariables),
  points: designPointsSchema,
  goal: goalSchema,
  /** With a second goal the outcome is the set of films of which none is better in both. */
  second: goalSchema.optional(),
  effort: z.enum(['quick', 'normal', 'thorough']),
  seed: z.int().min(0).max(4_294_967_295),
});

const thicknesses = z.array(z.number());
const points = z.array(z.object({ pointId: z.string(), readings: pointReadingsSchema }));

export const optimiseResultSchema = z.object({
  kind: z.literal('optimise'),
  layerIds: z.array(z.string()),
  /** The film as drawn. Values are in the unit of the goal's quantity: deg, 1, or 1/nm. */
  start: z.object({ thicknessesNm: thicknesses, value: z.number().nullable() }),
  best: z.object({
    thicknessesNm: thicknesses,
    value: z.number().nullable(),
    /** Empty in an answer that is not finished. */
    points,
    /** Layers whose thickness ended at a bound. */
    atBounds: z.array(z.string()),
  }),
  /** The best film so far as the search went on. */
  path: z.array(
    z.object({
      phase: z.enum(['global', 'local']),
      evaluations: z.int(),
      value: z.number().nullable(),
      thicknessesNm: thicknesses,
    }),
  ),
  evaluations: z.int(),
  /** `unfinished`: what was found so far by a search that goes on, or that was stopped before its end. */
  ended: z.enum(['converged', 'budget', 'unfinished']),
  /** Ordered by the first goal; null without a second. The first film is the best one. */
  pareto: z
    .array(
      z.object({
        thicknessesNm: thicknesses,
        first: z.number(),
        second: z.number(),
        /** Left out in answers that are not finished, and in those stored before readings of each film were kept. */
        points: points.optional(),
      }),
    )
    .nullable(),
  seed: z.int(),
});

export type Goal = z.infer<typeof goalSchema>;
export type OptimiseDesign = z.infer<typeof optimiseDesignSchema>;
export type ParetoFilm = NonNullable<z.infer<typeof optimiseResultSchema>['pareto']>[number];
export type OptimiseResult = z.infer<typeof optimiseResultSchema>;
