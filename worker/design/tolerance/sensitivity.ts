import type { DesignPoint, PointReadings } from '../../../shared/designPoint.ts';
import { materialKeyOf } from '../../../shared/designPoint.ts';
import { toComplex } from '../../../shared/complex.ts';
import { layerNames } from '../../../shared/layerNames.ts';
import { foldDegrees } from '../../../shared/units.ts';
import type { StackDocument, StackMedium } from '../../../shared/stack.ts';
import type { Sensitivity, SensitivityAnswer } from '../../../shared/toleranceDesign.ts';
import type { ResolvableMaterial } from '../../dispersion/resolveCase.ts';
import { materialKey } from '../../sweep/sweepInput.ts';
import { drawnLayers } from '../expandBlocks.ts';
import type { FilmChange } from '../filmSolver.ts';
import { FilmSolver, UNCHANGED } from '../filmSolver.ts';
import type { ConstantFactors } from '../frozenFilm.ts';
import { freezeDocument, isVacuumOrAir } from '../frozenFilm.ts';
import { leastThicknesses } from '../leastThicknesses.ts';
import { mediaBeside } from '../mediaBeside.ts';

/** Step of a thickness, nm: the readings bend over nanometres, rounding is at 1e-13. */
const STEP_NM = 1e-3;
/** Relative step of a constant, and the step itself of one that is 0. */
const STEP_FACTOR = 1e-4;

type Derivative = Sensitivity['derivative'];

/**
 * How much every reading changes with every thickness and constant: fourth-order central differences
 * (f(-2h) - 8 f(-h) + 8 f(h) - f(2h)) / 12h, Abramowitz and Stegun, table 25.2; at the least thickness that a layer can have, and of a k of 0,
 * a one-sided difference of second order.
 *
 * @param materials by id and version, all that the document names
 * @throws ResolutionError when a material is not known at a working point
 */
export function sensitivities(
  document: StackDocument,
  points: readonly DesignPoint[],
  materials: readonly ResolvableMaterial[],
): SensitivityAnswer {
  const known = new Map(materials.map((material) => [materialKey(material), material]));
  const names = shortNames(materials);
  const answer: SensitivityAnswer = { readings: [], sensitivities: [] };
  for (const { id: pointId, workingPoint } of points) {
    const film = { ...document, workingPoint };
    const solver = new FilmSolver(film, known, { contrast: true, ceiling: true });
    answer.readings.push({ pointId, readings: solver.readings(UNCHANGED) });
    answer.sensitivities.push(
      ...thicknessSensitivities(film, solver, names).map((one) => ({ pointId, ...one })),
      ...constantSensitivities(freezeDocument(film, known), film, solver, names).map((one) => ({
        pointId,
        ...one,
      })),
    );
  }
  return answer;
}

type OneSensitivity = Omit<Sensitivity, 'pointId'>;

function thicknessSensitivities(
  film: StackDocument,
  solver: FilmSolver,
  names: ReadonlyMap<string, string>,
): OneSensitivity[] {
  const layers = drawnLayers(film.layers);
  const least = leastThicknesses(film);
  const called = layerNames(layers, (medium) => mediumLabel(medium, names));
  return layers.map((layer) => {
    const at = (shiftNm: number) =>
      solver.readings({
        thicknessNm: new Map([[layer.id, layer.thicknessNm + shiftNm]]),
        constants: null,
      });
    return {
      parameter: 'thickness',
      of: layer.id,
      label: `thickness of ${called.get(layer.id)!}`,
      value: layer.thicknessNm,
      derivative:
        layer.thicknessNm - (least.get(layer.id) ?? 0) < 2 * STEP_NM
          ? forward(at, STEP_NM)
          : central(at, STEP_NM),
    };
  });
}

/** Of every material once, however many layers it has; typed tensors and mixtures have no n, k and Q of their own. */
function constantSensitivities(
  frozen: StackDocument,
  film: StackDocument,
  solver: FilmSolver,
  names: ReadonlyMap<string, string>,
): OneSensitivity[] {
  const media = new Map<string, { frozen: StackMedium; drawn: StackMedium }>();
  const drawn = [...drawnLayers(film.layers).map(({ medium }) => medium), ...mediaBeside(film)];
  const solved = [...drawnLayers(frozen.layers).map(({ medium }) => medium), ...mediaBeside(frozen)];
  drawn.forEach((medium, position) => {
    const key = materialKeyOf(medium);
    const before = media.get(key);
    const now = { frozen: solved[position]!, drawn: medium };
    // The layer that is magnetized has Q, another of the same material may not.
    if (!before || before.frozen.voigt === undefined) media.set(key, now);
  });
  return [...media].flatMap(([of, { frozen: medium, drawn: asDrawn }]) => {
    const label = mediumLabel(asDrawn, names);
    const at = (change: (step: number) => ConstantFactors) => (step: number) => {
      const film: FilmChange = { thicknessNm: new Map(), constants: new Map([[of, change(step)]]) };
      return solver.readings(film);
    };
    const isIncident = of === materialKeyOf(film.incident);
    const stepOfZero = STEP_FACTOR / Math.max(1, thicknessInWavelengths(film, of));
    return parametersOf(medium, !isIncident).map(({ parameter, value, change }): OneSensitivity => ({
      parameter,
      of,
      label: `${parameter} of ${label}`,
      value,
      derivative: derivativeBy(at(change), parameter, value, stepOfZero),
    }));
  });
}

