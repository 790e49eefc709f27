import type { Request } from 'express';
import type { ZodType } from 'zod';
import { describeIssues, isNestedTooDeep } from '../../shared/issues.ts';
import { invalid } from '../errors.ts';
import { hostileParts } from './hostileParts.ts';

/**
 * The body after its schema; undefined for a route that takes none.
 *
 * @throws Refusal 422 with every issue
 */
export function readBody(schema: ZodType | undefined, request: Request): unknown {
  if (schema === undefined) return undefined;
  if (!request.is('application/json')) {
    throw invalid([{ path: '', message: 'send the body as JSON with Content-Type: application/json' }]);
  }
  return parse(schema, request.body);
}

/** @throws Refusal 422 with every issue */
export function readQuery(schema: ZodType | undefined, request: Request): unknown {
  return schema === undefined ? undefined : parse(schema, request.query);
}

function parse(schema: ZodType, input: unknown): unknown {
  if (isNestedTooDeep(input)) throw invalid([{ path: '', message: 'is nested too deeply to be a request' }]);
  const hostile = hostileParts(input);
  if (hostile.length > 0) throw invalid(hostile);
  const parsed = schema.safeParse(input);
  if (parsed.success) return parsed.data;
  throw invalid(describeIssues(parsed.error, input));
}
