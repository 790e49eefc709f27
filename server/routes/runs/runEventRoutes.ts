import type { Response } from 'express';
import type { RunProgress } from '../../../shared/run.ts';
import type { AppDependencies } from '../../dependencies.ts';
import type { Run } from '../../models/run.ts';
import { readRun } from '../../policies/run.ts';
import { presentRunProgress } from '../../presenters/presentRun.ts';
import type { Route } from '../../routing/route.ts';
import { streamRoute } from '../../routing/route.ts';
import { loadRun } from '../../services/runs.ts';

/** A comment keeps proxies from closing a connection on which nothing happens while a run waits. */
const HEARTBEAT_MS = 15_000;

const PROGRESS_ATTRIBUTES = ['state', 'done', 'total', 'error', 'startedAt'];
const DELETED = { state: 'cancelled', secondsLeft: null, error: 'The run was deleted.' } as const;

const readRunEvents = streamRoute({
  method: 'get',
  path: '/runs/:runId/events',
  summary: 'Server-sent events: `progress` with the progress of the run, until it has come to its end.',
  noun: 'run',
  policy: readRun,
  load: ({ dependencies, params }) => loadRun(dependencies.models, params.runId),
  answer: { contentType: 'text/event-stream' },
  async handler({ dependencies, subject, request, response }) {
    if (isOver(subject.state) && request.get('last-event-id') === subject.state) {
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
    await sendUntilOver(dependencies, subject, response);
  },
});

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
    const look = async () => {
      const now = await models.Run.findByPk(run.id, { attributes: PROGRESS_ATTRIBUTES });
      send(now ? presentRunProgress(now) : { ...presentRunProgress(run), ...DELETED });
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

export const runEventRoutes: Route[] = [readRunEvents];
