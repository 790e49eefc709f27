import type { CapDesign, CapOutcome, CapPointCurves } from '../../../shared/capDesign.ts';
import type { PointReadings } from '../../../shared/designPoint.ts';
import { isSeen, signalOf } from '../demands.ts';
import type { CapCurves } from './capCurves.ts';
import type { Band, CapSamples } from './capSamples.ts';
import { windowsOf } from './capWindows.ts';
import type { Window } from './capWindows.ts';
import { obstacleOf, reasonFor } from './capWords.ts';
import { weakestPoint } from './weakestPoint.ts';

/**
 * Everything that the chooser shows of one candidate.
 *
 * @param bare |signal| without a cap at each working point
 */
export function capOutcome(
  design: CapDesign,
  curves: CapCurves,
  nm: number[],
  samples: CapSamples,
  bare: readonly (number | null)[],
): CapOutcome {
  const readings = curves.nominal(nm);
  const slopes = curves.slopes(nm);
  const points = design.points.map(({ id }, point) =>
    pointCurves(id, readings[point]!, slopes[point]!, samples.band(point), design, bare[point] ?? null),
  );
  const isMet = nm.map((one, position) =>
    curves.isMet(
      one,
      readings.map((list) => list[position]!),
      slopes.map((list) => list[position]!),
    ),
  );
  const isMetAt = (one: number) =>
    curves.isMet(
      one,
      curves.nominal([one]).map((list) => list[0]!),
      curves.slopes([one]).map((list) => list[0]!),
    );
  const computed: Computed = {
    design,
    curves,
    nm,
    bare,
    readings,
    points,
    yields: samples.yields(),
    isMet,
    windows: windowsOf(nm, isMet, isMetAt),
  };
  const isRobust = computed.yields.map((share, at) => share >= design.leastYield && isMet[at]!);
  const position = bestPosition(computed, isRobust);
  const { id, label } = curves.candidate;
  return {
    id,
    label,
    points,
    yield: computed.yields,
    windows: computed.windows,
    robustWindows: windowsOf(nm, isRobust),
    best: position === null ? null : bestOf(computed, position, isRobust[position]!),
    obstacle: position === null ? obstacleOf(design, nm, curves.leastNm(), readings, slopes) : null,
  };
}

/** One candidate at all thicknesses and working points. */
type Computed = {
  design: CapDesign;
  curves: CapCurves;
  nm: number[];
  /** |signal| without a cap, by working point. */
  bare: readonly (number | null)[];
  readings: PointReadings[][];
  points: CapPointCurves[];
  yields: number[];
  isMet: boolean[];
  windows: Window[];
};

function pointCurves(
  pointId: string,
  readings: PointReadings[],
  slopes: (number | null)[],
  band: Band,
  design: CapDesign,
  bare: number | null,
): CapPointCurves {
  const signal = readings.map((one) => signalOf(one, design.signal));
  return {
    pointId,
    rotationDeg: readings.map(({ rotationDeg }) => rotationDeg),
    ellipticityDeg: readings.map(({ ellipticityDeg }) => ellipticityDeg),
    amplitude: readings.map(({ amplitude }) => amplitude),
    contrast: readings.map(({ contrast }) => contrast),
    reflectance: readings.map(({ reflectance }) => reflectance),
    ceilingShare: readings.map(({ ceilingShare }) => ceilingShare),
    signal,
    signalLow: band.low,
    signalMedian: band.median,
    signalHigh: band.high,
    slopePercentPerNm: slopes,
    costPercent: signal.map((one) => (one === null || !isSeen(bare) ? null : 100 * (1 - one / bare))),
  };
}

function weakestAt({ points, bare }: Computed, position: number): ReturnType<typeof weakestPoint> {
  return weakestPoint(
    points.map(({ signalLow }) => signalLow[position] ?? null),
    bare,
  );
}

/**
 * The robust thickness of greatest worth at its weakest working point; without any, the one that the most films meet. Null where
 * there is no signal to choose for.
 */
function bestPosition(computed: Computed, isRobust: boolean[]): number | null {
  const robust = isRobust.some(Boolean);
  let best: number | null = null;
  let bestScore = -Infinity;
  computed.isMet.forEach((met, position) => {
    if (!(robust ? isRobust[position] : met)) return;
    if (computed.points.every(({ signal }) => signal[position] === null)) return;
    const score = robust ? weakestAt(computed, position).worth : computed.yields[position]!;
    if (score > bestScore) [best, bestScore] = [position, score];
  });
  return best;
}

function bestOf(computed: Computed, position: number, isRobust: boolean): NonNullable<CapOutcome['best']> {
  const { design, readings, points, windows } = computed;
  const thicknessNm = computed.nm[position]!;
  const yieldThere = computed.yields[position]!;
  const rows = points.map((curve, point) => ({
    pointId: curve.pointId,
    readings: readings[point]![position]!,
    signal: curve.signal[position] ?? 0,
    signalLow: curve.signalLow[position] ?? 0,
    signalHigh: curve.signalHigh[position] ?? 0,
    costPercent: curve.costPercent[position] ?? null,
    slopePercentPerNm: curve.slopePercentPerNm[position] ?? null,
  }));
  const weakest = weakestAt(computed, position).point;
  const reason = reasonFor(design, {
    nm: thicknessNm,
    yield: yieldThere,
    isRobust,
    window: windows.find(({ fromNm, toNm }) => thicknessNm >= fromNm && thicknessNm <= toNm),
    worst: { label: design.points[weakest]!.label, ...rows[weakest]! },
  });
  return { thicknessNm, reason, yield: yieldThere, points: rows };
}

/** Candidates from the best to the worst: robust ones first, then by how much of the bare signal is left. */
export function rankCandidates(
  { leastYield }: CapDesign,
  outcomes: CapOutcome[],
  bare: readonly (number | null)[],
): string[] {
  const score = ({ best }: CapOutcome): [number, number] => {
    if (!best) return [-1, 0];
    const { worth } = weakestPoint(
      best.points.map(({ signalLow }) => signalLow),
      bare,
    );
    return best.yield >= leastYield ? [1, worth] : [0, best.yield];
  };
  return outcomes
    .map((outcome, order) => ({ id: outcome.id, order, score: score(outcome) }))
    .sort((a, b) => b.score[0] - a.score[0] || b.score[1] - a.score[1] || a.order - b.order)
    .map(({ id }) => id);
}
