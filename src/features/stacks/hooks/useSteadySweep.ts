import { useState } from 'react';
import type { SweepAxis } from '../../../../shared/run.ts';
import type { PreviewAxes } from '../model/sweepAxis.ts';

/**
 * The axes as they were when a movement began. What an axis begins with follows from the film, such as 2.5 times the
 * thickness that is swept, and would run along while that thickness is dragged.
 */
export function useSteadySweep(axes: PreviewAxes | null, moving: boolean): PreviewAxes | null {
  const [held, setHeld] = useState(axes);
  const keep = moving && held !== null && axes !== null && sameTargets(held, axes);
  if (!keep && held !== axes) setHeld(axes);
  return keep ? held : axes;
}

function sameTargets(a: PreviewAxes, b: PreviewAxes): boolean {
  return targetsOf(a) === targetsOf(b);
}

function targetsOf({ axis, second, family }: PreviewAxes): string {
  return JSON.stringify([axis, second, family].map((one) => one && targetOf(one)));
}

function targetOf({ from: _from, to: _to, ...target }: SweepAxis) {
  return target;
}
