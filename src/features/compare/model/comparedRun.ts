import type { RunResult } from '../../../../shared/resultFormat.ts';
import { readingDefinitions } from '../../../../shared/readings.ts';
import { readingNames } from '../../../../shared/run.ts';
import type { ReadingName, Run } from '../../../../shared/run.ts';
import { families } from '../../../components/plot/readingView.ts';
import type { RunAxis } from './runAxes.ts';
import type { RunSlice } from './runSlice.ts';

/** A run with its values and its letter on this page. */
export type LoadedRun = { run: Run; result: RunResult; letter: string };

/** One curve or map of a run, with what sets its input apart from all the others. */
export type ComparedSlice = RunSlice & {
  of: LoadedRun;
  /** Which of the compared runs it belongs to, for its look. */
  position: number;
  /** The drawn axes, the first across. */
  axes: readonly RunAxis[];
  /** Its own value of each held quantity, by key. */
  at: ReadonlyMap<string, number>;
  /** Those values in words, where the run has several curves: `2 nm`. */
  member: string;
  phrases: readonly string[];
  /** How it lies beside what was asked for: `cut at 633 nm between 630 nm and 640 nm, linear`. */
  notes: readonly string[];
};

/** A run with what is drawn of it; none where it does not reach the value at which a quantity is held. */
export type ComparedRun = LoadedRun & {
  slices: readonly ComparedSlice[];
  /** What all its slices have in common and not all runs have. */
  phrases: readonly string[];
  notes: readonly string[];
  /** Of what it has several curves, in words: `the thickness of Pt cap`. */
  members: string;
};

/** The readings that every compared run has and that a plot can draw. */
export function commonReadings(results: readonly RunResult[]): ReadingName[] {
  return readingNames.filter((name) => {
    const { family } = readingDefinitions[name];
    const drawn = families.some((one) => one === family) && name !== 'stackCeiling';
    return drawn && results.length > 0 && results.every(({ columns }) => columns[name] !== undefined);
  });
}
