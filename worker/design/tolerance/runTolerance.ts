import type { ToleranceDesign, ToleranceResult } from '../../../shared/toleranceDesign.ts';
import type { DesignThreads } from '../designThreads.ts';
import { piecesOf } from '../designThreads.ts';
import { ToleranceSamples } from './toleranceSamples.ts';

const SAMPLES_PER_STEP = 100;

/** The samples over all threads, then what comes of them. */
export async function runTolerance(
  design: ToleranceDesign,
  threads: DesignThreads,
): Promise<ToleranceResult> {
  const samples = await drawSamples(design, threads);
  // Given by designTask.ts for this kind of step.
  return (await threads.run({ kind: 'tolerance outcome', samples })) as ToleranceResult;
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
