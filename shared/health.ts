import { z } from 'zod';

const partSchema = z.object({ ok: z.boolean(), detail: z.string() });

export const healthSchema = z.object({
  ok: z.boolean(),
  version: z.string(),
  /** True where the demo group and its sign-ins exist: never in production. */
  demo: z.boolean(),
  database: partSchema,
  queue: partSchema,
  pool: partSchema,
});

export type Health = z.infer<typeof healthSchema>;
