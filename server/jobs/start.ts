import type { Dependencies, Jobs } from '../dependencies.ts';
import { CardMakings } from './cardMakings.ts';
import { ComputeHost } from './computeHost.ts';
import { ImportReader } from './importReader.ts';
import { RunChannel } from './runChannel.ts';
import { RunQueue } from './runQueue.ts';
import { Sweeper } from './sweeper.ts';

type JobDependencies = Pick<Dependencies, 'config' | 'models' | 'materials' | 'logger' | 'pool'>;

/**
 * Starts everything that goes on beside requests: the reader of imports, the queue of runs, the listener, the sweeper and, unless
 * COMPUTE is off, the compute host of this process.
 *
 * @throws Error when the database cannot be reached or is not migrated; a database that goes away later is waited for
 */
export async function startJobs(dependencies: JobDependencies): Promise<Jobs> {
  const { config, models } = dependencies;
  const logger = dependencies.logger.child({ part: 'jobs' });
  const queue = new RunQueue(models.sequelize);
  await queue.start();
  const channel = new RunChannel(config.databaseUrl, logger);
  await channel.start();
  const imports = new ImportReader({ ...dependencies, logger });
  await imports.readLost();
  const sweeper = new Sweeper({ models, queue, imports, logger });
  const host = config.compute ? new ComputeHost({ ...dependencies, queue, logger }, channel) : null;
  if (host) logger.info({ host: host.name }, 'Taking runs from the queue');

  return {
    enqueue: (runId, transaction) => queue.send(runId, transaction),
    watch: (runId, listener) =>
      channel.listen((notice) => {
        if (notice === 'reconnected') listener(null);
        else if (notice.kind === 'progress' && notice.runId === runId) listener(notice.progress);
        else if (notice.kind === 'stop' && notice.runId === runId) listener(null);
      }),
    partialResult: (runId) => host?.partialResult(runId) ?? null,
    partialDesign: (runId) => host?.partialDesign(runId) ?? null,
    imports,
    cards: new CardMakings(),
    health() {
      const computing = host ? `${host.runCount} runs on this machine` : 'other machines compute';
      return Promise.resolve(
        channel.connected
          ? { ok: true, detail: `listening; ${computing}` }
          : { ok: false, detail: `not connected to the database; ${computing}` },
      );
    },
    async stop() {
      await host?.stop();
      await sweeper.stop();
      await imports.stop();
      await channel.stop();
      await queue.stop();
    },
  };
}
