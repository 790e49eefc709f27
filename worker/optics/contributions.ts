import type { Complex } from '../../shared/complex.ts';
import type { BaseFields, BaseLayer } from './baseFields.ts';
import { fluxInto } from './baseFields.ts';
import { minus, modulus, over, plus, scaled, times } from './complexNumber.ts';

/** What one layer adds to the reflected amplitudes, to first order in Q. */
export type Share = { sp: Complex; ps: Complex; pp: Complex };

/**
 * The share of layer j of the fields (the substrate is the last one): the integrals of physics.md section 5 over a
 * homogeneous layer, in closed form. Zero for a layer that is not magnetic.
 */
export function layerShare(fields: BaseFields, j: number): Share {
  const layer = fields.layers[j]!;
  const { medium } = layer;
  const [mx, my, mz] = medium.m;
  const permittivity = medium.permittivity;
  const moment = Math.hypot(mx, my, mz);
  if (!permittivity || moment === 0 || (medium.voigt[0] === 0 && medium.voigt[1] === 0)) {
    return { sp: [0, 0], ps: [0, 0], pp: [0, 0] };
  }
  const { yx, yz, xz } = overlaps(fields, layer, permittivity);
  // (i k0 / 2 N0 cos theta) i Q eps_d
  const gyration = times(medium.voigt, permittivity);
  const weight = scaled(gyration, -fields.k0 / (2 * fields.q0));
  return {
    sp: times(weight, plus(scaled(yx, -mz), scaled(yz, mx))),
    ps: times(weight, scaled(plus(scaled(yx, mz), scaled(yz, mx)), -1)),
    pp: times(weight, scaled(xz, 2 * my)),
  };
}

/** Integrals over depth of Ey^s Ex^p, Ey^s Ez^p and Ex^p Ez^p; both polarizations share q. */
function overlaps(fields: BaseFields, layer: BaseLayer, permittivity: Complex) {
  const { p, s, zp, phi, thicknessNm } = layer;
  const kappa = scaled(layer.q, fields.k0);
  const along = oneWayIntegral(kappa, phi, thicknessNm);
  const across = Number.isFinite(thicknessNm) ? scaled(phi, thicknessNm) : ([0, 0] as Complex);
  const ez = over([-fields.xi, 0], permittivity);
  const aa = times(s.a, p.a);
  const bb = times(s.b, p.b);
  const ab = times(s.a, p.b);
  const ba = times(s.b, p.a);
  return {
    yx: times(zp, plus(times(minus(aa, bb), along), times(minus(ba, ab), across))),
    yz: times(ez, plus(times(plus(aa, bb), along), times(plus(ba, ab), across))),
    xz: times(times(ez, zp), times(minus(times(p.a, p.a), times(p.b, p.b)), along)),
  };
}

/** Integral of exp(2 i kappa z) over the layer; over a half space the limit of vanishing loss. */
function oneWayIntegral(kappa: Complex, phi: Complex, thicknessNm: number): Complex {
  const rate = scaled([-kappa[1], kappa[0]], 2);
  if (!Number.isFinite(thicknessNm)) return over([-1, 0], rate);
  if (modulus(rate) * thicknessNm < 1e-5) {
    // exp(x) - 1 over x by its series, where the difference would cancel.
    const x = scaled(rate, thicknessNm);
    return scaled(plus(plus([1, 0], scaled(x, 0.5)), scaled(times(x, x), 1 / 6)), thicknessNm);
  }
  return over(minus(times(phi, phi), [1, 0]), rate);
}

export type Ceiling = {
  /** First-order bound on |r_sp| of this stack; null where a magnetic medium does not absorb. */
  stack: number | null;
  /** What no arrangement of other layers can beat: the largest |m| |Q eps_d| / (2 Im eps_d). */
  material: number | null;
};

/**
 * The ceiling of physics.md section 4, to first order in Q: the sum over magnetic materials of
 * |m| |Q eps_d| / (2 Im eps_d) sqrt(A_p A_s).
 *
 * Layers of one material may differ in |m|, which then weighs their absorption (Cauchy-Schwarz).
 */
export function ceiling(fields: BaseFields): Ceiling {
  const groups = new Map<string, { strength: number; p: number; s: number; moment: number }>();
  for (const [j, { medium }] of fields.layers.entries()) {
    const moment = Math.hypot(...medium.m);
    const { permittivity, voigt } = medium;
    if (!permittivity || moment === 0 || modulus(voigt) === 0) continue;
    const key = [...permittivity, ...voigt].join(' ');
    const group = groups.get(key) ?? {
      strength: modulus(times(voigt, permittivity)) / (2 * permittivity[1]),
      p: 0,
      s: 0,
      moment: 0,
    };
    group.p += moment * lossIn(fields, j, 'p');
    group.s += moment * lossIn(fields, j, 's');
    group.moment = Math.max(group.moment, moment);
    groups.set(key, group);
  }
  const all = [...groups.values()];
  if (all.length === 0 || all.some(({ strength }) => !Number.isFinite(strength))) {
    return { stack: null, material: null };
  }
  return {
    stack: all.reduce((sum, { strength, p, s }) => sum + strength * Math.sqrt(Math.max(0, p * s)), 0),
    material: Math.max(...all.map(({ strength, moment }) => strength * moment)),
  };
}

/** Energy that light loses in layer j; an absorbing substrate takes all that reaches it. */
function lossIn(fields: BaseFields, j: number, polarization: 'p' | 's'): number {
  const into = fluxInto(fields, j, polarization);
  return j === fields.layers.length - 1 ? into : into - fluxInto(fields, j + 1, polarization);
}
