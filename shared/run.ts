import { z } from 'zod';
import { LIMITS } from './limits.ts';
import { sourceSchema } from './materialSource.ts';
import { checkAxis, checkAxes } from './runAxes.ts';
import { solveWarningSchema } from './solve.ts';
import { stackDocumentSchema, stackNameSchema } from './stack.ts';
import { strictObject } from './strictObject.ts';

/** What the stack page shows at once, and a run stores when nobody says. */
export const usualReadings = [
  'rotationP',
  'ellipticityP',
  'rotationS',
  'ellipticityS',
  'reflectanceP',
  'reflectanceS',
  'crossSp',
  'crossPs',
  'contrastP',
  'contrastS',
] as const;

/** What a run stores at each point. Angles in degrees, the rest dimensionless. `readings.ts` defines each. */
export const readingNames = [
  ...usualReadings,
  'transmittanceP',
  'transmittanceS',
  'absorptanceP',
  'absorptanceS',
  'ceilingShare',
  'stackCeiling',
  'oddRotationP',
  'oddEllipticityP',
  'oddRotationS',
  'oddEllipticityS',
  'evenRotationP',
  'evenEllipticityP',
  'evenRotationS',
  'evenEllipticityS',
  'faradayRotationP',
  'faradayEllipticityP',
  'faradayRotationS',
  'faradayEllipticityS',
  'polarPart',
  'longitudinalPart',
  'circularContrast',
  'rotationAtAzimuth',
  'ellipticityAtAzimuth',
] as const;

export type ReadingName = (typeof readingNames)[number];

const span = {
  points: z.int().min(1).max(LIMITS.runPoints),
  spacing: z.enum(['linear', 'log']),
};

/** Planes in which a magnetization may turn. */
export const directionPlanes = ['xz', 'yz', 'xy'] as const;

/** The layer id that names the substrate on an axis. */
export const SUBSTRATE = 'substrate';

/**
 * The swept quantity. Ends are included; `from` may exceed `to`. Log spacing needs both ends > 0.
 *
 * - `direction`: m turns in a plane and keeps its length, in every magnetic layer that is not fixed, or in one layer.
 *   The angle counts from +z toward +x (`xz`), from +z toward +y (`yz`) or from +x toward +y (`xy`).
 * - `voigtScale`: multiplies Q of every magnetic layer, or of one.
 * - `repeat`: how often a block stands in the stack; whole numbers at every point.
 * - `graded`: width of the interface above a layer, or above the substrate (`layerId: 'substrate'`).
 */
export const axisSchema = z
  .discriminatedUnion('kind', [
    strictObject({
      kind: z.literal('wavelength'),
      from: z.number().positive(),
      to: z.number().positive(),
      ...span,
    }),
    strictObject({
      kind: z.literal('angle'),
      from: z.number().min(0).lt(90),
      to: z.number().min(0).lt(90),
      ...span,
    }),
    strictObject({
      kind: z.literal('thickness'),
      layerId: z.string(),
      from: z.number().min(0),
      to: z.number().min(0),
      ...span,
    }),
    strictObject({
      kind: z.literal('direction'),
      plane: z.enum(directionPlanes),
      layerId: z.string().optional(),
      from: z.number().min(-360).max(360),
      to: z.number().min(-360).max(360),
      ...span,
    }),
    strictObject({
      kind: z.literal('voigtScale'),
      layerId: z.string().optional(),
      from: z.number().min(0),
      to: z.number().min(0),
      ...span,
    }),
    strictObject({
      kind: z.literal('repeat'),
      blockId: z.string(),
      from: z.int().min(0).max(LIMITS.repeat),
      to: z.int().min(0).max(LIMITS.repeat),
      ...span,
    }),
    strictObject({
      kind: z.literal('graded'),
      layerId: z.string(),
      from: z.number().min(0),
      to: z.number().min(0),
      ...span,
    }),
  ])
  .superRefine(checkAxis);

