import { createHash } from 'node:crypto';
import { canonicalJson } from '../../shared/canonicalJson.ts';
import type { DesignInput } from '../../shared/design.ts';
import type { ResolvableMaterial } from '../../worker/dispersion/resolveCase.ts';
import type { RunInput } from '../models/run.ts';

/**
 * SHA-256, in hex, of everything that the numbers of a run follow from: document, axis, readings and the constants of
 * every material. Equal inputs have equal hashes however their keys are ordered.
 */
export function hashRunInput(input: RunInput, materials: ResolvableMaterial[]): string {
  // A run of one axis has the hash that it had before there were more: undefined keys do not count.
  const { document, axis, second, family, readings } = input;
  return sha256({ document, axis, second, family, readings, materials: constantsOf(materials) });
}

/** ... and of a design question. */
export function hashDesignInput(design: DesignInput, materials: ResolvableMaterial[]): string {
  return sha256({ design, materials: constantsOf(materials) });
}

function constantsOf(materials: ResolvableMaterial[]) {
  return materials
    .map(({ id, version, content }) => ({ id, version, content }))
    .sort((a, b) => (a.id < b.id ? -1 : a.id > b.id ? 1 : a.version - b.version));
}

function sha256(value: unknown): string {
  return createHash('sha256').update(canonicalJson(value)).digest('hex');
}
