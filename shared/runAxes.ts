import type { z } from 'zod';
import { LIMITS } from './limits.ts';

/**
 * The axes of a run taken together. Values are stored with the first axis innermost and the family outermost:
 * index = (familyIndex * secondPoints + secondIndex) * firstPoints + firstIndex.
 */
export const axisFields = ['axis', 'second', 'family'] as const;
export type AxisField = (typeof axisFields)[number];

/** What all axes have; `run.ts` says which kinds there are. */
type Axis = {
  kind: string;
  from: number;
  to: number;
  points: number;
  spacing: 'linear' | 'log';
  layerId?: string | undefined;
  blockId?: string | undefined;
};

type Axes<One> = { axis: One; second?: One | undefined; family?: One | undefined };

/** The axes that a run has, innermost first, each with the field that holds it. */
export function axesOf<One>(axes: Axes<One>): { field: AxisField; axis: One }[] {
  return axisFields.flatMap((field) => {
    const axis = axes[field];
    return axis ? [{ field, axis }] : [];
  });
}

/** Points of a run over all its axes. */
export function pointCountOf(axes: Axes<{ points: number }>): number {
  return axesOf(axes).reduce((product, { axis }) => product * axis.points, 1);
}

/** Rules inside one axis; issues are named by its fields. */
export function checkAxis(axis: Axis, context: z.RefinementCtx): void {
  const refuse = (field: string, message: string) =>
    context.addIssue({ code: 'custom', path: [field], message });
  if (axis.spacing === 'log') {
    if (axis.from <= 0) refuse('from', 'must be > 0 with log spacing');
    else if (axis.to <= 0) refuse('to', 'must be > 0 with log spacing');
  }
  if (axis.kind !== 'repeat') return;
  if (axis.spacing === 'log') refuse('spacing', 'must be linear for a repeat count');
  const steps = axis.points - 1;
  if (steps > 0 && (axis.to - axis.from) % steps !== 0) {
    const whole = Math.abs(axis.to - axis.from) + 1;
    refuse('points', `must give whole numbers from ${axis.from} to ${axis.to}, such as ${whole} points`);
  }
}

/** Rules between the axes and readings of one run; issues are named by the run's fields (`second.points`). */
export function checkAxes(
  run: Axes<Axis> & { readings?: string[] | undefined },
  context: z.RefinementCtx,
): void {
  const refuse = (path: string[], message: string) => context.addIssue({ code: 'custom', path, message });
  const axes = axesOf(run);
  axes.forEach(({ field, axis }, position) => {
    const other = axes.slice(0, position).find((one) => sweepSameQuantity(one.axis, axis));
    if (other)
      refuse([field, 'kind'], `${axis.kind} is swept by ${other.field} already: choose another quantity`);
  });
  const { family, second } = run;
  if (family && (family.points < 2 || family.points > LIMITS.familyCurves)) {
    refuse(['family', 'points'], `must be 2 to ${LIMITS.familyCurves}, got ${family.points}`);
  }
  const points = pointCountOf(run);
  if (axes.length > 1 && points > LIMITS.runPoints) {
    const counts = axes.map(({ axis }) => axis.points).join(' x ');
    refuse(
      [second ? 'second' : 'family', 'points'],
      `the axes have ${counts} = ${points} points together: at most ${LIMITS.runPoints}`,
    );
  }
  const stored = new Set(run.readings).size;
  if (second && stored > LIMITS.mapReadings) {
    refuse(['readings'], `a map stores at most ${LIMITS.mapReadings} readings, got ${stored}`);
  }
}

function sweepSameQuantity(a: Axis, b: Axis): boolean {
  if (a.kind !== b.kind || a.blockId !== b.blockId) return false;
  // An axis without a layer means every layer, so any other of its kind has a layer in common with it.
  return a.layerId === undefined || b.layerId === undefined || a.layerId === b.layerId;
}