export type SweepAxis = z.infer<typeof axisSchema>;
export type AxisKind = SweepAxis['kind'];

/** What a run sweeps. A second axis makes a map, a family repeats curve or map for each of its few values. */
export type SweepAxes = { axis: SweepAxis; second?: SweepAxis | undefined; family?: SweepAxis | undefined };

const axesFields = {
  axis: axisSchema,
  second: axisSchema.optional(),
  family: axisSchema.optional(),
};

export const createRunSchema = strictObject({
  groupId: z.string(),
  name: stackNameSchema.optional(),
  /** The stack the document comes from, when it is a saved one. */
  stackId: z.string().optional(),
  document: stackDocumentSchema,
  ...axesFields,
  readings: z.array(z.enum(readingNames)).min(1).max(readingNames.length).optional(),
}).superRefine(checkAxes);

export type CreateRun = z.infer<typeof createRunSchema>;

export const runStates = ['queued', 'running', 'done', 'failed', 'cancelled'] as const;
export type RunState = (typeof runStates)[number];

export const runProgressSchema = z.object({
  state: z.enum(runStates),
  done: z.int(),
  total: z.int(),
  /** Seconds left by the rate so far; null while there is no rate. */
  secondsLeft: z.number().nullable(),
  error: z.string().nullable(),
});

export type RunProgress = z.infer<typeof runProgressSchema>;

export const runSummarySchema = z.object({
  id: z.string(),
  groupId: z.string(),
  name: z.string(),
  stackId: z.string().nullable(),
  stackName: z.string().nullable(),
  ...axesFields,
  progress: runProgressSchema,
  createdAt: z.iso.datetime(),
  finishedAt: z.iso.datetime().nullable(),
  createdBy: z.string().nullable(),
  isDemo: z.boolean(),
});

/** A constant that went into a run: what it is called in the stack, where it comes from, how it was used. */
export const usedMaterialSchema = z.object({
  id: z.string(),
  version: z.int(),
  name: z.string(),
  formula: z.string(),
  class: z.string(),
  indexSource: sourceSchema,
  voigtSource: sourceSchema.nullable(),
  rangeNm: z.tuple([z.number(), z.number()]),
  voigtRangeNm: z.tuple([z.number(), z.number()]).nullable(),
  /** True where a constant known at one wavelength was used at others, as the user allowed. */
  assumedConstant: z.boolean(),
  /** Of what makes a crystal more than N and Q; absent where there is none. */
  anisotropySource: sourceSchema.optional(),
  /** What it was mixed from and by which law, in words; absent for what is no mixture. */
  mixture: z.string().optional(),
  /** How imported constants were read and what was noticed then, in sentences; absent in runs made before it was kept. */
  origin: z.array(z.string()).optional(),
});

export type UsedMaterial = z.infer<typeof usedMaterialSchema>;

const snapshotFields = {
  document: stackDocumentSchema,
  readings: z.array(z.enum(readingNames)),
  materials: z.array(usedMaterialSchema),
  warnings: z.array(solveWarningSchema),
  /** Sentences that say what the numbers rest on; shown in full wherever the run is. */
  assumptions: z.array(z.string()),
  solverVersion: z.string(),
  inputSha256: z.string(),
  computeSeconds: z.number().nullable(),
};

export const runSchema = runSummarySchema.extend(snapshotFields);
export const runListSchema = z.object({ runs: z.array(runSummarySchema) });

export type RunSummary = z.infer<typeof runSummarySchema>;
export type Run = z.infer<typeof runSchema>;

/** A run as a share link shows it: nothing of the group but the run itself. */
export const sharedRunSchema = z.object({
  name: z.string(),
  ...axesFields,
  finishedAt: z.iso.datetime().nullable(),
  ...snapshotFields,
});

export type SharedRun = z.infer<typeof sharedRunSchema>;
