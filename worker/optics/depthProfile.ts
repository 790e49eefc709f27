import type { Complex } from '../../shared/complex.ts';
import type { CompiledStack } from './compiledStack.ts';
import { over, plus, scaled, times } from './complexNumber.ts';
import type { Geometry } from './geometry.ts';
import { incidenceGeometry } from './geometry.ts';
import type { Matrix2 } from './matrix2.ts';
import { add, createMatrix2, invert, scaleColumns, scaleRows } from './matrix2.ts';
import { Medium } from './medium.ts';
import { Modes } from './modes.ts';
import { FieldState, LayerStep } from './recursion.ts';
import type { Tensor } from './tensor.ts';
import { addGyration, createTensor, element, mirror, scaleAntisymmetricPart } from './tensor.ts';

/** Ex, Ey, Ez for unit incident light, as re, im: six doubles. */
type Field = Float64Array;

/** What stands at one depth, for p and s light of unit amplitude and unit power. */
export type ProfilePoint = {
  depthNm: number;
  /** Position in the expanded sequence of layers; the substrate follows the last layer. */
  layer: number;
  /** |E|, in units of the incident amplitude. */
  field: { p: number; s: number };
  /** Absorbed share of the incident power per nm. */
  absorbedPerNm: { p: number; s: number };
  /** Density of r_sp per nm, to first order in Q: its integral over depth is the sum of the layer shares. */
  signalPerNm: Complex;
};

type Slice = { step: LayerStep; layer: number; medium: Medium; depthNm: number };

/** How deep into the substrate the profile goes at the most, nm. */
const SUBSTRATE_DEPTH_NM = 60;

/**
 * |E|, absorption and signal density against depth, for any stack.
 *
 * The field is that of the stack as it is; the signal density is the integrand of physics.md section 5, taken with
 * the unmagnetized stack and, for anisotropic media, its adjoint field (-xi, transposed tensors).
 *
 * @param slicesPerLayer each layer shows its two faces and the slices between
 */
export function depthProfile(
  stack: CompiledStack,
  wavelengthIndex: number,
  angleDeg: number,
  slicesPerLayer: number,
): ProfilePoint[] {
  stack.load(wavelengthIndex);
  const geometry = incidenceGeometry(stack.incidentIndex(wavelengthIndex)[0], angleDeg);
  const k0 = (2 * Math.PI) / stack.wavelengthsNm[wavelengthIndex]!;
  const fieldsWith = (change: (medium: Medium) => Medium) =>
    sliceFields(stack, geometry, k0, slicesPerLayer, change);
  const exact = fieldsWith((medium) => medium);
  const base = fieldsWith(withoutGyration);
  const adjoint = fieldsWith((medium) => turnedHalfRound(withoutGyration(medium)));
  const perPower = k0 / geometry.q0;
  return exact.map((here, index) => {
    const { medium } = here;
    return {
      depthNm: here.depthNm,
      layer: here.layer,
      field: { p: norm(here.p), s: norm(here.s) },
      absorbedPerNm: {
        p: perPower * lossOf(medium.tensor, here.p),
        s: perPower * lossOf(medium.tensor, here.s),
      },
      signalPerNm: times([0, k0 / (2 * geometry.q0)], coupling(medium, adjoint[index]!.s, base[index]!.p)),
    };
  });
}

type FieldPoint = { depthNm: number; layer: number; medium: Medium; p: Field; s: Field };

/** The fields at both faces of every slice, by the recursion of FieldState with each layer cut into slices. */
function sliceFields(
  stack: CompiledStack,
  geometry: Geometry,
  k0: number,
  slicesPerLayer: number,
  change: (medium: Medium) => Medium,
): FieldPoint[] {
  const modes = new Map<Medium, Modes>();
  for (const medium of stack.media) {
    const changed = new Modes(change(medium));
    changed.update(geometry);
    modes.set(medium, changed);
  }
  const slices = cut(stack, modes, k0, slicesPerLayer);
  const state = new FieldState();
  state.start(modes.get(stack.substrate)!, geometry);
  const faces: { m: Matrix2; n: Matrix2; toNext: Matrix2 }[] = [];
  const keep = (toNext: Matrix2) => faces.push({ m: state.m.slice(), n: state.n.slice(), toNext });
  keep(createMatrix2());
  for (const { step } of [...slices].reverse()) {
    state.chain.set([1, 0, 0, 0, 0, 0, 1, 0]);
    step.cross(state);
    keep(state.chain.slice());
  }
  faces.reverse();
  let x = incidentAmplitudes(state, geometry);
  const points: FieldPoint[] = [];
  faces.forEach((face, index) => {
    const above = slices[index - 1];
    const below = slices[index];
    for (const slice of [above, below]) {
      if (!slice) continue;
      const isTop = slice === below;
      // Inner faces of a layer are shown once; the face between two layers once for each.
      if (!isTop && below?.layer === slice.layer) continue;
      const medium = modes.get(slice.medium)!.medium;
      points.push({
        depthNm: isTop ? slice.depthNm : slice.depthNm + slice.step.layer.thicknessNm,
        layer: slice.layer,
        medium: slice.medium,
        p: fieldAt(face, x, 0, medium.tensor, geometry.xi),
        s: fieldAt(face, x, 2, medium.tensor, geometry.xi),
      });
    }
    x = product(face.toNext, x);
  });
  return points;
}

