import type { ColumnPlan } from './columnPlan.ts';
import { quantitiesOf } from './columnPlan.ts';
import { columnPairs, columnRoles, indexPairs, roleLabels, voigtPairs } from './columnRoles.ts';
import type { ColumnRole } from './columnRoles.ts';

const pairNames = Object.values(columnPairs);

/** What is still missing or contradictory about the columns, each with the remedy; empty when they can be converted. */
export function planProblems(plan: ColumnPlan): string[] {
  const columnsOf = (role: ColumnRole) =>
    plan.roles.flatMap((one, column) => (one === role ? [column + 1] : []));
  const has = (role: ColumnRole) => columnsOf(role).length > 0;
  const problems: string[] = [];
  if (!has('spectral')) problems.push('Say which column holds the wavelength or the photon energy.');
  for (const role of columnRoles) {
    const columns = columnsOf(role);
    if (role !== 'unused' && columns.length > 1) {
      problems.push(`Columns ${columns.join(' and ')} are both ${roleLabels[role]}: leave one unused.`);
    }
  }
  for (const { first, second, both } of pairNames) {
    const [name, other] = [roleLabels[first], roleLabels[second]];
    if (has(second) && !has(first)) problems.push(`${other} needs ${name}: choose its column too.`);
    if (both && has(first) && !has(second)) problems.push(`${name} needs ${other}: choose its column too.`);
  }
  const used = (pair: keyof typeof columnPairs) =>
    has(columnPairs[pair].first) || has(columnPairs[pair].second);
  if (indexPairs.filter(used).length > 1) {
    problems.push('n, k and ε₁, ε₂ say the same in two ways: leave one of them unused.');
  }
  if (voigtPairs.filter(used).length > 1) {
    problems.push('Only one kind of magneto-optic columns can be read at a time: leave the others unused.');
  }
  const { index, voigt } = quantitiesOf(plan);
  if (index === null && voigt === null) {
    problems.push('Choose the columns of n and k (or ε₁ and ε₂), of a magneto-optic constant, or of both.');
  }
  if (index === null && voigt !== null && plan.indexOf === null) {
    problems.push('The table gives no N: choose the material that gives it, below the table.');
  }
  return problems;
}
