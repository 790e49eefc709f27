import { execFileSync } from 'node:child_process';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { LibraryEntry } from '../../shared/material.ts';
import { designResultSchema } from '../../shared/design.ts';
import { readingOf } from '../../shared/readings.ts';
import { librarySolveRequestSchema, solveResponseSchema } from '../../shared/solve.ts';
import { toSolveCase } from '../../shared/stackCase.ts';
import { loadLibrary } from '../../worker/dispersion/loadLibrary.ts';
import type { ApiServer } from '../../tests/apiServer.ts';
import { startApiServer } from '../../tests/apiServer.ts';
import { buildContent } from '../../tests/factories.ts';
import type { ScratchDatabase } from '../../tests/scratchDatabase.ts';
import { createScratchDatabase } from '../../tests/scratchDatabase.ts';
import { migrate } from '../migrations/migrate.ts';
import { projectRoot } from '../projectRoot.ts';
import { hashSecret } from '../services/secrets.ts';
import { solve } from '../services/solve.ts';
import { createStudy, deleteStudy } from '../services/studies.ts';
import { seedDemo } from './demo.ts';
import { DEMO_LINK_TOKEN, DEMO_PASSWORD, readDemoData } from './demoData.ts';
import { revokeDemoLink, seedDemoRun } from './demoRun.ts';
import { seedDemoStudy } from './demoStudy.ts';
import { seedLibrary } from './library.ts';

function solveOnCommandLine(input: string): string {
  const tsx = path.join(projectRoot, 'node_modules', 'tsx', 'dist', 'cli.mjs');
  return execFileSync(process.execPath, [tsx, 'worker/solve.ts', '-'], {
    ...{ cwd: projectRoot, input, encoding: 'utf8', maxBuffer: 64_000_000 },
  });
}

// The demo group exists once in a database: this one is ours alone.
let scratch: ScratchDatabase;
let api: ApiServer;
const library = loadLibrary(path.join(projectRoot, 'data', 'library'));
beforeAll(async () => {
  scratch = await createScratchDatabase();
  await migrate(scratch.url);
  api = await startApiServer({ databaseUrl: scratch.url });
  await seedLibrary(api.models, library);
});
afterAll(async () => {
  await api.stop();
  await scratch.drop();
});

describe('the shipped library', () => {
  const entry: LibraryEntry = {
    id: `seeded-${Date.now()}`,
    name: 'Testium',
    formula: 'Te',
    class: 'magnet',
    preferred: false,
    notes: ['One'],
    content: buildContent(),
  };
  const versions = () =>
    api.models.MaterialVersion.findAll({ where: { materialId: entry.id }, order: ['version'] });

  test('is there, and seeding again changes nothing', async () => {
    expect(library.length).toBeGreaterThanOrEqual(35);
    const before = await api.models.MaterialVersion.count();
    await Promise.all([seedLibrary(api.models, library), seedLibrary(api.models, library)]);
    expect(await api.models.MaterialVersion.count()).toBe(before);
  });

  test('gets a new version where constants changed, and keeps the old one', async () => {
    await seedLibrary(api.models, [entry]);
    const changed = { ...entry, content: buildContent({ voigt: null, voigtSource: null }) };
    await seedLibrary(api.models, [changed]);
    await seedLibrary(api.models, [{ ...changed, name: 'Testium, renamed' }]);
    const stored = await versions();
    expect(stored.map((row) => row.content)).toEqual([entry.content, changed.content]);
    const material = await api.models.Material.findByPk(entry.id, { rejectOnEmpty: true });
    expect([material.version, material.name, material.groupId]).toEqual([2, 'Testium, renamed', null]);
  });
});

