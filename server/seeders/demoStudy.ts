import { createDesignSchema } from '../../shared/design.ts';
import { createGrowthCardSchema } from '../../shared/growthCard.ts';
import { stackDocumentSchema } from '../../shared/stack.ts';
import type { StackDocument } from '../../shared/stack.ts';
import { createStudySchema } from '../../shared/study.ts';
import type { AppDependencies } from '../dependencies.ts';
import type { Models } from '../models/models.ts';
import type { Run } from '../models/run.ts';
import type { Study } from '../models/study.ts';
import { createCard } from '../services/createCard.ts';
import { createDesign } from '../services/designs.ts';
import { createStudy } from '../services/studies.ts';
import type { Demo } from './demo.ts';
import type { DemoData } from './demoData.ts';
import { withSeedLock } from './seedLock.ts';

/**
 * Makes the demo study, the cap question that it rests on and the growth card that came of it, the way people make them.
 * Made once: what somebody deleted or changed since stays so. Nobody waits for the answer of the question.
 */
export async function seedDemoStudy(app: AppDependencies, demo: Demo, data: DemoData): Promise<void> {
  await withSeedLock(app.models.sequelize, async () => {
    if (await wasMade(app.models, demo, data.study.title)) return;
    const document = stackDocumentSchema.parse(
      data.stacks.find(({ name }) => name === data.study.stack)?.document,
    );
    const design = await createDemoDesign(app, demo, data, document);
    const study = await createDemoStudy(app, demo, data, design);
    await createDemoCard(app, demo, data, { document, study });
  });
}

/** Tells the seeded study from one that somebody made by hand, whatever its title; the trail remembers a deleted one. */
async function wasMade({ Study, Activity }: Models, { group }: Demo, title: string): Promise<boolean> {
  const there = await Study.count({ where: { groupId: group.id, isDemo: true } });
  if (there > 0) return true;
  const lines = await Activity.findAll({ where: { groupId: group.id, action: 'study.create' } });
  return lines.some(({ detail }) => detail['isDemo'] === true && detail['title'] === title);
}

async function createDemoDesign(
  app: AppDependencies,
  { group, lead }: Demo,
  { study }: DemoData,
  document: StackDocument,
): Promise<Run> {
  const { name, ...question } = study.design;
  const stack = await app.models.Stack.findOne({ where: { groupId: group.id, name: study.stack } });
  const wanted = createDesignSchema.parse({
    groupId: group.id,
    name,
    ...(stack && { stackId: stack.id }),
    input: { kind: 'cap', document, ...question },
  });
  const design = await createDesign(app, personOf(lead), group, wanted, 'demo design');
  return design.update({ isDemo: true });
}

async function createDemoStudy(
  app: AppDependencies,
  { group, lead }: Demo,
  { study, run }: DemoData,
  design: Run,
): Promise<Study> {
  const angles = await app.models.Run.findOne({ where: { groupId: group.id, name: run.name, isDemo: true } });
  const [before, after] = study.notes;
  const wanted = createStudySchema.parse({
    title: study.title,
    document: {
      question: study.question,
      items: [
        { kind: 'note', id: 'task', text: before },
        { kind: 'design', id: 'caps', designId: design.id, caption: study.captions.design },
        { kind: 'note', id: 'reading', text: after },
        ...(angles ? [{ kind: 'run', id: 'angles', runId: angles.id, caption: study.captions.run }] : []),
      ],
      decision: study.decision,
    },
  });
  const made = await createStudy(app.models, personOf(lead), group.id, { ...wanted, isDemo: true });
  return made.study;
}

/** The film as it was decided on: the chosen cap in place of the drawn one. */
async function createDemoCard(
  app: AppDependencies,
  { group, lead }: Demo,
  { study: { card, design } }: DemoData,
  { document, study }: { document: StackDocument; study: Study },
): Promise<void> {
  const { layer, ...rest } = card;
  const layers = document.layers.map((item) => (item.id === layer.id ? layer : item));
  const wanted = createGrowthCardSchema.parse({
    ...rest,
    document: { ...document, layers },
    points: design.points,
    signal: design.signal,
    tolerance: design.tolerance,
    studyId: study.id,
    link: { expiresAt: null },
  });
  const never = new AbortController().signal;
  await createCard(app, personOf(lead), group, wanted, { isDemo: true, signal: never });
}

const personOf = ({ id, name }: Demo['lead']) => ({ userId: id, name });
