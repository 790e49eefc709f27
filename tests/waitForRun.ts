import { setTimeout as sleep } from 'node:timers/promises';
import type { RunState } from '../shared/run.ts';
import type { Models } from '../server/models/models.ts';
import type { Run } from '../server/models/run.ts';

/** The run once it is in one of these states; fails with what it is in when that takes too long. */
export function waitForRun(models: Models, runId: string, ...states: RunState[]): Promise<Run> {
  return waitLongForRun(20_000, models, runId, ...states);
}

/** ... where a process has to start first, which takes a busy machine long. */
export async function waitLongForRun(
  patienceMs: number,
  models: Models,
  runId: string,
  ...states: RunState[]
): Promise<Run> {
  const deadline = performance.now() + patienceMs;
  for (;;) {
    const run = await models.Run.findByPk(runId);
    if (!run) throw new Error(`Run ${runId} is gone.`);
    if (states.includes(run.state)) return run;
    if (performance.now() > deadline) {
      throw new Error(`Run ${runId} is ${run.state} and not ${states.join(' or ')}: ${run.error ?? ''}`);
    }
    await sleep(20);
  }
}
