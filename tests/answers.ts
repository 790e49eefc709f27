import type { Response } from 'supertest';
import type { ZodType, z } from 'zod';
import { errorEnvelopeSchema } from '../shared/error.ts';

/** The body of an answer, read with the schema that the client reads it with. */
export function read<Schema extends ZodType>(schema: Schema, answer: Response): z.output<Schema> {
  return schema.parse(answer.body);
}

/** What a refusal says. */
export function refusalOf(answer: Response) {
  return errorEnvelopeSchema.parse(answer.body).error;
}

/** Paths of the issues of a refusal, in alphabetical order. */
export function issuePaths(answer: Response): string[] {
  return (refusalOf(answer).issues ?? []).map((issue) => issue.path).sort();
}
