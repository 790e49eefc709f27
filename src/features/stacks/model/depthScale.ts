/** Rows of the editor lower than this cannot carry their numbers. */
const LEAST_PX = 34;
/** The scale is linear for layers much thinner than this and logarithmic above: 1 nm and 500 nm are both seen. */
const KNEE_NM = 2;

/** Px of a unit of the compressed scale: most where few layers do not fill the room by force, least in the editor. */
const MOST_PX = 13;
const EDITOR_PX = 3;

function compressed(thicknessNm: number): number {
  return Math.log2(1 + Math.max(0, thicknessNm) / KNEE_NM);
}

function heightsWithin(
  thicknessesNm: readonly number[],
  roomPx: number,
  leastPx: number,
  leastPerUnit: number,
): number[] {
  const units = thicknessesNm.map(compressed);
  const total = units.reduce((sum, value) => sum + value, 0);
  const spare = (roomPx - leastPx * units.length) / total;
  const pxPerUnit = total > 0 ? Math.min(MOST_PX, Math.max(leastPerUnit, spare)) : 0;
  return units.map((value) => leastPx + pxPerUnit * value);
}

/**
 * Heights of layers on the compressed depth scale: the same monotone function of thickness for every layer of the
 * drawing, so that a thicker layer is never drawn lower. Many layers share the room, few do not fill it by force.
 *
 * @param thicknessesNm of the layers as drawn (a block's layers once)
 * @param roomPx height that the drawing should keep to, where the least heights allow it
 * @returns px, one a layer
 */
export function layerHeights(thicknessesNm: readonly number[], roomPx: number): number[] {
  return heightsWithin(thicknessesNm, roomPx, LEAST_PX, EDITOR_PX).map(Math.round);
}

/** The same scale for a figure beside the drawing, which carries no numbers: every layer, however many, in the room. */
export function profileHeights(thicknessesNm: readonly number[], roomPx: number, leastPx: number): number[] {
  return heightsWithin(thicknessesNm, roomPx, leastPx, 0);
}

/** A depth as printed beside the drawing: as many digits as the thicknesses have, at most three decimals. */
export function formatDepth(depthNm: number): string {
  if (depthNm >= 1e6) return `${Number((depthNm / 1e6).toPrecision(4))} mm`;
  if (depthNm >= 1e4) return `${Number((depthNm / 1e3).toPrecision(4))} µm`;
  return String(Number(depthNm.toFixed(depthNm < 100 ? 2 : 1)));
}
