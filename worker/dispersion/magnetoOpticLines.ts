import type { Complex } from '../../shared/complex.ts';
import type { MagnetoOpticLine } from '../../shared/dispersion.ts';
import { over, plus, scaled, times } from '../optics/complexNumber.ts';

/**
 * Sum of lines at a photon energy in eV, with F = E + iG (shared/dispersion.ts): causal, and odd in E in the sense
 * f(-E) = -conj f(E), as a gyration must be for eps_xy = i g to be real in time. Shapes as by F. J. Kahn,
 * P. S. Pershan and J. P. Remeika, Phys. Rev. 186, 891 (1969), where the same transitions are called
 * paramagnetic (unequal strengths) and diamagnetic (split energies); the closed forms are ours.
 */
export function sumOfLines(lines: readonly MagnetoOpticLine[], energyEv: number): Complex {
  return lines.reduce<Complex>((sum, line) => plus(sum, lineAt(line, energyEv)), [0, 0]);
}

function lineAt({ shape, amplitude, centreEv, dampingEv }: MagnetoOpticLine, energyEv: number): Complex {
  const f: Complex = [energyEv, dampingEv];
  // E0^2 - F^2 as (E0 - F)(E0 + F): a narrow line keeps its digits at its centre.
  const distance = times([centreEv - energyEv, -dampingEv], [centreEv + energyEv, dampingEv]);
  const paramagnetic = over(scaled(f, amplitude * centreEv), distance);
  return shape === 'paramagnetic' ? paramagnetic : over(scaled(paramagnetic, centreEv ** 2), distance);
}
