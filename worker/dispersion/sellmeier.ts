import type { Complex } from '../../shared/complex.ts';
import type { IndexModel } from '../../shared/dispersion.ts';
import { DispersionValueError } from './opticalValue.ts';

/**
 * n^2 = constant + sum of b L^2 / (L^2 - c), L in micrometres, c in um^2: W. Sellmeier, Ann. Phys. 219, 272 (1871),
 * in the form of optical glass catalogues, there with constant = 1.
 *
 * @throws DispersionValueError where n^2 is not positive, as on the short side of a pole
 */
export function sellmeierIndex(
  { constant, terms }: Extract<IndexModel, { name: 'sellmeier' }>,
  wavelengthNm: number,
): Complex {
  const l2 = (wavelengthNm / 1000) ** 2;
  const n2 = terms.reduce((sum, { b, cUm2 }) => sum + (b * l2) / (l2 - cUm2), constant);
  if (n2 > 0 && n2 < Infinity) return [Math.sqrt(n2), 0];
  throw new DispersionValueError(
    `the Sellmeier formula gives n^2 = ${n2} at ${wavelengthNm} nm: n^2 must be > 0, so keep the range away from the poles`,
  );
}
