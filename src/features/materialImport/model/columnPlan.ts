import { z } from 'zod';
import { angleUnits, conductivityUnits, spectralUnits } from '../../../../shared/materialImport.ts';
import type { ImportMapping, ImportTable, SignHabits } from '../../../../shared/materialImport.ts';
import { columnRoles, indexPairs, voigtPairs, columnPairs } from './columnRoles.ts';
import type { ColumnRole } from './columnRoles.ts';

/** What a person says about the columns of a table, complete or not. */
export const columnPlanSchema = z.object({
  roles: z.array(z.enum(columnRoles)),
  units: z.object({
    spectral: z.enum(spectralUnits),
    conductivity: z.enum(conductivityUnits),
    angle: z.enum(angleUnits),
  }),
  incidentIndex: z.number().min(1).max(10),
  indexOf: z.object({ material: z.string(), version: z.int().min(1) }).nullable(),
});

export type ColumnPlan = z.infer<typeof columnPlanSchema>;

/** The plan that the server's suggestion makes; nothing is used where it found no wavelength column. */
export function planOf({ columns, suggestion }: ImportTable): ColumnPlan {
  const roles = columns.map((): ColumnRole => 'unused');
  const put = (column: number | null, role: ColumnRole) => {
    if (column !== null && column < roles.length) roles[column] = role;
  };
  const plan: ColumnPlan = {
    roles,
    units: { spectral: 'nm', conductivity: 's^-1', angle: 'deg' },
    incidentIndex: 1,
    indexOf: null,
  };
  if (!suggestion) return plan;
  const { spectral, index, voigt } = suggestion;
  put(spectral.column, 'spectral');
  plan.units.spectral = spectral.unit;
  if (index?.from === 'n, k') {
    put(index.n, 'n');
    put(index.k, 'k');
  } else if (index) {
    put(index.eps1, 'eps1');
    put(index.eps2, 'eps2');
  }
  if (voigt?.from === 'Kerr angles') {
    put(voigt.rotation, 'rotation');
    put(voigt.ellipticity, 'ellipticity');
    plan.units.angle = voigt.unit;
    plan.incidentIndex = voigt.incidentIndex;
  } else if (voigt) {
    put(voigt.re, columnPairs[voigt.from].first);
    put(voigt.im, columnPairs[voigt.from].second);
    if (voigt.from === 'sigma_xy') plan.units.conductivity = voigt.unit;
  }
  return plan;
}

/** How the columns give N and the magneto-optic constant; null where they do not. */
export function quantitiesOf({ roles }: Pick<ColumnPlan, 'roles'>) {
  const used = (pair: keyof typeof columnPairs) =>
    roles.includes(columnPairs[pair].first) || roles.includes(columnPairs[pair].second);
  return { index: indexPairs.find(used) ?? null, voigt: voigtPairs.find(used) ?? null };
}

/**
 * The mapping that a plan without problems (planProblems.ts) and its habits make; null where the wavelength column
 * is missing.
 */
export function mappingOf(plan: ColumnPlan, habits: SignHabits): ImportMapping | null {
  const at = (role: ColumnRole) => {
    const column = plan.roles.indexOf(role);
    return column < 0 ? null : column;
  };
  const spectral = at('spectral');
  if (spectral === null) return null;
  const index = indexMapping(at);
  return {
    spectral: { column: spectral, unit: plan.units.spectral },
    index,
    voigt: voigtMapping(plan, at),
    indexOf: index ? null : plan.indexOf,
    habits,
  };
}

type At = (role: ColumnRole) => number | null;

function indexMapping(at: At): ImportMapping['index'] {
  const [n, eps1] = [at('n'), at('eps1')];
  if (n !== null) return { from: 'n, k', n, k: at('k') };
  return eps1 === null ? null : { from: 'eps1, eps2', eps1, eps2: at('eps2') };
}

function voigtMapping({ roles, units, incidentIndex }: ColumnPlan, at: At): ImportMapping['voigt'] {
  const from = quantitiesOf({ roles }).voigt;
  if (from === null) return null;
  const [first, second] = [at(columnPairs[from].first), at(columnPairs[from].second)];
  if (first === null) return null;
  switch (from) {
    case 'Q':
    case 'eps_xy':
      return { from, re: first, im: second };
    case 'sigma_xy':
      return { from, re: first, im: second, unit: units.conductivity };
    case 'Kerr angles':
      if (second === null) return null;
      return { from, rotation: first, ellipticity: second, unit: units.angle, incidentIndex };
  }
}
