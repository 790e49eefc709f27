import type { Vector } from './complex.ts';
import type { LibraryMediumInput, TensorInput } from './medium.ts';
import type { LibrarySolveCase, LibraryStackItemInput } from './solve.ts';
import type { StackDocument, StackItem, StackLayer, StackMedium, WorkingMagnetization } from './stack.ts';

/**
 * The same stack in its three magnetization states. The Kerr angles on screen are the change of `given` against
 * `zero`; the transverse contrast compares `given` with `reversed`.
 */
export type MagnetizationState = 'given' | 'zero' | 'reversed';

/**
 * A stack document as a case of the solve contract, with the magnetization of the working point put in.
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
  const layerOf = (layer: StackLayer): LibraryStackItemInput => ({
    ...mediumOf(
      layer.medium,
      workingM(layer.m, layer.fixed ?? false, magnetization),
      magnetization,
      layer.fixed,
    ),
    thicknessNm: layer.thicknessNm,
  });
  const itemOf = (item: StackItem): LibraryStackItemInput =>
    'layers' in item ? { repeat: item.repeat, layers: item.layers.map(itemOf) } : layerOf(item);
  return {
    wavelengthNm,
    angleDeg,
    incident: mediumOf(document.incident, undefined, magnetization),
    layers: document.layers.map(itemOf),
    substrate: mediumOf(
      document.substrate,
      workingM(document.substrateM, false, magnetization),
      magnetization,
    ),
  };
}

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

function mediumOf(
  medium: StackMedium,
  m: Vector | undefined,
  magnetization: WorkingMagnetization,
  fixed = false,
): LibraryMediumInput {
  const { label: _label, ...constants } = medium;
  const reversed = magnetization.mode === 'reversed' && !fixed ? reversedTensor(constants) : constants;
  return m === undefined ? reversed : { ...reversed, m };
}

/** The case with every magnetization taken away (`zero`) or turned round (`reversed`), free tensors included. */
export function inMagnetizationState<Case extends LibrarySolveCase>(
  given: Case,
  state: MagnetizationState,
): Case {
  if (state === 'given') return given;
  const change = <Medium extends LibraryMediumInput>(medium: Medium): Medium => {
    const tensors = state === 'zero' ? symmetricTensor(medium) : reversedTensor(medium);
    if (tensors.m === undefined) return tensors;
    return { ...tensors, m: state === 'zero' ? [0, 0, 0] : negated(tensors.m) };
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
  return mapTensor(medium, (tensor, row, column) => tensor[column]![row]!);
}

/** ... and its m = 0 state is the symmetric part. */
function symmetricTensor<Medium extends LibraryMediumInput>(medium: Medium): Medium {
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
