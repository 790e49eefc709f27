import type { CapDesign } from '../../../shared/capDesign.ts';
import type { DesignPoint, PointReadings, SignalName } from '../../../shared/designPoint.ts';
import type { DemandName } from '../demands.ts';
import { failedDemands, signalOf } from '../demands.ts';
import type { Window } from './capWindows.ts';

/** Numbers as sentences have them: three digits, angles in mdeg. */
export function signalWords(signal: SignalName, value: number): string {
  return signal === 'rotation' || signal === 'ellipticity' ? `${digits(1000 * value)} mdeg` : digits(value);
}

export function nmWords(nm: number): string {
  return `${digits(nm)} nm`;
}

function digits(value: number): string {
  return String(Number(value.toPrecision(3)));
}

const signalLabels: Record<SignalName, string> = {
  rotation: 'Kerr rotation',
  ellipticity: 'Kerr ellipticity',
  amplitude: 'cross-polarized amplitude',
  contrast: 'transverse contrast',
};

/** Why a thickness was chosen. */
export function reasonFor(
  design: CapDesign,
  choice: {
    nm: number;
    yield: number;
    isRobust: boolean;
    window: Window | undefined;
    worst: { label: string; signal: number; costPercent: number | null };
  },
): string {
  const { worst, window } = choice;
  const label = signalLabels[design.signal];
  const where = window
    ? `; the nominal film meets them from ${nmWords(window.fromNm)} to ${nmWords(window.toNm)}`
    : '';
  const share = percent(choice.yield, design.tolerance.samples);
  const asked = `${Number((100 * design.leastYield).toPrecision(6))} %`;
  const at = design.points.length > 1 ? ` at ${worst.label}, its weakest working point` : '';
  const robust = choice.isRobust
    ? `${share} of the films protect and meet all demands (${asked} were asked), and of such thicknesses this one has the greatest lower edge of the ${label}${at}`
    : `only ${share} of the films protect and meet all demands (${asked} were asked), the most of any thickness`;
  const cost =
    worst.costPercent === null
      ? ''
      : worst.costPercent >= 0
        ? `, ${digits(worst.costPercent)} % less than without a cap`
        : `, ${digits(-worst.costPercent)} % more than without a cap`;
  const there = design.points.length > 1 ? ` there` : '';
  return `${nmWords(choice.nm)}: ${robust}${where}; ${label}${there} ${signalWords(design.signal, worst.signal)}${cost}.`;
}

/** With the decimals that so many samples have, so that what is below a limit does not read as if it were at it. */
function percent(share: number, samples: number): string {
  const decimals = Math.max(0, Math.ceil(Math.log10(samples)) - 2);
  return `${Number((100 * share).toFixed(decimals))} %`;
}

const demandLabels: Record<DemandName, string> = {
  leastRotationDeg: 'Kerr rotation',
  leastAmplitude: 'cross-polarized amplitude',
  leastContrast: 'transverse contrast',
  leastReflectance: 'reflectance',
  mostEllipticityDeg: 'Kerr ellipticity',
  mostSlopePercentPerNm: 'change of the signal per nm',
};

/** What keeps every thickness from meeting the demands. */
export function obstacleOf(
  { points, demands, range, signal }: CapDesign,
  nm: readonly number[],
  leastNm: number,
  readings: PointReadings[][],
  slopes: (number | null)[][],
): string {
  if (leastNm === Infinity) {
    return 'The layer of fixed thickness is thinner than the least thickness that protects: make it thicker.';
  }
  const thick = nm.flatMap((one, position) => (one >= leastNm ? [position] : []));
  if (thick.length === 0) {
    return `The range ends at ${nmWords(range.toNm)}, below the ${nmWords(leastNm)} that protect: extend the range.`;
  }
  const failsAt = (point: number, position: number) =>
    failedDemands(readings[point]![position]!, demands, slopes[point]![position]);
  for (const name of Object.keys(demands) as DemandName[]) {
    const point = points.findIndex((_, index) =>
      thick.every((position) => failsAt(index, position).includes(name)),
    );
    if (point >= 0) return neverMet(name, points[point]!);
  }
  if (thick.every((position) => readings.every((list) => signalOf(list[position]!, signal) === null))) {
    return `There is no ${signalLabels[signal]} for any thickness that protects: the film reflects nothing.`;
  }
  return 'Each demand is met at some thickness, but no thickness meets all of them at every working point.';

  function neverMet(name: DemandName, point: DesignPoint): string {
    const limit = demands[name]!;
    const value = name.endsWith('Deg')
      ? `${digits(1000 * limit)} mdeg`
      : `${digits(limit)}${name === 'mostSlopePercentPerNm' ? ' % per nm' : ''}`;
    const bound = name.startsWith('least') ? `never reaches ${value}` : `is never as small as ${value}`;
    return `The ${demandLabels[name]} ${bound} at ${point.label} for any thickness that protects.`;
  }
}
