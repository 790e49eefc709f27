import {
  cardMakingSchema,
  createGrowthCardSchema,
  growthCardListSchema,
  growthCardSchema,
} from '../../../shared/growthCard.ts';
import { ComputeError } from '../../../worker/sweep/computeError.ts';
import type { AppDependencies } from '../../dependencies.ts';
import { gone } from '../../errors.ts';
import { addToGroup, readGroup } from '../../policies/group.ts';
import { deleteCard as mayDelete, readCard as mayRead } from '../../policies/growthCard.ts';
import {
  presentCardList,
  presentCardMaking,
  presentGrowthCard,
  presentSharedGrowthCard,
} from '../../presenters/presentGrowthCard.ts';
import { readIdempotencyKey } from '../../routing/readIdempotencyKey.ts';
import type { Route } from '../../routing/route.ts';
import { route, streamRoute } from '../../routing/route.ts';
import { createCard } from '../../services/createCard.ts';
import { deleteCard, listCards, loadCard } from '../../services/growthCards.ts';
import { idOfKey } from '../../services/idOfKey.ts';
import { sendCardPdf } from '../../services/sendCardPdf.ts';

const listCardsOfGroup = route({
  method: 'get',
  path: '/groups/:groupId/cards',
  summary: 'The growth cards of a group, newest first.',
  noun: 'group',
  policy: readGroup,
  load: ({ dependencies, params }) => dependencies.models.Group.findByPk(params.groupId),
  answer: { status: 200, schema: growthCardListSchema },
  async handler({ dependencies, subject }) {
    return presentCardList(await listCards(dependencies.models, subject.id));
  },
});

const createCardInGroup = route({
  method: 'post',
  path: '/groups/:groupId/cards',
  summary:
    'Compute a growth card and keep it; it is never changed. It ends when the asker hangs up. With an Idempotency-Key header (any text up to 200 characters) a request sent twice makes one, and GET .../cards-in-making/:key tells how far it is.',
  noun: 'group',
  policy: addToGroup,
  body: createGrowthCardSchema,
  load: ({ dependencies, params }) => dependencies.models.Group.findByPk(params.groupId),
  answer: { status: 201, schema: growthCardSchema },
  async handler({ dependencies, actor, subject, body, request, response }) {
    const idempotencyKey = readIdempotencyKey(request);
    const hungUp = new AbortController();
    response.once('close', () => hungUp.abort());
    // Whoever was gone before this line closes nothing any more.
    if (response.closed) hungUp.abort();
    try {
      return presentGrowthCard(
        await createCard(dependencies, actor, subject, body, { signal: hungUp.signal, idempotencyKey }),
      );
    } catch (error) {
      // Nobody reads this any more; it keeps the end of a card out of the log of failures.
      if (error instanceof ComputeError && error.failure === 'cancelled' && hungUp.signal.aborted) {
        throw gone('The card was not made because nobody waited for it.');
      }
      throw error;
    }
  },
});

const readCardMaking = route({
  method: 'get',
  path: '/groups/:groupId/cards-in-making/:key',
  summary:
    'How far the card is that you asked for with this Idempotency-Key; null when it is not being made here, then with its id if it was stored.',
  noun: 'group',
  policy: addToGroup,
  load: ({ dependencies, params }) => dependencies.models.Group.findByPk(params.groupId),
  answer: { status: 200, schema: cardMakingSchema },
  async handler({ dependencies: { jobs, models }, actor, subject, params }) {
    const id = idOfKey(actor, subject, params.key);
    const progress = jobs.cards.progressOf(id);
    // In this order: what has ended is stored by now, or never.
    const card = progress ? null : await loadCard(models, id);
    return presentCardMaking(progress, card?.id ?? null);
  },
});

const load = ({ dependencies, params }: { dependencies: AppDependencies; params: { cardId: string } }) =>
  loadCard(dependencies.models, params.cardId);

const readCard = route({
  method: 'get',
  path: '/cards/:cardId',
  summary: 'A growth card as it was made.',
  noun: 'growth card',
  policy: mayRead,
  load,
  answer: { status: 200, schema: growthCardSchema },
  handler: ({ subject }) => presentGrowthCard(subject),
});

const removeCard = route({
  method: 'delete',
  path: '/cards/:cardId',
  summary: 'Delete a growth card; a link that opens it ends.',
  noun: 'growth card',
  policy: mayDelete,
  load,
  answer: { status: 204, schema: null },
  handler: ({ dependencies, actor, subject }) => deleteCard(dependencies.models, actor, subject),
});

const readCardPdf = streamRoute({
  method: 'get',
  path: '/cards/:cardId/card.pdf',
  summary: 'The growth card as PDF, on as few pages of A4 as can be read, to print and to write on.',
  noun: 'growth card',
  policy: mayRead,
  load,
  answer: { contentType: 'application/pdf' },
  handler: ({ subject, response }) => sendCardPdf(presentSharedGrowthCard(subject), response),
});

export const cardRoutes: Route[] = [
  listCardsOfGroup,
  createCardInGroup,
  readCardMaking,
  readCard,
  removeCard,
  readCardPdf,
];
