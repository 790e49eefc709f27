import { z } from 'zod';
import { designResultSchema } from '../../../shared/design.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { readRun } from '../../policies/run.ts';
import type { Route } from '../../routing/route.ts';
import { streamRoute } from '../../routing/route.ts';
import { loadDesign } from '../../services/designs.ts';
import { sendDesignFile } from '../../services/sendDesignFile.ts';
import { sendRunEvents } from '../../services/sendRunEvents.ts';

const load = ({ dependencies, params }: { dependencies: AppDependencies; params: { designId: string } }) =>
  loadDesign(dependencies.models, params.designId);

/** `?partial=true` also takes a design that is still being computed, or that was stopped before its end. */
const partialQuerySchema = z.strictObject({ partial: z.enum(['true', 'false']).optional() });

const readDesignEvents = streamRoute({
  method: 'get',
  path: '/designs/:designId/events',
  summary: 'Server-sent events: `progress` with the progress of the design, until it has come to its end.',
  noun: 'design',
  policy: readRun,
  load,
  answer: { contentType: 'text/event-stream' },
  handler: ({ dependencies, subject, request, response }) =>
    sendRunEvents(dependencies, subject, request, response),
});

const readDesignResult = streamRoute({
  method: 'get',
  path: '/designs/:designId/result',
  summary:
    'The answer. With partial=true what is found so far, too, while this machine computes it and the question can say so, and what a design that was cancelled or failed had found by then (`ended` is unfinished).',
  noun: 'design',
  policy: readRun,
  query: partialQuerySchema,
  load,
  answer: { contentType: 'application/json', schema: designResultSchema },
  handler: ({ dependencies, subject, query, response }) =>
    sendDesignFile(dependencies, subject, query.partial === 'true' ? 'partial' : 'result', response),
});

const readDesignCsv = streamRoute({
  method: 'get',
  path: '/designs/:designId/result.csv',
  summary: 'The answer as CSV (RFC 4180), names and units in the header line, sources in front.',
  noun: 'design',
  policy: readRun,
  load,
  answer: { contentType: 'text/csv' },
  handler: ({ dependencies, subject, response }) => sendDesignFile(dependencies, subject, 'csv', response),
});

const readDesignInput = streamRoute({
  method: 'get',
  path: '/designs/:designId/input.json',
  summary:
    'A request of the solve contract that reproduces the answer on the command line. At each working point in turn come its films, each as magnetized there, with m = 0 and reversed. Of a cap chooser: the bare film, every candidate at its best thickness, then each candidate at every thickness of its curve (in a file named -without-curves at the edges of its windows instead). Of an optimisation: the film as drawn, then the best. Of a tolerance: the nominal film.',
  noun: 'design',
  policy: readRun,
  load,
  answer: { contentType: 'application/json' },
  handler: ({ dependencies, subject, response }) => sendDesignFile(dependencies, subject, 'input', response),
});

export const designFileRoutes: Route[] = [readDesignEvents, readDesignResult, readDesignCsv, readDesignInput];
