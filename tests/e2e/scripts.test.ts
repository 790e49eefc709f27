import { execFile } from 'node:child_process';
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { tokenListSchema } from '../../shared/account.ts';
import { projectRoot } from '../../server/projectRoot.ts';
import { ask } from './demo.ts';
import { startSite } from './site.ts';
import type { Site } from './site.ts';
import type { Visitor } from './visitor.ts';

// The scripts of data/examples and what README.md promises, as a reader would try them.

/** The example of the solve contract with the rounded numbers that stand beside it there. */
const KERR_OF_THE_EXAMPLE = ['632.8 60 p 0.2883 -0.0266', '632.8 60 s 0.1884 0.1016'];

let site: Site;
let theorist: Visitor;
let token: string;

beforeAll(async () => {
  site = await startSite();
  theorist = await site.visit({ as: 'theorist' });
  const { page } = theorist;
  await theorist.open('/account');
  await page.getByLabel('Name of the new token').fill('a script');
  await page.getByRole('button', { name: 'Create token' }).click();
  token = await page
    .getByRole('status')
    .getByText(/^skw_\S+$/)
    .innerText();
});

afterAll(async () => site?.stop());

const inProject = (...parts: string[]) => path.join(projectRoot, ...parts);

function run(program: string, args: string[], environment: Record<string, string> = {}) {
  const env = { ...process.env, SKEWLIGHT_URL: site.url, ...environment };
  return promisify(execFile)(program, args, { cwd: projectRoot, env });
}

describe.each([
  ['node', 'solve.mjs'],
  ['python3', 'solve.py'],
])('the example for %s', (program, file) => {
  const script = inProject('data', 'examples', file);

  it('prints the Kerr angles of the cases beside it', async () => {
    const { stdout } = await run(program, [script], { SKEWLIGHT_TOKEN: token });
    expect(stdout.trim().split('\n').slice(1)).toEqual(KERR_OF_THE_EXAMPLE);
  });

  it('says what is wrong with a token that nobody has', async () => {
    const refused = run(program, [script], { SKEWLIGHT_TOKEN: 'skw_nobody' });
    await expect(refused).rejects.toMatchObject({
      code: 1,
      stderr: expect.stringContaining('API token') as string,
    });
  });
});

it('lists the token as used, without showing it again', async () => {
  const { tokens } = await ask(theorist.context, '/tokens', tokenListSchema);
  expect(tokens.find(({ name }) => name === 'a script')?.lastUsedAt).toBeTruthy();
  expect(JSON.stringify(tokens)).not.toContain(token);
});

describe('README.md', () => {
  it('solves its example on the command line to the numbers that it prints', async () => {
    const { stdout } = await run(process.execPath, [
      ...['--import', 'tsx', 'worker/solve.ts'],
      inProject('data', 'examples', 'cases.json'),
    ]);
    const readme = await readFile(inProject('README.md'), 'utf8');
    const cases = await readFile(inProject('data', 'examples', 'cases.json'), 'utf8');
    const shown: unknown = JSON.parse(/```json\n(.*?)```/s.exec(readme)?.[1] ?? '');
    expect(shown).toEqual(JSON.parse(cases));
    const numbers = [...stdout.matchAll(/"(?:rotation|ellipticity)Deg":(-?[\d.e-]+)/g)].map(([, digits]) =>
      Number(digits).toFixed(4),
    );
    expect(numbers).toEqual(['0.2883', '-0.0266', '0.1884', '0.1016']);
    for (const number of numbers) expect(readme).toContain(number);
  });

  it('names every environment variable that the server reads, with its default', async () => {
    const readme = await readFile(inProject('README.md'), 'utf8');
    const config = await readFile(inProject('server', 'config.ts'), 'utf8');
    const fields = [...config.matchAll(/^ {2}([A-Z][A-Z_]+): (.*),$/gm)].map(([, name = '', rule = '']) => ({
      name,
      value: /\.default\('?(.*?)'?\)$/.exec(rule)?.[1]?.replace('_', ''),
    }));
    expect(fields.length).toBeGreaterThan(10);
    for (const { name, value } of fields) {
      const row = readme.split('\n').find((line) => line.startsWith(`| \`${name}\` `));
      expect(row, `${name} has no row in README.md`).toBeDefined();
      if (value !== undefined) expect(row).toContain(`\`${value}\``);
    }
  });
});
