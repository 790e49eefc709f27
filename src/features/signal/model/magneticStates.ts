import type { ReadingName } from '../../../../shared/run.ts';
import { readingOf } from '../../../../shared/readings.ts';
import type { LibrarySolveRequest, SolveResponse } from '../../../../shared/solve.ts';
import type {
  StackDocument,
  StackItem,
  WorkingMagnetization,
  WorkingPoint,
} from '../../../../shared/stack.ts';
import { inMagnetizationState, toSolveCase } from '../../../../shared/stackCase.ts';
import type { DescribeMedium } from './filmLayers.ts';

/** A magnetization state of the film that can be compared with another. */
export type MagneticState = { id: string; label: string };

const directions: Record<string, { label: string; m: [number, number, number] }> = {
  '+z': { label: 'polar, +z', m: [0, 0, 1] },
  '-z': { label: 'polar, −z', m: [0, 0, -1] },
  '+x': { label: 'longitudinal, +x', m: [1, 0, 0] },
  '-x': { label: 'longitudinal, −x', m: [-1, 0, 0] },
  '+y': { label: 'transverse, +y', m: [0, 1, 0] },
  '-y': { label: 'transverse, −y', m: [0, -1, 0] },
};

const SWITCHED = 'switched ';

/** The states of a film: as drawn, reversed, one layer switched, or one direction for all that is not fixed. */
export function magneticStates(document: StackDocument, describe: DescribeMedium): MagneticState[] {
  const magnetic = layersOf(document.layers).filter(({ m }) => m !== undefined);
  return [
    { id: 'drawn', label: 'as drawn' },
    { id: 'reversed', label: 'reversed' },
    ...magnetic.map(({ id, medium, position }) => ({
      id: SWITCHED + id,
      label: `only ${describe(medium).name} (layer ${position}) switched`,
    })),
    ...Object.entries(directions).map(([id, { label }]) => ({ id, label })),
  ];
}

function layersOf(items: readonly StackItem[], prefix = '') {
  type Numbered = Exclude<StackItem, { layers: StackItem[] }> & { position: string };
  return items.flatMap((item, index): Numbered[] => {
    const position = `${prefix}${index + 1}`;
    return 'layers' in item ? layersOf(item.layers, `${position}.`) : [{ ...item, position }];
  });
}

/** One request for a step: the film in state A, in state B and with m = 0. */
export function stepRequest(
  document: StackDocument,
  point: WorkingPoint,
  a: string,
  b: string,
): LibrarySolveRequest {
  const caseIn = (state: string) => {
    const switched = state.startsWith(SWITCHED) ? state.slice(SWITCHED.length) : null;
    const film =
      switched === null ? document : { ...document, layers: switchLayer(document.layers, switched) };
    return toSolveCase(film, point.wavelengthNm, point.angleDeg, workingStateOf(state));
  };
  const first = caseIn(a);
  return { cases: [first, caseIn(b), inMagnetizationState(first, 'zero')] };
}

function workingStateOf(state: string): WorkingMagnetization {
  const direction = directions[state];
  if (direction) return { mode: 'direction', m: direction.m };
  return { mode: state === 'reversed' ? 'reversed' : 'drawn' };
}

function switchLayer(items: readonly StackItem[], id: string): StackItem[] {
  return items.map((item): StackItem => {
    if ('layers' in item) return { ...item, layers: switchLayer(item.layers, id) };
    if (item.id !== id || item.m === undefined) return item;
    const [x, y, z] = item.m;
    return { ...item, m: [0 - x, 0 - y, 0 - z] };
  });
}

export type StepRow = { reading: ReadingName; a: number | null; b: number | null; step: number | null };

const stepReadings = [
  'rotationP',
  'ellipticityP',
  'rotationS',
  'ellipticityS',
  'reflectanceP',
  'reflectanceS',
] as const;

/** The readings in both states and what they change by from A to B, from the answer to `stepRequest`. */
export function stepRows(response: SolveResponse): StepRow[] {
  const [a, b, zero] = response.results.map(({ points }) => points[0]);
  if (!a || !b || !zero) return [];
  return stepReadings.map((reading) => {
    const values = [readingOf(reading, a, zero, a), readingOf(reading, b, zero, b)] as const;
    const [first, second] = values;
    return { reading, a: first, b: second, step: first === null || second === null ? null : second - first };
  });
}
