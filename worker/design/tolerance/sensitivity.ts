import type { DesignPoint, PointReadings } from '../../../shared/designPoint.ts';
import { materialKeyOf } from '../../../shared/designPoint.ts';
import { toComplex } from '../../../shared/complex.ts';
import { layerNames } from '../../../shared/layerNames.ts';
import { foldDegrees } from '../../../shared/units.ts';
import type { StackDocument, StackLayer, StackMedium } from '../../../shared/stack.ts';
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
/** Relative step of a constant, and the step itself of one so small that a share of it would drown in rounding. */
const STEP_FACTOR = 1e-4;

type Derivative = Sensitivity['derivative'];

/**
 * How much every reading changes with every thickness and constant: fourth-order central differences
 * (f(-2h) - 8 f(-h) + 8 f(h) - f(2h)) / 12h, Abramowitz and Stegun, table 25.2; at the least thickness that a layer can have, and of a k near 0,
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
  const answer: SensitivityAnswer = { readings: [], sensitivities: [] };
  for (const point of points) {
    const film = new SensitiveFilm(document, point, materials);
    answer.readings.push({ pointId: point.id, readings: film.readings });
    answer.sensitivities.push(...film.derivatives(0, film.count));
  }
  return answer;
}

/** Of how many things derivatives are taken at one working point: layers, then media. */
export function sensitiveCount(document: StackDocument): number {
  return drawnLayers(document.layers).length + mediaKeys(document).length;
}

/** One film at one working point, whose derivatives can be asked for in pieces. */
export class SensitiveFilm {
  readonly readings: PointReadings;
  readonly count: number;
  readonly #pointId: string;
  readonly #film: StackDocument;
  readonly #solver: FilmSolver;
  readonly #layers: StackLayer[];
  readonly #media: Medium[];
  readonly #least: ReadonlyMap<string, number>;
  readonly #called: ReadonlyMap<string, string>;

  /**
   * @param materials as in `sensitivities`
   * @throws ResolutionError when a material is not known at the working point
   */
  constructor(
    document: StackDocument,
    { id, workingPoint }: Pick<DesignPoint, 'id' | 'workingPoint'>,
    materials: readonly ResolvableMaterial[],
  ) {
    const known = new Map(materials.map((material) => [materialKey(material), material]));
    const names = shortNames(materials);
    this.#pointId = id;
    this.#film = { ...document, workingPoint };
    this.#solver = new FilmSolver(this.#film, known, { contrast: true, ceiling: true });
    this.#layers = drawnLayers(document.layers);
    this.#media = mediaOf(this.#film, freezeDocument(this.#film, known), names);
    this.#least = leastThicknesses(this.#film);
    this.#called = layerNames(this.#layers, (medium) => mediumLabel(medium, names));
    this.count = this.#layers.length + this.#media.length;
    this.readings = this.#solver.readings(UNCHANGED);
  }

