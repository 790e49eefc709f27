/** Rows lower than this cannot carry their numbers. */
const LEAST_PX = 34;
/** The scale is linear for layers much thinner than this and logarithmic above: 1 nm and 500 nm are both seen. */
const KNEE_NM = 2;

/**
 * Heights of layers on the compressed depth scale: the same monotone function of thickness for every layer of the
 * drawing, so that a thicker layer is never drawn lower. Many layers share the room, few do not fill it by force.
 *
 * @param thicknessesNm of the layers as drawn (a block's layers once)
 * @param roomPx height that the drawing should keep to, where the least heights allow it
 * @returns px, one a layer
 */
export function layerHeights(thicknessesNm: readonly number[], roomPx: number): number[] {
  const compressed = thicknessesNm.map((thickness) => Math.log2(1 + Math.max(0, thickness) / KNEE_NM));
  const total = compressed.reduce((sum, value) => sum + value, 0);
  const spare = roomPx - LEAST_PX * thicknessesNm.length;
  const pxPerUnit = total > 0 ? Math.min(13, Math.max(3, spare / total)) : 0;
  return compressed.map((value) => Math.round(LEAST_PX + pxPerUnit * value));
}

/** A depth as printed beside the drawing: as many digits as the thicknesses have, at most three decimals. */
export function formatDepth(depthNm: number): string {
  if (depthNm >= 1e6) return `${Number((depthNm / 1e6).toPrecision(4))} mm`;
  if (depthNm >= 1e4) return `${Number((depthNm / 1e3).toPrecision(4))} µm`;
  return String(Number(depthNm.toFixed(depthNm < 100 ? 2 : 1)));
}
