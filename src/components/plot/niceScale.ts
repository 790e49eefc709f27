/** An axis as drawn: its ends and the ticks between them, in the values of the quantity. */
export type NiceScale = { min: number; max: number; ticks: number[] };

/** The step of 1, 2 or 5 times a power of ten that gives about `count` ticks over `span`. */
function niceStep(span: number, count: number): number {
  const rough = span / count;
  const power = 10 ** Math.floor(Math.log10(rough));
  const fraction = rough / power;
  const nice = fraction < 1.5 ? 1 : fraction < 3.5 ? 2 : fraction < 7.5 ? 5 : 10;
  return nice * power;
}

/**
 * A linear scale that encloses [low, high]. A flat curve gets a band around it, so that it is drawn in the middle
 * and not on the frame.
 */
export function niceScale(low: number, high: number, count = 5): NiceScale {
  if (!Number.isFinite(low) || !Number.isFinite(high)) return { min: 0, max: 1, ticks: [0, 0.5, 1] };
  // Below this, differences are rounding of the doubles themselves and would be drawn as noise.
  const size = Math.max(Math.abs(low), Math.abs(high));
  const flat = high - low <= Math.max(1e-12 * size, 1e-290);
  const margin = flat ? (size > 1e-280 ? size * 0.1 : 1) : 0;
  const step = niceStep(high - low + 2 * margin, count);
  const min = Math.floor((low - margin) / step + 1e-9) * step;
  const max = Math.ceil((high + margin) / step - 1e-9) * step;
  return { min: clean(min, step), max: clean(max, step), ticks: ticksBetween(min, max, step) };
}

/**
 * A linear scale with this many intervals, so that its ticks lie on the grid lines of another axis. Null where that
 * would leave more than half of the height empty.
 */
export function alignedScale(low: number, high: number, intervals: number): NiceScale | null {
  const free = niceScale(low, high, intervals);
  const width = free.max - free.min;
  const power = 10 ** Math.floor(Math.log10(width / intervals));
  for (const lead of [0.5, 1, 2, 2.5, 5, 10, 20, 25]) {
    const step = lead * power;
    const min = Math.floor(low / step + 1e-9) * step;
    const max = min + intervals * step;
    if (max < high - 1e-9 * step) continue;
    if (max - min > 2.2 * width) return null;
    return { min: clean(min, step / 10), max: clean(max, step / 10), ticks: ticksBetween(min, max, step) };
  }
  return null;
}

/** Ticks within [min, max], the ends kept as they are: for the x axis, whose range the user has chosen. */
export function linearTicks(min: number, max: number, count = 7): number[] {
  if (!(max > min)) return [min];
  const step = niceStep(max - min, count);
  return ticksBetween(Math.ceil(min / step - 1e-9) * step, max, step);
}

/** Ticks of a logarithmic axis: powers of ten, with 2 and 5 between where there are fewer than three decades. */
export function logTicks(min: number, max: number): number[] {
  const decades = Math.log10(max / min);
  if (decades < 0.7) return linearTicks(min, max, 5);
  const every = Math.max(1, Math.ceil(decades / 8));
  const multiples = decades <= 3 ? [1, 2, 5] : [1];
  const ticks: number[] = [];
  for (let power = Math.floor(Math.log10(min)); power <= Math.ceil(Math.log10(max)); power++) {
    if (power % every !== 0) continue;
    for (const multiple of multiples) {
      const tick = multiple * 10 ** power;
      if (tick >= min * (1 - 1e-9) && tick <= max * (1 + 1e-9)) ticks.push(tick);
    }
  }
  return ticks;
}

/** A logarithmic scale that encloses [low, high] > 0, over at most 14 decades: below that is rounding. */
export function logScale(low: number, high: number): NiceScale {
  if (!(high > 0)) return { min: 0.1, max: 1, ticks: [0.1, 1] };
  const top = 10 ** Math.ceil(Math.log10(high) - 1e-9);
  const lowest = Math.max(low, high * 1e-14);
  const bottom = 10 ** Math.floor(Math.log10(lowest > 0 ? lowest : high / 10) + 1e-9);
  const min = bottom < top ? bottom : top / 10;
  return { min, max: top, ticks: logTicks(min, top) };
}

function ticksBetween(first: number, last: number, step: number): number[] {
  const count = Math.round((last - first) / step + 1e-9);
  return Array.from({ length: count + 1 }, (_, index) => clean(first + index * step, step / 10)).filter(
    (tick) => tick <= last + step * 1e-6,
  );
}

/** Takes off the rounding of `index * step` (0.30000000000000004) and the sign of -0. */
function clean(value: number, step: number): number {
  const digits = Math.max(0, 1 - Math.floor(Math.log10(step)));
  return digits > 100 ? value : Number(value.toFixed(Math.min(100, digits))) + 0;
}

/** A tick as printed: the digits that tell it from its neighbours, a true minus sign. */
export function formatTick(tick: number, ticks: readonly number[]): string {
  if (tick === 0) return '0';
  const steps = ticks.slice(1).map((value, index) => Math.abs(value - ticks[index]!));
  const step = Math.min(...steps);
  const uniform = steps.length > 0 && steps.every((value) => Math.abs(value - step) < step * 1e-6);
  const sizes = ticks.filter((value) => value !== 0).map(Math.abs);
  const [least, most] = [Math.min(...sizes), Math.max(...sizes)];
  if (most >= 1e5 || most < 1e-3 || (!uniform && least < 1e-3)) {
    return minus(
      tick
        .toExponential(2)
        .replace(/\.?0+e/, 'e')
        .replace('e+', 'e'),
    );
  }
  return minus(uniform ? tick.toFixed(decimalsOf(step)) : String(tick));
}

/** Decimals that show a step in full: 2 for 0.25. */
function decimalsOf(step: number): number {
  let decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  while (decimals < 8 && Math.abs(Number(step.toFixed(decimals)) - step) > 1e-6 * step) decimals++;
  return decimals;
}

function minus(text: string): string {
  return text.replace(/-/g, '−');
}
