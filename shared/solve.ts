import { z } from 'zod';
import { complexPairSchema } from './complex.ts';
import { LIMITS } from './limits.ts';
import { checkMediumKeys, libraryFields, libraryMediumSchema, mediumFields, mediumSchema } from './medium.ts';
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

export type LayerInput = MediumInput & { thicknessNm: number };
export type BlockInput = { repeat: number; layers: StackItemInput[] };
export type StackItemInput = LayerInput | BlockInput;

export type LibraryLayerInput = LibraryMediumInput & { thicknessNm: number };
export type LibraryBlockInput = { repeat: number; layers: LibraryStackItemInput[] };
export type LibraryStackItemInput = LibraryLayerInput | LibraryBlockInput;

const layerSchema = strictObject({ thicknessNm, ...mediumFields }).superRefine(checkMediumKeys);
const libraryLayerSchema = strictObject({ thicknessNm, ...mediumFields, ...libraryFields }).superRefine(
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

export const solveCaseSchema = strictObject({
  ...caseFields,
  incident: mediumSchema,
  layers: z.array(stackItemSchema),
  substrate: mediumSchema,
});

export const librarySolveCaseSchema = strictObject({
  ...caseFields,
  incident: libraryMediumSchema,
  layers: z.array(libraryStackItemSchema),
  substrate: libraryMediumSchema,
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

/** One solved point; definitions and signs are those of the conventions page. */
export const solvePointSchema = z.object({
  wavelengthNm: z.number(),
  angleDeg: z.number(),
  r: jonesSchema,
  t: jonesSchema.nullable(),
  R: polarizedSchema,
  T: polarizedSchema,
  A: polarizedSchema,
  kerr: z.object({ p: kerrAnglesSchema, s: kerrAnglesSchema }),
});

export const solveWarningSchema = z.object({ case: z.int(), path: z.string(), message: z.string() });

export const solveResponseSchema = z.object({
  results: z.array(
    z.object({
      points: z.array(solvePointSchema),
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
