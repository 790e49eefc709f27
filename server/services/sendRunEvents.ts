import type { Request, Response } from 'express';
import type { RunProgress } from '../../shared/run.ts';
import type { AppDependencies } from '../dependencies.ts';
import type { Run } from '../models/run.ts';
import { presentRunProgress } from '../presenters/presentRun.ts';

/** A comment keeps proxies from closing a connection on which nothing happens while a run waits. */
const HEARTBEAT_MS = 15_000;

const PROGRESS_ATTRIBUTES = ['state', 'done', 'total', 'error', 'startedAt'];

/** Server-sent events with the progress of a sweep or a design, until it has come to its end. */
export async function sendRunEvents(
  dependencies: Pick<AppDependencies, 'models' | 'jobs'>,
  run: Run,
  request: Request,
  response: Response,
): Promise<void> {
  if (isOver(run.state) && request.get('last-event-id') === run.state) {
    // The reader has the end already and connects again by itself: this tells it to stop.
    response.status(204).end();
    return;
  }
  response.set({
    'Content-Type': 'text/event-stream',
    'Cache-Control': 'no-store, no-transform',
    'X-Accel-Buffering': 'no',
  });
  response.flushHeaders();
  await sendUntilOver(dependencies, run, response);
}

/** Sends the state at once, then every notice, until the run is over or the reader is gone. */
function sendUntilOver(
  { models, jobs }: Pick<AppDependencies, 'models' | 'jobs'>,
  run: Run,
  response: Response,
): Promise<void> {
  return new Promise((resolve) => {
    let ended = false;
    const end = () => {
      if (ended) return;
      ended = true;
      stopWatching();
      clearInterval(heartbeat);
      response.end();
      resolve();
    };
    const send = (progress: RunProgress) => {
      if (ended) return;
      response.write(`id: ${progress.state}\nevent: progress\ndata: ${JSON.stringify(progress)}\n\n`);
      if (isOver(progress.state)) end();
    };
    const deleted = {
      state: 'cancelled',
      secondsLeft: null,
      error: `The ${run.kind === 'sweep' ? 'run' : 'design'} was deleted.`,
    } as const;
    const look = async () => {
      const now = await models.Run.findByPk(run.id, { attributes: PROGRESS_ATTRIBUTES });
      send(now ? presentRunProgress(now) : { ...presentRunProgress(run), ...deleted });
    };
    const lookAgain = () => {
      // With the database away the next notice, or the channel's coming back, leads here again.
      look().catch(() => {});
    };
    const stopWatching = jobs.watch(run.id, (progress) => (progress ? send(progress) : lookAgain()));
    const heartbeat = setInterval(() => response.write(': still here\n\n'), HEARTBEAT_MS);
    response.on('close', end);
    // After the watch has begun, so that nothing is lost between the two.
    lookAgain();
  });
}

function isOver(state: RunProgress['state']): boolean {
  return state === 'done' || state === 'failed' || state === 'cancelled';
}
