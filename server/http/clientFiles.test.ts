import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import express from 'express';
import { agent } from 'supertest';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { clientFiles } from './clientFiles.ts';

let directory: string;
beforeAll(async () => {
  directory = await mkdtemp(path.join(tmpdir(), 'skewlight-client-'));
  await mkdir(path.join(directory, 'assets'));
  await writeFile(path.join(directory, 'index.html'), '<title>Skewlight</title>');
  await writeFile(path.join(directory, 'assets', 'main-abc123.js'), 'export {};');
});
afterAll(() => rm(directory, { recursive: true }));

const get = (url: string) => agent(express().use(clientFiles(directory))).get(url);

test('assets never change and may be kept for ever', async () => {
  const answer = await get('/assets/main-abc123.js').expect(200);
  expect(answer.get('Cache-Control')).toBe('public, max-age=31536000, immutable');
});

test.each(['/', '/sign-in', '/stacks/1234', '/share/token.with-dots/'])(
  'the page %s is the client, asked for anew each time',
  async (url) => {
    const answer = await get(url).expect(200);
    expect(answer.text).toContain('Skewlight');
    expect(answer.get('Cache-Control')).toBe('no-cache');
  },
);

test('share links and reset links stay out of search engines', async () => {
  for (const url of ['/share/abc', '/reset-password/abc']) {
    expect((await get(url).expect(200)).get('X-Robots-Tag')).toContain('noindex');
  }
  expect((await get('/sign-in').expect(200)).get('X-Robots-Tag')).toBeUndefined();
});

test.each(['/assets/gone.js', '/..%2f..%2fpackage.json', '/%2e%2e/package.json'])(
  'the file %s is not there',
  async (url) => {
    const answer = await get(url);
    expect(answer.status).toBeGreaterThanOrEqual(400);
    expect(answer.text).not.toContain('dependencies');
  },
);
