import { z } from 'zod';
import { vectorSchema } from './complex.ts';
import { LIMITS } from './limits.ts';
import { checkMediumKeys, libraryMediumFields, magnetizationSchema } from './medium.ts';
import { spreadShapes } from './spread.ts';
import { strictObject } from './strictObject.ts';
import { layerThermalSchema } from './thermal.ts';

/**
 * A stack as people edit it: media by library id or by typed-in constants, every layer with an id of its own so
 * that a sweep can name it however the stack is reordered. stackCase.ts turns it into a solve case.
 */
const { m: _m, voigtScale: _voigtScale, tensorState: _tensorState, ...constantFields } = libraryMediumFields;

/** What fills a layer: `{material, version}` of the library, or constants typed in (then `label` names them). */
export const stackMediumSchema = strictObject({
  ...constantFields,
  label: z.string().max(LIMITS.nameLength).optional(),
}).superRefine(checkMediumKeys);

export type StackMedium = z.infer<typeof stackMediumSchema>;

const itemId = z.string().min(1).max(40);

export const stackLayerSchema = strictObject({
  id: itemId,
  medium: stackMediumSchema,
  thicknessNm: z.number().min(0),
  /** Magnetization of a magnetic layer; absent for a layer that is not magnetic. */
  m: magnetizationSchema.optional(),
  /** A fixed layer keeps its m when the working point reverses or replaces the magnetization. */
  fixed: z.boolean().optional(),
  /** Multiplies Q of the layer's medium; 1 when absent. */
  voigtScale: z.number().min(0).optional(),
  /** Q of the layer at a temperature other than that at which it is known; multiplies Q like voigtScale. */
  thermal: layerThermalSchema.optional(),
  /** Role in the film, such as cap or buffer. */
  note: z.string().max(LIMITS.nameLength).optional(),
  /** Width of the graded interface with the medium above. */
  gradedNm: z.number().min(0).optional(),
  /** Parts of a magnetic layer at its faces that carry no magnetization; they belong to its thickness. */
  dead: strictObject({ topNm: z.number().min(0), bottomNm: z.number().min(0) }).optional(),
  /** The upper part of the layer has turned into an oxide: `consumedNm` of it into `expansion` times as much. */
  oxide: strictObject({
    medium: stackMediumSchema,
    consumedNm: z.number().min(0),
    expansion: z.number().min(0.1).max(10),
  }).optional(),
}).superRefine((layer, context) => {
  const dead = (layer.dead?.topNm ?? 0) + (layer.dead?.bottomNm ?? 0);
  const left = layer.thicknessNm - (layer.oxide?.consumedNm ?? 0);
  const refuse = (path: string[], message: string) => context.addIssue({ code: 'custom', path, message });
  if (layer.oxide && left < 0) {
    refuse(['oxide', 'consumedNm'], `must not exceed the layer's thickness (${layer.thicknessNm} nm)`);
  } else if (layer.dead && dead > left) {
    refuse(['dead'], `the dead parts (${dead} nm) must fit into the ${left} nm of the layer`);
  }
});

export type StackLayer = z.infer<typeof stackLayerSchema>;
export type StackBlock = { id: string; repeat: number; layers: StackItem[] };
export type StackItem = StackLayer | StackBlock;

// A schema that holds itself needs a name in the API's description.
export const stackItemSchema: z.ZodType<StackItem, StackItem> = z
  .lazy(() =>
    z.union(
      [
        stackLayerSchema,
        strictObject({
          id: itemId,
          repeat: z.int().min(0).max(LIMITS.repeat),
          layers: z.array(stackItemSchema).max(LIMITS.documentItems),
        }),
      ],
      { error: 'must be a layer or a block {"id", "repeat", "layers"}' },
    ),
  )
  .meta({ id: 'StackItem' });

export const polarizations = ['p', 's'] as const;
export type Polarization = (typeof polarizations)[number];

/** Whose magnetization the readings are for: as drawn, reversed, or one direction in every layer not fixed. */
export const workingMagnetizationSchema = z.discriminatedUnion('mode', [
  strictObject({ mode: z.literal('drawn') }),
  strictObject({ mode: z.literal('reversed') }),
  strictObject({ mode: z.literal('direction'), m: vectorSchema.pipe(magnetizationSchema) }),
]);

export type WorkingMagnetization = z.infer<typeof workingMagnetizationSchema>;

