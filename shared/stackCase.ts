import type { Vector } from './complex.ts';
import type { LibraryMediumInput, TensorInput } from './medium.ts';
import type { LibraryLayerInput, LibrarySolveCase, LibraryStackItemInput } from './solve.ts';
import type { Node } from './spread.ts';
import { spreadNodes } from './spread.ts';
import type { StackDocument, StackItem, StackLayer, StackMedium, WorkingMagnetization } from './stack.ts';
import { thermalVoigtScale } from './thermal.ts';

/**
 * The same stack in its three magnetization states. The Kerr angles on screen are the change of `given` against
 * `zero`; the transverse contrast compares `given` with `reversed`.
 */
export type MagnetizationState = 'given' | 'zero' | 'reversed';

/**
 * A stack document as a case of the solve contract, with the magnetization of the working point put in.
 *
 * Dead layers and oxides become layers of their own; spreads become groups of wavelengths and angles with weights
 * (`average`), in which each wavelength and angle asked for is one group.
 *
 * @param wavelengthNm vacuum wavelength or wavelengths, nm
 * @param angleDeg angle or angles of incidence, deg
 * @param magnetization as drawn, reversed, or one direction for every layer that has an m and is not fixed
 */
export function toSolveCase(
  document: StackDocument,
  wavelengthNm: number | number[],
  angleDeg: number | number[],
  magnetization: WorkingMagnetization = document.workingPoint.magnetization,
): LibrarySolveCase {
  const itemsOf = (item: StackItem): LibraryStackItemInput[] =>
    'layers' in item
      ? [{ repeat: item.repeat, layers: item.layers.flatMap(itemsOf) }]
      : layersOf(item, magnetization);
  const { substrateGradedNm, backside } = document;
  const substrateM = workingM(document.substrateM, false, magnetization);
  const substrate = withVoigtScale(document.substrate, document.substrateVoigtScale);
  return {
    ...spreadOf(document, wavelengthNm, angleDeg),
    incident: mediumOf(document.incident, undefined, magnetization),
    layers: document.layers.flatMap(itemsOf),
    substrate: {
      ...mediumOf(substrate, substrateM, magnetization),
      ...(substrateGradedNm ? { gradedNm: substrateGradedNm } : {}),
    },
    ...(backside
      ? {
          backside: {
            incoherent: true,
            thicknessNm: backside.thicknessNm,
            exit: mediumOf(backside.exit, undefined, magnetization),
          },
        }
      : {}),
  };
}

/** One layer as drawn: oxide on top, then dead, live and dead part; most have only the live one. */
function layersOf(layer: StackLayer, magnetization: WorkingMagnetization): LibraryLayerInput[] {
  const { fixed = false, oxide, dead } = layer;
  const medium = withVoigtScale(layer.medium, voigtScaleOf(layer));
  const m = workingM(layer.m, fixed, magnetization);
  const live = mediumOf(medium, m, magnetization, fixed);
  const silent = m === undefined ? live : mediumOf(medium, [0, 0, 0], magnetization, fixed);
  const topNm = dead?.topNm ?? 0;
  const bottomNm = dead?.bottomNm ?? 0;
  const consumedNm = oxide?.consumedNm ?? 0;
  const parts: LibraryLayerInput[] = [];
  if (oxide && consumedNm > 0) {
    const oxideMedium = mediumOf(oxide.medium, undefined, magnetization);
    parts.push({ ...oxideMedium, thicknessNm: consumedNm * oxide.expansion });
  }
  if (topNm > 0) parts.push({ ...silent, thicknessNm: topNm });
  parts.push({ ...live, thicknessNm: layer.thicknessNm - consumedNm - topNm - bottomNm });
  if (bottomNm > 0) parts.push({ ...silent, thicknessNm: bottomNm });
  if (layer.gradedNm) parts[0] = { ...parts[0]!, gradedNm: layer.gradedNm };
  return parts;
}

