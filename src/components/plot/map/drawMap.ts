import { formatTick } from '../niceScale.ts';
import { toPixel } from '../plotScale.ts';
import type { PlotTokens } from '../plotTokens.ts';
import type { PlotAxis } from '../plotTypes.ts';
import type { Contour } from './contourLines.ts';
import { COLOURS } from './mapColours.ts';
import { gridPosition, valueAtPosition } from './mapLayout.ts';
import type { MapLayout, Size } from './mapLayout.ts';
import type { ColourDomain } from './mapRange.ts';
import type { MapData } from './mapTypes.ts';

/** Everything a map is drawn from, on screen and for a file. */
export type MapPicture = {
  layout: MapLayout;
  data: MapData;
  /** One pixel a value, axes rising; null where there is no canvas. */
  image: HTMLCanvasElement | null;
  domain: ColourDomain;
  table: Uint8ClampedArray;
  contours: readonly Contour[];
  axes: { x: PlotAxis; y: PlotAxis; value: PlotAxis };
  size: Size;
  tokens: PlotTokens;
};

const FONT = '"Roboto Flex Variable", "Roboto Flex", sans-serif';

/** Draws a map, its axes, contours and colour bar, in the pixels of the page. */
export function drawMap(context: CanvasRenderingContext2D, picture: MapPicture): void {
  const { layout, size, tokens } = picture;
  const { frame } = layout;
  context.clearRect(0, 0, size.width, size.height);
  context.save();
  context.beginPath();
  context.rect(frame.left, frame.top, frame.right - frame.left, frame.bottom - frame.top);
  context.clip();
  drawHatch(context, layout, tokens.line);
  drawImage(context, picture);
  drawContours(context, picture);
  context.restore();
  context.strokeStyle = tokens.line;
  context.lineWidth = 1;
  context.strokeRect(frame.left, frame.top, frame.right - frame.left, frame.bottom - frame.top);
  drawAxes(context, picture);
  drawBar(context, picture);
}

/** Slanted lines where nothing is known. */
function drawHatch(context: CanvasRenderingContext2D, { frame }: MapLayout, colour: string): void {
  const height = frame.bottom - frame.top;
  context.strokeStyle = colour;
  context.lineWidth = 1;
  context.beginPath();
  for (let x = frame.left - height; x < frame.right; x += 8) {
    context.moveTo(x, frame.bottom);
    context.lineTo(x + height, frame.top);
  }
  context.stroke();
}

function drawImage(context: CanvasRenderingContext2D, { layout, data, image }: MapPicture): void {
  if (image === null) return;
  const { frame, x, y } = layout;
  const [left, right] = sourceRange(data.x, x.min, x.max, x.log);
  const [low, high] = sourceRange(data.y, y.min, y.max, y.log);
  context.imageSmoothingEnabled = true;
  context.drawImage(
    image,
    left,
    data.y.length - high,
    right - left,
    high - low,
    frame.left,
    frame.top,
    frame.right - frame.left,
    frame.bottom - frame.top,
  );
}

/** Pixels of the picture between two values: a value stands in the middle of its pixel. */
function sourceRange(grid: ArrayLike<number>, low: number, high: number, log: boolean): [number, number] {
  if (grid.length < 2) return [0, 1];
  return [gridPosition(grid, low, log) + 0.5, gridPosition(grid, high, log) + 0.5];
}

function drawContours(context: CanvasRenderingContext2D, picture: MapPicture): void {
  const { layout, data, contours, tokens } = picture;
  const px = (position: number) => toPixel(layout.x, valueAtPosition(data.x, position, layout.x.log));
  const py = (position: number) => toPixel(layout.y, valueAtPosition(data.y, position, layout.y.log));
  contours.forEach(({ level, segments }, index) => {
    const place = labelPlace(layout, segments, px, py, (index + 1) / (contours.length + 1));
    context.strokeStyle = tokens.ink;
    context.globalAlpha = level === 0 ? 0.85 : 0.45;
    context.lineWidth = level === 0 ? 1.4 : 0.8;
    context.beginPath();
    for (let at = 0; at < segments.length; at += 4) {
      context.moveTo(px(segments[at]!), py(segments[at + 1]!));
      context.lineTo(px(segments[at + 2]!), py(segments[at + 3]!));
    }
    context.stroke();
    context.globalAlpha = 1;
    if (place) haloText(context, formatTick(level, layout.levels), place.x, place.y, tokens);
  });
}

/** A place on a contour for its number: near a line that differs from level to level, so that numbers keep apart. */
function labelPlace(
  { frame }: MapLayout,
  segments: readonly number[],
  px: (position: number) => number,
  py: (position: number) => number,
  share: number,
): { x: number; y: number } | null {
  const wanted = frame.left + (0.15 + 0.7 * share) * (frame.right - frame.left);
  let best: { x: number; y: number } | null = null;
  for (let at = 0; at < segments.length; at += 4) {
    const x = (px(segments[at]!) + px(segments[at + 2]!)) / 2;
    const y = (py(segments[at + 1]!) + py(segments[at + 3]!)) / 2;
    const inside = x > frame.left + 20 && x < frame.right - 20 && y > frame.top + 10 && y < frame.bottom - 10;
    if (inside && (best === null || Math.abs(x - wanted) < Math.abs(best.x - wanted))) best = { x, y };
  }
  return best;
}

