import { z } from 'zod';
import { signalNames } from '../../../../shared/designPoint.ts';
import { LIMITS } from '../../../../shared/limits.ts';
import { polarizations } from '../../../../shared/stack.ts';
import type { CardForm } from './cardDraft.ts';

/** A number that a person was about to type is none yet, and JSON writes it as null. */
const typed = z.number().nullable();

const keptSchema = z.object({
  title: z.string(),
  sampleId: z.string(),
  points: z
    .array(
      z.object({ label: z.string(), wavelengthNm: typed, angleDeg: typed, input: z.enum(polarizations) }),
    )
    .min(1)
    .max(LIMITS.designPoints),
  signal: z.enum(signalNames),
  ...{ ratePercent: typed, randomPercent: typed, indexPercent: typed, voigtPercent: typed },
  rates: z.array(z.object({ layerId: z.string(), nmPerMin: z.string() })),
  bench: z.string(),
  decision: z.string(),
  hasLink: z.boolean(),
  lastDay: z.string(),
});

const keyOf = (subject: string) => `skewlight.cardDraft.${subject}`;

/**
 * What was filled in before this tab was reloaded; null when there is nothing, or it is of another shape.
 *
 * @param blank gives what was not finished, and the layers that the film has today
 */
export function loadKeptCard(storage: Storage, subject: string, blank: CardForm): CardForm | null {
  const kept = read(storage.getItem(keyOf(subject)));
  if (!kept) return null;
  const rateOf = new Map(kept.rates.map(({ layerId, nmPerMin }) => [layerId, nmPerMin]));
  const first = blank.points[0];
  return {
    ...kept,
    points: kept.points.map((point, at) => ({
      ...point,
      wavelengthNm: point.wavelengthNm ?? (blank.points[at] ?? first)?.wavelengthNm ?? 0,
      angleDeg: point.angleDeg ?? (blank.points[at] ?? first)?.angleDeg ?? 0,
    })),
    ratePercent: kept.ratePercent ?? blank.ratePercent,
    randomPercent: kept.randomPercent ?? blank.randomPercent,
    indexPercent: kept.indexPercent ?? blank.indexPercent,
    voigtPercent: kept.voigtPercent ?? blank.voigtPercent,
    rates: blank.rates.map(({ layerId }) => ({ layerId, nmPerMin: rateOf.get(layerId) ?? '' })),
  };
}

/** @param form as JSON; a full storage only costs the safety net */
export function storeKeptCard(storage: Storage, subject: string, form: string | null): void {
  try {
    if (form === null) storage.removeItem(keyOf(subject));
    else storage.setItem(keyOf(subject), form);
  } catch {
    // QuotaExceededError: what was filled in is still on the page.
  }
}

function read(text: string | null): z.output<typeof keptSchema> | null {
  if (text === null) return null;
  try {
    return keptSchema.safeParse(JSON.parse(text)).data ?? null;
  } catch {
    return null;
  }
}