function spreadOf(
  document: StackDocument,
  wavelengthNm: number | number[],
  angleDeg: number | number[],
): Pick<LibrarySolveCase, 'wavelengthNm' | 'angleDeg' | 'average'> {
  const { spread } = document;
  const { bandwidthNm = 0, divergenceDeg = 0, thicknessPercent = 0, shape = 'normal' } = spread ?? {};
  if (bandwidthNm === 0 && divergenceDeg === 0 && thicknessPercent === 0) return { wavelengthNm, angleDeg };
  const nodesOf = (values: number | number[], deviation: number) =>
    [values].flat().map((value) => spreadNodes(value, deviation, shape));
  const wavelengths = nodesOf(wavelengthNm, bandwidthNm);
  const angles = nodesOf(angleDeg, divergenceDeg);
  const weights = (groups: Node[][]) => groups[0]!.map(({ weight }) => weight);
  return {
    wavelengthNm: wavelengths.flat().map(({ value }) => value),
    // A beam spread about the normal reaches it from both sides; past grazing there is no beam.
    angleDeg: angles.flat().map(({ value }) => Math.min(Math.abs(value), GRAZING_DEG)),
    average: {
      ...(bandwidthNm > 0 ? { wavelengthWeights: weights(wavelengths) } : {}),
      ...(divergenceDeg > 0 ? { angleWeights: weights(angles) } : {}),
      ...(thicknessPercent > 0
        ? {
            thickness: spreadNodes(1, thicknessPercent / 100, shape).map(({ value, weight }) => ({
              factor: value,
              weight,
            })),
          }
        : {}),
    },
  };
}

/** Whether intensities are added or averaged, so that no amplitude stands for the answer. */
export function addsIntensities({ backside, spread }: StackDocument): boolean {
  const { thicknessPercent = 0, divergenceDeg = 0, bandwidthNm = 0 } = spread ?? {};
  return backside !== undefined || thicknessPercent > 0 || divergenceDeg > 0 || bandwidthNm > 0;
}

/** Points of the numeric core behind one point of a spread film's answer: wavelengths times angles. */
export function spreadNodeCount(document: StackDocument): number {
  const { wavelengthNm, angleDeg } = spreadOf(document, 1000, 45);
  return [wavelengthNm].flat().length * [angleDeg].flat().length;
}

/** The last angle that an average over the divergence uses. */
const GRAZING_DEG = 89.999;

function workingM(
  m: Vector | undefined,
  fixed: boolean,
  magnetization: WorkingMagnetization,
): Vector | undefined {
  if (m === undefined || fixed) return m;
  switch (magnetization.mode) {
    case 'drawn':
      return m;
    case 'reversed':
      return negated(m);
    case 'direction':
      return magnetization.m;
  }
}

type ScaledMedium = StackMedium & { voigtScale?: number | undefined };

/** By how much Q of a layer is scaled by hand and by its temperature; absent where by neither. */
function voigtScaleOf({ voigtScale, thermal }: StackLayer): number | undefined {
  return thermal ? (voigtScale ?? 1) * thermalVoigtScale(thermal) : voigtScale;
}

/** A medium without Q has nothing to scale; of a mixture both parts are scaled. */
function withVoigtScale(medium: StackMedium, voigtScale: number | undefined): ScaledMedium {
  if (voigtScale === undefined) return medium;
  if (medium.mixture) {
    const { parts } = medium.mixture;
    return { ...medium, mixture: { ...medium.mixture, parts: [scaledPart(parts[0]), scaledPart(parts[1])] } };
  }
  const hasVoigt = medium.voigt !== undefined || medium.material !== undefined;
  return hasVoigt ? { ...medium, voigtScale } : medium;

  function scaledPart<Part extends { voigt?: unknown; material?: unknown; voigtScale?: number | undefined }>(
    part: Part,
  ): Part {
    const { voigtScale: own = 1 } = part;
    return part.voigt === undefined && part.material === undefined
      ? part
      : { ...part, voigtScale: own * voigtScale! };
  }
}

function mediumOf(
  medium: ScaledMedium,
  m: Vector | undefined,
  magnetization: WorkingMagnetization,
  fixed = false,
): LibraryMediumInput {
  const { label: _label, ...constants } = medium;
  const reversed = magnetization.mode === 'reversed' && !fixed ? reversedTensor(constants) : constants;
  if (m === undefined) return reversed;
  const { mixture } = reversed;
  if (!mixture) return { ...reversed, m };
  // The m of a mixed layer is that of its magnetic part.
  const [first, second] = mixture.parts;
  return {
    ...reversed,
    mixture: {
      ...mixture,
      parts: [
        { ...first, m },
        { ...second, m },
      ],
    },
  };
}

