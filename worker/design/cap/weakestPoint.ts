import { isSeen } from '../demands.ts';

/**
 * What the weakest working point leaves of the bare signal. Working points at which the bare film shows nothing say
 * nothing about caps and do not count; where that is all of them, the signals themselves are compared.
 *
 * @param low lower edge of the signal's band at each working point
 * @param bare |signal| without a cap at each working point
 */
export function weakestPoint(
  low: readonly (number | null)[],
  bare: readonly (number | null)[],
): { point: number; worth: number } {
  const worths = low.map((signal, point) => {
    const whole = bare[point] ?? null;
    return { point, share: isSeen(whole) ? (signal ?? 0) / whole : null, signal: signal ?? 0 };
  });
  const seen = worths.filter(({ share }) => share !== null);
  return (seen.length > 0 ? seen : worths)
    .map(({ point, share, signal }) => ({ point, worth: share ?? signal }))
    .reduce((least, one) => (one.worth < least.worth ? one : least));
}
