import { z } from 'zod';
import { LIMITS } from './limits.ts';
import { axisSchema, readingNames } from './run.ts';
import { stackDocumentSchema } from './stack.ts';
import { strictObject } from './strictObject.ts';

/** Answers for the stack page while somebody edits; nothing is stored. */

/** One curve now: the answer is the binary file of resultFormat.ts. */
export const liveCurveRequestSchema = strictObject({
  document: stackDocumentSchema,
  axis: axisSchema.refine(({ points }) => points <= LIMITS.liveCurvePoints, {
    path: ['points'],
    error: `must be at most ${LIMITS.liveCurvePoints}: start a run for more`,
  }),
  readings: z.array(z.enum(readingNames)).min(1).max(8),
  /** Whether the header of the answer has the strip of the document's working point too. */
  strip: z.boolean().optional(),
});

/** Angles of incidence at which something happens, for the document at its own wavelength and magnetization. */
export const angleFeaturesRequestSchema = strictObject({ document: stackDocumentSchema });

export const angleFeaturesSchema = z.object({
  /** Where R_p is least between 0 and 90 deg; null when it has no minimum inside. */
  pseudoBrewster: z.object({ angleDeg: z.number(), reflectanceP: z.number() }).nullable(),
  /** Where a reading passes through 0, refined to 1e-9 deg; a jump by a fold is none. */
  signChanges: z.array(
    z.object({
      reading: z.enum(['rotationP', 'ellipticityP', 'rotationS', 'ellipticityS']),
      angleDeg: z.number(),
      /** From negative to positive as the angle grows. */
      rising: z.boolean(),
    }),
  ),
});

export type LiveCurveRequest = z.infer<typeof liveCurveRequestSchema>;
export type AngleFeatures = z.infer<typeof angleFeaturesSchema>;