/** Where the readings strip stands. */
export const workingPointSchema = strictObject({
  wavelengthNm: z.number().positive(),
  angleDeg: z.number().min(0).lt(90),
  input: z.enum(polarizations),
  /** Azimuth of linear light, 0 = p toward 90 = s, for the readings at any azimuth; that of `input` when absent. */
  inputAzimuthDeg: z.number().min(-90).max(180).optional(),
  magnetization: workingMagnetizationSchema,
});

export type WorkingPoint = z.infer<typeof workingPointSchema>;

/** The azimuth for which `rotationAtAzimuth` and `ellipticityAtAzimuth` are read, deg from p toward s. */
export function inputAzimuthOf({ input, inputAzimuthDeg }: WorkingPoint): number {
  return inputAzimuthDeg ?? (input === 's' ? 90 : 0);
}

export const stackDocumentSchema = strictObject({
  incident: stackMediumSchema,
  layers: z.array(stackItemSchema).max(LIMITS.documentItems),
  substrate: stackMediumSchema,
  /** Magnetization of a magnetic substrate. */
  substrateM: magnetizationSchema.optional(),
  substrateVoigtScale: z.number().min(0).optional(),
  substrateGradedNm: z.number().min(0).optional(),
  /** The substrate is a thick slab; inner reflections add in intensity, `exit` lies behind it. */
  backside: strictObject({ thicknessNm: z.number().min(0), exit: stackMediumSchema }).optional(),
  /** Averages over what light and film are not sharp in; standard deviations of the stated shape. */
  spread: strictObject({
    shape: z.enum(spreadShapes),
    // The outermost node of a normal distribution lies at 3.75 standard deviations.
    thicknessPercent: z.number().min(0).max(25).optional(),
    divergenceDeg: z.number().min(0).max(10).optional(),
    bandwidthNm: z.number().min(0).max(200).optional(),
  }).optional(),
  workingPoint: workingPointSchema,
}).superRefine((document, context) => {
  const bandwidthNm = document.spread?.bandwidthNm ?? 0;
  if (bandwidthNm > document.workingPoint.wavelengthNm / 4) {
    context.addIssue({
      code: 'custom',
      path: ['spread', 'bandwidthNm'],
      message: `must be at most a quarter of the wavelength (${document.workingPoint.wavelengthNm} nm), got ${bandwidthNm}`,
    });
  }
  const seen = new Set<string>();
  const visit = (items: StackItem[], path: (string | number)[]) => {
    items.forEach((item, position) => {
      const here = [...path, position];
      if (seen.has(item.id)) {
        context.addIssue({ code: 'custom', path: [...here, 'id'], message: `is used twice: ${item.id}` });
      }
      seen.add(item.id);
      if ('layers' in item) visit(item.layers, [...here, 'layers']);
    });
  };
  visit(document.layers, ['layers']);
});

export type StackDocument = z.infer<typeof stackDocumentSchema>;

export const stackNameSchema = z
  .string()
  .trim()
  .min(1, { error: 'must not be empty' })
  .max(LIMITS.nameLength, { error: `must have at most ${LIMITS.nameLength} characters` });

export const createStackSchema = strictObject({
  name: stackNameSchema,
  description: z.string().max(LIMITS.noteLength).default(''),
  document: stackDocumentSchema,
});

/** `version` is the one the edit started from: a save over someone else's newer version is a conflict (409). */
export const updateStackSchema = strictObject({
  version: z.int().min(1),
  name: stackNameSchema.optional(),
  description: z.string().max(LIMITS.noteLength).optional(),
  document: stackDocumentSchema.optional(),
});

export const stackSummarySchema = z.object({
  id: z.string(),
  groupId: z.string(),
  name: z.string(),
  description: z.string(),
  version: z.int(),
  layerCount: z.int().meta({ description: 'Layers after blocks are expanded.' }),
  isDemo: z.boolean(),
  updatedAt: z.iso.datetime(),
  updatedBy: z.string().nullable().meta({ description: 'Name of the person who saved this version.' }),
});

export const stackSchema = stackSummarySchema.extend({ document: stackDocumentSchema });
export const stackListSchema = z.object({ stacks: z.array(stackSummarySchema) });

export type CreateStack = z.input<typeof createStackSchema>;
export type UpdateStack = z.infer<typeof updateStackSchema>;
export type StackSummary = z.infer<typeof stackSummarySchema>;
export type Stack = z.infer<typeof stackSchema>;
