import type { Medium } from './medium.ts';

/** A layer as written in the case; a block refers to it as often as it repeats. */
export type WrittenLayer = {
  /** Positions into nested `layers` arrays. */
  path: number[];
  medium: Medium;
  thicknessNm: number;
};

/** A layer of the expanded sequence, and how wide its upper interface is graded. */
export type GradedLayer = WrittenLayer & { gradedNm: number };
