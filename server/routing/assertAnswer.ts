import { isDeepStrictEqual } from 'node:util';
import type { ZodType } from 'zod';

/**
 * Holds an answer against its schema, as the client will: nothing missing, and nothing that the schema does not
 * name, so that no column of a row slips out.
 *
 * @throws Error that says where they differ
 */
export function assertAnswer(schema: ZodType, answer: unknown): void {
  const sent: unknown = JSON.parse(JSON.stringify(answer));
  const parsed = schema.safeParse(sent);
  if (!parsed.success) throw new Error(`The answer does not fit its schema: ${parsed.error.message}`);
  if (!isDeepStrictEqual(parsed.data, sent)) {
    throw new Error(`The answer has more than its schema says: ${JSON.stringify(sent).slice(0, 500)}`);
  }
}
