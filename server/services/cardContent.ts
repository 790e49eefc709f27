import type { z } from 'zod';
import type { DesignPoint, SignalName } from '../../shared/designPoint.ts';
import type { CardReading, createGrowthCardSchema } from '../../shared/growthCard.ts';
import { readingDefinitions } from '../../shared/readings.ts';
import type { ReadingName, UsedMaterial } from '../../shared/run.ts';
import type { StackDocument } from '../../shared/stack.ts';
import type { ToleranceDesign, ToleranceResult } from '../../shared/toleranceDesign.ts';
import { drawnLayers } from '../../worker/design/expandBlocks.ts';
import { ComputeError } from '../../worker/sweep/computeError.ts';
import type { Dependencies, MakeCard } from '../dependencies.ts';
import { Refusal, invalid } from '../errors.ts';
import type { GrowthCardContent } from '../models/growthCard.ts';
import { cardAssumptions } from './cardAssumptions.ts';
import { cardCautions } from './cardCautions.ts';
import { cardLayers } from './cardLayers.ts';
import { cardSources } from './cardSources.ts';
import { takeDesignSnapshot } from './designSnapshot.ts';
import type { DesignSnapshot } from './designSnapshot.ts';
import { loadRunMaterials } from './runMaterials.ts';

type WantedCard = z.output<typeof createGrowthCardSchema>;

type Compute = Pick<Dependencies, 'materials' | 'pool'>;

/** The tolerance question that a card answers, with what its answer rests on. */
export type CardQuestion = { design: ToleranceDesign; snapshot: DesignSnapshot };

type Watch = { signal: AbortSignal; report: Parameters<MakeCard>[1] };

/** A card is made while somebody waits for it, and sees how far it is. */
const PATIENCE_MS = 300_000;

/** @throws Refusal 422 with issues at the fields of the request */
export async function askCardQuestion(
  compute: Compute,
  groupId: string,
  wanted: WantedCard,
): Promise<CardQuestion> {
  refuseUnknownRates(wanted);
  const { document, points, signal, tolerance } = wanted;
  const question: ToleranceDesign = {
    ...{ kind: 'tolerance', document, points, tolerance, signal, demands: {} },
  };
  const snapshot = await takeDesignSnapshot(compute, groupId, question).catch((error: unknown) => {
    throw withCardPaths(error);
  });
  const { design } = snapshot.input;
  if (design.kind !== 'tolerance') throw new Error(`a tolerance question was kept as ${design.kind}`);
  return { design, snapshot };
}

/**
 * What a card says of a film: the answer for its working points, and what it rests on.
 *
 * @throws Refusal 422 when it takes longer than five minutes; ComputeError `cancelled` when the signal aborts
 */
export async function takeCardContent(
  { materials: store, pool }: Compute,
  wanted: WantedCard,
  { design, snapshot }: CardQuestion,
  watch: Watch,
): Promise<Omit<GrowthCardContent, 'url'>> {
  const { tolerance, rates, bench } = wanted;
  const { document, points } = design;
  const answers = await answer(pool, { design, materials: await loadRunMaterials(store, snapshot) }, watch);
  return {
    ...{ document, tolerance, bench },
    layers: cardLayers(document, snapshot.materials, tolerance, rates),
    readings: points.map((point) => cardReading(point, wanted, answers)),
    assumptions: cardAssumptions(design, snapshot.materials),
    sources: cardSources(document, snapshot.materials),
    cautions: cardCautions(formulasOf(document, snapshot.materials), bench),
  };
}

async function answer(
  pool: Dependencies['pool'],
  work: Parameters<typeof pool.bands>[0],
  { signal, report }: Watch,
): Promise<Answers> {
  const late = AbortSignal.timeout(PATIENCE_MS);
  const onProgress = (done: number, total: number) => report({ step: 'bands', done, total });
  onProgress(0, work.design.tolerance.samples);
  try {
    return await pool.bands(work, { signal: AbortSignal.any([signal, late]), onProgress });
  } catch (error) {
    if (error instanceof ComputeError && late.aborted) {
      const message = `the bands took longer than ${PATIENCE_MS / 60_000} minutes: ask fewer samples or working points`;
      throw invalid([{ path: 'tolerance.samples', message }]);
    }
    throw error;
  }
}

type Answers = ToleranceResult['points'];

type Shown = {
  of: SignalName | 'reflectance';
  key: keyof Answers[number]['distributions'];
  name: ReadingName;
};

/** What is read at one working point: the signal that counts first. */
function cardReading(point: DesignPoint, { signal }: WantedCard, answers: Answers): CardReading {
  const found = answers.find(({ pointId }) => pointId === point.id);
  if (!found) throw new Error(`the working point ${point.id} has no answer`);
  const isP = point.workingPoint.input === 'p';
  const usual: Shown[] = [
    { of: 'rotation', key: 'rotationDeg', name: isP ? 'rotationP' : 'rotationS' },
    { of: 'ellipticity', key: 'ellipticityDeg', name: isP ? 'ellipticityP' : 'ellipticityS' },
    { of: 'amplitude', key: 'amplitude', name: isP ? 'crossSp' : 'crossPs' },
    { of: 'reflectance', key: 'reflectance', name: isP ? 'reflectanceP' : 'reflectanceS' },
  ];
  const contrast: Shown = { of: 'contrast', key: 'contrast', name: isP ? 'contrastP' : 'contrastS' };
  const all = signal === 'contrast' ? [contrast, ...usual] : usual;
  const shown = [...all.filter((one) => one.of === signal), ...all.filter((one) => one.of !== signal)];
  return {
    pointId: point.id,
    label: point.label,
    conditions: conditionsOf(point),
    readings: shown.map(({ key, name }) => {
      const { label, unit } = readingDefinitions[name];
      const [, low, , high] = found.distributions[key]?.quantiles ?? [];
      return { label, unit, nominal: found.nominal[key], low: low ?? null, high: high ?? null };
    }),
  };
}

function conditionsOf({ workingPoint }: DesignPoint): string {
  const { wavelengthNm, angleDeg, input, magnetization } = workingPoint;
  const m = {
    drawn: 'm as drawn',
    reversed: 'm reversed',
    direction: `m along (${magnetization.mode === 'direction' ? magnetization.m.join(', ') : ''})`,
  }[magnetization.mode];
  return `${wavelengthNm} nm, ${angleDeg}° from the normal, ${input} light, ${m}`;
}

/** Formulas of the materials, and what people called constants that they typed in. */
function formulasOf(document: StackDocument, materials: readonly UsedMaterial[]): string[] {
  const media = [document.substrate, ...drawnLayers(document.layers).map(({ medium }) => medium)];
  return [...materials.map(({ formula }) => formula), ...media.flatMap(({ label }) => label ?? [])];
}

function refuseUnknownRates({ document, rates }: WantedCard): void {
  const known = new Set(drawnLayers(document.layers).map(({ id }) => id));
  const issues = rates.flatMap(({ layerId }, position) =>
    known.has(layerId)
      ? []
      : [{ path: `rates[${position}].layerId`, message: `the film has no layer ${layerId}` }],
  );
  if (issues.length > 0) throw invalid(issues);
}

/** The request of a card holds the question's fields without the `input.` of a design's. */
function withCardPaths(error: unknown): unknown {
  if (!(error instanceof Refusal) || !error.issues) return error;
  const issues = error.issues.map(({ path, message }) => ({ path: path.replace(/^input\./, ''), message }));
  return new Refusal(error.status, error.code, error.message, issues);
}
