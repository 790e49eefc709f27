import { sharedGrowthCardSchema } from '../../../shared/growthCard.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { anyone } from '../../policies/policy.ts';
import { presentSharedGrowthCard } from '../../presenters/presentGrowthCard.ts';
import type { Route } from '../../routing/route.ts';
import { route, streamRoute } from '../../routing/route.ts';
import { countLinkUse, openLink } from '../../services/links.ts';
import { sendCardPdf } from '../../services/sendCardPdf.ts';

async function load(context: { dependencies: AppDependencies; params: { token: string } }) {
  const shared = await openLink(context.dependencies.models, context.params.token);
  return shared && 'card' in shared ? shared : null;
}

const readSharedCard = route({
  method: 'get',
  path: '/shared/:token/card',
  summary: 'The growth card that a share link opens; 410 once it is revoked or has expired.',
  noun: 'link',
  policy: anyone,
  load,
  answer: { status: 200, schema: sharedGrowthCardSchema },
  async handler({ dependencies, subject }) {
    await countLinkUse(dependencies.models, subject.link);
    return presentSharedGrowthCard(subject.card);
  },
});

const readSharedCardPdf = streamRoute({
  method: 'get',
  path: '/shared/:token/card.pdf',
  summary: 'The shared growth card as one page of PDF.',
  noun: 'link',
  policy: anyone,
  load,
  answer: { contentType: 'application/pdf' },
  handler: ({ subject, response }) => sendCardPdf(presentSharedGrowthCard(subject.card), response),
});

export const sharedCardRoutes: Route[] = [readSharedCard, readSharedCardPdf];
