/** One axis on the screen: the value at either end, the pixel at either end, and how it runs between. */
export type PlotScale = { min: number; max: number; from: number; to: number; log: boolean };

/** What the axis is linear in: the value, or its common logarithm. */
export function onScale(value: number, log: boolean): number {
  return log ? Math.log10(value) : value;
}

export function offScale(place: number, log: boolean): number {
  return log ? 10 ** place : place;
}

/** Pixel of a value. */
export function toPixel(scale: PlotScale, value: number): number {
  const low = onScale(scale.min, scale.log);
  const span = onScale(scale.max, scale.log) - low;
  if (span === 0) return (scale.from + scale.to) / 2;
  return scale.from + ((onScale(value, scale.log) - low) / span) * (scale.to - scale.from);
}

/** Value at a pixel. */
export function fromPixel(scale: PlotScale, pixel: number): number {
  const low = onScale(scale.min, scale.log);
  const span = onScale(scale.max, scale.log) - low;
  return offScale(low + ((pixel - scale.from) / (scale.to - scale.from)) * span, scale.log);
}

export type Window = [low: number, high: number];

/** The smallest part of the full range that a zoom may show. */
const NARROWEST = 1e-6;

/**
 * The window after a zoom: `factor` < 1 comes closer, and the value at `center` stays where it is on the screen.
 * Never wider than `full`.
 */
export function zoomWindow(
  window: Window,
  full: Window,
  center: number,
  factor: number,
  log: boolean,
): Window {
  const [low, high] = [onScale(window[0], log), onScale(window[1], log)];
  const [fullLow, fullHigh] = [onScale(full[0], log), onScale(full[1], log)];
  const at = onScale(center, log);
  const width = Math.min(
    Math.max((high - low) * factor, (fullHigh - fullLow) * NARROWEST),
    fullHigh - fullLow,
  );
  const share = high > low ? (at - low) / (high - low) : 0.5;
  const wanted = at - share * width;
  const start = Math.min(Math.max(wanted, fullLow), fullHigh - width);
  if (width >= fullHigh - fullLow) return full;
  return [offScale(start, log), offScale(start + width, log)];
}
