import type { SignHabits } from '../../../../shared/materialImport.ts';
import type { ColumnPlan } from './columnPlan.ts';
import { quantitiesOf } from './columnPlan.ts';
import type { ImportDraft } from './importDraft.ts';

export type HabitName = keyof SignHabits;

/** The habits on which the sign of something in these columns depends; the others are not asked. */
export function neededHabits(plan: Pick<ColumnPlan, 'roles'>): HabitName[] {
  const { index, voigt } = quantitiesOf(plan);
  // A change of the time factor conjugates; Q itself also changes its sign then, even where it is real.
  const conjugated =
    plan.roles.some((role) => ['k', 'eps2', 'Im eps_xy', 'Im sigma_xy'].includes(role)) ||
    voigt === 'Q' ||
    (index !== null && voigt === 'sigma_xy');
  const needed: HabitName[] = [];
  if (conjugated) needed.push('time');
  if (voigt === 'Q') needed.push('voigtSign');
  if (voigt !== null) needed.push('magnetization');
  if (voigt === 'Kerr angles') needed.push('rotation', 'ellipticity');
  return needed;
}

/** Whether the direction of m is asked against the axes of a tensor, not against the film. */
export function isOfTensor(plan: Pick<ColumnPlan, 'roles'>): boolean {
  return quantitiesOf(plan).voigt !== 'Kerr angles';
}

/** The answers without the one whose question becomes another with the next plan. */
export function answersThatStay(
  { plan, answers }: Pick<ImportDraft, 'plan' | 'answers'>,
  next: ColumnPlan,
): ImportDraft['answers'] {
  if (isOfTensor(plan) === isOfTensor(next)) return answers;
  const { magnetization: _otherQuestion, ...rest } = answers;
  return rest;
}
