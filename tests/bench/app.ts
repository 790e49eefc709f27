import { availableParallelism } from 'node:os';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { parseArgs } from 'node:util';
import { z } from 'zod';
import type { CreateRun } from '../../shared/run.ts';
import { projectRoot } from '../../server/projectRoot.ts';
import { readDemoData } from '../../server/seeders/demoData.ts';
import { startBenchServer } from './benchServer.ts';
import { timeReadTable } from './readTable.ts';
import { User } from './user.ts';
import { curveRequest, mapRun, stripRequest, sweepRun } from './workloads.ts';

/**
 * `npm run bench:app`: what a person waits for, against a real server on a throw-away database (of the PostgreSQL at
 * DATABASE_URL or TEST_DATABASE_URL, else the project's own). The way of a run from its request to its stored numbers,
 * the readings strip under four parallel users, curves while a layer is dragged, and the reading of a large table of constants. `--json` prints one JSON object.
 */
const { values: options } = parseArgs({ options: { json: { type: 'boolean', default: false } } });

const SWEEPS = 7;
const MAPS = 3;
const TABLES = 5;
const USERS = 4;
const STRIP_REQUESTS = 100;
const CURVES = 200;

type Row = { what: string; count: number; medianMs: number; p99Ms: number };

async function measure(databaseUrl: string): Promise<{ rows: Row[]; peakMemoryMb: number }> {
  const server = await startBenchServer(databaseUrl);
  try {
    const people = readDemoData().people;
    const users = await Promise.all(
      Array.from({ length: USERS }, (_, i) => User.signIn(server.url, people[i % people.length]!.email)),
    );
    const [first] = users;
    const rows = [
      ...(await timeStrip(users)),
      ...(await timeLiveCurves(first!)),
      ...(await timeRuns(first!, 'sweep of 2,000 points, 10 layers', sweepRun, SWEEPS)),
      ...(await timeRuns(first!, 'map of 1,000 x 1,000 points', mapRun, MAPS)),
      rowOf('reading a table of 100,000 rows', await timeReadTable(TABLES)),
    ];
    return { rows, peakMemoryMb: server.peakMemoryMb() };
  } finally {
    await server.stop();
  }
}

/** Each user sends the next request when the answer to the last one is there. */
async function timeStrip(users: User[]): Promise<Row[]> {
  const times: number[] = [];
  const use = async (user: User, requests: number) => {
    for (let i = 0; i < requests; i += 1) {
      const asked = performance.now();
      await user.solve(stripRequest((i * 0.83) % 85));
      times.push(performance.now() - asked);
    }
  };
  await Promise.all(users.map((user) => use(user, 10)));
  times.length = 0;
  await Promise.all(users.map((user) => use(user, STRIP_REQUESTS)));
  return [rowOf(`readings strip, ${USERS} users`, times)];
}

/** A layer dragged: two curves under way at a time, as the page asks them. The middle time is that from answer to answer. */
async function timeLiveCurves(user: User): Promise<Row[]> {
  const asked: number[] = [];
  const arrivals: number[] = [];
  let next = 0;
  const lane = async () => {
    while (next < CURVES) {
      const started = performance.now();
      await user.liveCurve(curveRequest(1 + (next += 1) * 0.01));
      arrivals.push(performance.now());
      asked.push(arrivals.at(-1)! - started);
    }
  };
  await Promise.all([lane(), lane()]);
  const between = arrivals.slice(1).map((at, index) => at - arrivals[index]!);
  return [
    rowOf('live curve of 200 points: from question to answer', asked),
    rowOf('live curve of 200 points: from answer to answer', between),
  ];
}

/** The way of a run, and of that the part spent on computing. */
async function timeRuns(
  user: User,
  what: string,
  wanted: Omit<CreateRun, 'groupId'>,
  count: number,
): Promise<Row[]> {
  const times = {
    stored: [] as number[],
    computing: [] as number[],
    picture: [] as number[],
    data: [] as number[],
  };
  for (let i = 0; i < count; i += 1) {
    const asked = performance.now();
    const { id } = await user.startRun(wanted);
    await user.firstPicture(id, 'rotationP');
    times.picture.push(performance.now() - asked);
    const run = await user.finished(id);
    times.stored.push(performance.now() - asked);
    times.computing.push((run.computeSeconds ?? NaN) * 1_000);
    const loading = performance.now();
    await user.data(id, 'rotationP');
    times.data.push(performance.now() - loading);
    await user.removeRun(id);
  }
  return [
    rowOf(`${what}: request to stored`, times.stored),
    rowOf(`${what}: computing`, times.computing),
    rowOf(`${what}: request to first picture`, times.picture),
    rowOf(`${what}: loading one reading`, times.data),
  ];
}

function rowOf(what: string, times: number[]): Row {
  const sorted = [...times].sort((a, b) => a - b);
  const at = (part: number) =>
    Number(sorted[Math.min(sorted.length - 1, Math.floor(part * sorted.length))]!.toFixed(1));
  return { what, count: sorted.length, medianMs: at(0.5), p99Ms: at(0.99) };
}

const isFunction = (value: unknown) => typeof value === 'function';
const setupSchema = z.object({
  runEntry: z.custom<(work: () => Promise<number>) => Promise<void>>(isFunction),
  testServer: z.custom<() => Promise<object>>(isFunction),
  testDatabases: z.custom<(server: object) => Promise<(stage: string) => Promise<string>>>(isFunction),
});

/** The plain Node files that provide PostgreSQL; they have no types of their own. */
async function loadSetup(): Promise<z.infer<typeof setupSchema>> {
  const load = async (file: string): Promise<object> => {
    const module: unknown = await import(pathToFileURL(path.join(projectRoot, 'server', 'setup', file)).href);
    return z.looseObject({}).parse({ ...(module as object) });
  };
  return setupSchema.parse({
    ...(await load('processes/stopping.mjs')),
    ...(await load('testing/testServer.mjs')),
    ...(await load('testing/testDatabases.mjs')),
  });
}

const givenUrl = process.env['DATABASE_URL'] ?? process.env['TEST_DATABASE_URL'];
if (givenUrl !== undefined) process.env['DATABASE_URL'] = givenUrl;
const { runEntry, testServer, testDatabases } = await loadSetup();
await runEntry(async () => {
  const freshDatabase = await testDatabases(await testServer());
  const { rows, peakMemoryMb } = await measure(await freshDatabase('bench'));
  const about = {
    node: process.version,
    cores: availableParallelism(),
    peakMemoryMb: Math.round(peakMemoryMb),
  };
  if (options.json) process.stdout.write(`${JSON.stringify({ ...about, results: rows })}\n`);
  else {
    process.stdout.write(
      `Node ${about.node}, ${about.cores} cores; the server held at most ${about.peakMemoryMb} MB\n`,
    );
    console.table(rows);
  }
  return 0;
});
