import type { AngleFeatures } from '../../../../shared/live.ts';
import { readingDefinitions } from '../../../../shared/readings.ts';
import type { ReadingName } from '../../../../shared/run.ts';
import type { PlotMark } from '../../../components/plot/plotTypes.ts';
import { formatNumber, formatPlain } from '../../../lib/format.ts';

/** Digits after the point that the angles are known to (shared/live.ts). */
const BREWSTER_DECIMALS = 6;
const ZERO_DECIMALS = 9;

/** A name for the plot and the same in words, such as "φ_p = 0 at 61.2 deg, rising". */
export type AngleMark = PlotMark & { words: string };

/** The features of an angle sweep that belong to what is drawn, in the order of their angles. */
export function angleMarks(features: AngleFeatures, drawn: readonly ReadingName[]): AngleMark[] {
  const { pseudoBrewster, signChanges } = features;
  const marks = signChanges
    .filter(({ reading }) => drawn.includes(reading))
    .map(({ reading, angleDeg, rising }) => {
      const { symbol, label } = readingDefinitions[reading];
      return {
        x: angleDeg,
        label: `${symbol} = 0`,
        words: `${label} is 0 at ${fixed(angleDeg, ZERO_DECIMALS)}°, ${rising ? 'from negative to positive' : 'from positive to negative'}`,
      };
    });
  const brewster = pseudoBrewster && {
    x: pseudoBrewster.angleDeg,
    label: 'R_p least',
    words: `Pseudo-Brewster angle ${fixed(pseudoBrewster.angleDeg, BREWSTER_DECIMALS)}°, where R_p is least: ${formatNumber(pseudoBrewster.reflectanceP)}`,
  };
  return [...(brewster ? [brewster] : []), ...marks].sort((a, b) => a.x - b.x);
}

/** Zeros at the end say nothing more: 45 stays 45. */
function fixed(value: number, decimals: number): string {
  return formatPlain(Number(value.toFixed(decimals)));
}
