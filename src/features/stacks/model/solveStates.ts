import type { ReadingName, SweepAxis } from '../../../../shared/run.ts';
import { applyAxis } from '../../../../shared/applyAxis.ts';
import { readingDefinitions, readingOf } from '../../../../shared/readings.ts';
import type { LibrarySolveCase, LibrarySolveRequest, SolveResponse } from '../../../../shared/solve.ts';
import type { Polarization, StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { addsIntensities, inMagnetizationState, toSolveCase } from '../../../../shared/stackCase.ts';
import type { MagnetizationState } from '../../../../shared/stackCase.ts';
import { withLayer } from './items.ts';

/** Which magnetization states the readings are made of; `given` is always first. */
export function statesFor(readings: readonly ReadingName[]): MagnetizationState[] {
  const families = new Set(readings.map((name) => readingDefinitions[name].family));
  const states: MagnetizationState[] = ['given'];
  if (families.has('rotation') || families.has('ellipticity')) states.push('zero');
  if (families.has('contrast')) states.push('reversed');
  return states;
}

/** One request for everything the readings strip shows: the film as given, with m = 0 and reversed. */
export function pointRequest(document: StackDocument, point: WorkingPoint): LibrarySolveRequest {
  const given = toSolveCase(document, point.wavelengthNm, point.angleDeg, point.magnetization);
  const cases = (['given', 'zero', 'reversed'] as const).map((state) => inMagnetizationState(given, state));
  if (!addsIntensities(document)) cases[0] = { ...given, outputs: ['ceiling'] };
  return { cases };
}

export type PointReadings = Partial<Record<ReadingName, number | null>>;

/** What the strip shows, and the share of the ceiling. */
const stripNames = [
  'rotationP',
  'ellipticityP',
  'rotationS',
  'ellipticityS',
  'reflectanceP',
  'reflectanceS',
  'crossSp',
  'crossPs',
  'contrastP',
  'contrastS',
  'ceilingShare',
] as const;

/** The answer to `pointRequest`. */
export function readPointResponse(response: SolveResponse): PointReadings {
  const [given, zero, reversed] = response.results.map((result) => result.points[0]);
  if (!given || !zero || !reversed) return {};
  return Object.fromEntries(stripNames.map((name) => [name, readingOf(name, given, zero, reversed)]));
}

export type Sweep = { axis: SweepAxis; grid: readonly number[]; readings: readonly ReadingName[] };

/**
 * One request for a whole sweep. Over wavelength or angle a case holds the grid; a thickness needs a case at each
 * of its values. The states follow each other, each over the whole grid.
 */
export function sweepRequest(
  document: StackDocument,
  point: WorkingPoint,
  sweep: Sweep,
): LibrarySolveRequest {
  const { axis, grid } = sweep;
  return {
    cases: statesFor(sweep.readings).flatMap((state) => casesAlong(axis, grid, state, document, point)),
  };
}

function casesAlong(
  axis: SweepAxis,
  grid: readonly number[],
  state: MagnetizationState,
  document: StackDocument,
  point: WorkingPoint,
): LibrarySolveCase[] {
  const caseOf = (film: StackDocument, wavelengths: number | number[], angles: number | number[]) =>
    inMagnetizationState(toSolveCase(film, wavelengths, angles, point.magnetization), state);
  switch (axis.kind) {
    case 'wavelength':
      return [caseOf(document, [...grid], point.angleDeg)];
    case 'angle':
      return [caseOf(document, point.wavelengthNm, [...grid])];
    case 'thickness':
      return grid.map((thicknessNm) =>
        caseOf(withLayer(document, axis.layerId, { thicknessNm }), point.wavelengthNm, point.angleDeg),
      );
    default:
      return grid.map((value) => {
        const film = applyAxis({ ...document, workingPoint: point }, axis, value);
        return inMagnetizationState(toSolveCase(film, point.wavelengthNm, point.angleDeg), state);
      });
  }
}

export type ReadingColumns = Partial<Record<ReadingName, Float64Array>>;

/** The answer to `sweepRequest` as one column a reading, NaN where there is no value. */
export function readSweepResponse(response: SolveResponse, sweep: Sweep): ReadingColumns {
  const states = statesFor(sweep.readings);
  const points = response.results.flatMap((result) => result.points);
  const count = sweep.grid.length;
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
export function kerrAngles(readings: PointReadings | null, input: Polarization) {
  const rotationDeg = readings?.[input === 'p' ? 'rotationP' : 'rotationS'] ?? null;
  const ellipticityDeg = readings?.[input === 'p' ? 'ellipticityP' : 'ellipticityS'] ?? null;
  return rotationDeg === null || ellipticityDeg === null ? null : { rotationDeg, ellipticityDeg };
}
