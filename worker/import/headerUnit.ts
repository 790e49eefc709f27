import type { angleUnits, conductivityUnits, SpectralUnit } from '../../shared/materialImport.ts';

export type ColumnUnit = SpectralUnit | (typeof angleUnits)[number] | (typeof conductivityUnits)[number];

const spellings: [RegExp, ColumnUnit][] = [
  [/^(nm|nanomet(er|re)s?)$/i, 'nm'],
  [/^([uµμ]m|microns?|micromet(er|re)s?)$/i, 'um'],
  [/^(A|Å|Å|ang(str[oö]ms?)?)$/i, 'A'],
  [/^(eV|electronvolts?)$/i, 'eV'],
  [/^(cm\^?\{?[-−]1\}?|cm⁻¹|1\/cm)$/i, 'cm-1'],
  [/^THz$/i, 'THz'],
  [/^(deg(rees?)?|°)$/i, 'deg'],
  [/^(mdeg|millideg(rees?)?|m°)$/i, 'mdeg'],
  [/^(mrad|milliradians?)$/i, 'mrad'],
  [/^rad(ians?)?$/i, 'rad'],
  [/^(arcmin(utes?)?|['′])$/i, 'arcmin'],
  [/^(s\^?\{?[-−]1\}?|s⁻¹|1\/s)$/, 's^-1'],
  [/^(S\/m|S m\^?-1|S·?m⁻¹|\(?(ohm|Ω)[ ·]?m\)?\^?[-−]1)$/, 'S/m'],
];

/** Takes a unit off a header: `Wavelength [nm]`, `lambda (um)`, `E / eV`, `wavelength_nm`, `nm`. */
export function splitHeaderUnit(header: string): { name: string; unit: ColumnUnit | null } {
  const whole = header.trim();
  if (!/^['′]$/.test(whole) && unitOf(whole) && whole.length > 1) return { name: '', unit: unitOf(whole) };
  const patterns = [
    /^(.*?)\s*[[(]\s*([^[\]]+?)\s*[\])]$/,
    /^(.*?)\s*\/\s*(\S+)$/,
    /^(.*)(?:_|,|\s+in|\s)\s*([^\s_,]+)$/,
  ];
  for (const pattern of patterns) {
    const [, name, token] = pattern.exec(whole) ?? [];
    const unit = token === undefined ? null : unitOf(token);
    if (name && unit) return { name, unit };
  }
  return { name: whole, unit: null };
}

function unitOf(token: string): ColumnUnit | null {
  return spellings.find(([spelling]) => spelling.test(token))?.[1] ?? null;
}
