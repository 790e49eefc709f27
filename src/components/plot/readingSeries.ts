import { readingDefinitions } from '../../../shared/readings.ts';
import type { ReadingName, SweepAxis } from '../../../shared/run.ts';
import { formatNumber, fromDegrees } from '../../lib/format.ts';
import type { AngleUnit } from '../../lib/format.ts';
import type { PlotAxis, PlotSeries } from './plotTypes.ts';
import { families } from './readingView.ts';
import type { Family } from './readingView.ts';

/** How each family looks everywhere: colour, dash, name at the curve. */
export const familyLooks: Record<
  Family,
  Pick<PlotSeries, 'tone' | 'dash'> & { word: string; width: number }
> = {
  rotation: { tone: 'rotation', dash: 'solid', word: 'rotation', width: 2.4 },
  ellipticity: { tone: 'ellipticity', dash: 'dashed', word: 'ellipticity', width: 2.2 },
  reflectance: { tone: 'reflectance', dash: 'dotted', word: 'R', width: 1.8 },
  cross: { tone: 'magnet', dash: 'solid', word: '|r|', width: 2 },
  contrast: { tone: 'ink', dash: 'dashed', word: 'contrast', width: 2 },
  ceiling: { tone: 'accent', dash: 'dotted', word: 'share of ceiling', width: 2.2 },
};

const crossNames = { p: '|r_sp|', s: '|r_ps|' } as const;

export type ReadingPlotData = { series: PlotSeries[]; yAxes: PlotAxis[] };

/**
 * The curves and axes of a set of readings: Kerr angles on the left in the unit of the screen, then reflectance,
 * cross-polarized amplitude and contrast (in thousandths), each family that is there on an axis of its own.
 *
 * @param columns one value a grid point, angles in degrees, NaN for none
 */
export function readingSeries(
  grid: ArrayLike<number>,
  columns: Partial<Record<ReadingName, ArrayLike<number>>>,
  readings: readonly ReadingName[],
  unit: AngleUnit,
  log: boolean,
): ReadingPlotData {
  const present = readings.filter((name) => columns[name] !== undefined);
  const lights = present.flatMap((name) => readingDefinitions[name].polarization ?? []);
  const both = new Set(lights).size > 1;
  const kinds = axisOrder.filter((kind) => present.some((name) => axisOf(name) === kind));
  const series = present.flatMap((name): PlotSeries[] => {
    const { family, polarization } = readingDefinitions[name];
    const kind = axisOf(name);
    const values = columns[name];
    if (kind === null || values === undefined || !isFamily(family)) return [];
    const { word, width, ...look } = familyLooks[family];
    const plain = family === 'cross' && polarization ? crossNames[polarization] : word;
    return [
      {
        ...look,
        name: both && family !== 'cross' && polarization ? `${plain} ${polarization}` : plain,
        x: grid,
        y: scaled(values, kind, unit),
        width: polarization === 's' ? width * 0.6 : width,
        symbol: polarization === 's' ? 'open' : 'none',
        yAxisIndex: kinds.indexOf(kind),
      },
    ];
  });
  return { series, yAxes: kinds.map((kind) => axisFor(kind, unit, log)) };
}

const axisOrder = ['angle', 'reflectance', 'cross', 'contrast', 'ceiling'] as const;
type AxisKind = (typeof axisOrder)[number];

function axisOf(name: ReadingName): AxisKind | null {
  const { family } = readingDefinitions[name];
  if (family === 'rotation' || family === 'ellipticity') return 'angle';
  return isFamily(family) ? family : null;
}

function isFamily(family: string): family is Family {
  return families.some((one) => one === family);
}

function scaled(values: ArrayLike<number>, kind: AxisKind, unit: AngleUnit): ArrayLike<number> {
  const factor =
    kind === 'angle'
      ? fromDegrees(1, unit)
      : { reflectance: 1, cross: 1000, contrast: 1000, ceiling: 100 }[kind];
  return factor === 1 ? values : Float64Array.from(values, (value) => value * factor);
}

function axisFor(kind: AxisKind, unit: AngleUnit, log: boolean): PlotAxis {
  const label = (name: string) => (log ? `abs(${name})` : name);
  switch (kind) {
    case 'angle':
      return { label: label(unit), log, include: [0], format: (value) => `${signed(value)} ${unit}` };
    case 'reflectance':
      return { label: 'R', log, include: [0], most: 1, format: (value) => formatNumber(value) };
    case 'cross':
      return { label: '|r| × 10³', log, include: [0], format: (value) => `${formatNumber(value)} × 10⁻³` };
    case 'contrast':
      return {
        label: log ? 'abs(contrast) × 10³' : 'contrast × 10³',
        log,
        include: [0],
        format: (value) => `${signed(value)} × 10⁻³`,
      };
    case 'ceiling':
      return { label: '% of ceiling', log, include: [0], format: (value) => `${formatNumber(value)} %` };
  }
}

function signed(value: number): string {
  return formatNumber(value, { signed: true });
}

/** From where to where m turns as its angle rises, by plane. */
export const planeEnds = { xz: '+z toward +x', yz: '+z toward +y', xy: '+x toward +y' } as const;

/** The x axis of a sweep in words. */
export function sweepXAxis(axis: SweepAxis, layerName?: string): PlotAxis {
  const log = axis.spacing === 'log';
  switch (axis.kind) {
    case 'wavelength':
      return { label: 'wavelength (nm)', log, format: (value) => `${plain(value)} nm` };
    case 'angle':
      return { label: 'angle of incidence (deg)', log, format: (value) => `${plain(value)}°` };
    case 'thickness':
      return {
        label: `thickness of ${layerName ?? 'the layer'} (nm)`,
        log,
        format: (value) => `${plain(value)} nm`,
      };
    case 'direction':
      return {
        label: `m from ${planeEnds[axis.plane]}${layerName ? `, ${layerName}` : ''} (deg)`,
        log,
        format: (value) => `${plain(value)}°`,
      };
    case 'voigtScale':
      return {
        label: `Q of ${layerName ?? 'every magnet'} times`,
        log,
        format: (value) => `Q × ${plain(value)}`,
      };
    case 'repeat':
      return { label: 'repeats', log, format: (value) => `${plain(value)} repeats` };
    case 'graded':
      return {
        label: `interface width above ${layerName ?? 'the layer'} (nm)`,
        log,
        format: (value) => `${plain(value)} nm`,
      };
  }
}

/** Seven digits: a grid of 1e6 points over 90 deg still has distinct values. */
function plain(value: number): string {
  return String(Number(value.toPrecision(7)));
}

/** One reading as every plot draws it, for a map or a family: values in the unit of the screen, look and axis. */
export function oneReading(
  name: ReadingName,
  values: ArrayLike<number>,
  unit: AngleUnit,
  log: boolean,
): {
  values: ArrayLike<number>;
  look: Pick<PlotSeries, 'name' | 'tone' | 'dash' | 'width'>;
  axis: PlotAxis;
} | null {
  const { series, yAxes } = readingSeries(values, { [name]: values }, [name], unit, log);
  const [one] = series;
  const [axis] = yAxes;
  if (!one || !axis) return null;
  const { polarization, family } = readingDefinitions[name];
  const light = polarization && family !== 'cross' ? ` ${polarization}` : '';
  const { tone, dash = 'solid', width = 2 } = one;
  return { values: one.y, look: { name: one.name + light, tone, dash, width }, axis };
}
