import { z } from 'zod';
import { complexPairSchema } from './complex.ts';
import { LIMITS } from './limits.ts';
import {
  checkMediumKeys,
  libraryMediumFields,
  libraryMediumSchema,
  mediumFields,
  mediumSchema,
} from './medium.ts';
import type { LibraryMediumInput, MediumInput } from './medium.ts';
import { strictObject } from './strictObject.ts';

/**
 * The stateless entry to the numeric core, the same on the command line and over HTTP.
 * Two shapes of one request: `solveRequestSchema` takes numbers only, `librarySolveRequestSchema` also takes
 * media by library id. Rules that need a whole case (counts of samples, depth, points) are in solveRules.ts.
 */
const positive = z.number().positive();
const angle = z.number().min(0).lt(90);

const thicknessNm = z.number().min(0).meta({ description: 'Layer thickness in nm.' });

const repeat = z
  .int()
  .min(0)
  .max(LIMITS.repeat)
  .meta({ description: 'How often the block stands in the stack.' });

/** Width of the zone, centred on the upper face, in which the composition runs evenly from the medium above. */
const gradedNm = z.number().min(0).optional().meta({
  description: 'Width in nm of a graded interface with the medium above, half of it in either layer.',
});

export type LayerInput = MediumInput & { thicknessNm: number; gradedNm?: number | undefined };
export type BlockInput = { repeat: number; layers: StackItemInput[] };
export type StackItemInput = LayerInput | BlockInput;

export type LibraryLayerInput = LibraryMediumInput & { thicknessNm: number; gradedNm?: number | undefined };
export type LibraryBlockInput = { repeat: number; layers: LibraryStackItemInput[] };
export type LibraryStackItemInput = LibraryLayerInput | LibraryBlockInput;

const layerSchema = strictObject({ thicknessNm, gradedNm, ...mediumFields }).superRefine(checkMediumKeys);
const libraryLayerSchema = strictObject({ thicknessNm, gradedNm, ...libraryMediumFields }).superRefine(
  checkMediumKeys,
);

// A schema that holds itself needs a name in the API's description.
const stackItemSchema: z.ZodType<StackItemInput, StackItemInput> = z
  .lazy(() =>
    z.union([layerSchema, strictObject({ repeat, layers: z.array(stackItemSchema) })], {
      error: 'must be a layer or a block {"repeat", "layers"}',
    }),
  )
  .meta({ id: 'LayerOrBlock' });

const libraryStackItemSchema: z.ZodType<LibraryStackItemInput, LibraryStackItemInput> = z
  .lazy(() =>
    z.union([libraryLayerSchema, strictObject({ repeat, layers: z.array(libraryStackItemSchema) })], {
      error: 'must be a layer or a block {"repeat", "layers"}',
    }),
  )
  .meta({ id: 'LibraryLayerOrBlock' });

export function isBlock<Layer extends object, Block extends { layers: unknown[] }>(
  item: Layer | Block,
): item is Block {
  return 'layers' in item;
}

const caseFields = {
  wavelengthNm: z.union([positive, z.array(positive).min(1)], {
    error: 'must be a number > 0 or an array of them',
  }),
  angleDeg: z.union([angle, z.array(angle).min(1)], {
    error: 'must be a number in [0, 90) or an array of them',
  }),
};

/** What a case may ask for beside the standard answer. */
export const solveOutputs = ['mueller', 'faraday', 'contributions', 'depth', 'ceiling'] as const;
export type SolveOutput = (typeof solveOutputs)[number];

const outputs = z.array(z.enum(solveOutputs)).optional();

/** A thick slab substrate whose inner reflections add in intensity; its bare back face looks at `exit`. */
const backsideFields = {
  incoherent: z.literal(true),
  thicknessNm: z.number().min(0),
};

const weights = z.array(z.number().min(0)).min(1);

/**
 * Averages of intensities over neighbouring points. The wavelengths of the case come in groups of as many as there
 * are wavelengthWeights, each group one point of the answer; angles likewise. Weights add up to 1.
 */
const averageSchema = strictObject({
  wavelengthWeights: weights.optional(),
  angleWeights: weights.optional(),
  /** All layers thicker by a common factor, as over a film that is not uniform under the beam. */
  thickness: z
    .array(strictObject({ factor: z.number().min(0), weight: z.number().min(0) }))
    .min(1)
    .optional(),
}).optional();

const substrateSchema = strictObject({ gradedNm, ...mediumFields }).superRefine(checkMediumKeys);
const librarySubstrateSchema = strictObject({ gradedNm, ...libraryMediumFields }).superRefine(
  checkMediumKeys,
);

export const solveCaseSchema = strictObject({
  ...caseFields,
  outputs,
  average: averageSchema,
  backside: strictObject({ ...backsideFields, exit: mediumSchema }).optional(),
  incident: mediumSchema,
  layers: z.array(stackItemSchema),
  substrate: substrateSchema,
});

