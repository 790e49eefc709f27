import { Writable } from 'node:stream';
import express from 'express';
import { pino } from 'pino';
import { agent } from 'supertest';
import { expect, test } from 'vitest';
import { requestLog } from './requestLog.ts';

test('the log has the request under the id of the answer, and no secrets', async () => {
  const lines: string[] = [];
  const sink = new Writable({
    write(chunk: Buffer, _encoding, done) {
      lines.push(chunk.toString());
      done();
    },
  });
  const app = express()
    .use(requestLog(pino({ level: 'debug' }, sink)))
    .use((_request, response) => response.json({}));
  const answer = await agent(app)
    .get('/api/v1/shared/very-secret-token/data?x=1')
    .set('Authorization', 'Bearer skw_secret')
    .set('Cookie', 'skewlight_session=secret');
  await agent(app).get('/share/very-secret-token');
  await agent(app).get('/reset-password/very-secret-token');
  const log = lines.join('');
  expect(log).toContain(answer.get('X-Request-Id'));
  expect(log).toContain('/api/v1/shared/***/data?x=1');
  expect(log).not.toContain('secret');
});
