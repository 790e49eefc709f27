import { z } from 'zod';
import {
  demandsSchema,
  designPointsSchema,
  pointReadingsSchema,
  signalNames,
  toleranceSchema,
} from './designPoint.ts';
import { LIMITS } from './limits.ts';
import { stackDocumentSchema, stackMediumSchema } from './stack.ts';
import { strictObject } from './strictObject.ts';

/** The cap chooser: which material, and how thick, protects a film and hides it least. */

const capLayerSchema = strictObject({
  medium: stackMediumSchema,
  /** Least thickness that protects, nm, and who says so. */
  leastNm: z.number().min(0),
  leastSource: z.string().trim().max(LIMITS.noteLength),
  /** Thickness of the layer that is not swept; null for the swept one. */
  fixedNm: z.number().min(0).nullable(),
});

/** One or two layers, in the order in which light meets them; exactly one is swept. */
export const capCandidateSchema = strictObject({
  id: z.string().min(1).max(40),
  label: z.string().trim().min(1, { error: 'must not be empty' }).max(LIMITS.nameLength),
  layers: z.array(capLayerSchema).min(1).max(2),
}).superRefine(({ layers }, context) => {
  if (layers.filter(({ fixedNm }) => fixedNm === null).length !== 1) {
    context.addIssue({
      code: 'custom',
      path: ['layers'],
      message: 'must have exactly one layer without fixedNm: the one whose thickness is swept',
    });
  }
});

export const capDesignSchema = strictObject({
  kind: z.literal('cap'),
  document: stackDocumentSchema,
  /** Layers of the document that the candidates stand in for: the present cap. */
  replaces: z.array(z.string()).max(2),
  candidates: z.array(capCandidateSchema).min(1).max(LIMITS.capCandidates),
  range: strictObject({
    fromNm: z.number().min(0),
    toNm: z.number().positive().max(LIMITS.designThicknessNm),
    points: z.int().min(2).max(LIMITS.capPoints),
  }).refine(({ fromNm, toNm }) => fromNm < toNm, { path: ['toNm'], error: 'must be greater than fromNm' }),
  points: designPointsSchema,
  signal: z.enum(signalNames),
  demands: demandsSchema,
  tolerance: toleranceSchema,
  /** Share of the samples that must meet all demands for a thickness to count as robust. */
  leastYield: z.number().min(0).max(1),
});

const curve = z.array(z.number().nullable());

const capPointCurvesSchema = z.object({
  pointId: z.string(),
  rotationDeg: curve,
  ellipticityDeg: curve,
  amplitude: curve,
  contrast: curve,
  reflectance: z.array(z.number()),
  ceilingShare: curve,
  /** The chosen signal, nominal; median and the band that holds 68.27 % of the samples. */
  signal: curve,
  signalLow: curve,
  signalMedian: curve,
  signalHigh: curve,
  /** Of the nominal signal, percent of it per nm. */
  slopePercentPerNm: curve,
  /** How much of the signal without a cap is lost, percent; negative where the cap gains. */
  costPercent: curve,
});

/** From where to where all demands hold; edges are refined between the points of the curve to 0.001 nm. */
const windowSchema = z.object({ fromNm: z.number(), toNm: z.number() });

const capOutcomeSchema = z.object({
  id: z.string(),
  label: z.string(),
  points: z.array(capPointCurvesSchema),
  /** Share of samples that meet all demands at all working points, at each thickness. */
  yield: z.array(z.number()),
  /** Where all demands hold for the nominal film, the least thickness that protects included. */
  windows: z.array(windowSchema),
  /** Where at least `leastYield` of the samples meet them, to the step of the curve. */
  robustWindows: z.array(windowSchema),
  /** Null when no thickness meets the demands. */
  best: z
    .object({
      thicknessNm: z.number(),
      /** Why this one, in a sentence. */
      reason: z.string(),
      yield: z.number(),
      points: z.array(
        z.object({
          pointId: z.string(),
          readings: pointReadingsSchema,
          signal: z.number(),
          signalLow: z.number(),
          signalHigh: z.number(),
          costPercent: z.number().nullable(),
          slopePercentPerNm: z.number().nullable(),
        }),
      ),
    })
    .nullable(),
  /** What keeps a candidate without `best` from meeting the demands, in a sentence. */
  obstacle: z.string().nullable(),
});

export const capResultSchema = z.object({
  kind: z.literal('cap'),
  thicknessNm: z.array(z.number()),
  /** The film without any cap at each working point. */
  bare: z.array(
    z.object({ pointId: z.string(), readings: pointReadingsSchema, signal: z.number().nullable() }),
  ),
  candidates: z.array(capOutcomeSchema),
  /** Ids from the best to the worst. */
  ranking: z.array(z.string()),
  samples: z.int(),
  seed: z.int(),
});

export type CapCandidate = z.infer<typeof capCandidateSchema>;
export type CapDesign = z.infer<typeof capDesignSchema>;
export type CapOutcome = z.infer<typeof capOutcomeSchema>;
export type CapPointCurves = z.infer<typeof capPointCurvesSchema>;
export type CapResult = z.infer<typeof capResultSchema>;
