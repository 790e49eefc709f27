import type { LayerThermal } from '../../../../shared/thermal.ts';
import { thermalVoigtScale } from '../../../../shared/thermal.ts';

/** What the drawing says of a layer at a temperature of its own, such as "T 450 K: Q × 0.83". */
export function thermalWords(thermal: LayerThermal): string {
  return `T ${thermal.temperatureK} K: Q × ${scaleWords(thermal)}`;
}

/** By how much Q changes, to three digits; trailing zeros say nothing here. */
export function scaleWords(thermal: LayerThermal): string {
  return String(Number(thermalVoigtScale(thermal).toPrecision(3)));
}