function haloText(
  context: CanvasRenderingContext2D,
  text: string,
  x: number,
  y: number,
  tokens: PlotTokens,
): void {
  context.font = `11px ${FONT}`;
  context.textAlign = 'center';
  context.textBaseline = 'middle';
  context.strokeStyle = tokens.panel;
  context.lineWidth = 3;
  context.lineJoin = 'round';
  context.strokeText(text, x, y);
  context.fillStyle = tokens.ink;
  context.fillText(text, x, y);
}

function drawAxes(context: CanvasRenderingContext2D, { layout, axes, tokens }: MapPicture): void {
  const { frame, x, y } = layout;
  context.fillStyle = tokens.muted;
  context.strokeStyle = tokens.muted;
  context.lineWidth = 1;
  context.font = `12px ${FONT}`;
  context.textAlign = 'center';
  context.textBaseline = 'top';
  for (const tick of x.ticks) {
    const at = toPixel(x, tick);
    line(context, at, frame.bottom, at, frame.bottom + 4);
    context.fillText(formatTick(tick, x.ticks), at, frame.bottom + 7);
  }
  context.fillText(axes.x.label, (frame.left + frame.right) / 2, frame.bottom + 25);
  context.textAlign = 'right';
  context.textBaseline = 'middle';
  for (const tick of y.ticks) {
    const at = toPixel(y, tick);
    line(context, frame.left - 4, at, frame.left, at);
    context.fillText(formatTick(tick, y.ticks), frame.left - 8, at);
  }
  context.textAlign = 'left';
  context.textBaseline = 'alphabetic';
  context.fillText(axes.y.label, Math.max(2, frame.left - 44), frame.top - 10);
}

function drawBar(context: CanvasRenderingContext2D, picture: MapPicture): void {
  const { layout, domain, table, axes, tokens } = picture;
  const { bar, levels } = layout;
  const height = bar.bottom - bar.top;
  for (let index = 0; index < COLOURS; index++) {
    const [r, g, b] = table.subarray(3 * index, 3 * index + 3);
    context.fillStyle = `rgb(${r} ${g} ${b})`;
    // Half a pixel more, so that no seam shows between two colours.
    const top = bar.bottom - ((index + 1) / COLOURS) * height;
    context.fillRect(bar.left, top, bar.right - bar.left, height / COLOURS + 0.5);
  }
  context.strokeStyle = tokens.line;
  context.strokeRect(bar.left, bar.top, bar.right - bar.left, height);
  context.fillStyle = tokens.muted;
  context.strokeStyle = tokens.muted;
  context.font = `12px ${FONT}`;
  context.textAlign = 'left';
  context.textBaseline = 'middle';
  for (const level of levels) {
    const at = bar.bottom - ((level - domain.low) / (domain.high - domain.low)) * height;
    line(context, bar.right, at, bar.right + 4, at);
    context.fillText(formatTick(level, levels), bar.right + 7, at);
  }
  context.textBaseline = 'alphabetic';
  context.textAlign = 'right';
  context.fillText(axes.value.label, bar.right + 50, bar.top - 10);
}

function line(context: CanvasRenderingContext2D, x1: number, y1: number, x2: number, y2: number): void {
  context.beginPath();
  context.moveTo(x1, y1);
  context.lineTo(x2, y2);
  context.stroke();
}

/** The values as a canvas of one pixel each; null where the browser has none (tests). */
export function imageOf(
  pixels: Uint8ClampedArray<ArrayBuffer>,
  width: number,
  height: number,
): HTMLCanvasElement | null {
  const canvas = document.createElement('canvas');
  canvas.width = width;
  canvas.height = height;
  const context = canvas.getContext('2d');
  if (context === null) return null;
  context.putImageData(new ImageData(pixels, width, height), 0, 0);
  return canvas;
}

/** The map as a PNG at twice its size on screen, on the panel's colour. */
export async function mapPng(picture: MapPicture): Promise<Blob> {
  const scale = 2;
  const canvas = document.createElement('canvas');
  canvas.width = picture.size.width * scale;
  canvas.height = picture.size.height * scale;
  const context = canvas.getContext('2d');
  const failure = new Error('The browser could not make the picture. Try the CSV file.');
  if (context === null) throw failure;
  context.scale(scale, scale);
  drawMap(context, picture);
  context.setTransform(1, 0, 0, 1, 0, 0);
  context.globalCompositeOperation = 'destination-over';
  context.fillStyle = picture.tokens.panel;
  context.fillRect(0, 0, canvas.width, canvas.height);
  return new Promise((resolve, reject) => {
    canvas.toBlob((blob) => (blob ? resolve(blob) : reject(failure)), 'image/png');
  });
}
