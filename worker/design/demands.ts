import type { Demands, PointReadings, SignalName } from '../../shared/designPoint.ts';

/** Signals no larger than this, deg or 1, are rounding: there is nothing to see. */
const ROUNDING = 1e-12;

/** The chosen signal with its sign, in deg or 1; null where it does not exist. */
export function signedSignalOf(readings: PointReadings, signal: SignalName): number | null {
  return {
    rotation: readings.rotationDeg,
    ellipticity: readings.ellipticityDeg,
    amplitude: readings.amplitude,
    contrast: readings.contrast,
  }[signal];
}

/** The size of the chosen signal, in deg or 1; null where it does not exist. */
export function signalOf(readings: PointReadings, signal: SignalName): number | null {
  const value = signedSignalOf(readings, signal);
  return value === null ? null : Math.abs(value);
}

/** Whether a signal exists and is more than rounding, so that others can be given as shares of it. */
export function isSeen(signal: number | null): signal is number {
  return signal !== null && Math.abs(signal) > ROUNDING;
}

export type DemandName = keyof Demands;

/** Which demands a reading at one working point does not meet; a reading that does not exist meets none. */
export function failedDemands(
  readings: PointReadings,
  demands: Demands,
  slopePercentPerNm: number | null = null,
): DemandName[] {
  const failed: DemandName[] = [];
  const atLeast = (name: DemandName, value: number | null) => {
    const least = demands[name];
    if (least !== undefined && !(value !== null && Math.abs(value) >= least)) failed.push(name);
  };
  const atMost = (name: DemandName, value: number | null) => {
    const most = demands[name];
    if (most !== undefined && !(value !== null && Math.abs(value) <= most)) failed.push(name);
  };
  atLeast('leastRotationDeg', readings.rotationDeg);
  atLeast('leastAmplitude', readings.amplitude);
  atLeast('leastContrast', readings.contrast);
  atLeast('leastReflectance', readings.reflectance);
  atMost('mostEllipticityDeg', readings.ellipticityDeg);
  atMost('mostSlopePercentPerNm', slopePercentPerNm);
  return failed;
}

/** Whether any demand or the signal needs the contrast, which costs a second state. */
export function asksContrast(demands: Demands, signal: SignalName): boolean {
  return signal === 'contrast' || demands.leastContrast !== undefined;
}
