import type { DesignInput, DesignResult } from '../../shared/design.ts';
import { capTotal, runCap } from './cap/runCap.ts';
import type { DesignWork } from './designInput.ts';
import type { DesignOptions, SubmitStep } from './designThreads.ts';
import { DesignThreads } from './designThreads.ts';
import { optimiseTotal } from './optimise/effort.ts';
import { runOptimise } from './optimise/runOptimise.ts';
import { runTolerance, toleranceTotal } from './tolerance/runTolerance.ts';

export type DesignOutcome = { result: DesignResult; seconds: number };

/** How much work a question is, in its own unit: films that are solved, or derivatives taken. */
export function designTotal(design: DesignInput): number {
  switch (design.kind) {
    case 'cap':
      return capTotal(design);
    case 'optimise':
      return optimiseTotal(design);
    case 'tolerance':
      return toleranceTotal(design);
  }
}

/**
 * Answers a design question on all threads. The same input gives the same answer on any number of them.
 *
 * @throws ComputeError `cancelled`, `refused`, `crashed` or `closed`
 */
export async function runDesign(
  work: DesignWork,
  count: number,
  submit: SubmitStep,
  options: DesignOptions<DesignResult> = {},
): Promise<DesignOutcome> {
  const started = performance.now();
  const threads = new DesignThreads(work, count, submit);
  const { design } = work;
  const result = await threads.watch<DesignResult>(designTotal(design), options, () => {
    switch (design.kind) {
      case 'cap':
        return runCap(design, threads);
      case 'optimise':
        return runOptimise(design, threads, options.onPartial);
      case 'tolerance':
        return runTolerance(design, threads);
    }
  });
  return { result, seconds: (performance.now() - started) / 1000 };
}
