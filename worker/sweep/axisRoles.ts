import type { SweepAxis } from '../../shared/run.ts';
import { isGeneralSomewhere, splitsLayers } from './generalStack.ts';
import type { SweepInput } from './sweepInput.ts';

/**
 * How an axis enters the solver. Wavelengths, angles and one thickness vary inside one compiled stack; anything else
 * makes another stack of each value.
 */
export type AxisRole = 'wavelength' | 'angle' | 'thickness' | 'stack' | 'none';

/** The roles of the first and the second axis; the family always makes another stack. */
export function axisRoles(input: SweepInput): { first: AxisRole; second: AxisRole } {
  const compilesThickness = !isGeneralSomewhere(input) && !splitsLayers(input.document);
  const first = roleOf(input.axis, compilesThickness);
  return {
    first,
    second: input.second ? roleOf(input.second, compilesThickness && first !== 'thickness') : 'none',
  };
}

function roleOf(axis: SweepAxis, compilesThickness: boolean): AxisRole {
  switch (axis.kind) {
    case 'wavelength':
    case 'angle':
      return axis.kind;
    case 'thickness':
      return compilesThickness ? 'thickness' : 'stack';
    default:
      return 'stack';
  }
}
