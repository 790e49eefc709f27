import type { ComplexInput } from './complex.ts';
import { toComplex } from './complex.ts';
import type { Issue } from './error.ts';
import { LIMITS } from './limits.ts';
import type { LibraryMediumInput } from './medium.ts';
import type {
  LibraryLayerInput,
  LibrarySolveCase,
  LibrarySolveRequest,
  LibraryStackItemInput,
} from './solve.ts';

/**
 * The rules of a request that need more than one field: counts of samples, the incident medium, depth and size of
 * blocks, number of points. The request has passed its schema. (Warnings come with the answer: worker/optics/warnings.ts.)
 *
 * @param limits.maxPoints points (wavelength x angle over all cases) that this entry takes
 * @param limits.beyond what to do instead, said when there are more
 */
export function checkSolveRequest(
  request: LibrarySolveRequest,
  limits: { maxPoints: number; beyond: string },
): Issue[] {
  const issues: Issue[] = [];
  let points = 0;
  request.cases.forEach((one, index) => {
    const path = `cases[${index}]`;
    const wavelengths = Array.isArray(one.wavelengthNm) ? one.wavelengthNm.length : 1;
    points += wavelengths * (Array.isArray(one.angleDeg) ? one.angleDeg.length : 1);
    forEachMedium(one, (medium, where) => checkSamples(medium, `${path}.${where}`, wavelengths, issues));
    checkIncident(one.incident, `${path}.incident`, issues);
    checkAverage(one, path, wavelengths, issues);
    checkGraded(one, path, issues);
    if (one.backside) {
      checkIsotropic(one.substrate, `${path}.substrate`, 'the slab of an incoherent backside', issues);
      checkIsotropic(one.backside.exit, `${path}.backside.exit`, 'the exit medium', issues);
    }
    if (one.backside || one.average) checkIntensityOutputs(one.outputs ?? [], `${path}.outputs`, issues);
    const expanded = expandedLayers(one.layers, `${path}.layers`, 0, issues);
    if (expanded > LIMITS.expandedLayers) {
      issues.push({
        path: `${path}.layers`,
        message: `must have at most ${LIMITS.expandedLayers} layers after blocks are expanded, got ${expanded}`,
      });
    }
  });
  if (points > limits.maxPoints) {
    issues.push({
      path: 'cases',
      message: `must have at most ${limits.maxPoints} points (wavelengths x angles over all cases), got ${points}: ${limits.beyond}`,
    });
  }
  return issues;
}

function expandedLayers(
  items: LibraryStackItemInput[],
  path: string,
  depth: number,
  issues: Issue[],
): number {
  return items.reduce((count, item, index) => {
    if (!('layers' in item)) return count + 1;
    if (depth >= LIMITS.blockDepth) {
      issues.push({
        path: `${path}[${index}].layers`,
        message: `blocks may be nested at most ${LIMITS.blockDepth} deep`,
      });
      return count;
    }
    return count + item.repeat * expandedLayers(item.layers, `${path}[${index}].layers`, depth + 1, issues);
  }, 0);
}

function checkSamples(medium: LibraryMediumInput, path: string, wavelengths: number, issues: Issue[]): void {
  for (const key of ['index', 'voigt', 'extraordinary', 'epsilon'] as const) {
    const value = medium[key];
    if (typeof value !== 'object' || !('samples' in value)) continue;
    if (value.samples.length !== wavelengths) {
      issues.push({
        path: `${path}.${key}.samples`,
        message: `must have one entry per wavelength (${wavelengths}), got ${value.samples.length}`,
      });
    }
  }
}

/** Groups that come out even, weights that add up to 1. */
function checkAverage(one: LibrarySolveCase, path: string, wavelengths: number, issues: Issue[]): void {
  const { average } = one;
  if (!average) return;
  const refuse = (key: string, message: string) => issues.push({ path: `${path}.average.${key}`, message });
  const angles = Array.isArray(one.angleDeg) ? one.angleDeg.length : 1;
  const lists = [
    { key: 'wavelengthWeights', weights: average.wavelengthWeights, count: wavelengths, what: 'wavelengths' },
    { key: 'angleWeights', weights: average.angleWeights, count: angles, what: 'angles' },
    { key: 'thickness', weights: average.thickness?.map(({ weight }) => weight), count: 0, what: '' },
  ];
  for (const { key, weights, count, what } of lists) {
    if (!weights) continue;
    const sum = weights.reduce((total, weight) => total + weight, 0);
    if (Math.abs(sum - 1) > 1e-9) refuse(key, `weights must add up to 1, got ${sum}`);
    if (count % weights.length !== 0) {
      refuse(key, `the ${what} must come in groups of ${weights.length}, got ${count}`);
    }
  }
}

