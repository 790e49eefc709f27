import { availableParallelism } from 'node:os';
import { parseArgs } from 'node:util';
import { ratesOfProgram } from './bench/against.ts';
import { pointsPerSecond } from './bench/measure.ts';
import { pointsOf, WORKLOADS } from './bench/workloads.ts';

/**
 * `npm run -s bench`: points per second of the numeric kernel alone, on one thread and on all cores; every point gets
 * r, R and the exact Kerr angles for p and s. `--json` prints one JSON object. `--against <file.c>` also compiles
 * that program (gcc -O3 -march=native -ffast-math), runs it on the same machine and gives the ratio; it prints
 * `{"workload", "singleThreadPointsPerSecond"}` per line. `--only <workload>` measures one.
 */
const { values: options } = parseArgs({
  options: {
    json: { type: 'boolean', default: false },
    against: { type: 'string' },
    only: { type: 'string' },
  },
});

type Row = {
  workload: string;
  points: number;
  singleThreadPointsPerSecond: number;
  poolPointsPerSecond: number;
  againstPointsPerSecond?: number;
};

const cores = availableParallelism();
const rates = options.against === undefined ? null : ratesOfProgram(options.against);
const results: Row[] = [];
for (const workload of WORKLOADS) {
  if (options.only !== undefined && options.only !== workload.name) continue;
  const other = rates?.get(workload.name);
  results.push({
    workload: workload.name,
    points: pointsOf(workload).anglesDeg.length,
    singleThreadPointsPerSecond: Math.round(await pointsPerSecond(workload, 1)),
    poolPointsPerSecond: Math.round(await pointsPerSecond(workload, cores)),
    ...(other === undefined ? {} : { againstPointsPerSecond: other }),
  });
}

if (options.json) process.stdout.write(`${JSON.stringify({ node: process.version, cores, results })}\n`);
else printTable();

function printTable(): void {
  const millions = (rate: number) => (rate / 1e6).toFixed(3);
  const rows = results.map((row) => {
    const single = row.singleThreadPointsPerSecond;
    const against = row.againstPointsPerSecond;
    return {
      workload: row.workload,
      points: row.points,
      'one thread, Mpoints/s': millions(single),
      [`${cores} threads`]: millions(row.poolPointsPerSecond),
      gain: (row.poolPointsPerSecond / single).toFixed(2),
      ...(against === undefined
        ? {}
        : { 'compared program': millions(against), ratio: (single / against).toFixed(2) }),
    };
  });
  process.stdout.write(`Node ${process.version}, ${cores} cores\n`);
  console.table(rows);
}
