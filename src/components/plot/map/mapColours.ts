import type { PlotTokens } from '../plotTokens.ts';

type Lab = readonly [lightness: number, a: number, b: number];

/** Entries of a colour table; more than the eye tells apart. */
export const COLOURS = 256;

/**
 * A table of colours, red, green, blue a byte each, from the tokens of the theme. Lightness runs evenly in OKLab
 * (Ottosson 2020), so that equal steps of the value look equal and the map reads on a grey print.
 *
 * Signed quantities run from blue over the panel's own colour to orange, which people tell apart whatever their
 * colour vision; the others run from the panel's colour to the accent.
 */
export function colourTable(tokens: PlotTokens, signed: boolean): Uint8ClampedArray {
  const ground = toLab(tokens.panel);
  const arm = (hue: string) => armOf(ground, toLab(hue));
  const [below, above] = [arm(tokens.rotation), arm(tokens.ellipticity)];
  const single = arm(tokens.accent);
  const table = new Uint8ClampedArray(3 * COLOURS);
  for (let index = 0; index < COLOURS; index++) {
    const share = index / (COLOURS - 1);
    const lab = !signed ? single(share) : share < 0.5 ? below(1 - 2 * share) : above(2 * share - 1);
    table.set(toBytes(lab), 3 * index);
  }
  return table;
}

/** From the ground (0) through a hue to its far end (1): darker than the hue on light ground, lighter on dark. */
function armOf(ground: Lab, hue: Lab): (share: number) => Lab {
  const end = ground[0] > 0.5 ? 0.3 : 0.9;
  const knee = Math.min(0.9, Math.max(0.4, (hue[0] - ground[0]) / (end - ground[0])));
  return (share) => {
    const colour = share <= knee ? share / knee : 1 - (0.45 * (share - knee)) / (1 - knee);
    return [
      ground[0] + (end - ground[0]) * share,
      share <= knee ? ground[1] + (hue[1] - ground[1]) * colour : hue[1] * colour,
      share <= knee ? ground[2] + (hue[2] - ground[2]) * colour : hue[2] * colour,
    ];
  };
}

/** OKLab of a colour written as #rrggbb. */
function toLab(hex: string): Lab {
  const digits = hex.replace('#', '');
  const full = digits.length === 3 ? [...digits].map((digit) => digit + digit).join('') : digits;
  const [r, g, b] = [0, 2, 4].map((at) => linear(parseInt(full.slice(at, at + 2), 16) / 255)) as [
    number,
    number,
    number,
  ];
  const l = Math.cbrt(0.4122214708 * r + 0.5363325363 * g + 0.0514459929 * b);
  const m = Math.cbrt(0.2119034982 * r + 0.6806995451 * g + 0.1073969566 * b);
  const s = Math.cbrt(0.0883024619 * r + 0.2817188376 * g + 0.6299787005 * b);
  return [
    0.2104542553 * l + 0.793617785 * m - 0.0040720468 * s,
    1.9779984951 * l - 2.428592205 * m + 0.4505937099 * s,
    0.0259040371 * l + 0.7827717662 * m - 0.808675766 * s,
  ];
}

function toBytes([lightness, a, b]: Lab): [number, number, number] {
  const l = (lightness + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const m = (lightness - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const s = (lightness - 0.0894841775 * a - 1.291485548 * b) ** 3;
  return [
    255 * gamma(4.0767416621 * l - 3.3077115913 * m + 0.2309699292 * s),
    255 * gamma(-1.2684380046 * l + 2.6097574011 * m - 0.3413193965 * s),
    255 * gamma(-0.0041960863 * l - 0.7034186147 * m + 1.707614701 * s),
  ];
}

function linear(value: number): number {
  return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
}

function gamma(value: number): number {
  const bounded = Math.min(1, Math.max(0, value));
  return bounded <= 0.0031308 ? 12.92 * bounded : 1.055 * bounded ** (1 / 2.4) - 0.055;
}
