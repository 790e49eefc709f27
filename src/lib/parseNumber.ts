/**
 * A number as people write it: decimal point or comma, ASCII or typographic minus, spaces around, an exponent.
 * Null for anything else, the empty text included.
 */
export function parseNumber(text: string): number | null {
  const plain = text.trim().replace('−', '-').replace(',', '.');
  if (!/^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(plain)) return null;
  const value = Number(plain);
  return Number.isFinite(value) ? value : null;
}
