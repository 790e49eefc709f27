import { z } from 'zod';
import { designPointsSchema, signalNames, toleranceSchema } from './designPoint.ts';
import { LIMITS } from './limits.ts';
import { stackDocumentSchema, stackNameSchema } from './stack.ts';
import { strictObject } from './strictObject.ts';

/** The one page a grower takes to the chamber. It is made once and never changed. */

const words = z.string().trim().max(LIMITS.noteLength);

export const createGrowthCardSchema = strictObject({
  title: stackNameSchema,
  document: stackDocumentSchema,
  points: designPointsSchema,
  signal: z.enum(signalNames),
  tolerance: toleranceSchema,
  /** Deposition rates the grower knows, nm/min; empty columns are filled in by hand. */
  rates: z.array(strictObject({ layerId: z.string(), nmPerMin: z.number().positive() })).default([]),
  sampleId: z.string().trim().max(LIMITS.nameLength).default(''),
  /** How the film will be measured, in words: source, polarizer, analyzer offset, detector. */
  bench: words.default(''),
  decision: strictObject({ text: words.min(1, { error: 'must not be empty: what was decided, and why' }) }),
  /** Where the card comes from; at most one. The link of the QR code opens it, or the card alone. */
  studyId: z.string().optional(),
  designId: z.string().optional(),
  /** Whether the card carries a share link as a QR code, and when that link ends (null: never). */
  link: strictObject({ expiresAt: z.iso.datetime().nullable() }).nullable(),
});

/** One line of the table, from the substrate up; `repeat` lines stand for a block. */
const cardLayerSchema = z.object({
  /** In the order of growth, from 1; null for the substrate. */
  step: z.int().nullable(),
  /** Such as "6 times steps 3 to 4"; null outside of blocks. */
  block: z.string().nullable(),
  material: z.string(),
  role: z.string(),
  thicknessNm: z.number().nullable(),
  /** One standard deviation of the thickness by the stated tolerances, nm. */
  deviationNm: z.number().nullable(),
  nmPerMin: z.number().nullable(),
  /** Deposition time at that rate, s. */
  seconds: z.number().nullable(),
});

const cardReadingSchema = z.object({
  pointId: z.string(),
  label: z.string(),
  /** The working point in words. */
  conditions: z.string(),
  readings: z.array(
    z.object({
      label: z.string(),
      unit: z.enum(['deg', '1']),
      nominal: z.number().nullable(),
      /** Band that holds 68.27 % of the samples. */
      low: z.number().nullable(),
      high: z.number().nullable(),
    }),
  ),
});

export const growthCardSchema = z.object({
  id: z.string(),
  groupId: z.string(),
  title: z.string(),
  sampleId: z.string(),
  document: stackDocumentSchema,
  layers: z.array(cardLayerSchema),
  readings: z.array(cardReadingSchema),
  bench: z.string(),
  decision: z.object({ text: z.string(), by: z.string(), at: z.iso.datetime() }),
  tolerance: toleranceSchema,
  assumptions: z.array(z.string()),
  sources: z.array(z.string()),
  cautions: z.array(z.string()),
  /** Address of the QR code; null without a link. */
  url: z.string().nullable(),
  studyId: z.string().nullable(),
  designId: z.string().nullable(),
  solverVersion: z.string(),
  inputSha256: z.string(),
  createdAt: z.iso.datetime(),
  isDemo: z.boolean(),
});

/** The steps of making a card, in their order. */
export const cardSteps = ['film', 'bands', 'card'] as const;

/**
 * How far a card is that somebody waits for. `progress` is null when none is being made under this key; `cardId` is then
 * the card that was stored, null when there is none.
 */
export const cardMakingSchema = z.object({
  progress: z
    .object({
      step: z.enum(cardSteps),
      /** Films that are drawn for the bands, of all. */
      done: z.int(),
      total: z.int(),
      /** Null while there is no rate to estimate from. */
      secondsLeft: z.number().nullable(),
    })
    .nullable(),
  cardId: z.string().nullable(),
});

export const growthCardListSchema = z.object({
  cards: z.array(
    growthCardSchema.pick({ id: true, title: true, sampleId: true, createdAt: true, decision: true }),
  ),
});

/** A card as a share link shows it: nothing of the group but the card itself. */
export const sharedGrowthCardSchema = growthCardSchema.omit({ groupId: true, studyId: true, designId: true });

export type CreateGrowthCard = z.input<typeof createGrowthCardSchema>;
export type GrowthCard = z.infer<typeof growthCardSchema>;
export type SharedGrowthCard = z.infer<typeof sharedGrowthCardSchema>;
export type CardMaking = z.infer<typeof cardMakingSchema>;
export type CardLayer = z.infer<typeof cardLayerSchema>;
export type CardReading = z.infer<typeof cardReadingSchema>;
