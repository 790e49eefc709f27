import type { ComplexInput, Vector } from '../../shared/complex.ts';
import { toComplex } from '../../shared/complex.ts';
import { materialKeyOf } from '../../shared/designPoint.ts';
import type { LibrarySolveCase } from '../../shared/solve.ts';
import type { StackDocument, StackItem, StackMedium } from '../../shared/stack.ts';
import { toSolveCase } from '../../shared/stackCase.ts';
import type { ResolvableMaterial } from '../dispersion/resolveCase.ts';
import { resolveCase } from '../dispersion/resolveCase.ts';

/** Factors on the constants of one material; on Re Q and Im Q each. What is 0 cannot be scaled: it can be added to. */
export type ConstantFactors = {
  n: number;
  k: number;
  q: [re: number, im: number];
  added?: { k: number; q: [re: number, im: number] };
};

/**
 * The document with numbers in place of library materials, for its own working point. Media can then be changed
 * without the library, and solved often. A medium keeps its `materialKeyOf` as its label.
 *
 * @throws ResolutionError when a material is not known at the working point
 */
export function freezeDocument(
  document: StackDocument,
  materials: ReadonlyMap<string, ResolvableMaterial>,
): StackDocument {
  const { wavelengthNm, angleDeg } = document.workingPoint;
  // With a bandwidth these are several wavelengths, and constants become one sample for each.
  const probe = toSolveCase(document, wavelengthNm, angleDeg);
  return mapMedia(document, (medium, isMagnetized) => {
    const label = materialKeyOf(medium);
    if (medium.material === undefined && !medium.mixture) return { ...medium, label };
    const { label: _label, ...constants } = medium;
    const isTensor = [...materials.values()].some(
      ({ id, content }) => id === medium.material && content.index.kind === 'tensor',
    );
    const asked: LibrarySolveCase = {
      wavelengthNm: probe.wavelengthNm,
      angleDeg: 0,
      incident: { index: 1 },
      layers: [],
      substrate: isMagnetized && !isTensor ? withMagnetization(constants) : constants,
    };
    const { m: _m, gradedNm: _graded, ...resolved } = resolveCase(asked, materials).substrate;
    if (!resolved.mixture) return { ...resolved, label };
    const [first, second] = resolved.mixture.parts.map(({ m: _part, ...part }) => part);
    return { ...resolved, mixture: { ...resolved.mixture, parts: [first!, second!] }, label };
  });
}

/** Any m will do: it makes resolveCase put in the Voigt constant, and is taken out again. */
function withMagnetization(medium: StackMedium): LibrarySolveCase['substrate'] {
  const m: Vector = [0, 0, 1];
  if (!medium.mixture) return { ...medium, m };
  const [first, second] = medium.mixture.parts;
  const parts: NonNullable<LibrarySolveCase['substrate']['mixture']>['parts'] = [
    { ...first, m },
    { ...second, m },
  ];
  return { ...medium, mixture: { ...medium.mixture, parts } };
}

/**
 * Every medium of the document changed: incident, layers and their oxides, substrate, exit.
 *
 * @param change is told whether the medium carries a magnetization at the working point
 */
function mapMedia(
  document: StackDocument,
  change: (medium: StackMedium, isMagnetized: boolean) => StackMedium,
): StackDocument {
  const { magnetization } = document.workingPoint;
  const isMagnetized = (m: Vector | undefined, fixed = false) => {
    if (m === undefined) return false;
    const used = magnetization.mode === 'direction' && !fixed ? magnetization.m : m;
    return used.some((component) => component !== 0);
  };
  const changeItem = (item: StackItem): StackItem => {
    if ('layers' in item) return { ...item, layers: item.layers.map(changeItem) };
    const medium = change(item.medium, isMagnetized(item.m, item.fixed));
    if (!item.oxide) return { ...item, medium };
    return { ...item, medium, oxide: { ...item.oxide, medium: change(item.oxide.medium, false) } };
  };
  const { backside } = document;
  return {
    ...document,
    incident: change(document.incident, false),
    layers: document.layers.map(changeItem),
    substrate: change(document.substrate, isMagnetized(document.substrateM)),
    ...(backside ? { backside: { ...backside, exit: change(backside.exit, false) } } : {}),
  };
}

/** Vacuum and air, at any pressure and humidity, have no constants that could be off. */
export function isVacuumOrAir({ index }: Pick<StackMedium, 'index'>): boolean {
  if (index === undefined) return false;
  const values = typeof index === 'object' && 'samples' in index ? index.samples : [index];
  return values.map(toComplex).every(([n, k]) => Math.abs(n - 1) < 1e-3 && k === 0);
}

/**
 * A frozen document with constants times factors and added to, both indices of a uniaxial medium alike. Media given as tensors or
 * mixtures, vacuum and air, and what is not named, stay.
 */
export function scaleConstants(
  frozen: StackDocument,
  factors: ReadonlyMap<string, ConstantFactors>,
): StackDocument {
  return mapMedia(frozen, (medium) => {
    const factor = factors.get(medium.label ?? '');
    if (!factor || medium.index === undefined || isVacuumOrAir(medium)) return medium;
    const { n: byN, k: byK, q: byQ, added = nothingAdded } = factor;
    const scaleIndex = ([n, k]: [number, number]): [number, number] => [n * byN, k * byK + added.k];
    const scaleVoigt = ([re, im]: [number, number]): [number, number] => [
      re * byQ[0] + added.q[0],
      im * byQ[1] + added.q[1],
    ];
    return {
      ...medium,
      index: scaleSamples(medium.index, scaleIndex),
      ...(medium.extraordinary === undefined
        ? {}
        : { extraordinary: scaleSamples(medium.extraordinary, scaleIndex) }),
      ...(medium.voigt === undefined ? {} : { voigt: scaleSamples(medium.voigt, scaleVoigt) }),
    };
  });
}

const nothingAdded: NonNullable<ConstantFactors['added']> = { k: 0, q: [0, 0] };

type Sampled = ComplexInput | { samples: ComplexInput[] };

function scaleSamples(
  given: Sampled,
  scale: (value: [number, number]) => [number, number],
): [number, number] | { samples: ComplexInput[] } {
  if (typeof given === 'object' && 'samples' in given) {
    return { samples: given.samples.map((value) => scale(toComplex(value))) };
  }
  return scale(toComplex(given));
}
