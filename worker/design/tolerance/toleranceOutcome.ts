import type { PointReadings } from '../../../shared/designPoint.ts';
import type { Distribution, ToleranceDesign, ToleranceResult } from '../../../shared/toleranceDesign.ts';
import type { ResolvableMaterial } from '../../dispersion/resolveCase.ts';
import { materialKey } from '../../sweep/sweepInput.ts';
import type { DemandName } from '../demands.ts';
import { failedDemands } from '../demands.ts';
import { FilmSolver, UNCHANGED } from '../filmSolver.ts';
import { ONE_SIGMA, TWO_SIGMA, quantileOf } from '../quantiles.ts';
import type { ToleranceSamples } from './toleranceSamples.ts';

const BINS = 41;

/** What comes of all samples, derivatives apart. */
export type ToleranceOutcome = Omit<ToleranceResult, 'sensitivities'>;

export function toleranceOutcome(
  design: ToleranceDesign,
  materials: readonly ResolvableMaterial[],
  samples: ToleranceSamples,
): ToleranceOutcome {
  const { yields, byDemand } = yieldsOf(design, samples);
  return {
    kind: 'tolerance',
    points: bandsOutcome(design, materials, samples),
    yield: yields,
    byDemand,
    samples: design.tolerance.samples,
    seed: design.tolerance.seed,
  };
}

/** The readings of the film as drawn and how those of the samples are spread. */
export function bandsOutcome(
  design: ToleranceDesign,
  materials: readonly ResolvableMaterial[],
  samples: ToleranceSamples,
): ToleranceResult['points'] {
  const known = new Map(materials.map((material) => [materialKey(material), material]));
  const nominal = design.points.map(({ workingPoint }) =>
    new FilmSolver({ ...design.document, workingPoint }, known, { contrast: true, ceiling: true }).readings(
      UNCHANGED,
    ),
  );
  return pointOutcomes(design, nominal, samples);
}

function pointOutcomes(
  { points }: ToleranceDesign,
  nominal: PointReadings[],
  samples: ToleranceSamples,
): ToleranceResult['points'] {
  return points.map(({ id }, point) => ({
    pointId: id,
    nominal: nominal[point]!,
    distributions: {
      rotationDeg: distributionOf(samples.column(point, 'rotationDeg')),
      ellipticityDeg: distributionOf(samples.column(point, 'ellipticityDeg')),
      amplitude: distributionOf(samples.column(point, 'amplitude')),
      contrast: distributionOf(samples.column(point, 'contrast')),
      reflectance: distributionOf(samples.column(point, 'reflectance')),
    },
  }));
}

/** @param column NaN where the reading does not exist; null when it never does */
export function distributionOf(column: Float64Array): Distribution | null {
  const sorted = column.filter((value) => !Number.isNaN(value)).sort();
  const count = sorted.length;
  if (count === 0) return null;
  const mean = sorted.reduce((sum, value) => sum + value, 0) / count;
  const squares = sorted.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  const [from, to] = [sorted[0]!, sorted[count - 1]!];
  const counts = new Array<number>(BINS).fill(0);
  const width = (to - from) / BINS;
  for (const value of sorted) {
    const bin = width === 0 ? 0 : Math.min(BINS - 1, Math.floor((value - from) / width));
    counts[bin]! += 1;
  }
  const shares = [TWO_SIGMA.low, ONE_SIGMA.low, 0.5, ONE_SIGMA.high, TWO_SIGMA.high];
  return {
    mean,
    deviation: count > 1 ? Math.sqrt(squares / (count - 1)) : 0,
    quantiles: shares.map((share) => quantileOf(sorted, share)),
    histogram: { from, to, counts },
    samples: count,
  };
}

function yieldsOf(
  { points, demands, tolerance: { samples: count } }: ToleranceDesign,
  samples: ToleranceSamples,
): { yields: ToleranceResult['yield']; byDemand: ToleranceResult['byDemand'] } {
  const asked = (Object.entries(demands) as [DemandName, number | undefined][]).flatMap(([name, limit]) =>
    limit === undefined ? [] : [name],
  );
  if (asked.length === 0) return { yields: null, byDemand: [] };
  const met = new Map(asked.map((name) => [name, 0]));
  let allMet = 0;
  for (let sample = 0; sample < count; sample += 1) {
    const failed = new Set(
      points.flatMap((_, point) => failedDemands(readingsAt(samples, point, sample), demands)),
    );
    if (failed.size === 0) allMet += 1;
    for (const name of asked) if (!failed.has(name)) met.set(name, met.get(name)! + 1);
  }
  return {
    yields: { share: allMet / count, ...wilsonInterval(allMet, count) },
    byDemand: asked.map((demand) => ({ demand, share: met.get(demand)! / count })),
  };
}

function readingsAt(samples: ToleranceSamples, point: number, sample: number): PointReadings {
  const at = (name: Parameters<ToleranceSamples['column']>[1]) => {
    const value = samples.column(point, name)[sample]!;
    return Number.isNaN(value) ? null : value;
  };
  return {
    rotationDeg: at('rotationDeg'),
    ellipticityDeg: at('ellipticityDeg'),
    amplitude: at('amplitude'),
    contrast: at('contrast'),
    reflectance: at('reflectance') ?? 0,
    ceilingShare: null,
  };
}

/** 95 % interval of a share: E. B. Wilson, J. Am. Stat. Assoc. 22, 209 (1927). */
export function wilsonInterval(met: number, count: number): { low: number; high: number } {
  const z = 1.959964;
  const share = met / count;
  const centre = share + (z * z) / (2 * count);
  const half = z * Math.sqrt((share * (1 - share)) / count + (z * z) / (4 * count * count));
  const scale = 1 + (z * z) / count;
  return { low: Math.max(0, (centre - half) / scale), high: Math.min(1, (centre + half) / scale) };
}
