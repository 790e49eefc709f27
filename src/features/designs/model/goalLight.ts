import type { Goal, GoalQuantity } from '../../../../shared/optimiseDesign.ts';
import { FAINT_REFLECTANCE } from './shownFilm.ts';

/** Whether a quantity is an angle of the reflected light or a share of it, which says little where hardly any comes back. */
export function needsLight(quantity: GoalQuantity): boolean {
  return quantity !== 'amplitude' && quantity !== 'least reflectance';
}

/** A goal as it stands before anything else is filled in. */
export function newGoal(quantity: GoalQuantity): Goal {
  return needsLight(quantity) ? { quantity, leastReflectance: FAINT_REFLECTANCE } : { quantity };
}

/** The least reflectance after a change of quantity: what was offered comes and goes, what somebody chose stays. */
export function leastReflectanceFor(
  { quantity, leastReflectance }: Goal,
  next: GoalQuantity,
): Pick<Goal, 'leastReflectance'> {
  const [before, after] = [needsLight(quantity), needsLight(next)];
  if (before === after) return leastReflectance === undefined ? {} : { leastReflectance };
  if (after) return { leastReflectance: leastReflectance ?? FAINT_REFLECTANCE };
  return leastReflectance === undefined || leastReflectance === FAINT_REFLECTANCE ? {} : { leastReflectance };
}
