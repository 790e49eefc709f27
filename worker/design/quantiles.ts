/**
 * Quantile of a sorted list by linear interpolation between order statistics (type 7 of R. J. Hyndman and Y. Fan,
 * Am. Stat. 50, 361 (1996)).
 *
 * @param sorted ascending, not empty
 * @param share 0..1
 */
export function quantileOf(sorted: ArrayLike<number>, share: number): number {
  const place = share * (sorted.length - 1);
  const below = Math.floor(place);
  const from = sorted[below]!;
  const to = sorted[Math.min(below + 1, sorted.length - 1)]!;
  return from + (place - below) * (to - from);
}

/** Shares between which one standard deviation to either side of a normal distribution lies. */
export const ONE_SIGMA = { low: 0.15865525393, high: 0.84134474607 } as const;
/** ... and two. */
export const TWO_SIGMA = { low: 0.02275013195, high: 0.97724986805 } as const;
