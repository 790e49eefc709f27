import type { Complex } from '../../shared/complex.ts';

/**
 * Fields inside a stack of isotropic layers by Abeles' 2x2 matrices (Born and Wolf, sec. 1.6), for the tests: an
 * independent way to the fields that the layer shares are integrals of.
 */
export type PlainFilm = { thicknessNm: number; index: Complex };

export type FieldAt = { exP: Complex; ezP: Complex; eyS: Complex };

const mul = (a: Complex, b: Complex): Complex => [a[0] * b[0] - a[1] * b[1], a[0] * b[1] + a[1] * b[0]];
const add = (a: Complex, b: Complex): Complex => [a[0] + b[0], a[1] + b[1]];
const div = (a: Complex, b: Complex): Complex => {
  const s = b[0] * b[0] + b[1] * b[1];
  return [(a[0] * b[0] + a[1] * b[1]) / s, (a[1] * b[0] - a[0] * b[1]) / s];
};

function sqrtForward(a: Complex): Complex {
  const modulus = Math.hypot(...a);
  const re = Math.sqrt(Math.max(0, (modulus + a[0]) / 2));
  const im = Math.sqrt(Math.max(0, (modulus - a[0]) / 2));
  return a[1] >= 0 ? [re, im] : [-re, im];
}

/** cos(w) and i sin(w) of a complex w. */
function circular([re, im]: Complex): [cos: Complex, iSin: Complex] {
  const [c, s, ch, sh] = [Math.cos(re), Math.sin(re), Math.cosh(im), Math.sinh(im)];
  return [
    [c * ch, -s * sh],
    [-c * sh, s * ch],
  ];
}

type State = { f: Complex; g: Complex };

/** From the state at depth z + d to that at depth z: f' = i y g, g' = i x f, with k0 d = phase. */
function back({ f, g }: State, x: Complex, y: Complex, phase: number): State {
  const q = sqrtForward(mul(x, y));
  const [cos, iSin] = circular([q[0] * phase, q[1] * phase]);
  const minus: Complex = [-iSin[0], -iSin[1]];
  return {
    f: add(mul(cos, f), mul(mul(minus, div(y, q)), g)),
    g: add(mul(cos, g), mul(mul(minus, div(x, q)), f)),
  };
}

/** Per polarization: f = Hy, g = Ex for p (f' = i eps g, g' = i (1 - xi^2/eps) f), f = Ey, g = -Hx for s. */
const coefficients = {
  p: (eps: Complex, xi: number): [x: Complex, y: Complex] => [
    add([1, 0], mul([-xi * xi, 0], div([1, 0], eps))),
    eps,
  ],
  s: (eps: Complex, xi: number): [x: Complex, y: Complex] => [add(eps, [-xi * xi, 0]), [1, 0]],
};

/**
 * @returns the field at a depth inside film `at`, for unit p and s light from a medium of index n0
 */
export function abelesFields(
  films: PlainFilm[],
  substrate: Complex,
  { n0, angleDeg, wavelengthNm }: { n0: number; angleDeg: number; wavelengthNm: number },
): (at: number, depthNm: number) => FieldAt {
  const theta = (angleDeg * Math.PI) / 180;
  const xi = n0 * Math.sin(theta);
  const k0 = (2 * Math.PI) / wavelengthNm;
  const states = (kind: 'p' | 's') => {
    const epsOf = (index: Complex) => mul(index, index);
    const [xs, ys] = coefficients[kind](epsOf(substrate), xi);
    // In the substrate g = (q / y) f, with unit f.
    let state: State = { f: [1, 0], g: div(sqrtForward(mul(xs, ys)), ys) };
    const bottoms: State[] = [];
    for (const film of [...films].reverse()) {
      bottoms.unshift(state);
      const [x, y] = coefficients[kind](epsOf(film.index), xi);
      state = back(state, x, y, k0 * film.thicknessNm);
    }
    // Outside: p has Hy = n0 (1 + r), Ex = cos (1 - r); s has Ey = 1 + r, -Hx = n0 cos (1 - r).
    const cos = Math.cos(theta);
    const incident =
      kind === 'p'
        ? add(mul(state.f, [1 / n0, 0]), mul(state.g, [1 / cos, 0]))
        : add(state.f, mul(state.g, [1 / (n0 * cos), 0]));
    const scale = div([2, 0], incident);
    return { bottoms, scale };
  };
  const p = states('p');
  const s = states('s');
  return (at, depthNm) => {
    const film = films[at];
    const [pBottom, sBottom] = [p.bottoms[at], s.bottoms[at]];
    if (!film || !pBottom || !sBottom) throw new RangeError(`no film ${at}`);
    const eps = mul(film.index, film.index);
    const rest = k0 * (film.thicknessNm - depthNm);
    const pState = back(pBottom, ...coefficients.p(eps, xi), rest);
    const sState = back(sBottom, ...coefficients.s(eps, xi), rest);
    const hy = mul(pState.f, p.scale);
    return {
      exP: mul(pState.g, p.scale),
      ezP: div(mul([-xi, 0], hy), eps),
      eyS: mul(sState.f, s.scale),
    };
  };
}
