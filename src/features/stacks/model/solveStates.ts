import type { LiveCurveRequest } from '../../../../shared/live.ts';
import type { StripReadings } from '../../../../shared/readingsStrip.ts';
import type { ReadingName, SweepAxis } from '../../../../shared/run.ts';
import { applyAxis } from '../../../../shared/applyAxis.ts';
import { comparedStates, outputFor, readingOf } from '../../../../shared/readings.ts';
import type { LibrarySolveCase, LibrarySolveRequest, SolveResponse } from '../../../../shared/solve.ts';
import type { Polarization, StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import {
  addsIntensities,
  countLayers,
  inMagnetizationState,
  toSolveCase,
} from '../../../../shared/stackCase.ts';
import type { MagnetizationState } from '../../../../shared/stackCase.ts';
import { listLayers } from './items.ts';
import { hasAxes } from './media.ts';
import type { Materials } from './media.ts';

/** Which magnetization states the readings are made of; `given` is always first. */
export function statesFor(readings: readonly ReadingName[]): MagnetizationState[] {
  const compared = readings.map(comparedStates);
  const states: MagnetizationState[] = ['given'];
  if (compared.some(({ zero }) => zero)) states.push('zero');
  if (compared.some(({ reversed }) => reversed)) states.push('reversed');
  return states;
}

type GridAxis = { axis: SweepAxis; grid: readonly number[] };

/** What the page sweeps: one axis, a second one for a map, a third for a family. */
export type Sweep = GridAxis & {
  readings: readonly ReadingName[];
  second?: GridAxis | undefined;
  family?: GridAxis | undefined;
};

/** Points of a sweep over all its axes. */
export function sweepPoints({ grid, second, family }: Sweep): number {
  return grid.length * (second?.grid.length ?? 1) * (family?.grid.length ?? 1);
}

/** Readings of one live curve at most (shared/live.ts). */
const CURVE_READINGS = 8;

/** Whether the sweep is one curve that is computed while somebody drags. Repeats are not spaced evenly once thinned. */
export function isCurve({ axis, grid, second, family, readings }: Sweep): boolean {
  if (second || family || readings.length === 0 || readings.length > CURVE_READINGS) return false;
  return axis.kind !== 'repeat' || grid.length === axis.points;
}

/** One curve, and with it the readings at the working point where they need not go ahead of it. */
export function curveRequest(
  document: StackDocument,
  point: WorkingPoint,
  sweep: Sweep,
  materials: Materials,
): LiveCurveRequest {
  const strip = isQuick(document, materials) && reaches(sweep, point) && sweep.axis.kind !== 'graded';
  return {
    document: { ...document, workingPoint: point },
    axis: { ...sweep.axis, points: sweep.grid.length },
    readings: [...sweep.readings],
    ...(strip ? { strip } : {}),
  };
}

/** Layers, repetitions counted, up to which a curve takes so little that nobody notices that the strip waits for it. */
const QUICK_LAYERS = 200;

/** Sharp layers of isotropic media in coherent light: a point takes microseconds. */
function isQuick(document: StackDocument, materials: Materials): boolean {
  const { incident, layers, substrate, substrateGradedNm } = document;
  const all = listLayers(layers);
  const media = [
    incident,
    substrate,
    ...all.flatMap(({ medium, oxide }) => [medium, ...(oxide ? [oxide.medium] : [])]),
  ];
  return (
    !addsIntensities(document) &&
    !substrateGradedNm &&
    all.every(({ gradedNm }) => !gradedNm) &&
    !media.some((medium) => hasAxes(medium, materials)) &&
    countLayers(layers) <= QUICK_LAYERS
  );
}

/** A working point beyond the swept wavelengths may have no constants, which must not take the curve away. */
function reaches({ axis: { kind, from, to } }: Sweep, { wavelengthNm }: WorkingPoint): boolean {
  if (kind !== 'wavelength') return true;
  return wavelengthNm >= Math.min(from, to) && wavelengthNm <= Math.max(from, to);
}

/**
 * One request for a whole sweep. Over wavelength or angle a case holds the grid; anything else needs a case at each
 * of its values. The states follow each other, each over all points, the first axis innermost.
 */
export function sweepRequest(
  document: StackDocument,
  point: WorkingPoint,
  sweep: Sweep,
): LibrarySolveRequest {
  const start = { ...document, workingPoint: point };
  const films = along(sweep.family, [start]).flatMap((film) => along(sweep.second, [film]));
  const outputs = [...new Set(sweep.readings.flatMap((name) => outputFor(name) ?? []))];
  return {
    cases: statesFor(sweep.readings).flatMap((state) =>
      films
        .flatMap((film) => casesAlong(sweep, state, film))
        .map((one) => (state === 'given' && outputs.length > 0 ? { ...one, outputs } : one)),
    ),
  };
}

/** The film at every value of an axis; as it is where there is none. */
function along(swept: GridAxis | undefined, films: StackDocument[]): StackDocument[] {
  if (!swept) return films;
  return swept.grid.flatMap((value) => films.map((film) => applyAxis(film, swept.axis, value)));
}

function casesAlong(
  { axis, grid }: GridAxis,
  state: MagnetizationState,
  film: StackDocument,
): LibrarySolveCase[] {
  const { wavelengthNm, angleDeg } = film.workingPoint;
  const caseOf = (one: StackDocument, wavelengths: number | number[], angles: number | number[]) =>
    inMagnetizationState(toSolveCase(one, wavelengths, angles), state);
  switch (axis.kind) {
    case 'wavelength':
      return [caseOf(film, [...grid], angleDeg)];
    case 'angle':
      return [caseOf(film, wavelengthNm, [...grid])];
    default:
      return grid.map((value) => caseOf(applyAxis(film, axis, value), wavelengthNm, angleDeg));
  }
}

export type ReadingColumns = Partial<Record<ReadingName, Float64Array>>;

/** The answer to `sweepRequest` as one column a reading, NaN where there is no value. */
export function readSweepResponse(response: SolveResponse, sweep: Sweep): ReadingColumns {
  const states = statesFor(sweep.readings);
  const points = response.results.flatMap((result) => result.points);
  const count = sweepPoints(sweep);
  const at = (state: MagnetizationState, index: number) => {
    const position = states.indexOf(state);
    // A state that no reading needs was not asked for; the reading then does not look at it.
    return points[(position < 0 ? 0 : position) * count + index];
  };
  const columns: ReadingColumns = {};
  for (const name of sweep.readings) {
    columns[name] = Float64Array.from({ length: count }, (_, index) => {
      const [given, zero, reversed] = [at('given', index), at('zero', index), at('reversed', index)];
      return (given && zero && reversed ? readingOf(name, given, zero, reversed) : null) ?? NaN;
    });
  }
  return columns;
}

/** Rotation and ellipticity for the input light, deg; null where the reflected beam has no polarization. */
export function kerrAngles(readings: StripReadings | null, input: Polarization) {
  const rotationDeg = readings?.[input === 'p' ? 'rotationP' : 'rotationS'] ?? null;
  const ellipticityDeg = readings?.[input === 'p' ? 'ellipticityP' : 'ellipticityS'] ?? null;
  return rotationDeg === null || ellipticityDeg === null ? null : { rotationDeg, ellipticityDeg };
}
