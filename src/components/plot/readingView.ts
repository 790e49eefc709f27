import { readingDefinitions } from '../../../shared/readings.ts';
import { readingNames } from '../../../shared/run.ts';
import type { ReadingName } from '../../../shared/run.ts';
import type { AngleUnit } from '../../lib/format.ts';

/** The kinds of reading that a plot offers, in the order of their switches. */
export const families = ['rotation', 'ellipticity', 'reflectance', 'cross', 'contrast', 'ceiling'] as const;
export type Family = (typeof families)[number];
export type Light = 'p' | 's' | 'ps';

/** How readings are shown; null stands for the choice that follows from the stack or the run. */
export type ReadingView = {
  shown: readonly Family[] | null;
  light: Light | null;
  /** The one reading that a map or a family shows. */
  reading: ReadingName | null;
  /** Logarithm of the absolute value on the y axes. */
  log: boolean;
  unit: AngleUnit;
};

/** Reads the part of an address that says how readings are shown. Nonsense falls back to the default. */
export function readReadingView(search: URLSearchParams): ReadingView {
  const shown = search.get('show')?.split(',');
  const light = search.get('light');
  const unit = search.get('unit');
  return {
    shown: shown ? families.filter((family) => shown.includes(family)) : null,
    light: light === 'p' || light === 's' || light === 'ps' ? light : null,
    reading: readingNames.find((name) => name === search.get('reading')) ?? null,
    log: search.get('scale') === 'log',
    unit: unit === 'deg' || unit === 'mrad' ? unit : 'mdeg',
  };
}

/** Writes it back; defaults are left out. */
export function writeReadingView(view: ReadingView, search: URLSearchParams): void {
  const set = (key: string, value: string | null) => {
    if (value === null) search.delete(key);
    else search.set(key, value);
  };
  set('show', view.shown?.join(',') ?? null);
  set('light', view.light);
  set('reading', view.reading);
  set('scale', view.log ? 'log' : null);
  set('unit', view.unit === 'mdeg' ? null : view.unit);
}

/** The readings of these families for this light, in their fixed order. */
export function readingsOf(shown: readonly Family[], light: Light): ReadingName[] {
  return readingNames.filter((name) => {
    const { family, polarization } = readingDefinitions[name];
    const drawn = shown.some((one) => one === family) && name !== 'stackCeiling';
    return drawn && (polarization === null || light.includes(polarization));
  });
}

/** The families that a set of readings has. */
export function familiesOf(readings: readonly ReadingName[]): Family[] {
  return families.filter((family) => readings.some((name) => readingDefinitions[name].family === family));
}

/** The lights that a set of readings has. */
export function lightsOf(readings: readonly ReadingName[]): Light {
  const has = (polarization: 'p' | 's') =>
    readings.some((name) => readingDefinitions[name].polarization === polarization);
  return has('p') && has('s') ? 'ps' : has('s') ? 's' : 'p';
}
