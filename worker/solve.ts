import { createReadStream } from 'node:fs';
import { text } from 'node:stream/consumers';
import { describeIssues, isNestedTooDeep } from '../shared/issues.ts';
import type { ErrorEnvelope, Issue } from '../shared/error.ts';
import { LIMITS } from '../shared/limits.ts';
import type { SolveRequest } from '../shared/solve.ts';
import { solveRequestSchema } from '../shared/solve.ts';
import { checkSolveRequest } from '../shared/solveRules.ts';
import { solveCasePoints } from './optics/solveRequest.ts';
import { solveWarnings } from './optics/warnings.ts';

/**
 * `npm run -s solve -- cases.json > results.json`: the numeric core without database, server or sign-in.
 * Reads standard input for `-`. Exit status 0 when every case was solved; 1 with the error envelope on standard
 * output when the input is refused, and then nothing is solved.
 */
class Refusal extends Error {
  readonly issues: Issue[];

  constructor(message: string, issues: Issue[] = []) {
    super(message);
    this.issues = issues;
  }
}

async function readInput(path: string | undefined): Promise<unknown> {
  if (path === undefined) {
    throw new Refusal('name a file of cases, or - for standard input: npm run -s solve -- cases.json');
  }
  let content: string;
  try {
    content = await text(path === '-' ? process.stdin : createReadStream(path));
  } catch (error) {
    throw new Refusal(`cannot read ${path}: ${error instanceof Error ? error.message : String(error)}`);
  }
  try {
    return JSON.parse(content);
  } catch (error) {
    throw new Refusal(`${path} is not JSON: ${error instanceof Error ? error.message : String(error)}`);
  }
}

function parseRequest(input: unknown): SolveRequest {
  if (isNestedTooDeep(input)) throw new Refusal('the input is nested too deeply to be a request');
  const parsed = solveRequestSchema.safeParse(input);
  const issues = parsed.success
    ? checkSolveRequest(parsed.data, {
        maxPoints: LIMITS.commandLinePoints,
        beyond: 'split them over several calls',
      })
    : describeIssues(parsed.error, input);
  if (!parsed.success || issues.length > 0) {
    throw new Refusal(
      issues
        .map(({ path, message }) => (path === '' ? `the input ${message}` : `${path}: ${message}`))
        .join('\n'),
      issues,
    );
  }
  return parsed.data;
}

/** Writes and waits while the reader of standard output is slower than the solver. */
async function write(chunk: string): Promise<void> {
  if (!process.stdout.write(chunk)) await new Promise((resolve) => process.stdout.once('drain', resolve));
}

/** Points per write: large enough to be quick, small enough that a million points need little memory. */
const POINTS_PER_WRITE = 500;

async function writeResults(request: SolveRequest): Promise<void> {
  await write('{"results":[');
  for (const [index, one] of request.cases.entries()) {
    await write(`${index > 0 ? ',' : ''}{"points":[`);
    let pending: string[] = [];
    let first = true;
    const flush = async () => {
      if (pending.length === 0) return;
      await write(`${first ? '' : ','}${pending.join(',')}`);
      first = false;
      pending = [];
    };
    for (const point of solveCasePoints(one)) {
      pending.push(JSON.stringify(point));
      if (pending.length >= POINTS_PER_WRITE) await flush();
    }
    await flush();
    await write(']}');
  }
  const warnings = solveWarnings(request);
  await write(warnings.length > 0 ? `],"warnings":${JSON.stringify(warnings)}}\n` : ']}\n');
}

// A reader that has seen enough, such as head, closes the pipe: stop without a stack trace.
process.stdout.on('error', (error: NodeJS.ErrnoException) => process.exit(error.code === 'EPIPE' ? 0 : 1));

try {
  await writeResults(parseRequest(await readInput(process.argv[2])));
} catch (error) {
  if (!(error instanceof Refusal)) throw error;
  const envelope: ErrorEnvelope = {
    error: { code: 'invalid', message: error.message, issues: error.issues },
  };
  await write(`${JSON.stringify(envelope)}\n`);
  process.exitCode = 1;
}
