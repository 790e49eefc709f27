import { z } from 'zod';
import { complexPairSchema } from './complex.ts';
import { strictObject } from './strictObject.ts';

/**
 * How a constant depends on the vacuum wavelength. Lengths in nm, photon energies in eV, everything in the canonical
 * sign (physics of the conventions page): N = n + ik for exp(-iwt), Q with eps_xy = +iQ eps_d for m = +z.
 */

const positive = z.number().positive();
const wavelengthsNm = z.array(positive).min(1);
const rangeNm = z.tuple([positive, positive]);

/** Longest text of a formula. */
export const FORMULA_LENGTH = 1_000;
/** Most terms of a sum of oscillators, of a Sellmeier formula or of lines. */
const TERMS = 12;

const tableIndex = strictObject({
  kind: z.literal('table'),
  wavelengthsNm,
  n: z.array(z.number().min(0)),
  k: z.array(z.number().min(0)),
});

/** What the value of a formula is; `n` is a lossless real index, the other two may be complex. */
export const formulaQuantities = ['n', 'N', 'eps'] as const;

/**
 * A formula in the wavelength L in micrometres or the photon energy E in eV, the coefficients c1, c2, ... and, where
 * the quantity is complex, the imaginary unit i.
 */
const formulaFields = {
  kind: z.literal('formula'),
  expression: z.string().max(FORMULA_LENGTH),
  coefficients: z.array(z.number()).max(40),
  rangeNm,
};

const formulaIndex = strictObject({ ...formulaFields, quantity: z.enum(formulaQuantities).optional() });

/** One term of the permittivity of a sum of oscillators; energies in eV. */
export const oscillatorSchema = z.discriminatedUnion('kind', [
  /** - plasmaEv^2 / (E^2 + i dampingEv E) */
  strictObject({ kind: z.literal('drude'), plasmaEv: z.number().min(0), dampingEv: positive }),
  /** strength centreEv^2 / (centreEv^2 - E^2 - i dampingEv E) */
  strictObject({
    kind: z.literal('lorentz'),
    strength: z.number().min(0),
    centreEv: positive,
    dampingEv: positive,
  }),
  /** Joint density of states above a gap times a Lorentz oscillator: Jellison and Modine (1996). */
  strictObject({
    kind: z.literal('tauc-lorentz'),
    amplitudeEv: z.number().min(0),
    gapEv: z.number().min(0),
    centreEv: positive,
    dampingEv: positive,
  }),
]);

/** Parametric models of an index, valid within `rangeNm`. */
const modelIndex = strictObject({
  kind: z.literal('model'),
  rangeNm,
  model: z.discriminatedUnion('name', [
    /** n^2 = constant + sum of b L^2 / (L^2 - cUm2), L in micrometres. */
    strictObject({
      name: z.literal('sellmeier'),
      constant: z.number().min(0),
      terms: z
        .array(strictObject({ b: z.number(), cUm2: z.number().min(0) }))
        .min(1)
        .max(TERMS),
    }),
    /** n = a + bUm2 / L^2 + cUm4 / L^4; k = kA exp(kBEv (E - kCEv)) where given. */
    strictObject({
      name: z.literal('cauchy'),
      a: positive,
      bUm2: z.number(),
      cUm4: z.number(),
      tail: strictObject({ k: z.number().min(0), perEv: z.number(), atEv: positive }).optional(),
    }),
    /** eps = epsInfinity + sum of terms. */
    strictObject({
      name: z.literal('oscillators'),
      epsInfinity: z.number().min(0),
      terms: z.array(oscillatorSchema).min(1).max(TERMS),
    }),
  ]),
});

/** A free permittivity tensor, rows x, y, z; it carries its own magnetization. One entry: known at one wavelength. */
const pairRow = z.tuple([complexPairSchema, complexPairSchema, complexPairSchema]);
const tensorIndex = strictObject({
  kind: z.literal('tensor'),
  wavelengthsNm,
  epsilon: z.array(z.tuple([pairRow, pairRow, pairRow])),
});