  /** Derivatives by some of the `count` layers and media. */
  derivatives(from: number, to: number): Sensitivity[] {
    const layers = this.#layers.length;
    const found = [
      ...this.#layers.slice(from, to).map((layer) => this.#byThickness(layer)),
      ...this.#media
        .slice(Math.max(0, from - layers), Math.max(0, to - layers))
        .flatMap((medium) => this.#byConstants(medium)),
    ];
    return found.map((one) => ({ pointId: this.#pointId, ...one }));
  }

  #byThickness({ id, thicknessNm }: StackLayer): OneSensitivity {
    const at = (shiftNm: number) =>
      this.#solver.readings({ thicknessNm: new Map([[id, thicknessNm + shiftNm]]), constants: null });
    return {
      parameter: 'thickness',
      of: id,
      label: `thickness of ${this.#called.get(id)!}`,
      value: thicknessNm,
      derivative:
        thicknessNm - (this.#least.get(id) ?? 0) < 2 * STEP_NM ? forward(at, STEP_NM) : central(at, STEP_NM),
    };
  }

  #byConstants({ key, label, frozen }: Medium): OneSensitivity[] {
    const at = (change: (step: number) => ConstantFactors) => (step: number) => {
      const film: FilmChange = { thicknessNm: new Map(), constants: new Map([[key, change(step)]]) };
      return this.#solver.readings(film);
    };
    const isIncident = key === materialKeyOf(this.#film.incident);
    const stepOfK = STEP_FACTOR / Math.max(1, thicknessInWavelengths(this.#film, key));
    return parametersOf(frozen, isIncident ? null : stepOfK).map(({ parameter, value, change, take }) => ({
      parameter,
      of: key,
      label: `${parameter} of ${label}`,
      value,
      derivative: take(at(change)),
    }));
  }
}

type OneSensitivity = Omit<Sensitivity, 'pointId'>;

/** With the constants at the working point. Typed tensors and mixtures have no n, k and Q of their own. */
type Medium = { key: string; label: string; frozen: StackMedium };

/** Every material once, however many layers it has. */
function mediaOf(film: StackDocument, frozen: StackDocument, names: ReadonlyMap<string, string>): Medium[] {
  const solved = allMedia(frozen);
  const media = new Map<string, Medium>();
  for (const [place, medium] of allMedia(film).entries()) {
    const key = materialKeyOf(medium);
    const before = media.get(key);
    // The layer that is magnetized has Q, another of the same material may not.
    if (before && before.frozen.voigt !== undefined) continue;
    media.set(key, { key, label: mediumLabel(medium, names), frozen: solved[place]! });
  }
  return [...media.values()];
}

function mediaKeys(document: StackDocument): string[] {
  return [...new Set(allMedia(document).map(materialKeyOf))];
}

function allMedia(document: StackDocument): StackMedium[] {
  return [...drawnLayers(document.layers).map(({ medium }) => medium), ...mediaBeside(document)];
}

type Parameter = {
  parameter: 'n' | 'k' | 'Re Q' | 'Im Q';
  value: number;
  change: (step: number) => ConstantFactors;
  /** The derivative from the readings at steps of `change`. */
  take: (at: (step: number) => PointReadings) => Derivative;
};

/** 4 pi d / wavelength of the thickest part of a medium: how soon a k of it shows. A slab is soon opaque. */
function thicknessInWavelengths(film: StackDocument, of: string): number {
  const { layers, substrate, backside, workingPoint } = film;
  const parts = drawnLayers(layers).map(({ medium, thicknessNm }) => ({ medium, thicknessNm }));
  if (backside) parts.push({ medium: substrate, thicknessNm: backside.thicknessNm });
  const own = parts.filter(({ medium }) => materialKeyOf(medium) === of).map((part) => part.thicknessNm);
  return (4 * Math.PI * Math.max(0, ...own)) / workingPoint.wavelengthNm;
}

/**
 * The constants of a medium given as one index, of a uniaxial one for both indices together; vacuum and air have none.
 *
 * @param stepOfK of a k near 0; null where the film cannot be solved with a k of this medium
 */
function parametersOf(medium: StackMedium, stepOfK: number | null): Parameter[] {
  const { index, voigt } = medium;
  if (index === undefined || isVacuumOrAir(medium) || (typeof index === 'object' && 'samples' in index))
    return [];
  const [n, k] = toComplex(index);
  const same: ConstantFactors = { n: 1, k: 1, q: [1, 1] };
  const nothing = { k: 0, q: [0, 0] as [number, number] };
  const byShare = (value: number): Parameter['take'] => {
    return (at) => over(central(at, STEP_FACTOR), value);
  };
  const parameters: Parameter[] = [
    { parameter: 'n', value: n, change: (step) => ({ ...same, n: 1 + step }), take: byShare(n) },
  ];
  if (stepOfK !== null) {
    const scaled = (step: number) => ({ ...same, k: 1 + step });
    const added = (step: number) => ({ ...same, added: { ...nothing, k: step } });
    parameters.push(
      k >= 2 * stepOfK
        ? { parameter: 'k', value: k, change: scaled, take: byShare(k) }
        : // Below 0 a medium would amplify.
          { parameter: 'k', value: k, change: added, take: (at) => forward(at, stepOfK) },
    );
  }
  if (voigt !== undefined && !(typeof voigt === 'object' && 'samples' in voigt)) {
    toComplex(voigt).forEach((value, part) => {
      const parameter = part === 0 ? 'Re Q' : 'Im Q';
      const both = (one: number, other: number): [number, number] =>
        part === 0 ? [one, other] : [other, one];
      const scaled = (step: number) => ({ ...same, q: both(1 + step, 1) });
      const added = (step: number) => ({ ...same, added: { ...nothing, q: both(step, 0) } });
      parameters.push(
        Math.abs(value) >= STEP_FACTOR
          ? { parameter, value, change: scaled, take: byShare(value) }
          : { parameter, value, change: added, take: (at) => central(at, STEP_FACTOR) },
      );
    });
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
