import { z } from 'zod';
import { complexSchema, toComplex, vectorSchema } from './complex.ts';
import { LIMITS } from './limits.ts';
import { strictObject } from './strictObject.ts';

/**
 * The constants of a medium as the solve contract writes them. Values may be given once, or as
 * `{samples: [...]}` with one entry per wavelength of the case.
 */
const tensorSchema = z.tuple(
  [
    z.tuple([complexSchema, complexSchema, complexSchema]),
    z.tuple([complexSchema, complexSchema, complexSchema]),
    z.tuple([complexSchema, complexSchema, complexSchema]),
  ],
  { error: 'must be a 3x3 array of numbers or [re, im]' },
);

export type TensorInput = z.infer<typeof tensorSchema>;

/** Constants beyond this have no physical meaning, and their squares would leave the range of doubles. */
const LARGEST = 1e20;

function refuseAbsurd(size: number, least: number, what: string, context: z.RefinementCtx): void {
  if (size > LARGEST)
    context.addIssue({ code: 'custom', message: `${what} must be <= ${LARGEST}, got ${size}` });
  if (size < least) context.addIssue({ code: 'custom', message: `${what} must be >= ${least}, got ${size}` });
}

/** A refractive index N = n + ik: the convention exp(-iwt) makes k >= 0 for a medium that absorbs. */
const indexValueSchema = complexSchema.superRefine((value, context) => {
  const [n, k] = toComplex(value);
  if (n < 0) context.addIssue({ code: 'custom', message: `n must be >= 0, got ${n}` });
  if (k < 0) {
    context.addIssue({
      code: 'custom',
      message: `k must be >= 0, got ${k}: the convention here is N = n + ik (time factor exp(-iwt)), so a source that writes n - ik must change the sign of k; gain is not supported`,
    });
  }
  if (n === 0 && k === 0) context.addIssue({ code: 'custom', message: 'must not be 0' });
  else refuseAbsurd(Math.hypot(n, k), 1 / LARGEST, '|N|', context);
});

const voigtValueSchema = complexSchema.superRefine((value, context) => {
  refuseAbsurd(Math.hypot(...toComplex(value)), 0, '|Q|', context);
});

const tensorValueSchema = tensorSchema.superRefine((tensor, context) => {
  const [re, im] = toComplex(tensor[2][2]);
  if (re === 0 && im === 0) {
    context.addIssue({ code: 'custom', message: 'eps_zz must not be 0', path: [2, 2] });
  } else {
    refuseAbsurd(Math.hypot(re, im), 1 / LARGEST, '|eps_zz|', context);
  }
  const largest = Math.max(...tensor.flatMap((row) => row.map((value) => Math.hypot(...toComplex(value)))));
  refuseAbsurd(largest, 0, 'every element', context);
});

function sampled<Value extends z.ZodType>(value: Value, error: string) {
  return z.union([value, strictObject({ samples: z.array(value).min(1) })], { error });
}

const indexSchema = sampled(indexValueSchema, 'must be a number, [n, k] or {"samples": [...]}').meta({
  description: 'Complex refractive index N = n + ik.',
});
const voigtSchema = sampled(voigtValueSchema, 'must be a number, [re, im] or {"samples": [...]}').meta({
  description: 'Complex Voigt constant Q in the canonical sign: for m = +z, eps_xy = i Q eps_d.',
});
const voigtScaleSchema = z.number().min(0).optional().meta({ description: 'Multiplies Q; 1 when left out.' });
const epsilonSchema = sampled(tensorValueSchema, 'must be a 3x3 complex array or {"samples": [...]}').meta({
  description: 'Full permittivity tensor, rows x, y, z; replaces every other key of the medium.',
});

export const magnetizationSchema = vectorSchema
  .superRefine((m, context) => {
    const length = Math.hypot(m[0], m[1], m[2]);
    if (length > 1 + LIMITS.magnetizationSlack) {
      context.addIssue({
        code: 'custom',
        message: `|m| must be <= 1 (fraction of saturation), got ${length}`,
      });
    }
  })
  .meta({
    description: 'Magnetization as a fraction of saturation: x in the plane of incidence, z into the film.',
  });

const axisSchema = vectorSchema.superRefine((axis, context) => {
  if (Math.hypot(axis[0], axis[1], axis[2]) === 0) {
    context.addIssue({ code: 'custom', message: 'must not be the zero vector' });
  }
});

const quadraticSchema = strictObject({
  g11: complexSchema,
  g12: complexSchema,
  g44: complexSchema,
  azimuthDeg: z.number().optional(),
}).meta({ description: 'Second order in m of a cubic crystal; azimuthDeg turns [100] from x toward y.' });

/**
 * Two media mixed on a scale far below the wavelength (physics.md section 6). `bruggeman` treats them alike;
 * `maxwell-garnett` has spheres of the second in the first. Each part keeps its own m.
 */
const mixtureRules = {
  model: z.enum(['bruggeman', 'maxwell-garnett']),
  /** Volume fraction of the second part. */
  fraction: z.number().min(0).max(1),
};

const partFields = {
  index: indexSchema.optional(),
  voigt: voigtSchema.optional(),
  voigtScale: voigtScaleSchema,
  m: magnetizationSchema.optional(),
};

const partSchema = strictObject(partFields).superRefine((part, context) => {
  if (part.index === undefined) context.addIssue({ code: 'custom', path: ['index'], message: 'is required' });
});

