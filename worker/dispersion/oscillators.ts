import type { Complex } from '../../shared/complex.ts';
import type { IndexModel, Oscillator } from '../../shared/dispersion.ts';
import { photonEnergyEv } from '../../shared/units.ts';
import { over, plus } from '../optics/complexNumber.ts';
import { passiveRoot } from './opticalValue.ts';
import { taucLorentzTerm } from './taucLorentz.ts';

/**
 * N of eps = epsInfinity + sum of Drude, Lorentz and Tauc-Lorentz terms.
 *
 * @throws DispersionValueError where eps is 0 or not finite
 */
export function oscillatorsIndex(
  { epsInfinity, terms }: Extract<IndexModel, { name: 'oscillators' }>,
  wavelengthNm: number,
): Complex {
  const energyEv = photonEnergyEv(wavelengthNm);
  const eps = terms.reduce<Complex>(
    (sum, term) => plus(sum, permittivityTerm(term, energyEv)),
    [epsInfinity, 0],
  );
  return passiveRoot('the sum of oscillators', eps, wavelengthNm);
}

/** What one term adds to the permittivity, for exp(-iwt); the imaginary part is >= 0. */
function permittivityTerm(term: Oscillator, energyEv: number): Complex {
  switch (term.kind) {
    // P. Drude, Ann. Phys. 306, 566 (1900): -Ep^2 / (E^2 + i G E).
    case 'drude':
      return over([-(term.plasmaEv ** 2), 0], [energyEv ** 2, term.dampingEv * energyEv]);
    // H. A. Lorentz, The Theory of Electrons (1909): f E0^2 / (E0^2 - E^2 - i G E).
    case 'lorentz':
      return over(
        [term.strength * term.centreEv ** 2, 0],
        [term.centreEv ** 2 - energyEv ** 2, -term.dampingEv * energyEv],
      );
    case 'tauc-lorentz':
      return taucLorentzTerm(term, energyEv);
  }
}
