import { describe, expect, it } from 'vitest';
import { importMappingSchema, ownHabits } from '../../../../shared/materialImport.ts';
import type { ImportMapping, ImportTable } from '../../../../shared/materialImport.ts';
import { mappingOf, planOf } from './columnPlan.ts';
import { neededHabits } from './neededHabits.ts';
import { planProblems } from './planProblems.ts';

const tableWith = (columns: number, suggestion: ImportMapping | null): ImportTable => ({
  delimiter: 'comma',
  decimal: 'point',
  headerLine: null,
  comments: [],
  columns: Array.from({ length: columns }, () => ({ header: null, least: 0, greatest: 1 })),
  rowCount: 1,
  firstRows: [],
  lastRows: [],
  suggestion,
  warnings: [],
});

const spectral = { column: 0, unit: 'THz' } as const;
const iron = { material: 'fe-johnson-1974', version: 1 };

/** Every way in which columns can give constants. */
const mappings: ImportMapping[] = [
  { spectral, index: { from: 'n, k', n: 2, k: 1 }, voigt: null, indexOf: null, habits: ownHabits },
  { spectral, index: { from: 'n, k', n: 2, k: null }, voigt: null, indexOf: null, habits: ownHabits },
  {
    spectral,
    index: { from: 'eps1, eps2', eps1: 1, eps2: 2 },
    voigt: { from: 'Q', re: 4, im: 3 },
    indexOf: null,
    habits: ownHabits,
  },
  { spectral, index: null, voigt: { from: 'eps_xy', re: 1, im: null }, indexOf: iron, habits: ownHabits },
  {
    spectral,
    index: null,
    voigt: { from: 'sigma_xy', re: 1, im: 2, unit: 'S/m' },
    indexOf: iron,
    habits: ownHabits,
  },
  {
    spectral,
    index: { from: 'eps1, eps2', eps1: 3, eps2: null },
    voigt: { from: 'Kerr angles', rotation: 1, ellipticity: 2, unit: 'mrad', incidentIndex: 1.5 },
    indexOf: null,
    habits: ownHabits,
  },
];

describe('what is said about the columns', () => {
  it.each(mappings)('gives the suggested mapping back, number %#', (mapping) => {
    const plan = { ...planOf(tableWith(6, mapping)), indexOf: mapping.indexOf };
    expect(planProblems(plan)).toEqual([]);
    const made = mappingOf(plan, ownHabits);
    expect(made).toEqual(mapping);
    expect(importMappingSchema.safeParse(made).success).toBe(true);
  });

  it('says everything that is missing or contradictory, with the columns', () => {
    const plan = planOf(tableWith(5, null));
    expect(planProblems(plan)).toEqual([
      'Say which column holds the wavelength or the photon energy.',
      'Choose the columns of n and k (or ε₁ and ε₂), of a magneto-optic constant, or of both.',
    ]);
    expect(planProblems({ ...plan, roles: ['spectral', 'n', 'n', 'eps2', 'rotation'] })).toEqual([
      'Columns 2 and 3 are both n: leave one unused.',
      'ε₂ = Im ε needs ε₁ = Re ε: choose its column too.',
      'Kerr rotation needs Kerr ellipticity: choose its column too.',
      'n, k and ε₁, ε₂ say the same in two ways: leave one of them unused.',
    ]);
    expect(planProblems({ ...plan, roles: ['spectral', 'Re Q', 'Re eps_xy'] })).toEqual([
      'Only one kind of magneto-optic columns can be read at a time: leave the others unused.',
      'The table gives no N: choose the material that gives it, below the table.',
    ]);
  });
});

describe('the sign habits that are asked', () => {
  // Each follows from physics.md section 2: what conjugation, m and the sense of looking change.
  it.each([
    { roles: ['spectral', 'n'], asked: [] },
    { roles: ['spectral', 'n', 'k'], asked: ['time'] },
    { roles: ['spectral', 'Re Q'], asked: ['time', 'voigtSign', 'magnetization'] },
    { roles: ['spectral', 'Re eps_xy', 'Im eps_xy'], asked: ['time', 'magnetization'] },
    { roles: ['spectral', 'Re eps_xy'], asked: ['magnetization'] },
    { roles: ['spectral', 'rotation', 'ellipticity'], asked: ['magnetization', 'rotation', 'ellipticity'] },
    {
      roles: ['spectral', 'eps1', 'eps2', 'rotation', 'ellipticity'],
      asked: ['time', 'magnetization', 'rotation', 'ellipticity'],
    },
  ] as const)('are $asked for $roles', ({ roles, asked }) => {
    expect(neededHabits({ roles: [...roles] })).toEqual(asked);
  });
});
