import { splitHeaderUnit } from './headerUnit.ts';
import type { ColumnUnit } from './headerUnit.ts';

export type Meaning = {
  quantity: 'wavelength' | 'energy' | 'wavenumber' | 'frequency' | Tabled;
  unit: ColumnUnit | null;
};

export type Tabled =
  | 'n'
  | 'k'
  | 'eps1'
  | 'eps2'
  | 'Q re'
  | 'Q im'
  | 'eps_xy re'
  | 'eps_xy im'
  | 'sigma_xy re'
  | 'sigma_xy im'
  | 'rotation'
  | 'ellipticity';

/** Names that mean one thing, after blanks, underscores and hyphens are taken out. */
const names: [RegExp, Meaning['quantity']][] = [
  [/^(vacuum|vac|free)?(wavelength|wavelen|wave|lambda|λ|lam|wl|wvl)(vac|0)?$/, 'wavelength'],
  [/^(photon)?(energy|e|en|hν|hv|ħω|hω|hw)$/, 'energy'],
  [/^(wavenumber|wavenumbers|ν̃)$/, 'wavenumber'],
  [/^(frequency|freq|ν|f)$/, 'frequency'],
  [/^(n|refractiveindex|index)$/, 'n'],
  [/^(k|kappa|κ|extinction(coefficient)?)$/, 'k'],
  [/^(polar)?(kerr|moke)?(rotation|rot|theta|θ|phi|φ)(angle)?k?(err)?$/, 'rotation'],
  [/^(polar)?(kerr|moke)?(ellipticity|ell|eta|η|chi|χ)(angle)?k?(err)?$/, 'ellipticity'],
];

/** Complex quantities: real part, imaginary part. */
const complex: [RegExp, Tabled, Tabled][] = [
  [/^(n|refractiveindex)$/, 'n', 'k'],
  [/^(eps|epsilon|ε|ϵ|e|permittivity|dielectricfunction)(xx|d|diag)?$/, 'eps1', 'eps2'],
  [/^(q|voigt|voigtconstant|qvoigt)$/, 'Q re', 'Q im'],
  [/^(eps|epsilon|ε|ϵ|e)xy$/, 'eps_xy re', 'eps_xy im'],
  [/^(sigma|sig|σ|s)xy$/, 'sigma_xy re', 'sigma_xy im'],
];

/** Where the part is written: `Re(eps)`, `Im Q`, `eps1xy`, `Q'`, `eps_xy_im`. */
const parts: { pattern: RegExp; part: 're' | 'im' }[] = [
  { pattern: /^re(?:al)?(?:part)?(?:of)?[([{]?(.+?)[)\]}]?$/, part: 're' },
  { pattern: /^im(?:ag|aginary)?(?:part)?(?:of)?[([{]?(.+?)[)\]}]?$/, part: 'im' },
  { pattern: /^(.+?)(?:''|"|”|″|′′)(xy|xx)?$/, part: 'im' },
  { pattern: /^(.+?)(?:'|’|′)(xy|xx)?$/, part: 're' },
  { pattern: /^(.*[^n\d])1(xy|xx)?$/, part: 're' },
  { pattern: /^(.*[^n\d])2(xy|xx)?$/, part: 'im' },
  { pattern: /^(.+?)[([]?(?:real|re|r)[)\]]?$/, part: 're' },
  { pattern: /^(.+?)[([]?(?:imag|im|i)[)\]]?$/, part: 'im' },
];

/** What a header says about its column; null when it says nothing that is known. */
export function recogniseHeader(header: string): Meaning | null {
  const { name, unit } = splitHeaderUnit(header);
  const plain = name.toLowerCase().replace(/[\s_\-.,:{}]/g, '');
  const quantity =
    plain === '' ? spectralOf(unit) : (nameOf(plain) ?? partOf(plain) ?? complexOf(plain, 're'));
  return quantity === null ? null : { quantity, unit };
}

function nameOf(plain: string): Meaning['quantity'] | null {
  return names.find(([pattern]) => pattern.test(plain))?.[1] ?? null;
}

function partOf(plain: string): Tabled | null {
  for (const { pattern, part } of parts) {
    const match = pattern.exec(plain);
    const found = match && complexOf(`${match[1]}${match[2] ?? ''}`, part);
    if (found) return found;
  }
  return null;
}

function complexOf(plain: string, part: 're' | 'im'): Tabled | null {
  const found = complex.find(([pattern]) => pattern.test(plain));
  return found ? found[part === 're' ? 1 : 2] : null;
}

function spectralOf(unit: ColumnUnit | null): Meaning['quantity'] | null {
  if (unit === 'nm' || unit === 'um' || unit === 'A') return 'wavelength';
  if (unit === 'eV') return 'energy';
  if (unit === 'cm-1') return 'wavenumber';
  return unit === 'THz' ? 'frequency' : null;
}
