import type { LiveCurveRequest } from '../../shared/live.ts';
import type { CreateRun } from '../../shared/run.ts';
import type { LibrarySolveRequest } from '../../shared/solve.ts';
import { inMagnetizationState, toSolveCase } from '../../shared/stackCase.ts';
import type { StackDocument, StackLayer } from '../../shared/stack.ts';

type Wanted = Omit<CreateRun, 'groupId'>;

// Constants as in the kernel's bench: their values do not matter to the time.
const plain = (id: string, n: number, k: number, thicknessNm: number): StackLayer => ({
  id,
  medium: { index: [n, k] },
  thicknessNm,
});
const cobalt = (id: string, thicknessNm: number): StackLayer => ({
  id,
  medium: { index: [2.25, 4.07], voigt: [0.03, 0.01] },
  thicknessNm,
  m: [0, 0, 1],
});

const documentOf = (layers: StackLayer[]): StackDocument => ({
  incident: { index: 1 },
  layers,
  substrate: { index: [3.88, 0.02] },
  workingPoint: { wavelengthNm: 633, angleDeg: 45, input: 'p', magnetization: { mode: 'drawn' } },
});

/** air / Pt 3 / Co 1 / Pt 5 / Ta 5 / SiO2 100 / Si */
const film = documentOf([
  plain('cap', 2.33, 4.14, 3),
  cobalt('magnet', 1),
  plain('spacer', 2.33, 4.14, 5),
  plain('seed', 3.5, 3.6, 5),
  plain('oxide', 1.457, 0, 100),
]);

const tenLayers = documentOf(
  Array.from({ length: 5 }, (_, pair) => [
    cobalt(`co${pair}`, 0.6),
    plain(`pt${pair}`, 2.33, 4.14, 1.2),
  ]).flat(),
);

const wavelengths = (points: number) =>
  ({ kind: 'wavelength', from: 400, to: 800, points, spacing: 'linear' }) as const;
const angles = (points: number) => ({ kind: 'angle', from: 0, to: 85, points, spacing: 'linear' }) as const;

/** 2,000 points of a stack of ten layers, with all readings that a run usually stores. */
export const sweepRun: Wanted = { document: tenLayers, axis: wavelengths(2_000) };

/** 1,000 x 1,000 points. */
export const mapRun: Wanted = {
  document: film,
  axis: wavelengths(1_000),
  second: angles(1_000),
  readings: ['rotationP', 'ellipticityP', 'reflectanceP'],
};

/** What the readings strip asks at each change: the film as given, without magnetization and reversed. */
export function stripRequest(angleDeg: number): LibrarySolveRequest {
  const given = toSolveCase(film, 633, angleDeg);
  return {
    cases: (['given', 'zero', 'reversed'] as const).map((state) => ({
      ...inMagnetizationState(given, state),
      outputs: ['mueller', 'faraday', 'ceiling'],
    })),
  };
}

/** What the plot asks while the cap is dragged. */
export function curveRequest(capNm: number): LiveCurveRequest {
  const layers = film.layers.map((layer) => (layer.id === 'cap' ? plain('cap', 2.33, 4.14, capNm) : layer));
  return {
    document: { ...film, layers },
    axis: wavelengths(200),
    readings: ['rotationP', 'ellipticityP', 'reflectanceP'],
  };
}
