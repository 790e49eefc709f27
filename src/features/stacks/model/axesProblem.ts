import { z } from 'zod';
import { axisSchema } from '../../../../shared/run.ts';
import { checkAxes } from '../../../../shared/runAxes.ts';
import type { PreviewAxes } from './sweepAxis.ts';

const axesSchema = z
  .object({ axis: axisSchema, second: axisSchema.optional(), family: axisSchema.optional() })
  .superRefine(checkAxes);

/** What is wrong between the axes of a sweep, in a sentence; null when they go together. */
export function axesProblem({ axis, second, family }: PreviewAxes): string | null {
  const parsed = axesSchema.safeParse({
    axis,
    ...(second ? { second } : {}),
    ...(family ? { family } : {}),
  });
  // What is wrong inside an axis is said at its field.
  const between = parsed.error?.issues.find(({ path }) => path.length > 0 && path[0] !== 'axis');
  if (!between) return null;
  const where = between.path[0] === 'family' ? 'The family' : 'The second axis';
  return `${where}: ${String(between.path[1] ?? '')} ${between.message}`;
}