/** A graded interface needs room in both layers, and two media that can be mixed. */
function checkGraded(one: LibrarySolveCase, path: string, issues: Issue[]): void {
  const isGraded = (layer: { gradedNm?: number | undefined }) => (layer.gradedNm ?? 0) > 0;
  const sequence: { layer: LibraryLayerInput; where: string }[] = [];
  const visit = (items: LibraryStackItemInput[], where: string) =>
    items.forEach((item, index) => {
      if (!('layers' in item)) sequence.push({ layer: item, where: `${where}[${index}]` });
      // Twice is enough to meet every neighbour a repeated layer has.
      else for (let n = 0; n < Math.min(2, item.repeat); n++) visit(item.layers, `${where}[${index}].layers`);
    });
  visit(one.layers, `${path}.layers`);
  sequence.push({ layer: { ...one.substrate, thicknessNm: Infinity }, where: `${path}.substrate` });
  if (!sequence.some(({ layer }) => isGraded(layer))) return;
  const refuse = (where: string, message: string) => {
    const full = `${where}.gradedNm`;
    if (!issues.some((issue) => issue.path === full)) issues.push({ path: full, message });
  };
  sequence.forEach(({ layer, where }, index) => {
    const below = sequence[index + 1];
    const used = ((layer.gradedNm ?? 0) + (below?.layer.gradedNm ?? 0)) / 2;
    if (used > layer.thicknessNm) {
      const here = isGraded(layer) ? where : (below?.where ?? where);
      refuse(here, `needs ${used} nm of a layer of ${layer.thicknessNm} nm: make the interface narrower`);
    }
    if (!isGraded(layer)) return;
    for (const medium of [layer, sequence[index - 1]?.layer ?? one.incident]) {
      for (const key of ['extraordinary', 'quadratic', 'epsilon', 'mixture'] as const) {
        if (medium[key] !== undefined) refuse(where, `cannot grade between media one of which has ${key}`);
      }
    }
  });
}

/** A thick slab and what lies behind it have one index each (physics.md section 6). */
function checkIsotropic(medium: LibraryMediumInput, path: string, what: string, issues: Issue[]): void {
  for (const key of ['extraordinary', 'quadratic', 'epsilon'] as const) {
    if (medium[key] !== undefined) {
      issues.push({ path: `${path}.${key}`, message: `${what} must be isotropic: give index only` });
    }
  }
  const isMagnetic = medium.voigt !== undefined && medium.m?.some((component) => component !== 0);
  if (isMagnetic) issues.push({ path: `${path}.voigt`, message: `${what} must not be magnetic` });
}

/** Where intensities add there are no amplitudes to take apart. */
function checkIntensityOutputs(outputs: readonly string[], path: string, issues: Issue[]): void {
  outputs.forEach((output, index) => {
    if (output === 'mueller') return;
    issues.push({
      path: `${path}[${index}]`,
      message: `${output} needs amplitudes; ask for it without backside and average, which add intensities`,
    });
  });
}

/** Light must arrive from an isotropic, lossless, non-magnetic medium (physics.md section 1). */
function checkIncident(incident: LibraryMediumInput, path: string, issues: Issue[]): void {
  for (const key of ['extraordinary', 'axis', 'quadratic', 'epsilon'] as const) {
    if (incident[key] !== undefined) {
      issues.push({
        path: `${path}.${key}`,
        message: 'the incident medium must be isotropic: give index only',
      });
    }
  }
  for (const key of ['voigt', 'm'] as const) {
    if (incident[key] !== undefined) {
      issues.push({
        path: `${path}.${key}`,
        message: 'the incident medium must not be magnetic: give index only',
      });
    }
  }
  indexValues(incident).forEach(({ value, suffix }) => {
    const [n, k] = toComplex(value);
    if (k !== 0) {
      issues.push({
        path: `${path}.index${suffix}`,
        message: `the incident medium must not absorb: k must be 0, got ${k}`,
      });
    }
    if (n <= 0) issues.push({ path: `${path}.index${suffix}`, message: `n must be > 0, got ${n}` });
  });
}

function indexValues(medium: LibraryMediumInput): { value: ComplexInput; suffix: string }[] {
  if (medium.index === undefined) return [];
  if (typeof medium.index === 'object' && 'samples' in medium.index) {
    return medium.index.samples.map((value, index) => ({ value, suffix: `.samples[${index}]` }));
  }
  return [{ value: medium.index, suffix: '' }];
}

/** Visits incident medium, every layer as written (blocks not expanded) and substrate, with their paths. */
export function forEachMedium(
  one: LibrarySolveCase,
  visit: (medium: LibraryMediumInput, path: string) => void,
): void {
  const visitItems = (items: LibraryStackItemInput[], path: string) => {
    items.forEach((item, index) => {
      if ('layers' in item) visitItems(item.layers, `${path}[${index}].layers`);
      else visit(item, `${path}[${index}]`);
    });
  };
  visit(one.incident, 'incident');
  visitItems(one.layers, 'layers');
  visit(one.substrate, 'substrate');
  if (one.backside) visit(one.backside.exit, 'backside.exit');
}
