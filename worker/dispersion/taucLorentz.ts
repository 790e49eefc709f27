import type { Complex } from '../../shared/complex.ts';
import type { Oscillator } from '../../shared/dispersion.ts';
import { DispersionValueError } from './opticalValue.ts';

type TaucLorentz = Extract<Oscillator, { kind: 'tauc-lorentz' }>;

/**
 * What one Tauc-Lorentz oscillator adds to the permittivity: G. E. Jellison and F. A. Modine, Appl. Phys. Lett. 69,
 * 371 (1996), with the erratum 69, 2137. Imaginary part eq. (4); real part the closed form of its Kramers-Kronig
 * integral, eq. (6), without eps1(infinity). Its last two terms are joined here, so that E = Eg has a value.
 *
 * @throws DispersionValueError for an overdamped oscillator, where the closed form does not hold
 */
export function taucLorentzTerm(oscillator: TaucLorentz, energyEv: number): Complex {
  return [realPart(oscillator, energyEv), imaginaryPart(oscillator, energyEv)];
}

function imaginaryPart(
  { amplitudeEv: a, gapEv, centreEv: e0, dampingEv: c }: TaucLorentz,
  e: number,
): number {
  if (e <= gapEv) return 0;
  return (a * e0 * c * (e - gapEv) ** 2) / (((e * e - e0 * e0) ** 2 + c * c * e * e) * e);
}

function realPart({ amplitudeEv: a, gapEv: eg, centreEv: e0, dampingEv: c }: TaucLorentz, e: number): number {
  if (c >= 2 * e0) {
    throw new DispersionValueError(
      `a Tauc-Lorentz oscillator needs a damping below twice its centre energy (${2 * e0} eV), got ${c} eV`,
    );
  }
  const [e2, eg2, e02, c2] = [e * e, eg * eg, e0 * e0, c * c];
  const alpha = Math.sqrt(4 * e02 - c2);
  const gamma2 = e02 - c2 / 2;
  const zeta4 = (e2 - gamma2) ** 2 + (alpha * alpha * c2) / 4;
  const aLn = (eg2 - e02) * e2 + eg2 * c2 - e02 * (e02 + 3 * eg2);
  const aAtan = (e2 - e02) * (e02 + eg2) + eg2 * c2;
  const logRatio = Math.log((e02 + eg2 + alpha * eg) / (e02 + eg2 - alpha * eg));
  const angles = Math.PI - Math.atan((2 * eg + alpha) / c) + Math.atan((alpha - 2 * eg) / c);
  const gapAngle = Math.PI + 2 * Math.atan((2 * (gamma2 - eg2)) / (alpha * c));
  const gapLog = Math.log(Math.hypot(e02 - eg2, eg * c));
  const edge = (squareTimesLog(e - eg) - squareTimesLog(e + eg)) / e + 2 * eg * gapLog;
  const sum =
    (c * aLn * logRatio) / (2 * alpha * e0) -
    (aAtan * angles) / e0 +
    (2 * e0 * eg * (e2 - gamma2) * gapAngle) / alpha -
    e0 * c * edge;
  return (a * sum) / (Math.PI * zeta4);
}

/** x^2 ln |x|, 0 at 0. */
function squareTimesLog(x: number): number {
  return x === 0 ? 0 : x * x * Math.log(Math.abs(x));
}
