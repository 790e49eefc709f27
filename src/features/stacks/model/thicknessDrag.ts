/** Pixels of a drag that double a thick layer. */
const DOUBLING_PX = 40;
/** Below this a drag adds, above it multiplies: 0 nm can be left, 500 nm is not crept along. */
const KNEE_NM = 2;

/**
 * The thickness after a drag, in steps that a person would type.
 *
 * @param startNm where the drag began
 * @param downPx how far the pointer has come since, positive for thicker
 * @param leastNm what the oxide and the dead parts of the layer take
 */
export function draggedThickness(startNm: number, downPx: number, leastNm: number): number {
  const places = Math.log2(1 + startNm / KNEE_NM) + downPx / DOUBLING_PX;
  const wanted = Math.max(leastNm, KNEE_NM * (2 ** places - 1));
  if (downPx === 0 || wanted === leastNm) return downPx === 0 ? startNm : leastNm;
  const step = stepOf(wanted);
  return Math.max(leastNm, Number((Math.round(wanted / step) * step).toPrecision(12)));
}

/** The largest of 1, 2, 5 times a power of ten that a pixel or so moves by. */
function stepOf(nm: number): number {
  const perPixel = ((nm + KNEE_NM) * Math.LN2) / DOUBLING_PX;
  const power = 10 ** Math.floor(Math.log10(perPixel));
  const lead = [5, 2, 1].find((one) => one * power <= perPixel) ?? 1;
  return lead * power;
}
