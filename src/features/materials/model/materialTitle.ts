import type { MaterialSummary } from '../../../../shared/material.ts';
import { formatFormula } from '../../../lib/format.ts';

/** `Co, Cobalt`, but not `BK7, BK7 glass`. */
export function materialTitle({ formula, name }: Pick<MaterialSummary, 'formula' | 'name'>): string {
  return name === formula || name.startsWith(`${formula} `) ? name : `${formatFormula(formula)}, ${name}`;
}