export const mixtureSchema = strictObject({
  ...mixtureRules,
  parts: z.tuple([partSchema, partSchema]),
}).superRefine((mixture, context) => {
  if (mixture.model === 'maxwell-garnett' && mixture.parts[0].voigt !== undefined) {
    context.addIssue({
      code: 'custom',
      path: ['parts', 0, 'voigt'],
      message:
        'the host of a maxwell-garnett mixture must not be magnetic; put the magnet second, or use bruggeman',
    });
  }
});

const orientationSchema = z
  .tuple([z.number(), z.number(), z.number()], { error: 'must be three angles in deg' })
  .meta({
    description:
      'Euler angles in deg: the crystal or tensor is turned about z, then about the new y, then about the new z.',
  });

/** The keys of a medium given by numbers. Kept apart from the objects so that a layer can carry them inline. */
export const mediumFields = {
  index: indexSchema.optional(),
  voigt: voigtSchema.optional(),
  voigtScale: voigtScaleSchema,
  m: magnetizationSchema.optional(),
  extraordinary: indexSchema.optional(),
  axis: axisSchema.optional(),
  quadratic: quadraticSchema.optional(),
  epsilon: epsilonSchema.optional(),
  orientationDeg: orientationSchema.optional(),
  mixture: mixtureSchema.optional(),
};

export type MixtureInput = z.infer<typeof mixtureSchema>;

const libraryFields = {
  material: z.string().min(1).max(80).optional().meta({ description: 'Id of a material in the library.' }),
  version: z
    .int()
    .min(1)
    .optional()
    .meta({ description: 'Version of that material; the newest when left out.' }),
  assumeConstant: z
    .boolean()
    .optional()
    .meta({ description: 'Use a constant known at one wavelength at every other one too.' }),
  tensorState: z.enum(['reversed', 'unmagnetized']).optional().meta({
    description:
      'For a material that is a free tensor: its magnetization reversed (transposed) or absent (symmetric part).',
  }),
};

const libraryPartSchema = strictObject({ ...partFields, ...libraryFields }).superRefine((part, context) => {
  if ((part.index === undefined) === (part.material === undefined)) {
    context.addIssue({ code: 'custom', path: ['index'], message: 'give either index or material' });
  }
});

/** The same keys where media may be named by library id, parts of a mixture included. */
export const libraryMediumFields = {
  ...mediumFields,
  ...libraryFields,
  mixture: strictObject({
    ...mixtureRules,
    parts: z.tuple([libraryPartSchema, libraryPartSchema]),
  }).optional(),
};

const mediumObjectSchema = strictObject(mediumFields);
const libraryMediumObjectSchema = strictObject(libraryMediumFields);

export type MediumInput = z.infer<typeof mediumObjectSchema>;
export type LibraryMediumInput = z.infer<typeof libraryMediumObjectSchema>;

const constantKeys = ['index', 'voigt', 'extraordinary', 'axis', 'quadratic', 'epsilon', 'mixture'] as const;

/** Rules between the keys of one medium. `extra` keys of the object (thicknessNm of a layer) do not count. */
export function checkMediumKeys(medium: LibraryMediumInput, context: z.RefinementCtx): void {
  const refuse = (path: string, message: string) =>
    context.addIssue({ code: 'custom', message, path: [path] });
  const refuseBeside = (keys: readonly (keyof LibraryMediumInput)[], message: string) => {
    for (const key of keys) if (medium[key] !== undefined) refuse(key, message);
  };
  if (medium.material !== undefined) {
    refuseBeside([...constantKeys], 'cannot stand beside material: the library gives the constants');
    return;
  }
  refuseBeside(['version', 'assumeConstant', 'tensorState'], 'needs material');
  if (medium.epsilon !== undefined) {
    refuseBeside(
      ['index', 'voigt', 'voigtScale', 'm', 'extraordinary', 'axis', 'quadratic', 'mixture'],
      'cannot stand beside epsilon, which replaces it',
    );
    return;
  }
  if (medium.mixture !== undefined) {
    refuseBeside(
      ['index', 'voigt', 'voigtScale', 'm', 'extraordinary', 'axis', 'quadratic', 'orientationDeg'],
      'cannot stand beside mixture: its parts give the constants',
    );
    return;
  }
  if (medium.index === undefined) refuse('index', 'is required (or epsilon, or mixture)');
  if (medium.voigtScale !== undefined && medium.voigt === undefined)
    refuse('voigtScale', 'needs voigt or material');
  if (medium.quadratic !== undefined && medium.extraordinary !== undefined) {
    refuse('quadratic', 'cannot stand beside extraordinary');
  }
  if (medium.extraordinary !== undefined && medium.axis === undefined) {
    refuse('axis', 'is required with extraordinary (three numbers)');
  }
  if (medium.axis !== undefined && medium.extraordinary === undefined) refuse('axis', 'needs extraordinary');
  const hasAxes = medium.extraordinary !== undefined || medium.quadratic !== undefined;
  if (medium.orientationDeg !== undefined && !hasAxes) {
    refuse('orientationDeg', 'needs axes to turn: epsilon, extraordinary or quadratic');
  }
}

export const mediumSchema = mediumObjectSchema.superRefine(checkMediumKeys);
export const libraryMediumSchema = libraryMediumObjectSchema.superRefine(checkMediumKeys);
