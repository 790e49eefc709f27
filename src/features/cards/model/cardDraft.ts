import { z } from 'zod';
import { signalNames } from '../../../../shared/designPoint.ts';
import type { DesignPoint, SignalName, Tolerance } from '../../../../shared/designPoint.ts';
import type { CreateGrowthCard } from '../../../../shared/growthCard.ts';
import { LIMITS } from '../../../../shared/limits.ts';
import { polarizations } from '../../../../shared/stack.ts';
import type { StackDocument, StackItem, StackLayer } from '../../../../shared/stack.ts';

/** What a new card begins with. */
export type CardStart = {
  title: string;
  document: StackDocument;
  points: DesignPoint[];
  signal: SignalName;
  tolerance: Tolerance;
  studyId?: string;
  designId?: string;
};

/** Common practice, no source: what a calibrated sputter chamber keeps to. */
export const usualTolerance: Tolerance = {
  ratePercent: 3,
  randomPercent: 1,
  indexPercent: 1,
  voigtPercent: 5,
  materials: [],
  samples: 2000,
  seed: 1,
};

const percent = (what: string) =>
  z
    .number({ error: `${what} must be a number` })
    .min(0, { error: 'must be at least 0' })
    .max(50, {
      error: 'must be at most 50 %',
    });

/** As a person fills it in. An empty rate is one to fill in by hand; an empty day is a link without an end. */
export const cardFormSchema = z.object({
  title: z.string().trim().min(1, { error: 'must not be empty' }).max(LIMITS.nameLength),
  sampleId: z.string().trim().max(LIMITS.nameLength),
  points: z
    .array(
      z.object({
        label: z.string().trim().min(1, { error: 'must not be empty' }).max(LIMITS.nameLength),
        wavelengthNm: z
          .number({ error: 'must be a number' })
          .positive({ error: 'must be greater than 0 nm' }),
        angleDeg: z
          .number({ error: 'must be a number' })
          .min(0, { error: 'must be at least 0°' })
          .lt(90, { error: 'must be less than 90°' }),
        input: z.enum(polarizations),
      }),
    )
    .min(1),
  signal: z.enum(signalNames),
  ratePercent: percent('the rate error'),
  randomPercent: percent('the random error'),
  indexPercent: percent('the error of n and k'),
  voigtPercent: percent('the error of Q'),
  rates: z.array(
    z.object({
      layerId: z.string(),
      nmPerMin: z
        .string()
        .trim()
        .refine((text) => text === '' || Number(text) > 0, {
          error: 'must be a number greater than 0, or empty',
        }),
    }),
  ),
  bench: z.string().trim().max(LIMITS.noteLength),
  decision: z
    .string()
    .trim()
    .min(1, { error: 'must not be empty: what was decided, and why' })
    .max(LIMITS.noteLength),
  hasLink: z.boolean(),
  lastDay: z
    .string()
    .refine((day) => day === '' || endOfDay(day) > new Date(), { error: 'must be today or later' }),
});

export type CardForm = z.infer<typeof cardFormSchema>;

export function emptyForm({ title, signal, tolerance, document, points }: CardStart): CardForm {
  const { ratePercent, randomPercent, indexPercent, voigtPercent } = tolerance;
  return {
    title,
    sampleId: '',
    points: points.map(({ label, workingPoint: { wavelengthNm, angleDeg, input } }) => ({
      label,
      ...{ wavelengthNm, angleDeg, input },
    })),
    signal,
    ...{ ratePercent, randomPercent, indexPercent, voigtPercent },
    rates: grownLayers(document.layers).map(({ id }) => ({ layerId: id, nmPerMin: '' })),
    bench: '',
    decision: '',
    hasLink: true,
    lastDay: '',
  };
}

export function cardRequest(start: CardStart, form: CardForm): CreateGrowthCard {
  const { title, sampleId, points, signal, rates, bench, decision, hasLink, lastDay } = form;
  const { ratePercent, randomPercent, indexPercent, voigtPercent } = form;
  return {
    title,
    document: start.document,
    points: points.map(({ label, ...asked }, index) => ({
      id: start.points[index]?.id ?? `point-${index + 1}`,
      label,
      workingPoint: { ...(start.points[index] ?? start.points[0]!).workingPoint, ...asked },
    })),
    signal,
    tolerance: { ...start.tolerance, ratePercent, randomPercent, indexPercent, voigtPercent },
    rates: rates
      .filter(({ nmPerMin }) => nmPerMin !== '')
      .map(({ layerId, nmPerMin }) => ({ layerId, nmPerMin: Number(nmPerMin) })),
    sampleId,
    bench,
    decision: { text: decision },
    ...(start.studyId === undefined ? {} : { studyId: start.studyId }),
    ...(start.designId === undefined ? {} : { designId: start.designId }),
    link: hasLink ? { expiresAt: lastDay === '' ? null : endOfDay(lastDay).toISOString() } : null,
  };
}

/** The layers of a film in the order in which they are grown, those of a block once. */
export function grownLayers(items: readonly StackItem[]): StackLayer[] {
  return items.toReversed().flatMap((item) => ('layers' in item ? grownLayers(item.layers) : [item]));
}

/** Midnight after that day in the reader's time zone. */
function endOfDay(day: string): Date {
  const end = new Date(`${day}T00:00:00`);
  end.setDate(end.getDate() + 1);
  return end;
}
