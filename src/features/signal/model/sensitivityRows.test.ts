import { expect, it } from 'vitest';
import type { Sensitivity } from '../../../../shared/toleranceDesign.ts';
import { sensitivityRows } from './sensitivityRows.ts';

const one = (label: string, value: number, rotationDeg: number | null): Sensitivity => ({
  pointId: 'point',
  parameter: 'n',
  of: label,
  label,
  value,
  derivative: { rotationDeg, ellipticityDeg: 0, amplitude: 0, contrast: null, reflectance: 0 },
});

it('puts the parameter whose 1 % moves the rotation most first, whatever its sense', () => {
  // By hand: 2 * 0.1 / 100 = 0.002, 5 * -0.3 / 100 = -0.015.
  const rows = sensitivityRows([one('a', 2, 0.1), one('b', 5, -0.3), one('c', 1, null)]);
  expect(rows.map(({ label }) => label)).toEqual(['b', 'a', 'c']);
  expect(rows[0]!.rotationPerPercentDeg).toBeCloseTo(-0.015, 15);
  expect(rows[1]!.rotationPerPercentDeg).toBeCloseTo(0.002, 15);
  expect(rows[2]!.rotationPerPercentDeg).toBeNull();
});
