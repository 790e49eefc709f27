/** Nodes of an average: a value and its weight; the weights add up to 1. */
export type Node = { value: number; weight: number };

export const spreadShapes = ['normal', 'uniform'] as const;
export type SpreadShape = (typeof spreadShapes)[number];

// Seven-point rules, exact for polynomials up to degree 13 (Abramowitz & Stegun, tables 25.10 and 25.4).
const GAUSS_HERMITE: readonly [abscissa: number, weight: number][] = [
  [0, 0.810264617556807],
  [0.816287882858965, 0.425607252610128],
  [1.673551628767471, 0.054515582819127],
  [2.651961356835233, 0.000971781245099519],
];
const GAUSS_LEGENDRE: readonly [abscissa: number, weight: number][] = [
  [0, 0.417959183673469],
  [0.405845151377397, 0.381830050505119],
  [0.741531185599394, 0.279705391489277],
  [0.949107912342759, 0.12948496616887],
];

/**
 * Seven nodes about a centre for a distribution of the stated standard deviation.
 *
 * @param deviation standard deviation, in the unit of the centre; 0 gives the centre alone
 */
export function spreadNodes(centre: number, deviation: number, shape: SpreadShape): Node[] {
  if (deviation === 0) return [{ value: centre, weight: 1 }];
  const rule = shape === 'normal' ? GAUSS_HERMITE : GAUSS_LEGENDRE;
  // The Hermite weight is exp(-x^2): x = t / (sqrt 2 sigma). A uniform distribution of that sigma is 2 sqrt 3 sigma wide.
  const stretch = deviation * (shape === 'normal' ? Math.SQRT2 : Math.sqrt(3));
  const sum = rule.reduce((total, [abscissa, weight]) => total + (abscissa === 0 ? weight : 2 * weight), 0);
  return rule
    .flatMap(([abscissa, weight]) =>
      abscissa === 0
        ? [{ value: centre, weight: weight / sum }]
        : [-1, 1].map((side) => ({ value: centre + side * stretch * abscissa, weight: weight / sum })),
    )
    .sort((a, b) => a.value - b.value);
}
