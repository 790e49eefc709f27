import { createServer } from 'node:http';
import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import path from 'node:path';
import { pino } from 'pino';
import { loadLibrary } from '../worker/dispersion/loadLibrary.ts';
import { createPool } from '../worker/pool.ts';
import { createApp } from './app.ts';
import type { Config } from './config.ts';
import type { AppDependencies, Dependencies } from './dependencies.ts';
import { startJobs } from './jobs/start.ts';
import { startMailCatcher } from './mail/mailCatcher.ts';
import { createMailer } from './mail/mailer.ts';
import { migrate } from './migrations/migrate.ts';
import { createModels } from './models/models.ts';
import { projectRoot } from './projectRoot.ts';
import { seedDemo } from './seeders/demo.ts';
import { DEMO_LINK_TOKEN, DEMO_PASSWORD, readDemoData } from './seeders/demoData.ts';
import { revokeDemoLink, seedDemoRun } from './seeders/demoRun.ts';
import { seedDemoStudy } from './seeders/demoStudy.ts';
import { seedLibrary } from './seeders/library.ts';
import { createMaterialStore } from './services/materialStore.ts';

/** How long requests under way may take once the server is told to stop. */
const DRAIN_MS = 4_000;

export type RunningServer = {
  url: string;
  /** What a person who started it wants to read. */
  greeting: string;
  /** Ends everything in order: no new requests, those under way, runs, threads, mail, database. */
  stop(): Promise<void>;
};

/**
 * Starts the whole server: schema, shipped library, demo (outside production), mail, threads, jobs, web.
 *
 * @throws Error when the database cannot be reached, the port is taken or the library is damaged
 */
export async function startServer(config: Config): Promise<RunningServer> {
  const logger = pino({ level: config.logLevel });
  await migrate(config.databaseUrl);
  const models = createModels(config.databaseUrl);
  await seedLibrary(models, loadLibrary(path.join(projectRoot, 'data', 'library')));
  const mailCatcher = config.mailUrl === null ? await startMailCatcher() : null;
  const server = createServer();
  const publicUrl = () => config.publicUrl ?? localUrl(server, config);
  const dependencies: Dependencies = {
    config,
    models,
    materials: createMaterialStore(models),
    logger,
    pool: createPool({ threads: config.threads }),
    mailer: createMailer(config.mailUrl ?? mailCatcher?.url ?? '', config.mailFrom),
    mailCatcher,
    publicUrl,
  };
  await dependencies.pool.warm();
  const jobs = await startJobs(dependencies);
  const app: AppDependencies = { ...dependencies, jobs };
  server.on('request', createApp(app));
  await listen(server, config);
  const greeting = [`Skewlight is at ${publicUrl()}`, ...(await greetWithDemo(app))].join('\n');
  return { url: publicUrl(), greeting, stop: () => stopInOrder(server, app) };
}

async function greetWithDemo(app: AppDependencies): Promise<string[]> {
  if (app.config.production) await revokeDemoLink(app.models);
  if (!app.config.demo) return [];
  const data = readDemoData();
  const demo = await seedDemo(app.models, data);
  await seedDemoRun(app, demo, data);
  await seedDemoStudy(app, demo, data);
  return [
    `Demo sign-ins, password ${DEMO_PASSWORD}:`,
    ...data.people.map(({ email, role }) => `  ${email} (${role})`),
    `Demo link: ${app.publicUrl()}/share/${DEMO_LINK_TOKEN}`,
  ];
}

function localUrl(server: Server, { host, port }: Config): string {
  const address = server.address() as AddressInfo | null;
  const reachable = host === '0.0.0.0' || host === '::' ? '127.0.0.1' : host;
  return `http://${reachable.includes(':') ? `[${reachable}]` : reachable}:${address?.port ?? port}`;
}

function listen(server: Server, { host, port }: Config): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => {
      server.off('error', reject);
      resolve();
    });
  });
}

async function stopInOrder(server: Server, app: AppDependencies): Promise<void> {
  await closeWeb(server);
  await app.jobs.stop();
  await app.pool.close();
  app.mailer.close();
  await app.mailCatcher?.stop();
  await app.models.sequelize.close();
}

/** Requests under way are answered; what stays open beyond the patience, such as event streams, is cut. */
async function closeWeb(server: Server): Promise<void> {
  const closed = new Promise<void>((resolve) => server.close(() => resolve()));
  server.closeIdleConnections();
  const patience = setTimeout(() => server.closeAllConnections(), DRAIN_MS);
  await closed;
  clearTimeout(patience);
}
