import { createHash } from 'node:crypto';
import type { ResolvableMaterial } from '../../worker/dispersion/resolveCase.ts';
import type { RunInput } from '../models/run.ts';

/**
 * SHA-256, in hex, of everything that the numbers of a run follow from: document, axis, readings and the constants of
 * every material. Equal inputs have equal hashes however their keys are ordered.
 */
export function hashRunInput(input: RunInput, materials: ResolvableMaterial[]): string {
  const constants = materials
    .map(({ id, version, content }) => ({ id, version, content }))
    .sort((a, b) => (a.id < b.id ? -1 : a.id > b.id ? 1 : a.version - b.version));
  // A run of one axis has the hash that it had before there were more: undefined keys do not count.
  const { document, axis, second, family, readings } = input;
  return createHash('sha256')
    .update(canonicalJson({ document, axis, second, family, readings, materials: constants }))
    .digest('hex');
}

/** JSON with the keys of every object in order and without those that are undefined. */
function canonicalJson(value: unknown): string {
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  if (typeof value !== 'object' || value === null) return JSON.stringify(value) ?? 'null';
  const entries = Object.entries(value)
    .filter(([, inner]) => inner !== undefined)
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([key, inner]) => `${JSON.stringify(key)}:${canonicalJson(inner)}`);
  return `{${entries.join(',')}}`;
}