export const librarySolveCaseSchema = strictObject({
  ...caseFields,
  outputs,
  average: averageSchema,
  backside: strictObject({ ...backsideFields, exit: libraryMediumSchema }).optional(),
  incident: libraryMediumSchema,
  layers: z.array(libraryStackItemSchema),
  substrate: librarySubstrateSchema,
});

export const solveRequestSchema = strictObject({ cases: z.array(solveCaseSchema).min(1) });
export const librarySolveRequestSchema = strictObject({ cases: z.array(librarySolveCaseSchema).min(1) });

export type SolveCase = z.infer<typeof solveCaseSchema>;
export type LibrarySolveCase = z.infer<typeof librarySolveCaseSchema>;
export type SolveRequest = z.infer<typeof solveRequestSchema>;
export type LibrarySolveRequest = z.infer<typeof librarySolveRequestSchema>;

const jonesSchema = z.object({
  pp: complexPairSchema,
  ps: complexPairSchema,
  sp: complexPairSchema,
  ss: complexPairSchema,
});

const kerrAnglesSchema = z.object({ rotationDeg: z.number(), ellipticityDeg: z.number() }).nullable();

const polarizedSchema = z.object({ p: z.number(), s: z.number() });

const muellerSchema = z
  .array(z.array(z.number()))
  .meta({ description: '4x4, rows and columns S0..S3, not normalized; basis p, s.' });

const shareSchema = z.object({ sp: complexPairSchema, ps: complexPairSchema, pp: complexPairSchema });

/** What each magnetic layer adds to the reflected amplitudes, to first order in Q, and what that leaves out. */
export const contributionsSchema = z.object({
  layers: z.array(
    shareSchema.extend({
      path: z
        .string()
        .meta({ description: 'the layer as written, such as layers[2].layers[0], or substrate' }),
      /** Position in the expanded stack, counted from the light; the substrate comes last. */
      position: z.int(),
      depthNm: z.number().meta({ description: 'depth of its upper face' }),
    }),
  ),
  /** Sum of the shares. */
  total: shareSchema,
  /** r_sp and r_ps of the full answer, and its r_pp less that of the stack with m = 0. */
  exact: shareSchema,
});

/** Fields and losses against depth; for p and s light of unit amplitude and power. Lists run in step. */
export const depthSchema = z.object({
  depthNm: z.array(z.number()),
  position: z.array(z.int()),
  field: z.object({ p: z.array(z.number()), s: z.array(z.number()) }),
  absorbedPerNm: z.object({ p: z.array(z.number()), s: z.array(z.number()) }),
  /** Density of the first-order r_sp. */
  signalPerNm: z.array(complexPairSchema),
});

/** First-order bounds on |r_sp|: of this stack, and of its magnetic materials in any stack. Null without loss. */
export const ceilingSchema = z.object({
  stack: z.number().nullable(),
  material: z.number().nullable(),
  /** |r_sp| over the material's ceiling. */
  shareReached: z.number().nullable(),
});

/** One solved point; definitions and signs are those of the conventions page. */
export const solvePointSchema = z.object({
  wavelengthNm: z.number(),
  angleDeg: z.number(),
  r: jonesSchema.nullable().meta({ description: 'null with an incoherent backside' }),
  t: jonesSchema.nullable(),
  R: polarizedSchema,
  T: polarizedSchema,
  A: polarizedSchema,
  kerr: z.object({ p: kerrAnglesSchema, s: kerrAnglesSchema }),
  degreeOfPolarization: polarizedSchema.optional(),
  mueller: muellerSchema.optional(),
  faraday: z.object({ p: kerrAnglesSchema, s: kerrAnglesSchema }).nullable().optional(),
  contributions: contributionsSchema.nullable().optional(),
  depth: depthSchema.optional(),
  ceiling: ceilingSchema.optional(),
});

export const solveWarningSchema = z.object({ case: z.int(), path: z.string(), message: z.string() });

export const solveResponseSchema = z.object({
  results: z.array(
    z.object({
      points: z.array(solvePointSchema),
      graded: z.object({ slices: z.int(), change: z.number() }).optional().meta({
        description: 'Slices per graded interface, and the last change of any amplitude when they doubled.',
      }),
      resolved: solveCaseSchema.optional().meta({
        description: 'Over HTTP, when a medium was named by library id: the case with the samples used.',
      }),
    }),
  ),
  warnings: z.array(solveWarningSchema).optional(),
});

export type SolvePoint = z.infer<typeof solvePointSchema>;
export type SolveWarning = z.infer<typeof solveWarningSchema>;
export type SolveResponse = z.infer<typeof solveResponseSchema>;
