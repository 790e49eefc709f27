import type { ReadingName } from '../../../../shared/run.ts';
import { readingDefinitions } from '../../../../shared/readings.ts';
import type { Polarization } from '../../../../shared/stack.ts';
import { formatAngle, formatNumber } from '../../../lib/format.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import type { StripReadings } from '../../../../shared/readingsStrip.ts';

export type StripReading = {
  family: 'rotation' | 'ellipticity' | 'reflectance' | 'cross' | 'contrast';
  label: string;
  anchor: string;
  value: string | null;
  unit: string;
  other: string;
};

const names: Record<StripReading['family'], { p: ReadingName; s: ReadingName; label: string }> = {
  rotation: { p: 'rotationP', s: 'rotationS', label: 'Kerr rotation' },
  ellipticity: { p: 'ellipticityP', s: 'ellipticityS', label: 'Kerr ellipticity' },
  reflectance: { p: 'reflectanceP', s: 'reflectanceS', label: 'Reflectance' },
  cross: { p: 'crossSp', s: 'crossPs', label: 'Cross-polarized' },
  contrast: { p: 'contrastP', s: 'contrastS', label: 'Transverse contrast' },
};

/** The fifth cell: how much of what the magnet allows is reached, or why there is nothing to say. */
export type CeilingCell = { percent: number } | { reason: string };

/**
 * @param magnetized whether any layer has an m other than 0
 * @param averaged whether intensities are added or averaged
 */
export function ceilingCell(
  readings: StripReadings | null,
  magnetized: boolean,
  averaged: boolean,
): CeilingCell | null {
  if (averaged) return { reason: 'intensities are averaged: no one amplitude' };
  if (!magnetized) return { reason: 'no layer is magnetized' };
  if (readings === null) return null;
  const share = readings.ceilingShare ?? null;
  return share === null
    ? { reason: 'no ceiling: the magnet does not absorb here' }
    : { percent: 100 * share };
}

/**
 * What the strip shows for the input light, the other light in small. For purely transverse m the contrast takes
 * the place of the rotation, which is zero then.
 */
export function stripReadings(
  readings: StripReadings | null,
  input: Polarization,
  transverse: boolean,
  unit: AngleUnit,
): StripReading[] {
  const other = input === 'p' ? 's' : 'p';
  const shown = [transverse ? 'contrast' : 'rotation', 'ellipticity', 'reflectance', 'cross'] as const;
  return shown.map((family) => {
    const name = names[family][input];
    const value = readings?.[name] ?? null;
    const otherValue = readings?.[names[family][other]] ?? null;
    return {
      family,
      label:
        family === 'cross' ? `${names.cross.label} ${readingDefinitions[name].symbol}` : names[family].label,
      anchor: readingDefinitions[name].anchor,
      value: value === null ? null : format(family, value, unit),
      unit: unitOf(family, unit),
      other: `${other} light ${otherValue === null ? '–' : format(family, otherValue, unit)}`,
    };
  });
}

function unitOf(family: StripReading['family'], angleUnit: AngleUnit): string {
  switch (family) {
    case 'rotation':
    case 'ellipticity':
      return angleUnit;
    case 'reflectance':
      return '';
    case 'cross':
    case 'contrast':
      return '× 10⁻³';
  }
}

function format(family: StripReading['family'], value: number, unit: AngleUnit): string {
  switch (family) {
    case 'rotation':
    case 'ellipticity':
      return formatAngle(value, unit);
    case 'reflectance':
      return formatNumber(value);
    case 'cross':
      return formatNumber(value * 1000);
    case 'contrast':
      // A difference of two reflectances: below this it is the rounding of doubles, not a signal.
      return Math.abs(value) < 1e-13 ? '0' : formatNumber(value * 1000, { signed: true });
  }
}
