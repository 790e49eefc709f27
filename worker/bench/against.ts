import { execFileSync } from 'node:child_process';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { z } from 'zod';

const lineSchema = z.object({ workload: z.string(), singleThreadPointsPerSecond: z.number() });

/**
 * Compiles a C program with gcc and runs it: one line of JSON per workload with its rate on one thread.
 *
 * @param source the C file
 * @returns points per second by workload
 * @throws Error when gcc is missing, the file does not compile, or prints something else
 */
export function ratesOfProgram(source: string): Map<string, number> {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'skewlight-bench-'));
  try {
    const program = path.join(folder, 'program');
    execFileSync('gcc', ['-O3', '-march=native', '-ffast-math', '-o', program, source, '-lm']);
    const lines = execFileSync(program, { encoding: 'utf8' }).trim().split('\n');
    return new Map(
      lines.map((line) => {
        const { workload, singleThreadPointsPerSecond } = lineSchema.parse(JSON.parse(line));
        return [workload, singleThreadPointsPerSecond];
      }),
    );
  } finally {
    fs.rmSync(folder, { recursive: true });
  }
}
