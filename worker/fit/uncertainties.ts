import { Matrix, SVD } from 'ml-matrix';
import { lengthOf } from './jacobian.ts';

/** Two parameters, by position, and the correlation of their errors. */
export type Correlation = { first: number; second: number; rho: number };

export type Uncertainties = {
  /** One standard deviation of each parameter; null where the data do not determine it. */
  deviations: (number | null)[];
  /** Pairs beyond `STRONG`, the strongest first. */
  correlations: Correlation[];
};

/** Correlation from which on two parameters are said to be hard to tell apart. */
const STRONG = 0.98;
/** Singular values below this fraction of the largest are 0 but for the error of the difference quotients. */
const SINGULAR = 1e-8;
/** Part of a parameter in an undetermined direction from which on it counts as undetermined itself. */
const INVOLVED = 1e-3;

/**
 * Uncertainties of fitted parameters: with residuals of variance s^2, the covariance is s^2 (J^T J)^-1 at the minimum
 * (W. H. Press et al., Numerical Recipes, 3rd ed., sections 15.4 and 15.6), here by the singular values of J with
 * its columns scaled to length 1, which does not square its condition.
 *
 * @param columns derivatives of the compared values by each parameter
 * @param variance sum of the squares of the residuals over (values - parameters)
 */
export function uncertainties(columns: readonly Float64Array[], variance: number): Uncertainties {
  const lengths = columns.map(lengthOf);
  const scaled = columns.map((column, j) => column.map((entry) => entry / (lengths[j]! || 1)));
  const svd = new SVD(new Matrix(scaled).transpose(), { computeLeftSingularVectors: false });
  const { rightSingularVectors: directions, diagonal } = svd;
  const determined = diagonal.map((value) => value > SINGULAR * diagonal[0]!);
  /** Sum over the determined directions of V V^T / singular value^2. */
  const inverse = (i: number, j: number) =>
    diagonal.reduce((sum, value, d) => {
      return determined[d]! ? sum + (directions.get(i, d) * directions.get(j, d)) / value ** 2 : sum;
    }, 0);
  const deviations = columns.map((_, i) => {
    const isLost = diagonal.some((_value, d) => !determined[d]! && Math.abs(directions.get(i, d)) > INVOLVED);
    return isLost ? null : Math.sqrt(variance * inverse(i, i)) / lengths[i]!;
  });
  const known = deviations.flatMap((deviation, position) => (deviation === null ? [] : [position]));
  const correlations = known
    .flatMap((first) => known.filter((other) => other > first).map((second) => ({ first, second })))
    .map(({ first, second }) => ({
      first,
      second,
      rho: inverse(first, second) / Math.sqrt(inverse(first, first) * inverse(second, second)),
    }))
    .filter(({ rho }) => Math.abs(rho) > STRONG)
    .sort((one, other) => Math.abs(other.rho) - Math.abs(one.rho));
  return { deviations, correlations };
}
