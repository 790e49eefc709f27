import type { Complex } from '../../shared/complex.ts';
import type { CompiledStack } from './compiledStack.ts';
import { forwardRoot, minus, over, plus, scaled, times } from './complexNumber.ts';
import type { Geometry } from './geometry.ts';
import { incidenceGeometry } from './geometry.ts';
import type { Medium } from './medium.ts';

/** One polarization in one layer: f = a exp(i k0 q z) + b exp(i k0 q (d - z)), z from the top of the layer. */
export type Amplitudes = { a: Complex; b: Complex };

/** The unmagnetized field in one layer; the substrate comes last, with thickness Infinity and b = 0. */
export type BaseLayer = {
  medium: Medium;
  thicknessNm: number;
  q: Complex;
  /** Ex / Hy of a forward p wave: q / eps. */
  zp: Complex;
  /** exp(i k0 q d) */
  phi: Complex;
  /** Hy for unit p light. */
  p: Amplitudes;
  /** Ey for unit s light. */
  s: Amplitudes;
};

export type BaseFields = Geometry & { k0: number; layers: BaseLayer[] };

/** True where every medium is isotropic but for its gyration, at the loaded wavelength. */
export function hasScalarDiagonals(stack: CompiledStack): boolean {
  return stack.media.every((medium) => medium.scalarDiagonal || medium.isotropic);
}

/**
 * Fields of the same stack with Q = 0, where p and s never meet: the field E^p, E^s of physics.md section 5.
 *
 * @param stack loaded at the wavelength; `hasScalarDiagonals`
 */
export function baseFields(stack: CompiledStack, wavelengthIndex: number, angleDeg: number): BaseFields {
  stack.load(wavelengthIndex);
  const geometry = incidenceGeometry(stack.incidentIndex(wavelengthIndex)[0], angleDeg);
  const k0 = (2 * Math.PI) / stack.wavelengthsNm[wavelengthIndex]!;
  const layers = stack.sequence.map((layer) => emptyLayer(layer.medium, layer.thicknessNm, geometry, k0));
  layers.push(emptyLayer(stack.substrate, Infinity, geometry, k0));
  const { n0, q0 } = geometry;
  fill(layers, 'p', (layer) => layer.zp, [q0 / (n0 * n0), 0], n0);
  fill(layers, 's', (layer) => layer.q, [q0, 0], 1);
  return { ...geometry, k0, layers };
}

function emptyLayer(medium: Medium, thicknessNm: number, geometry: Geometry, k0: number): BaseLayer {
  const root = forwardRoot(medium.diagonalLessXi2(1, geometry));
  const q: Complex = root[0] === 0 && root[1] === 0 ? [1e-150, 0] : root;
  const permittivity = medium.permittivity ?? [medium.tensor[0]!, medium.tensor[1]!];
  const none = (): Amplitudes => ({ a: [0, 0], b: [0, 0] });
  return {
    medium,
    thicknessNm,
    q,
    zp: over(q, permittivity),
    phi: Number.isFinite(thicknessNm) ? exponential(scaled(q, k0 * thicknessNm)) : [0, 0],
    p: none(),
    s: none(),
  };
}

/** exp(i z) */
function exponential(z: Complex): Complex {
  const size = Math.exp(-z[1]);
  return [size * Math.cos(z[0]), size * Math.sin(z[0])];
}

/**
 * One polarization, as recursion.ts does it but scalar: up with f = M x, g = N x, then down with x.
 *
 * @param z admittance g / f of a forward wave in a layer, z0 that of the incident medium
 * @param unit f of unit incident light
 */
function fill(
  layers: BaseLayer[],
  polarization: 'p' | 's',
  z: (layer: BaseLayer) => Complex,
  z0: Complex,
  unit: number,
): void {
  let m: Complex = [1, 0];
  let n: Complex = z(layers.at(-1)!);
  const reflected: Complex[] = [];
  const below: Complex[] = [];
  for (let j = layers.length - 2; j >= 0; j--) {
    const layer = layers[j]!;
    const zm = times(z(layer), m);
    const k = plus(zm, n);
    reflected[j] = over(minus(zm, n), k);
    below[j] = over(scaled(times(z(layer), layer.phi), 2), k);
    const top = times(reflected[j]!, times(layer.phi, layer.phi));
    m = plus([1, 0], top);
    n = times(z(layer), minus([1, 0], top));
  }
  let x = over(scaled(z0, 2 * unit), plus(times(z0, m), n));
  layers.forEach((layer, j) => {
    const gamma = reflected[j];
    layer[polarization] = { a: x, b: gamma ? times(times(gamma, layer.phi), x) : [0, 0] };
    if (below[j]) x = times(x, below[j]);
  });
}

/** Power through the top of a layer toward the substrate, in units of the incident power. */
export function fluxInto(fields: BaseFields, j: number, polarization: 'p' | 's'): number {
  const layer = fields.layers[j]!;
  const z = polarization === 'p' ? layer.zp : layer.q;
  const { a, b } = layer[polarization];
  const up = times(b, layer.phi);
  const f = plus(a, up);
  const g = times(z, minus(a, up));
  return (g[0] * f[0] + g[1] * f[1]) / fields.q0;
}
