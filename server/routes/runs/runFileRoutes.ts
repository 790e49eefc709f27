import type { AppDependencies } from '../../dependencies.ts';
import { readRun } from '../../policies/run.ts';
import type { Route } from '../../routing/route.ts';
import { streamRoute } from '../../routing/route.ts';
import { loadRun } from '../../services/runs.ts';
import { sendRunFile } from '../../services/sendRunFile.ts';
import { dataQuerySchema, readingsQuerySchema } from './readingsQuery.ts';

const load = ({ dependencies, params }: { dependencies: AppDependencies; params: { runId: string } }) =>
  loadRun(dependencies.models, params.runId);

const readRunData = streamRoute({
  method: 'get',
  path: '/runs/:runId/data',
  summary:
    'The numbers as Float64 columns behind a JSON header (shared/resultFormat.ts). With partial=true those of a run that is still being computed on this machine too: NaN where nothing is computed yet, `done` in the header.',
  noun: 'run',
  policy: readRun,
  query: dataQuerySchema,
  load,
  answer: { contentType: 'application/octet-stream' },
  handler: ({ dependencies, subject, query, response }) =>
    sendRunFile(
      dependencies,
      subject,
      { kind: query.partial === 'true' ? 'partial' : 'binary', readings: query.readings },
      response,
    ),
});

const readRunCsv = streamRoute({
  method: 'get',
  path: '/runs/:runId/data.csv',
  summary: 'The numbers as CSV (RFC 4180), names and units in the header line.',
  noun: 'run',
  policy: readRun,
  query: readingsQuerySchema,
  load,
  answer: { contentType: 'text/csv' },
  handler: ({ dependencies, subject, query, response }) =>
    sendRunFile(dependencies, subject, { kind: 'csv', readings: query.readings }, response),
});

const readRunInput = streamRoute({
  method: 'get',
  path: '/runs/:runId/input.json',
  summary: 'A request of the solve contract that reproduces the run on the command line.',
  noun: 'run',
  policy: readRun,
  load,
  answer: { contentType: 'application/json' },
  handler: ({ dependencies, subject, response }) =>
    sendRunFile(dependencies, subject, { kind: 'input' }, response),
});

export const runFileRoutes: Route[] = [readRunData, readRunCsv, readRunInput];