/**
 * The case with every magnetization taken away (`zero`) or turned round (`reversed`), free tensors included: one given
 * by numbers is changed here, one that a material gives is changed when the material is put in (`tensorState`).
 */
export function inMagnetizationState<Case extends LibrarySolveCase>(
  given: Case,
  state: MagnetizationState,
): Case {
  if (state === 'given') return given;
  const change = <Medium extends LibraryMediumInput>(medium: Medium): Medium => {
    const tensors = state === 'zero' ? symmetricTensor(medium) : reversedTensor(medium);
    const { mixture } = tensors;
    if (mixture) {
      const [first, second] = mixture.parts;
      return { ...tensors, mixture: { ...mixture, parts: [changeM(first), changeM(second)] } };
    }
    return changeM(tensors);
  };
  const changeM = <Part extends { m?: Vector | undefined }>(part: Part): Part => {
    if (part.m === undefined) return part;
    return { ...part, m: state === 'zero' ? [0, 0, 0] : negated(part.m) };
  };
  const changeItem = (item: LibraryStackItemInput): LibraryStackItemInput =>
    'layers' in item ? { ...item, layers: item.layers.map(changeItem) } : change(item);
  return { ...given, layers: given.layers.map(changeItem), substrate: change(given.substrate) };
}

function negated(m: Vector): Vector {
  return [0 - m[0], 0 - m[1], 0 - m[2]];
}

/** A free tensor carries its own magnetization: its reversal is the transpose (physics.md section 2). */
function reversedTensor<Medium extends LibraryMediumInput>(medium: Medium): Medium {
  if (medium.material !== undefined && medium.tensorState !== 'unmagnetized') {
    if (medium.tensorState === undefined) return { ...medium, tensorState: 'reversed' };
    const given = { ...medium };
    delete given.tensorState;
    return given;
  }
  return mapTensor(medium, (tensor, row, column) => tensor[column]![row]!);
}

/** ... and its m = 0 state is the symmetric part. */
function symmetricTensor<Medium extends LibraryMediumInput>(medium: Medium): Medium {
  if (medium.material !== undefined) return { ...medium, tensorState: 'unmagnetized' };
  return mapTensor(medium, (tensor, row, column) => {
    const a = tensor[row]![column]!;
    const b = tensor[column]![row]!;
    const [aRe, aIm] = typeof a === 'number' ? [a, 0] : a;
    const [bRe, bIm] = typeof b === 'number' ? [b, 0] : b;
    return [(aRe + bRe) / 2, (aIm + bIm) / 2];
  });
}

function mapTensor<Medium extends LibraryMediumInput>(
  medium: Medium,
  element: (tensor: TensorInput, row: number, column: number) => TensorInput[0][0],
): Medium {
  if (medium.epsilon === undefined) return medium;
  const rebuild = (tensor: TensorInput): TensorInput => {
    const row = (index: number): TensorInput[0] => [
      element(tensor, index, 0),
      element(tensor, index, 1),
      element(tensor, index, 2),
    ];
    return [row(0), row(1), row(2)];
  };
  const epsilon = Array.isArray(medium.epsilon)
    ? rebuild(medium.epsilon)
    : { samples: medium.epsilon.samples.map(rebuild) };
  return { ...medium, epsilon };
}

/** How many layers the document has once its blocks are expanded. */
export function countLayers(items: StackItem[]): number {
  return items.reduce(
    (count, item) => count + ('layers' in item ? item.repeat * countLayers(item.layers) : 1),
    0,
  );
}

/** Where the layer with this id stands, as positions into nested `layers` arrays; null when there is none. */
export function findLayerPath(items: StackItem[], layerId: string): number[] | null {
  for (const [position, item] of items.entries()) {
    if (item.id === layerId && !('layers' in item)) return [position];
    if ('layers' in item) {
      const inner = findLayerPath(item.layers, layerId);
      if (inner) return [position, ...inner];
    }
  }
  return null;
}
