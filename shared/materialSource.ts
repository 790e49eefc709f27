import { z } from 'zod';
import { LIMITS } from './limits.ts';
import { strictObject } from './strictObject.ts';

/** How far a constant can be trusted; shown wherever the constant is used. */
export const confidences = ['measured', 'fitted', 'from memory', 'invented for the demo'] as const;
export type Confidence = (typeof confidences)[number];

const words = z.string().max(LIMITS.noteLength);

/** Where a constant comes from. It travels with every run, link and export. */
export const sourceSchema = strictObject({
  citation: words.min(1, { error: 'must not be empty: say where the numbers come from' }),
  doi: words.nullable(),
  licence: words.nullable(),
  sample: words.nullable(),
  /** Of the sample, such as "295 K"; versions made before it was asked have none. */
  temperature: words.nullable().optional(),
  method: words.nullable(),
  confidence: z.enum(confidences),
  /** What a reader must know before use, in a sentence. */
  caution: words.nullable(),
});

export type MaterialSource = z.infer<typeof sourceSchema>;