describe('the demo', () => {
  test('has its people with their roles, four stacks that solve, a finished run and the known link', async () => {
    const data = readDemoData();
    const demo = await seedDemo(api.models, data);
    await seedDemoRun(api.dependencies, demo, data);
    const lead = await api.anonymous().post('/api/v1/session').send({
      email: 'lead@northgate.example',
      password: DEMO_PASSWORD,
    });
    expect(lead.body).toMatchObject({
      groups: [{ groupName: 'Northgate Films', role: 'owner', isDemo: true }],
    });
    const memberships = await api.models.Membership.findAll({ where: { groupId: demo.group.id } });
    expect(memberships.map((one) => one.role).sort()).toEqual(['editor', 'editor', 'owner', 'viewer']);
    const stacks = await api.models.StackVersion.findAll({ where: { authorId: demo.lead.id } });
    expect(stacks).toHaveLength(4);
    for (const { document } of stacks) {
      const { wavelengthNm, angleDeg } = document.workingPoint;
      const request = librarySolveRequestSchema.parse({
        cases: [toSolveCase(document, wavelengthNm, angleDeg)],
      });
      const { results } = await solve(api.dependencies, request, []);
      expect(results[0]?.points).toHaveLength(1);
    }
    const link = await api.models.ShareLink.findOne({
      where: { tokenHash: hashSecret(DEMO_LINK_TOKEN) },
      include: 'run',
    });
    expect(link?.run).toMatchObject({ state: 'done', done: 341, total: 341, isDemo: true });
    await api.anonymous().get(`/api/v1/shared/${DEMO_LINK_TOKEN}`).expect(200);
  });

  test('answers which cap in a study whose numbers the command line gives again', async () => {
    const data = readDemoData();
    const demo = await seedDemo(api.models, data);
    const { group } = demo;
    // One of the same name that the lead made by hand is another.
    const actor = { userId: demo.lead.id, name: demo.lead.name };
    const byHand = { title: data.study.title, document: { question: 'Mine?', items: [], decision: '' } };
    await createStudy(api.models, actor, group.id, byHand);
    await seedDemoStudy(api.dependencies, demo, data);
    await seedDemoStudy(api.dependencies, demo, data);
    expect(await api.models.Study.count({ where: { groupId: group.id, isDemo: true } })).toBe(1);
    const [card] = await api.models.GrowthCard.findAll({ where: { groupId: group.id } });
    expect(card).toMatchObject({ isDemo: true, title: data.study.card.title });
    const design = await api.models.Run.findOne({
      where: { groupId: group.id, kind: 'cap' },
      rejectOnEmpty: true,
    });
    while (['queued', 'running'].includes(design.state)) {
      await sleep(100);
      await design.reload();
    }
    const lead = api.anonymous();
    await lead.post('/api/v1/session').send({ email: 'lead@northgate.example', password: DEMO_PASSWORD });
    const answer = await lead.get(`/api/v1/designs/${design.id}/result`).expect(200);
    const result = designResultSchema.parse(answer.body);
    if (result.kind !== 'cap') throw new Error(`the demo question is answered by ${result.kind}`);
    expect(result.candidates).toHaveLength(4);
    const best = result.candidates.find(({ id }) => id === result.ranking[0])!.best!;
    const said = `${(1000 * best.points[0]!.signal).toFixed(1)} mdeg`;
    expect(data.study.decision).toContain(`${best.thicknessNm} nm`);
    expect(data.study.decision).toContain(said);
    // The card's film is the chosen one: its nominal rotation is the same number.
    const nominal = card!.content.readings[0]!.readings[0]!.nominal!;
    expect(Math.abs(nominal)).toBeCloseTo(best.points[0]!.signal, 9);
    const input = await lead.get(`/api/v1/designs/${design.id}/input.json`).expect(200);
    const output = solveOnCommandLine(JSON.stringify(input.body));
    const points = solveResponseSchema.parse(JSON.parse(output)).results.map((one) => one.points[0]!);
    // Each film comes as given, with m = 0 and reversed.
    const rotations = points.flatMap((given, at) =>
      at % 3 === 0 ? [readingOf('rotationP', given, points[at + 1]!, points[at + 2]!)] : [],
    );
    const shown = result.candidates.flatMap((one) => one.points[0]!.rotationDeg);
    expect(shown).toHaveLength(4 * data.study.design.range.points);
    for (const value of shown) {
      expect(Math.min(...rotations.map((one) => Math.abs(one! - value!)))).toBeLessThan(1e-9);
    }
  }, 120_000);

  test('is made once: what somebody deleted stays deleted', async () => {
    const data = readDemoData();
    const demo = await seedDemo(api.models, data);
    const [stack] = await api.models.Stack.findAll({ where: { groupId: demo.group.id } });
    await stack!.destroy();
    const study = await api.models.Study.findOne({ where: { isDemo: true }, rejectOnEmpty: true });
    await deleteStudy(api.models, { userId: demo.lead.id, name: demo.lead.name }, study);
    const again = await seedDemo(api.models, data);
    await seedDemoRun(api.dependencies, again, data);
    await seedDemoStudy(api.dependencies, again, data);
    expect(await api.models.Study.count({ where: { isDemo: true } })).toBe(0);
    expect(again.group.id).toBe(demo.group.id);
    expect(await api.models.Stack.count({ where: { groupId: demo.group.id } })).toBe(3);
    expect(await api.models.Run.count({ where: { groupId: demo.group.id, kind: 'sweep' } })).toBe(1);
    expect(await api.models.Group.count({ where: { isDemo: true } })).toBe(1);
  });

  test('loses its known link when the database comes into production', async () => {
    await revokeDemoLink(api.models);
    await api.anonymous().get(`/api/v1/shared/${DEMO_LINK_TOKEN}`).expect(410);
  });
});
