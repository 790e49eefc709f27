import type { ReadingName, SweepAxes } from '../../shared/run.ts';
import type { StackDocument } from '../../shared/stack.ts';
import type { ResolvableMaterial } from '../dispersion/resolveCase.ts';

/**
 * Everything that determines the numbers of a sweep. Plain data: it crosses into worker threads as JSON.
 * Every medium of the document that names a material names its version too, and `materials` holds all of them.
 */
export type SweepInput = SweepAxes & {
  document: StackDocument;
  readings: ReadingName[];
  materials: ResolvableMaterial[];
};

/** The key under which `resolveCase` looks a material up. */
export function materialKey(material: { id: string; version: number }): string {
  return `${material.id}@${material.version}`;
}
