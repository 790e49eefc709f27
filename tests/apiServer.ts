import type { Express } from 'express';
import { pino } from 'pino';
import { agent } from 'supertest';
import type TestAgent from 'supertest/lib/agent.js';
import { createApp } from '../server/app.ts';
import { readConfig } from '../server/config.ts';
import type { Config } from '../server/config.ts';
import type { AppDependencies } from '../server/dependencies.ts';
import { startJobs } from '../server/jobs/start.ts';
import { startMailCatcher } from '../server/mail/mailCatcher.ts';
import { createMailer } from '../server/mail/mailer.ts';
import { createModels } from '../server/models/models.ts';
import type { Models } from '../server/models/models.ts';
import type { User } from '../server/models/user.ts';
import { createMaterialStore } from '../server/services/materialStore.ts';
import { createPool } from '../worker/pool.ts';
import { PASSWORD } from './factories.ts';

/** Keeps its cookies from request to request. */
export type Browser = TestAgent;

export type ApiServer = {
  app: Express;
  models: Models;
  dependencies: AppDependencies;
  /** Somebody without an account. */
  anonymous(): Browser;
  /** A browser in which this user, with the factories' password, has signed in. */
  signedIn(user: User): Promise<Browser>;
  stop(): Promise<void>;
};

/**
 * The whole server of one test file on the real test database, with its own mail catcher, pool and queue; answers
 * are held against their schemas. It listens to no port of its own: supertest does that.
 */
export async function startApiServer(overrides: Partial<Config> = {}): Promise<ApiServer> {
  const config: Config = {
    ...readConfig({
      NODE_ENV: 'test',
      DATABASE_URL: process.env['TEST_DATABASE_URL'],
      LOG_LEVEL: 'silent',
      ATTEMPT_LIMIT: '1000',
      THREADS: '2',
      PUBLIC_URL: 'http://skewlight.test',
    }),
    ...overrides,
  };
  const models = createModels(config.databaseUrl);
  const mailCatcher = await startMailCatcher();
  const parts = {
    config,
    models,
    materials: createMaterialStore(models),
    logger: pino({ level: config.logLevel }),
    pool: createPool({ threads: config.threads }),
    mailer: createMailer(mailCatcher.url, config.mailFrom),
    mailCatcher,
    publicUrl: () => config.publicUrl ?? '',
  };
  const jobs = await startJobs(parts);
  const dependencies: AppDependencies = { ...parts, jobs };
  const app = createApp(dependencies);
  return {
    app,
    models,
    dependencies,
    anonymous: () => agent(app),
    async signedIn(user) {
      const browser = agent(app);
      await browser.post('/api/v1/session').send({ email: user.email, password: PASSWORD }).expect(200);
      return browser;
    },
    async stop() {
      await jobs.stop();
      await parts.pool.close();
      parts.mailer.close();
      await mailCatcher.stop();
      await models.sequelize.close();
    },
  };
}
