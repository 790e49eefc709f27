import { angleUnits, conductivityUnits, spectralUnits } from '../../../../shared/materialImport.ts';

/** What a column of a table can be. */
export const columnRoles = [
  'unused',
  'spectral',
  'n',
  'k',
  'eps1',
  'eps2',
  'Re Q',
  'Im Q',
  'Re eps_xy',
  'Im eps_xy',
  'Re sigma_xy',
  'Im sigma_xy',
  'rotation',
  'ellipticity',
] as const;

export type ColumnRole = (typeof columnRoles)[number];

export const roleLabels: Record<ColumnRole, string> = {
  unused: 'not used',
  spectral: 'wavelength or energy',
  n: 'n',
  k: 'k',
  eps1: 'ε₁ = Re ε',
  eps2: 'ε₂ = Im ε',
  'Re Q': 'Re Q',
  'Im Q': 'Im Q',
  'Re eps_xy': 'Re ε_xy',
  'Im eps_xy': 'Im ε_xy',
  'Re sigma_xy': 'Re σ_xy',
  'Im sigma_xy': 'Im σ_xy',
  rotation: 'Kerr rotation',
  ellipticity: 'Kerr ellipticity',
};

/** Columns of one kind share one unit. */
export type UnitKind = 'spectral' | 'conductivity' | 'angle';

export function unitKindOf(role: ColumnRole): UnitKind | null {
  switch (role) {
    case 'spectral':
      return 'spectral';
    case 'Re sigma_xy':
    case 'Im sigma_xy':
      return 'conductivity';
    case 'rotation':
    case 'ellipticity':
      return 'angle';
    default:
      return null;
  }
}

export const unitLabels = {
  nm: 'nm',
  um: 'µm',
  A: 'Å',
  eV: 'eV',
  'cm-1': 'cm⁻¹',
  THz: 'THz',
  's^-1': 's⁻¹ (CGS)',
  'S/m': 'S/m (SI)',
  deg: 'deg',
  mdeg: 'mdeg',
  mrad: 'mrad',
  rad: 'rad',
  arcmin: 'arcmin',
} as const;

export const unitsOf = {
  spectral: spectralUnits,
  conductivity: conductivityUnits,
  angle: angleUnits,
} as const;

/** Quantities given by two columns, a real and an imaginary part, and whether the second may be missing. */
export const columnPairs = {
  'n, k': { first: 'n', second: 'k', both: false },
  'eps1, eps2': { first: 'eps1', second: 'eps2', both: false },
  Q: { first: 'Re Q', second: 'Im Q', both: false },
  eps_xy: { first: 'Re eps_xy', second: 'Im eps_xy', both: false },
  sigma_xy: { first: 'Re sigma_xy', second: 'Im sigma_xy', both: false },
  'Kerr angles': { first: 'rotation', second: 'ellipticity', both: true },
} as const;

export const indexPairs = ['n, k', 'eps1, eps2'] as const;
export const voigtPairs = ['Q', 'eps_xy', 'sigma_xy', 'Kerr angles'] as const;
