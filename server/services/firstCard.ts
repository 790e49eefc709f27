import { isDeepStrictEqual } from 'node:util';
import type { z } from 'zod';
import type { createGrowthCardSchema } from '../../shared/growthCard.ts';
import { conflict } from '../errors.ts';
import type { GrowthCard } from '../models/growthCard.ts';
import type { Models } from '../models/models.ts';
import type { CardQuestion } from './cardContent.ts';
import { cardLayers } from './cardLayers.ts';
import { hashSecret } from './secrets.ts';

type WantedCard = z.output<typeof createGrowthCardSchema>;

/**
 * The card that the same request made before; null when there is none of this id.
 *
 * @param question that this request asks
 * @throws Refusal 409 when the card of this id is another one
 */
export async function firstCard(
  models: Models,
  id: string,
  wanted: WantedCard,
  question: CardQuestion,
): Promise<GrowthCard | null> {
  const first = await models.GrowthCard.findByPk(id);
  if (!first) return null;
  const isSame =
    first.inputSha256 === question.snapshot.inputSha256 &&
    first.title === wanted.title &&
    first.sampleId === wanted.sampleId &&
    first.decision.text === wanted.decision.text &&
    first.content.bench === wanted.bench &&
    first.studyId === (wanted.studyId ?? null) &&
    first.designId === (wanted.designId ?? null) &&
    hasSameRates(first, wanted, question) &&
    (await hasSameLink(models, first, wanted));
  if (!isSame) throw conflict('This Idempotency-Key was used for another card: send a new one.');
  return first;
}

/** Rates are the same when they print the same column: a card does not keep the request. */
function hasSameRates(
  { content }: GrowthCard,
  { tolerance, rates }: WantedCard,
  { design, snapshot }: CardQuestion,
): boolean {
  const layers = cardLayers(design.document, snapshot.materials, tolerance, rates);
  const columnOf = (lines: typeof layers) => lines.map(({ nmPerMin }) => nmPerMin);
  return isDeepStrictEqual(columnOf(content.layers), columnOf(layers));
}

/** The address in the card ends with the token, which finds its link whatever the link opens. */
async function hasSameLink(
  { ShareLink }: Models,
  { content: { url } }: GrowthCard,
  { link }: WantedCard,
): Promise<boolean> {
  if (url === null || link === null) return (url === null) === (link === null);
  const token = url.slice(url.lastIndexOf('/') + 1);
  const made = await ShareLink.findOne({ where: { tokenHash: hashSecret(token) } });
  const end = link.expiresAt === null ? null : Date.parse(link.expiresAt);
  return made !== null && (made.expiresAt?.getTime() ?? null) === end;
}