const plainIndexKinds = [tableIndex, formulaIndex, modelIndex] as const;

/** A scalar index that needs no other material. */
export const plainIndexSchema = z.discriminatedUnion('kind', [...plainIndexKinds]);

const tableVoigt = strictObject({
  kind: z.literal('table'),
  wavelengthsNm,
  q: z.array(complexPairSchema),
});

const formulaVoigt = strictObject(formulaFields);

/**
 * Lines of magneto-optic activity against photon energy E, with F = E + i dampingEv:
 * paramagnetic `amplitude centreEv F / (centreEv^2 - F^2)`, from unequal strengths of the two circular transitions;
 * diamagnetic `amplitude centreEv^3 F / (centreEv^2 - F^2)^2`, from their splitting. Both are causal and odd in E.
 * `of` says whether the sum is Q itself or the gyration g = Q eps_d, which is the causal quantity.
 */
const linesVoigt = strictObject({
  kind: z.literal('lines'),
  rangeNm,
  of: z.enum(['voigt', 'gyration']),
  lines: z
    .array(
      strictObject({
        shape: z.enum(['paramagnetic', 'diamagnetic']),
        amplitude: z.number(),
        centreEv: positive,
        dampingEv: positive,
      }),
    )
    .min(1)
    .max(TERMS),
});

/** A Voigt constant that needs no other material. */
export const plainVoigtSchema = z.discriminatedUnion('kind', [tableVoigt, formulaVoigt, linesVoigt]);

export const mixtureModels = ['bruggeman', 'maxwell-garnett'] as const;

/** Two materials mixed far below the wavelength; the parts stand here whole, as they were when they were mixed. */
const mixtureIndex = strictObject({
  kind: z.literal('mixture'),
  model: z.enum(mixtureModels),
  /** Volume fraction of the second part. */
  fraction: z.number().min(0).max(1),
  parts: z
    .array(
      strictObject({
        material: z.string(),
        version: z.int().min(1),
        name: z.string(),
        index: plainIndexSchema,
        voigt: plainVoigtSchema.nullable(),
      }),
    )
    .length(2),
});

export const indexDispersionSchema = z.discriminatedUnion('kind', [
  ...plainIndexKinds,
  tensorIndex,
  mixtureIndex,
]);

/** `mixture`: the Q that the parts of the mixed index give. */
export const voigtDispersionSchema = z.discriminatedUnion('kind', [
  tableVoigt,
  formulaVoigt,
  linesVoigt,
  strictObject({ kind: z.literal('mixture') }),
]);

/**
 * What makes a crystal more than N and Q. Uniaxial: `index` is the ordinary index. Cubic: second order in m, known at
 * one wavelength; `azimuthDeg` turns [100] from x toward y.
 */
export const anisotropySchema = z.discriminatedUnion('kind', [
  strictObject({
    kind: z.literal('uniaxial'),
    extraordinary: plainIndexSchema,
    axis: z.tuple([z.number(), z.number(), z.number()]),
  }),
  strictObject({
    kind: z.literal('cubic'),
    wavelengthNm: positive,
    g11: complexPairSchema,
    g12: complexPairSchema,
    g44: complexPairSchema,
    azimuthDeg: z.number(),
  }),
]);

export type Oscillator = z.infer<typeof oscillatorSchema>;
export type PlainIndex = z.infer<typeof plainIndexSchema>;
export type PlainVoigt = z.infer<typeof plainVoigtSchema>;
export type IndexModel = Extract<PlainIndex, { kind: 'model' }>['model'];
export type IndexDispersion = z.infer<typeof indexDispersionSchema>;
export type VoigtDispersion = z.infer<typeof voigtDispersionSchema>;
export type Anisotropy = z.infer<typeof anisotropySchema>;
export type MagnetoOpticLine = Extract<PlainVoigt, { kind: 'lines' }>['lines'][number];