function cut(stack: CompiledStack, modes: Map<Medium, Modes>, k0: number, slicesPerLayer: number): Slice[] {
  const slices: Slice[] = [];
  let depthNm = 0;
  const push = (medium: Medium, thicknessNm: number, layer: number) => {
    const step = new LayerStep(modes.get(medium)!, { thicknessNm: thicknessNm / slicesPerLayer });
    step.update(k0);
    for (let i = 0; i < slicesPerLayer; i++) {
      slices.push({ step, layer, medium, depthNm: depthNm + (i * thicknessNm) / slicesPerLayer });
    }
    depthNm += thicknessNm;
  };
  stack.sequence.forEach((layer, index) => push(layer.medium, layer.thicknessNm, index));
  push(stack.substrate, Math.min(SUBSTRATE_DEPTH_NM, Math.max(10, 0.4 * depthNm)), stack.sequence.length);
  return slices;
}

/** x at the top face for unit p (first column) and s light; see `StackSolver`. */
function incidentAmplitudes(state: FieldState, { n0, q0 }: Geometry): Matrix2 {
  const x = createMatrix2();
  scaleRows(x, state.m, q0 / (n0 * n0), 0, q0, 0);
  add(x, x, state.n);
  invert(x, x);
  scaleColumns(x, x, (2 * q0) / n0, 0, 2 * q0, 0);
  return x;
}

function product(a: Matrix2, b: Matrix2): Matrix2 {
  const at = (matrix: Matrix2, i: number): Complex => [matrix[i]!, matrix[i + 1]!];
  const out = createMatrix2();
  for (const row of [0, 4]) {
    for (const column of [0, 2]) {
      const value = plus(times(at(a, row), at(b, column)), times(at(a, row + 2), at(b, 4 + column)));
      out[row + column] = value[0];
      out[row + column + 1] = value[1];
    }
  }
  return out;
}

/** Ex = g1, Ey = f2, and Ez from D_z = -xi Hy. */
function fieldAt(
  face: { m: Matrix2; n: Matrix2 },
  x: Matrix2,
  column: 0 | 2,
  tensor: Tensor,
  xi: number,
): Field {
  const f = product(face.m, x);
  const g = product(face.n, x);
  const hy: Complex = [f[column]!, f[column + 1]!];
  const ey: Complex = [f[column + 4]!, f[column + 5]!];
  const ex: Complex = [g[column]!, g[column + 1]!];
  const dz = plus(
    scaled(hy, -xi),
    scaled(plus(times(element(tensor, 2, 0), ex), times(element(tensor, 2, 1), ey)), -1),
  );
  const ez = over(dz, element(tensor, 2, 2));
  return Float64Array.of(...ex, ...ey, ...ez);
}

function norm(field: Field): number {
  return Math.hypot(...field);
}

/** E^H (eps - eps^H) / 2i E = Im(E^H eps E). */
function lossOf(tensor: Tensor, field: Field): number {
  const at = (i: number): Complex => [field[2 * i]!, field[2 * i + 1]!];
  let sum = 0;
  for (let i = 0; i < 3; i++) {
    for (let j = 0; j < 3; j++) {
      const [re, im] = times(element(tensor, i, j), at(j));
      sum += at(i)[0] * im - at(i)[1] * re;
    }
  }
  return sum;
}

/** E_adj . (gyration of the medium) . E, the adjoint s field turned back from the frame it was solved in. */
function coupling(medium: Medium, turned: Field, field: Field): Complex {
  if (!medium.isGyrotropic) return [0, 0];
  const gyration = gyrationOf(medium);
  // Half a turn about z takes (x, y, z) to (-x, -y, z); the s unit vector of the turned beam is -y.
  const signs = [1, 1, -1];
  let sum: Complex = [0, 0];
  for (let i = 0; i < 3; i++) {
    for (let j = 0; j < 3; j++) {
      const left: Complex = [signs[i]! * turned[2 * i]!, signs[i]! * turned[2 * i + 1]!];
      const right: Complex = [field[2 * j]!, field[2 * j + 1]!];
      sum = plus(sum, times(times(left, element(gyration, i, j)), right));
    }
  }
  return sum;
}

/** The part of the tensor that is odd in m. */
function gyrationOf(medium: Medium): Tensor {
  const gyration = createTensor();
  if (medium.permittivity) {
    addGyration(gyration, medium.permittivity, medium.voigt, medium.m);
    return gyration;
  }
  const even = medium.tensor.slice();
  scaleAntisymmetricPart(even, 0);
  return medium.tensor.map((value, i) => value - even[i]!);
}

/** The same medium at Q = 0; a free tensor keeps its symmetric part. */
function withoutGyration(medium: Medium): Medium {
  const tensor = medium.tensor.slice();
  scaleAntisymmetricPart(tensor, 0);
  return Medium.fromTensor(tensor);
}

/** Turned by 180 deg about z. */
function turnedHalfRound(medium: Medium): Medium {
  const tensor = medium.tensor.slice();
  mirror(tensor);
  return Medium.fromTensor(tensor);
}
