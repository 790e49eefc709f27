import { materialKeyOf } from '../../../../shared/designPoint.ts';
import type { Tolerance } from '../../../../shared/designPoint.ts';
import type { Sensitivity, ToleranceDesign } from '../../../../shared/toleranceDesign.ts';
import { drawnLayers } from './layerNames.ts';

/**
 * One standard deviation of a parameter by the stated tolerances, in the parameter's own unit. Of a thickness the errors
 * of rate and layer are independent and add in squares. Of Re Q and Im Q the one factor moves both.
 */
export function sigmaOf({ parameter, of, value }: Sensitivity, input: ToleranceDesign): number {
  if (parameter === 'thickness') {
    const layer = drawnLayers(input.document.layers).find(({ id }) => id === of);
    const errors = errorsOf(input.tolerance, layer ? materialKeyOf(layer.medium) : '');
    return (Math.hypot(errors.ratePercent, errors.randomPercent) / 100) * value;
  }
  const errors = errorsOf(input.tolerance, of);
  const percent = parameter === 'n' || parameter === 'k' ? errors.indexPercent : errors.voigtPercent;
  return (percent / 100) * Math.abs(value);
}

function errorsOf(tolerance: Tolerance, material: string) {
  const own = tolerance.materials.find((one) => one.material === material);
  return {
    ratePercent: own?.ratePercent ?? tolerance.ratePercent,
    randomPercent: own?.randomPercent ?? tolerance.randomPercent,
    indexPercent: own?.indexPercent ?? tolerance.indexPercent,
    voigtPercent: own?.voigtPercent ?? tolerance.voigtPercent,
  };
}
