import { z } from 'zod';
import { complexPairSchema } from './complex.ts';
import { LIMITS } from './limits.ts';
import { strictObject } from './strictObject.ts';

/**
 * A table of constants as somebody else wrote it: how it was read (`importTableSchema`), what its columns mean and which
 * sign habits its source has (`importMappingSchema`), and what comes out in our convention (`importPreviewSchema`).
 */

export const spectralUnits = ['nm', 'um', 'A', 'eV', 'cm-1', 'THz'] as const;
export type SpectralUnit = (typeof spectralUnits)[number];

export const angleUnits = ['deg', 'mdeg', 'mrad', 'rad', 'arcmin'] as const;
export const conductivityUnits = ['s^-1', 'S/m'] as const;

const column = z
  .int()
  .min(0)
  .max(LIMITS.importColumns - 1);

/**
 * Habits of the source (physics of the conventions page). They are always stored, also those that a quantity does
 * not need, so that an import can be repeated as it was.
 */
export const signHabitsSchema = strictObject({
  /** Time factor: with exp(+iwt) an absorbing medium has N = n - ik. */
  time: z.enum(['exp(-iwt)', 'exp(+iwt)']),
  /** eps_xy = +iQ eps_d or -iQ eps_d, for a tabulated Q. */
  voigtSign: z.enum(['+iQ', '-iQ']),
  /**
   * Where +m (or the field) of the source points. For Kerr angles against the film itself; for Q and tensor elements
   * against the source's own right-handed axes, `into` along their +z: a tensor does not change when z and m turn together.
   */
  magnetization: z.enum(['into the film', 'out of the film']),
  /** The sense in which a positive rotation turns, for an observer who looks into the reflected beam. */
  rotation: z.enum(['counter-clockwise', 'clockwise']),
  /** The sense in which the field of light of positive ellipticity turns, for the same observer. */
  ellipticity: z.enum(['counter-clockwise', 'clockwise']),
});

export type SignHabits = z.infer<typeof signHabitsSchema>;

/** The habits of this program. */
export const ownHabits: SignHabits = {
  time: 'exp(-iwt)',
  voigtSign: '+iQ',
  magnetization: 'into the film',
  rotation: 'counter-clockwise',
  ellipticity: 'counter-clockwise',
};

const mappingFields = strictObject({
  spectral: strictObject({ column, unit: z.enum(spectralUnits) }),
  /** Null when the file has no index; a Q given as eps_xy, sigma_xy or Kerr angles then takes N from `indexOf`. */
  index: z
    .discriminatedUnion('from', [
      strictObject({ from: z.literal('n, k'), n: column, k: column.nullable() }),
      strictObject({ from: z.literal('eps1, eps2'), eps1: column, eps2: column.nullable() }),
    ])
    .nullable(),
  voigt: z
    .discriminatedUnion('from', [
      strictObject({ from: z.literal('Q'), re: column, im: column.nullable() }),
      strictObject({ from: z.literal('eps_xy'), re: column, im: column.nullable() }),
      strictObject({
        from: z.literal('sigma_xy'),
        re: column,
        im: column.nullable(),
        unit: z.enum(conductivityUnits),
      }),
      strictObject({
        from: z.literal('Kerr angles'),
        rotation: column,
        ellipticity: column,
        unit: z.enum(angleUnits),
        /** Index of the medium from which the light came. */
        incidentIndex: z.number().min(1).max(10),
      }),
    ])
    .nullable(),
  /** The material whose N turns the magneto-optic columns into Q, where the file has no index. */
  indexOf: strictObject({ material: z.string(), version: z.int().min(1) }).nullable(),
  habits: signHabitsSchema,
});

/** Which column means what. A quantity without an imaginary column is real. */
export const importMappingSchema = mappingFields.superRefine((mapping, context) => {
  if (mapping.index === null && mapping.voigt === null) {
    context.addIssue({
      code: 'custom',
      path: ['index'],
      message: 'choose the columns of n and k, of the magneto-optic constant, or both',
    });
  }
  const needsIndex = mapping.voigt !== null && mapping.voigt.from !== 'Q';
  if (needsIndex && mapping.index === null && mapping.indexOf === null) {
    context.addIssue({
      code: 'custom',
      path: ['indexOf'],
      message: `is required: ${mapping.voigt!.from} becomes Q only together with N, which this file does not give`,
    });
  }
});

