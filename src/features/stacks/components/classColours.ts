import type { MaterialClass } from '../../../../shared/material.ts';

/** Fill of each class on the drawing: pale in light, deep in dark. */
export const classFill: Record<MaterialClass, string> = {
  magnet: 'var(--magnet-soft)',
  noble: 'var(--noble)',
  refractory: 'var(--refractory)',
  dielectric: 'var(--dielectric)',
  semiconductor: 'var(--semiconductor)',
};

/** Hatching of magnetic layers, so that they are told from the others without colour. */
export const magnetHatch =
  'repeating-linear-gradient(135deg, color-mix(in srgb, var(--magnet) 40%, transparent) 0 1.2px, transparent 1.2px 7px)';
