import { z } from 'zod';
import { complexPairSchema } from '../../../../shared/complex.ts';
import { formulaQuantities, mixtureModels } from '../../../../shared/dispersion.ts';
import { materialClasses } from '../../../../shared/material.ts';
import { importMappingSchema } from '../../../../shared/materialImport.ts';
import { confidences } from '../../../../shared/materialSource.ts';

/**
 * A material while somebody edits it. It may be wrong or unfinished at any moment, so this says only of what kind each
 * value is; what it must be is said once, by the schemas of the API. Cells of tables are kept as they were typed. As a
 * schema it reads back what a tab has kept.
 */

const rangeNm = z.tuple([z.number(), z.number()]);

const table = z.object({ kind: z.literal('table'), rows: z.array(z.array(z.string())) });

const sellmeier = z.object({
  kind: z.literal('sellmeier'),
  rangeNm,
  constant: z.number(),
  terms: z.array(z.object({ b: z.number(), cUm2: z.number() })),
});

const cauchy = z.object({
  kind: z.literal('cauchy'),
  rangeNm,
  a: z.number(),
  bUm2: z.number(),
  cUm4: z.number(),
  tail: z.object({ k: z.number(), perEv: z.number(), atEv: z.number() }).nullable(),
});

const oscillator = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('drude'), plasmaEv: z.number(), dampingEv: z.number() }),
  z.object({ kind: z.literal('lorentz'), strength: z.number(), centreEv: z.number(), dampingEv: z.number() }),
  z.object({
    kind: z.literal('tauc-lorentz'),
    amplitudeEv: z.number(),
    gapEv: z.number(),
    centreEv: z.number(),
    dampingEv: z.number(),
  }),
]);

const oscillators = z.object({
  kind: z.literal('oscillators'),
  rangeNm,
  epsInfinity: z.number(),
  terms: z.array(oscillator),
});

const formulaFields = {
  kind: z.literal('formula'),
  rangeNm,
  expression: z.string(),
  coefficients: z.array(z.number()),
};

const formula = z.object({ ...formulaFields, quantity: z.enum(formulaQuantities) });

const plainIndexKinds = [table, sellmeier, cauchy, oscillators, formula] as const;
const plainIndex = z.discriminatedUnion('kind', [...plainIndexKinds]);

const tensorRow = z.tuple([complexPairSchema, complexPairSchema, complexPairSchema]);
const tensor = z.object({
  kind: z.literal('tensor'),
  entries: z.array(
    z.object({ wavelengthNm: z.number(), epsilon: z.tuple([tensorRow, tensorRow, tensorRow]) }),
  ),
});

const partChoice = z.object({ material: z.string(), version: z.number() });
const mixture = z.object({
  kind: z.literal('mixture of'),
  model: z.enum(mixtureModels),
  fraction: z.number(),
  parts: z.tuple([partChoice, partChoice]),
});

/** Constants of a file, taken over with the way it was read. */
const imported = z.object({
  kind: z.literal('import'),
  importId: z.string(),
  fileName: z.string(),
  rows: z.number(),
  mapping: importMappingSchema,
});

const index = z.discriminatedUnion('kind', [...plainIndexKinds, tensor, mixture, imported]);

const lines = z.object({
  kind: z.literal('lines'),
  rangeNm,
  of: z.enum(['voigt', 'gyration']),
  lines: z.array(
    z.object({
      shape: z.enum(['paramagnetic', 'diamagnetic']),
      amplitude: z.number(),
      centreEv: z.number(),
      dampingEv: z.number(),
    }),
  ),
});

const voigt = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('none') }),
  table,
  lines,
  z.object(formulaFields),
  z.object({ kind: z.literal('mixture') }),
  imported,
]);

const anisotropy = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('none') }),
  z.object({
    kind: z.literal('uniaxial'),
    extraordinary: plainIndex,
    axis: z.tuple([z.number(), z.number(), z.number()]),
  }),
  z.object({
    kind: z.literal('cubic'),
    wavelengthNm: z.number(),
    g11: complexPairSchema,
    g12: complexPairSchema,
    g44: complexPairSchema,
    azimuthDeg: z.number(),
  }),
]);

/** Empty texts stand for what is not known. */
const source = z.object({
  citation: z.string(),
  doi: z.string(),
  licence: z.string(),
  sample: z.string(),
  temperature: z.string(),
  method: z.string(),
  confidence: z.enum(confidences),
  caution: z.string(),
});

const thermal = z
  .object({ curieK: z.number(), a: z.number(), b: z.number(), citation: z.string() })
  .nullable();

export const materialFormSchema = z.object({
  name: z.string(),
  formula: z.string(),
  class: z.enum(materialClasses),
  /** One note a line. */
  notes: z.string(),
  /** Why the new version is made. */
  versionNote: z.string(),
  content: z.object({
    index,
    indexSource: source,
    voigt,
    voigtSource: source,
    anisotropy,
    anisotropySource: source,
    thermal,
  }),
});

export type MaterialForm = z.infer<typeof materialFormSchema>;
export type ContentForm = MaterialForm['content'];
export type IndexForm = z.infer<typeof index>;
export type PlainIndexForm = z.infer<typeof plainIndex>;
export type VoigtForm = z.infer<typeof voigt>;
export type AnisotropyForm = z.infer<typeof anisotropy>;
export type OscillatorForm = z.infer<typeof oscillator>;
export type SourceForm = z.infer<typeof source>;
export type ThermalForm = z.infer<typeof thermal>;
export type ImportedForm = z.infer<typeof imported>;
export type FormOf<Form extends { kind: string }, Kind extends Form['kind']> = Extract<Form, { kind: Kind }>;
