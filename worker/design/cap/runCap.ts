import type { CapDesign, CapOutcome, CapResult } from '../../../shared/capDesign.ts';
import type { DesignThreads } from '../designThreads.ts';
import { piecesOf } from '../designThreads.ts';
import { capThicknesses } from './capCurves.ts';
import { rankCandidates } from './capOutcome.ts';
import { CapSamples } from './capSamples.ts';

/** Samples of one step: a fraction of a second. */
const SAMPLES_PER_STEP = 25;

/** Films that are solved: the unit of progress. */
export function capTotal({ candidates, tolerance }: CapDesign): number {
  return candidates.length * tolerance.samples;
}

/** Candidates one after the other, the samples of each over all threads. */
export async function runCap(design: CapDesign, threads: DesignThreads): Promise<CapResult> {
  const { samples, seed } = design.tolerance;
  const thicknessNm = capThicknesses(design);
  // Given by designTask.ts for this kind of step. In a thread: a formula that somebody wrote may take its time.
  const bare = (await threads.run({ kind: 'cap bare' })) as CapResult['bare'];
  const candidates: CapOutcome[] = [];
  for (const { id: candidateId } of design.candidates) {
    const { buffer } = new CapSamples({
      points: design.points.length,
      thicknesses: thicknessNm.length,
      samples,
    });
    await threads.runAll(
      piecesOf(samples, SAMPLES_PER_STEP).map((piece) => ({
        kind: 'cap samples',
        candidateId,
        ...piece,
        samples: buffer,
      })),
    );
    const outcome = await threads.run({
      kind: 'cap outcome',
      candidateId,
      samples: buffer,
      bare: bare.map(({ signal }) => signal),
    });
    // Given by designTask.ts for this kind of step.
    candidates.push(outcome as CapOutcome);
  }
  const ranking = rankCandidates(
    design,
    candidates,
    bare.map(({ signal }) => signal),
  );
  return { kind: 'cap', thicknessNm, bare, candidates, ranking, samples, seed };
}
