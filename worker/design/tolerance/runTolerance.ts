import type { Sensitivity, ToleranceDesign, ToleranceResult } from '../../../shared/toleranceDesign.ts';
import type { DesignThreads } from '../designThreads.ts';
import { piecesOf } from '../designThreads.ts';
import { sensitiveCount } from './sensitivity.ts';
import type { ToleranceOutcome } from './toleranceOutcome.ts';
import { ToleranceSamples } from './toleranceSamples.ts';

const SAMPLES_PER_STEP = 100;
const DERIVATIVES_PER_STEP = 8;

/** How much work the question is: its samples, and what derivatives are taken of. */
export function toleranceTotal({ document, points, tolerance }: ToleranceDesign): number {
  return tolerance.samples + points.length * sensitiveCount(document);
}

/** The samples over all threads, then derivatives over all threads, then what comes of the samples. */
export async function runTolerance(
  design: ToleranceDesign,
  threads: DesignThreads,
): Promise<ToleranceResult> {
  const samples = await drawSamples(design, threads);
  const pieces = piecesOf(sensitiveCount(design.document), DERIVATIVES_PER_STEP);
  const steps = design.points.flatMap((_, point) =>
    pieces.map((piece) => ({ kind: 'tolerance derivatives' as const, point, ...piece })),
  );
  // Both given by designTask.ts for these kinds of step.
  const derivatives = (await threads.runAll(steps)) as Sensitivity[][];
  const outcome = (await threads.run({ kind: 'tolerance outcome', samples })) as ToleranceOutcome;
  return { ...outcome, sensitivities: derivatives.flat() };
}

/** As runTolerance, of the points alone: what a growth card prints. */
export async function runBands(
  design: ToleranceDesign,
  threads: DesignThreads,
): Promise<ToleranceResult['points']> {
  const samples = await drawSamples(design, threads);
  // Given by designTask.ts for this kind of step.
  return (await threads.run({ kind: 'tolerance bands', samples })) as ToleranceResult['points'];
}

async function drawSamples(design: ToleranceDesign, threads: DesignThreads): Promise<SharedArrayBuffer> {
  const { buffer } = new ToleranceSamples(design);
  await threads.runAll(
    piecesOf(design.tolerance.samples, SAMPLES_PER_STEP).map((piece) => ({
      kind: 'tolerance samples',
      ...piece,
      samples: buffer,
    })),
  );
  return buffer;
}
