import { z } from 'zod';
import { canonicalJson } from './canonicalJson.ts';
import { LIMITS } from './limits.ts';
import { workingPointSchema } from './stack.ts';
import type { StackMedium, WorkingPoint } from './stack.ts';
import { strictObject } from './strictObject.ts';

/**
 * What every design question is asked at and for: working points, the signal that counts, the demands that a film must
 * meet and how far its layers may be off. Angles in deg, lengths in nm.
 */

/** A named working point: wavelength, angle, polarization and geometry at which the film will be read. */
export const designPointSchema = strictObject({
  id: z.string().min(1).max(40),
  label: z.string().trim().min(1, { error: 'must not be empty' }).max(LIMITS.nameLength),
  workingPoint: workingPointSchema,
});

export const designPointsSchema = z
  .array(designPointSchema)
  .min(1)
  .max(LIMITS.designPoints)
  .superRefine((points, context) => {
    points.forEach(({ id }, position) => {
      if (points.findIndex((other) => other.id === id) < position) {
        context.addIssue({ code: 'custom', path: [position, 'id'], message: `is used twice: ${id}` });
      }
    });
  });

/**
 * The quantity a film is chosen for, always of the light of the working point (p or s in): |Kerr rotation|,
 * |Kerr ellipticity|, cross-polarized amplitude, |transverse contrast|.
 */
export const signalNames = ['rotation', 'ellipticity', 'amplitude', 'contrast'] as const;
export type SignalName = (typeof signalNames)[number];

/** All readings of one design point; null where a reading does not exist (no reflection, no ceiling). */
export const pointReadingsSchema = z.object({
  rotationDeg: z.number().nullable(),
  ellipticityDeg: z.number().nullable(),
  amplitude: z.number().nullable(),
  contrast: z.number().nullable(),
  reflectance: z.number(),
  /** |r_sp| or |r_ps| over what the magnetic materials can give in any stack, to first order in Q. */
  ceilingShare: z.number().nullable(),
});

export type PointReadings = z.infer<typeof pointReadingsSchema>;
export type PointReadingName = keyof PointReadings;

/** Demands at every working point; those left out are not made. */
export const demandsSchema = strictObject({
  leastRotationDeg: z.number().min(0).optional(),
  leastAmplitude: z.number().min(0).optional(),
  leastContrast: z.number().min(0).optional(),
  leastReflectance: z.number().min(0).max(1).optional(),
  mostEllipticityDeg: z.number().min(0).optional(),
  /** |d signal / d thickness| over |signal|, percent per nm of the swept layer. Of cap choosers only. */
  mostSlopePercentPerNm: z.number().min(0).optional(),
});

export type Demands = z.infer<typeof demandsSchema>;

const percent = z.number().min(0).max(50);

/**
 * Errors of thickness and constants. Normal, every stated value is one standard deviation. A thickness is
 * nominal (1 + rate error of its material + random error of its layer): one rate error for each material, shared by all
 * its layers; one random error for each layer. A thickness below 0 counts as 0.
 */
export const toleranceSchema = strictObject({
  ratePercent: percent,
  randomPercent: percent,
  /** Of n and of k of each material that is not lossless vacuum or air: two independent factors. */
  indexPercent: percent.default(0),
  /** Of Q of each magnetic material: one real factor. */
  voigtPercent: percent.default(0),
  /** Other values for single materials, by `materialKeyOf`. */
  materials: z
    .array(
      strictObject({
        material: z.string(),
        ratePercent: percent.optional(),
        randomPercent: percent.optional(),
        indexPercent: percent.optional(),
        voigtPercent: percent.optional(),
      }),
    )
    .max(50)
    .default([]),
  samples: z.int().min(100).max(LIMITS.toleranceSamples),
  /** The same seed gives the same numbers on any machine and any number of cores. */
  seed: z.int().min(0).max(4_294_967_295),
});

export type Tolerance = z.infer<typeof toleranceSchema>;

/**
 * What makes two layers layers of one material: its library id, else the constants typed in. The database does not keep the
 * order of keys, so it must not matter.
 */
export function materialKeyOf({ material, label: _label, version: _version, ...typed }: StackMedium): string {
  return material ?? canonicalJson(typed);
}

export type DesignPoint = { id: string; label: string; workingPoint: WorkingPoint };
