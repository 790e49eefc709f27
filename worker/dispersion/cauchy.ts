import type { Complex } from '../../shared/complex.ts';
import type { IndexModel } from '../../shared/dispersion.ts';
import { photonEnergyEv } from '../../shared/units.ts';
import { passiveIndex } from './opticalValue.ts';

/**
 * n = a + b/L^2 + c/L^4, L in micrometres (A. L. Cauchy, 1836), with an exponential absorption tail
 * k = kA exp(perEv (E - atEv)) where one is given (F. Urbach, Phys. Rev. 92, 1324 (1953)).
 *
 * @throws DispersionValueError where n < 0 or N is not finite
 */
export function cauchyIndex(
  { a, bUm2, cUm4, tail }: Extract<IndexModel, { name: 'cauchy' }>,
  wavelengthNm: number,
): Complex {
  const l2 = (wavelengthNm / 1000) ** 2;
  const n = a + bUm2 / l2 + cUm4 / (l2 * l2);
  const k = tail ? tail.k * Math.exp(tail.perEv * (photonEnergyEv(wavelengthNm) - tail.atEv)) : 0;
  return passiveIndex('the Cauchy formula', [n, k], wavelengthNm);
}