type Parameter = {
  parameter: 'n' | 'k' | 'Re Q' | 'Im Q';
  value: number;
  change: (step: number) => ConstantFactors;
};

/** 4 pi d / wavelength of the thickest part of a medium: how soon a k of it shows. A slab is soon opaque. */
function thicknessInWavelengths(film: StackDocument, of: string): number {
  const { layers, substrate, backside, workingPoint } = film;
  const parts = drawnLayers(layers).map(({ medium, thicknessNm }) => ({ medium, thicknessNm }));
  if (backside) parts.push({ medium: substrate, thicknessNm: backside.thicknessNm });
  const own = parts.filter(({ medium }) => materialKeyOf(medium) === of).map((part) => part.thicknessNm);
  return (4 * Math.PI * Math.max(0, ...own)) / workingPoint.wavelengthNm;
}

/** @param at the readings at a relative step of the constant, of one that is 0 at the step itself */
function derivativeBy(
  at: (step: number) => PointReadings,
  parameter: Parameter['parameter'],
  value: number,
  stepOfZero: number,
): Derivative {
  if (value !== 0) return over(central(at, STEP_FACTOR), value);
  // Below 0 a medium would amplify.
  return parameter === 'k' ? forward(at, stepOfZero) : central(at, STEP_FACTOR);
}

/**
 * The constants of a medium given as one index, of a uniaxial one for both indices together; vacuum and air have none.
 *
 * @param mayAbsorb whether the film can be solved with a k of this medium
 */
function parametersOf(medium: StackMedium, mayAbsorb: boolean): Parameter[] {
  const { index, voigt } = medium;
  if (index === undefined || isVacuumOrAir(medium) || (typeof index === 'object' && 'samples' in index))
    return [];
  const [n, k] = toComplex(index);
  const same: ConstantFactors = { n: 1, k: 1, q: [1, 1] };
  const added = (step: { k?: number; q?: [number, number] }) => ({
    ...same,
    added: { k: 0, q: [0, 0] as [number, number], ...step },
  });
  const parameters: Parameter[] = [
    { parameter: 'n', value: n, change: (step) => ({ ...same, n: 1 + step }) },
  ];
  if (mayAbsorb) {
    const change = (step: number) => (k === 0 ? added({ k: step }) : { ...same, k: 1 + step });
    parameters.push({ parameter: 'k', value: k, change });
  }
  if (voigt !== undefined && !(typeof voigt === 'object' && 'samples' in voigt)) {
    const [re, im] = toComplex(voigt);
    parameters.push(
      {
        parameter: 'Re Q',
        value: re,
        change: (step) => (re === 0 ? added({ q: [step, 0] }) : { ...same, q: [1 + step, 1] }),
      },
      {
        parameter: 'Im Q',
        value: im,
        change: (step) => (im === 0 ? added({ q: [0, step] }) : { ...same, q: [1, 1 + step] }),
      },
    );
  }
  return parameters;
}

function central(at: (step: number) => PointReadings, h: number): Derivative {
  const values = [-2, -1, 1, 2].map((steps) => at(steps * h));
  return combine(values, [1, -8, 8, -1], 12 * h);
}

function forward(at: (step: number) => PointReadings, h: number): Derivative {
  return combine([at(0), at(h), at(2 * h)], [-3, 4, -1], 2 * h);
}

function combine(values: PointReadings[], weights: number[], divisor: number): Derivative {
  const entry = (name: keyof Derivative) => {
    const first = values[0]![name];
    let sum = 0;
    for (const [i, readings] of values.entries()) {
      const value = readings[name];
      if (value === null || first === null) return null;
      // Weights add up to 0. Rotations of 90 and -90 deg are the same.
      sum += weights[i]! * (name === 'rotationDeg' ? foldDegrees(value - first) : value);
    }
    return sum / divisor;
  };
  return {
    rotationDeg: entry('rotationDeg'),
    ellipticityDeg: entry('ellipticityDeg'),
    amplitude: entry('amplitude'),
    contrast: entry('contrast'),
    reflectance: entry('reflectance'),
  };
}

function over(derivative: Derivative, value: number): Derivative {
  const divided = (entry: number | null) => (entry === null ? null : entry / value);
  return {
    rotationDeg: divided(derivative.rotationDeg),
    ellipticityDeg: divided(derivative.ellipticityDeg),
    amplitude: divided(derivative.amplitude),
    contrast: divided(derivative.contrast),
    reflectance: divided(derivative.reflectance),
  };
}

/** Materials by their formulas; those that share one by their names. */
function shortNames(materials: readonly ResolvableMaterial[]): Map<string, string> {
  const isShared = ({ id, formula }: ResolvableMaterial) =>
    materials.some((other) => other.id !== id && other.formula === formula);
  return new Map(materials.map((one) => [one.id, one.formula && !isShared(one) ? one.formula : one.name]));
}

function mediumLabel(medium: StackMedium, names: ReadonlyMap<string, string>): string {
  if (medium.material !== undefined) return names.get(medium.material) ?? medium.material;
  return medium.label ?? 'a medium given by numbers';
}
