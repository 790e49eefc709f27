import type { BrowserContext } from 'playwright-core';
import { vi } from 'vitest';
import { designSchema } from '../../shared/design.ts';
import type { CreateDesign } from '../../shared/design.ts';
import { growthCardSchema } from '../../shared/growthCard.ts';
import type { CreateGrowthCard } from '../../shared/growthCard.ts';
import { createdLinkSchema } from '../../shared/link.ts';
import { studySchema } from '../../shared/study.ts';
import type { CreateStudy } from '../../shared/study.ts';
import { ask, demoGroupId, demoRunId, demoStack } from './demo.ts';
import { PATIENCE_MS } from './visitor.ts';

/** Few films: what is looked at is the pages, not the numbers. */
const tolerance = {
  ratePercent: 5,
  randomPercent: 2,
  indexPercent: 1,
  voigtPercent: 5,
  samples: 200,
  seed: 1,
};

export type Decisions = Awaited<ReturnType<typeof makeDecisions>>;

/** One small question of each kind with its answer, a study that holds two of them, a card, and their links. */
export async function makeDecisions(context: BrowserContext) {
  const groupId = await demoGroupId(context);
  const { document } = await demoStack(context, 'Pt/Co/Pt');
  const top = document.layers[0];
  if (!top || !('medium' in top)) throw new Error('The demo stack does not begin with a cap.');
  const points = [{ id: 'bench', label: 'bench', workingPoint: document.workingPoint }];
  const layer = { medium: top.medium, leastNm: 1.5, leastSource: 'a test', fixedNm: null };
  const answered = async (input: CreateDesign['input']): Promise<string> => {
    const { id } = await ask(context, '/designs', designSchema, { groupId, input });
    await vi.waitFor(
      async () => {
        const { progress } = await ask(context, `/designs/${id}`, designSchema);
        if (progress.state !== 'done') throw new Error(`The design ${id} is ${progress.state}.`);
      },
      { timeout: PATIENCE_MS, interval: 100 },
    );
    return id;
  };
  const cap = await answered({
    ...{ kind: 'cap', document, replaces: [top.id], points, signal: 'rotation', tolerance, leastYield: 0.9 },
    candidates: [{ id: 'own', label: 'the cap as it is', layers: [layer] }],
    range: { fromNm: 0, toNm: 6, points: 7 },
    demands: { leastReflectance: 0.1 },
  });
  const search = await answered({
    ...{ kind: 'optimise', document, points, effort: 'quick', seed: 1 },
    variables: [{ layerId: top.id, fromNm: 1, toNm: 5 }],
    ...{ goal: { quantity: 'rotation' }, second: { quantity: 'zero ellipticity' } },
  });
  const spread = await answered({
    ...{ kind: 'tolerance', document, points, signal: 'rotation', tolerance },
    demands: { leastReflectance: 0.1 },
  });
  const study: CreateStudy = {
    title: 'Every item of a study',
    document: {
      question: 'Which cap?',
      items: [
        { kind: 'note', id: 'note', text: '**Read** the table.' },
        { kind: 'design', id: 'caps', designId: cap, view: '', caption: 'The caps' },
        { kind: 'run', id: 'angles', runId: await demoRunId(context), view: 'at=30', caption: 'The angles' },
      ],
      decision: 'The cap as it is.',
    },
  };
  const card: CreateGrowthCard = {
    ...{ title: 'A card of every part', document, points, signal: 'rotation', tolerance },
    ...{ bench: 'HeNe laser, crossed polarizers', decision: { text: 'Grow it.' }, link: { expiresAt: null } },
  };
  const made = {
    ...{ cap, search, spread },
    study: (await ask(context, `/groups/${groupId}/studies`, studySchema, study)).id,
    card: (await ask(context, `/groups/${groupId}/cards`, growthCardSchema, card)).id,
  };
  const linkTo = async (subject: string): Promise<string> => {
    const link = await ask(context, `/${subject}/links`, createdLinkSchema, {
      label: '',
      expiresAt: null,
    });
    return new URL(link.url).pathname.replace('/share/', '');
  };
  const { url } = await ask(context, `/cards/${made.card}`, growthCardSchema);
  if (url === null) throw new Error('The card has no link.');
  return {
    ...made,
    capLink: await linkTo(`designs/${cap}`),
    studyLink: await linkTo(`studies/${made.study}`),
    cardLink: new URL(url).pathname.replace('/share/', ''),
  };
}
