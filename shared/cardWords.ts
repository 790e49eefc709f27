import { materialKeyOf } from './designPoint.ts';
import type { CardLayer, CardReading, GrowthCard } from './growthCard.ts';
import type { StackItem, StackMedium } from './stack.ts';

/**
 * The numbers and words of a growth card as its page and its PDF both print them, so that neither rounds by itself. A cell
 * that is empty is one to fill in by hand.
 */

const minus = '−';

/** A number with at most `digits` significant digits and no zeros at its end: 632.8, 0.05, 1000. */
export function plainNumber(value: number, digits = 6): string {
  const rounded = Number(value.toPrecision(digits));
  return String(rounded).replace(/-/g, minus);
}

/** Hundredths of a nm, or as many digits as were given up to a picometre. */
function nanometres(nm: number): string {
  const given = String(Number(nm.toFixed(3)));
  const decimals = Math.max(2, given.split('.')[1]?.length ?? 0);
  return nm.toFixed(decimals);
}

/** Cells of one line of the layer table, in the order of its columns; empty where a hand fills in or nothing applies. */
export function cardLayerCells(layer: CardLayer) {
  const { step, material, role, thicknessNm, deviationNm, nmPerMin, seconds } = layer;
  return {
    step: step === null ? '' : String(step),
    material,
    role,
    thickness: thicknessNm === null ? '' : nanometres(thicknessNm),
    deviation: deviationNm === null ? '' : `± ${nanometres(deviationNm)}`,
    rate: nmPerMin === null ? '' : plainNumber(nmPerMin),
    time: seconds === null ? '' : plainNumber(seconds, 4),
  };
}

type Reading = CardReading['readings'][number];

/**
 * One predicted reading: angles in mdeg, all else as a plain number. Four digits of the nominal value decide how many
 * decimals the ends of the band have.
 */
export function cardReadingCells({ label, unit, nominal, low, high }: Reading) {
  const scale = unit === 'deg' ? 1000 : 1;
  const largest = Math.max(...[nominal, low, high].map((value) => Math.abs(value ?? 0))) * scale;
  // One part in 1e12 of a degree is rounding, whose digits say nothing.
  const exponent = largest > 1e-12 ? Math.floor(Math.log10(largest)) : 0;
  const decimals = Math.min(12, Math.max(0, 3 - exponent));
  const print = (value: number | null) => {
    if (value === null) return '–';
    const text = (value * scale).toFixed(decimals).replace('-', minus);
    return unit === 'deg' && value > 0 ? `+${text}` : text;
  };
  return {
    label,
    unit: unit === 'deg' ? 'mdeg' : '',
    nominal: print(nominal),
    band: low === null || high === null ? '–' : `${print(low)} to ${print(high)}`,
  };
}

/** How far thicknesses and constants may be off, and how the bands were found. */
export function cardToleranceSentences({
  tolerance,
  document,
}: Pick<GrowthCard, 'tolerance' | 'document'>): string[] {
  const { ratePercent, randomPercent, indexPercent, voigtPercent, materials, samples, seed } = tolerance;
  const parts = [
    `rate error ${plainNumber(ratePercent)} % (one for each material, shared by its layers)`,
    `random error ${plainNumber(randomPercent)} % of each layer`,
    `n and k ${plainNumber(indexPercent)} %`,
    `Q ${plainNumber(voigtPercent)} %`,
  ];
  const names = materialNames([...mediaOf(document.layers), document.incident, document.substrate]);
  return [
    `Tolerances, one standard deviation each: ${parts.join(', ')}.`,
    ...materials.map((own) => {
      const stated = [
        own.ratePercent === undefined ? [] : [`rate error ${plainNumber(own.ratePercent)} %`],
        own.randomPercent === undefined ? [] : [`random error ${plainNumber(own.randomPercent)} %`],
        own.indexPercent === undefined ? [] : [`n and k ${plainNumber(own.indexPercent)} %`],
        own.voigtPercent === undefined ? [] : [`Q ${plainNumber(own.voigtPercent)} %`],
      ].flat();
      return `For ${names.get(own.material) ?? own.material}: ${stated.join(', ') || 'as all others'}.`;
    }),
    `A band holds 68.27 % of ${samples} films drawn at random with these errors (seed ${seed}).`,
  ];
}

function materialNames(media: StackMedium[]): Map<string, string> {
  return new Map(
    media.map((medium) => [
      materialKeyOf(medium),
      medium.label ?? medium.material ?? 'a material typed in as constants',
    ]),
  );
}

function mediaOf(items: StackItem[]): StackMedium[] {
  return items.flatMap((item) => ('layers' in item ? mediaOf(item.layers) : [item.medium]));
}

const months = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** `1 Dec 2026, 11:05 UTC`: paper is read in other time zones too. */
export function cardTime(iso: string): string {
  const at = new Date(iso);
  const two = (value: number) => String(value).padStart(2, '0');
  return `${at.getUTCDate()} ${months[at.getUTCMonth()]} ${at.getUTCFullYear()}, ${two(at.getUTCHours())}:${two(at.getUTCMinutes())} UTC`;
}

/** What makes the card's numbers come again. */
export function cardOrigin({
  createdAt,
  solverVersion,
  inputSha256,
}: Pick<GrowthCard, 'createdAt' | 'solverVersion' | 'inputSha256'>): string {
  return `Made ${cardTime(createdAt)} with solver ${solverVersion}. SHA-256 of the input: ${inputSha256}`;
}
