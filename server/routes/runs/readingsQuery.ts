import { z } from 'zod';
import { readingNames } from '../../../shared/run.ts';

/** `?readings=rotationP,ellipticityP`; all that the run stores when left out. */
const readings = z
  .string()
  .transform((text) => [...new Set(text.split(',').map((name) => name.trim()))])
  .pipe(z.array(z.enum(readingNames, { error: `must be of ${readingNames.join(', ')}` })))
  .optional();

export const readingsQuerySchema = z.strictObject({ readings });

/** `?partial=true` also takes a run that is still being computed. */
export const dataQuerySchema = z.strictObject({ readings, partial: z.enum(['true', 'false']).optional() });
