import { setTimeout as sleep } from 'node:timers/promises';
import { stackDocumentSchema } from '../../shared/stack.ts';
import type { AppDependencies } from '../dependencies.ts';
import type { Models } from '../models/models.ts';
import type { Run } from '../models/run.ts';
import { recordActivity } from '../services/recordActivity.ts';
import { createRun } from '../services/runs.ts';
import { hashSecret } from '../services/secrets.ts';
import type { Demo } from './demo.ts';
import type { DemoData } from './demoData.ts';
import { DEMO_LINK_TOKEN } from './demoData.ts';
import { withSeedLock } from './seedLock.ts';

/** A machine that computes nothing itself (COMPUTE=off) must still start. */
const PATIENCE_MS = 15_000;

const tokenHash = hashSecret(DEMO_LINK_TOKEN);

/**
 * Makes the demo run the way every run is made, and the link that opens it; waits until it is computed. Once the
 * link was made this does nothing, also when somebody revoked it or deleted the run.
 */
export async function seedDemoRun(app: AppDependencies, demo: Demo, data: DemoData): Promise<void> {
  const run = await withSeedLock(app.models.sequelize, async () => {
    if (await app.models.ShareLink.findOne({ where: { tokenHash } })) return null;
    const created = await createDemoRun(app, demo, data);
    await createDemoLink(app.models, demo, created, data.run.link);
    return created;
  });
  if (run) await waitUntilFinished(run);
}

/** Ends the link that everybody knows, on a database that was used for a demo before it came into production. */
export async function revokeDemoLink(models: Models): Promise<void> {
  await models.ShareLink.update({ revokedAt: new Date() }, { where: { tokenHash, revokedAt: null } });
}

async function createDemoRun(
  app: AppDependencies,
  { group, lead }: Demo,
  { run, stacks }: DemoData,
): Promise<Run> {
  const stack = await app.models.Stack.findOne({ where: { groupId: group.id, name: run.stack } });
  const document = stacks.find(({ name }) => name === run.stack)?.document;
  const created = await createRun(
    app,
    { userId: lead.id, name: lead.name },
    group,
    {
      groupId: group.id,
      name: run.name,
      stackId: stack?.id,
      document: stackDocumentSchema.parse(document),
      axis: run.axis,
    },
    'demo run',
  );
  return created.update({ isDemo: true });
}

async function createDemoLink(models: Models, { group, lead }: Demo, run: Run, label: string): Promise<void> {
  await models.sequelize.transaction(async (transaction) => {
    const link = await models.ShareLink.create(
      { runId: run.id, groupId: group.id, tokenHash, label, createdById: lead.id, expiresAt: null },
      { transaction },
    );
    const actor = { userId: lead.id, name: lead.name };
    await recordActivity(
      models,
      { action: 'link.create', groupId: group.id, actor, subjectId: link.id, detail: { label } },
      transaction,
    );
  });
}

async function waitUntilFinished(run: Run): Promise<void> {
  const end = Date.now() + PATIENCE_MS;
  while (Date.now() < end && (run.state === 'queued' || run.state === 'running')) {
    await sleep(50);
    await run.reload();
  }
}
