import { z } from 'zod';
import { LIMITS } from './limits.ts';
import { strictObject } from './strictObject.ts';

const lawFields = {
  curieK: z.number().positive(),
  /** Exponents of m(T) = (1 - (T/Tc)^a)^b. */
  a: z.number().min(0.1).max(10),
  b: z.number().min(0.01).max(10),
  /** Where Tc and the exponents come from. */
  citation: z.string().trim().min(1).max(LIMITS.noteLength),
};

/** The parameters of the law, stored with a material. */
export const thermalLawSchema = strictObject(lawFields);

/** The law applied to a layer: its Q, known at `referenceK`, is used at `temperatureK`. */
export const layerThermalSchema = strictObject({
  ...lawFields,
  temperatureK: z.number().min(0),
  referenceK: z.number().min(0),
}).superRefine(({ referenceK, curieK, a, b }, context) => {
  // Just below the Curie temperature the law may round to no magnetization at all, and nothing could be scaled.
  if (!(magnetizationAt(referenceK, { curieK, a, b }) > 0)) {
    context.addIssue({
      code: 'custom',
      path: ['referenceK'],
      message: `must be below the Curie temperature (${curieK} K): Q was known for a magnetized sample, got ${referenceK}`,
    });
  }
});

export type ThermalLaw = z.infer<typeof thermalLawSchema>;
export type LayerThermal = z.infer<typeof layerThermalSchema>;

/** Saturation magnetization at a temperature as a fraction of that at 0 K; 0 from the Curie temperature on. */
export function magnetizationAt(
  temperatureK: number,
  { curieK, a, b }: Pick<ThermalLaw, 'curieK' | 'a' | 'b'>,
): number {
  return temperatureK >= curieK ? 0 : (1 - (temperatureK / curieK) ** a) ** b;
}

/** By how much Q of a layer at its temperature differs from Q at the temperature at which it is known. */
export function thermalVoigtScale(thermal: LayerThermal): number {
  return magnetizationAt(thermal.temperatureK, thermal) / magnetizationAt(thermal.referenceK, thermal);
}
