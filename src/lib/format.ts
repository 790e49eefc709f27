/** Numbers and dates as people read them here. Everything shown on screen passes through this file. */

const minus = '−';
const superscripts: Record<string, string> = {
  '-': '⁻',
  '0': '⁰',
  '1': '¹',
  '2': '²',
  '3': '³',
  '4': '⁴',
  '5': '⁵',
  '6': '⁶',
  '7': '⁷',
  '8': '⁸',
  '9': '⁹',
};

function superscript(exponent: number): string {
  return Array.from(String(exponent), (digit) => superscripts[digit] ?? digit).join('');
}

function withMinus(text: string): string {
  return text.replace('-', minus);
}

type NumberOptions = {
  /** Significant digits, 4 when left out. */
  digits?: number;
  /** Prints + before a positive number, as for angles whose sense matters. */
  signed?: boolean;
};

/**
 * A number with a set count of significant digits: plain between 0.001 and a million, otherwise with a power of
 * ten. Trailing zeros stay, since they say how far the number is known.
 */
export function formatNumber(value: number, { digits = 4, signed = false }: NumberOptions = {}): string {
  if (Number.isNaN(value)) return 'not a number';
  const sign = signed && value > 0 ? '+' : '';
  if (!Number.isFinite(value)) return value > 0 ? `${sign}∞` : `${minus}∞`;
  if (value === 0) return '0';
  const size = Math.abs(value);
  if (size < 1e-3 || size >= 1e6) {
    const [mantissa = '0', exponent = '0'] = value.toExponential(digits - 1).split('e');
    return `${sign}${withMinus(mantissa)} × 10${superscript(Number(exponent))}`;
  }
  const rounded = Number(value.toPrecision(digits));
  const decimals = Math.max(0, digits - 1 - Math.floor(Math.log10(Math.abs(rounded))));
  return sign + withMinus(rounded.toFixed(decimals));
}

/** A number as a person typed it, with no digits added or lost: 3 stays 3, 0.4 stays 0.4. */
export function formatPlain(value: number): string {
  return withMinus(String(value));
}

/** `toLocaleString` would make one of these at every call, which takes longer than all the rest of a page. */
const counts = new Intl.NumberFormat('en');

/** A whole number with its thousands apart: 1,000,000. */
export function formatCount(count: number): string {
  return withMinus(counts.format(count));
}

export type AngleUnit = 'mdeg' | 'deg' | 'mrad';

/** Degrees in the unit of the screen. */
export function fromDegrees(angleDeg: number, unit: AngleUnit): number {
  switch (unit) {
    case 'mdeg':
      return angleDeg * 1000;
    case 'deg':
      return angleDeg;
    case 'mrad':
      return (angleDeg * 1000 * Math.PI) / 180;
  }
}

/** A magneto-optic angle, given in degrees, signed, without its unit. */
export function formatAngle(angleDeg: number, unit: AngleUnit = 'mdeg', digits = 4): string {
  return formatNumber(fromDegrees(angleDeg, unit), { digits, signed: true });
}

/** A complex number with the digits it was given: `2.87 + 3.36i`. */
export function formatTypedComplex([re, im]: readonly [number, number]): string {
  return `${formatPlain(re)} ${im < 0 ? minus : '+'} ${formatPlain(Math.abs(im))}i`;
}

/** A range with its unit, or the one value where both ends are the same. */
export function formatRange([from, to]: readonly [number, number], unit: string, digits = 4): string {
  const ends = [from, to].map((end) => withMinus(String(Number(end.toPrecision(digits)))));
  return from === to ? `${ends[0]} ${unit}` : `${ends[0]}–${ends[1]} ${unit}`;
}

const dayFormat = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' });
const timeFormat = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' });

/** `3 Mar 2026` */
export function formatDate(iso: string): string {
  return dayFormat.format(new Date(iso));
}

/** `3 Mar 2026, 14:05` in the reader's time zone. */
export function formatDateTime(iso: string): string {
  const moment = new Date(iso);
  return `${dayFormat.format(moment)}, ${timeFormat.format(moment)}`;
}

/** How long ago in words for the last day, the date before that. */
export function formatSince(iso: string, now = Date.now()): string {
  const seconds = (now - new Date(iso).getTime()) / 1000;
  if (seconds < 60) return 'just now';
  if (seconds < 3600) return `${Math.floor(seconds / 60)} min ago`;
  if (seconds < 86_400) return `${Math.floor(seconds / 3600)} h ago`;
  return formatDate(iso);
}

/** A span of time: `11 ms`, `4.2 s`, `3 min`, `2 h 5 min`. */
export function formatDuration(seconds: number): string {
  if (seconds < 1) return `${Math.max(1, Math.round(seconds * 1000))} ms`;
  if (seconds < 10) return `${seconds.toFixed(1)} s`;
  if (seconds < 90) return `${Math.round(seconds)} s`;
  const minutes = Math.round(seconds / 60);
  if (minutes < 60) return `${minutes} min`;
  const rest = minutes % 60;
  return rest === 0 ? `${Math.floor(minutes / 60)} h` : `${Math.floor(minutes / 60)} h ${rest} min`;
}

const subscripts = '₀₁₂₃₄₅₆₇₈₉';

/** Trade names that look like formulas but count nothing. */
const tradeNames = new Set(['BK7']);

/** A chemical formula with its counts set low: SiO2 becomes SiO₂. */
export function formatFormula(formula: string): string {
  if (tradeNames.has(formula)) return formula;
  return formula.replace(/([A-Za-z)])(\d+)/g, (_, before: string, digits: string) => {
    return before + Array.from(digits, (digit) => subscripts[Number(digit)]).join('');
  });
}