export type ImportMapping = z.infer<typeof importMappingSchema>;

/** Something to look at; nothing is changed because of it. `lines` are those of the file, 1-based, the first few. */
export const importWarningSchema = strictObject({
  code: z.enum([
    'negative-k',
    'not-passive',
    'jump',
    'duplicate',
    'unsorted',
    'unit',
    'large-voigt',
    'kramers-kronig',
    'empty-cells',
    'skipped-lines',
    'few-points',
    'outside-index',
  ]),
  message: z.string(),
  lines: z.array(z.int()),
});

export type ImportWarning = z.infer<typeof importWarningSchema>;

/** What was entered and how it was read, kept beside the canonical values. */
export const importOriginSchema = strictObject({
  importId: z.string(),
  fileName: z.string(),
  sha256: z.string(),
  rows: z.int(),
  mapping: importMappingSchema,
  /** How the entered values became the stored ones, in sentences. */
  sentences: z.array(z.string()),
  warnings: z.array(importWarningSchema),
});

export type ImportOrigin = z.infer<typeof importOriginSchema>;

/** A file as it was read, before anything is said about its meaning. */
export const importTableSchema = z.object({
  delimiter: z.enum(['comma', 'semicolon', 'tab', 'space']),
  decimal: z.enum(['point', 'comma']),
  /** Line of the header, 1-based; null when there is none. */
  headerLine: z.int().nullable(),
  comments: z.array(z.string()).meta({ description: 'The first comment lines.' }),
  columns: z.array(z.object({ header: z.string().nullable(), least: z.number(), greatest: z.number() })),
  rowCount: z.int(),
  firstRows: z.array(z.object({ line: z.int(), cells: z.array(z.number().nullable()) })),
  lastRows: z.array(z.object({ line: z.int(), cells: z.array(z.number().nullable()) })),
  /**
   * What the headers and values look like; habits are never guessed, and what is still to be chosen (such as the
   * material that gives N) is null. Null when no wavelength column was found.
   */
  suggestion: mappingFields.nullable(),
  /** What was noticed while reading: skipped lines, empty cells. */
  warnings: z.array(importWarningSchema),
});

export type ImportTable = z.infer<typeof importTableSchema>;

export const importStates = ['reading', 'ready', 'refused'] as const;

export const materialImportSchema = z.object({
  id: z.string(),
  groupId: z.string(),
  fileName: z.string(),
  bytes: z.int(),
  state: z.enum(importStates),
  /** Of the reading, 0..1. */
  progress: z.number(),
  /** Why it was refused, with the remedy. */
  error: z.string().nullable(),
  table: importTableSchema.nullable(),
  /** Set for a file that Skewlight exported: it is read back whole, without a mapping. */
  exported: z.object({ name: z.string(), formula: z.string(), class: z.string() }).nullable(),
});

export type MaterialImport = z.infer<typeof materialImportSchema>;

/** A pasted table; an upload is multipart with one part `file`. */
export const pasteImportSchema = strictObject({
  text: z.string().min(1, { error: 'must not be empty' }).max(LIMITS.bodyBytes),
  fileName: z.string().trim().min(1).max(LIMITS.nameLength).default('pasted table'),
});

const thinned = z.array(z.number());

/** The converted constants of an import, thinned for a plot, with everything that can be said about them. */
export const importPreviewSchema = z.object({
  rowCount: z.int(),
  rangeNm: z.tuple([z.number(), z.number()]),
  index: z.object({ wavelengthsNm: thinned, n: thinned, k: thinned }).nullable(),
  voigt: z.object({ wavelengthsNm: thinned, q: z.array(complexPairSchema) }).nullable(),
  sentences: z.array(z.string()),
  warnings: z.array(importWarningSchema),
});

export type ImportPreview = z.infer<typeof importPreviewSchema>;
