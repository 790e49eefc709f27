import { describe, expect, test } from 'vitest';
import { loadKernel } from '../kernel/loadKernel.ts';
import { BatchResult, COLUMN } from '../optics/fast/batchResult.ts';
import { FastSolver } from '../optics/fast/fastSolver.ts';
import { StackSolver } from '../optics/stackSolver.ts';
import { pointsOf, WORKLOADS } from './workloads.ts';

describe('workloads of the bench', () => {
  test('have the points that the bench promises', () => {
    const points = WORKLOADS.map((workload) => [workload.name, pointsOf(workload).anglesDeg.length]);
    expect(points).toEqual([
      ['W1-map', 40_000],
      ['W2-multilayer', 10_000],
      ['W3-oblique', 27_000],
      ['W1-spectrum', 500],
    ]);
  });

  test.each(WORKLOADS)('$name is solved right at every 97th point', (workload) => {
    const batch = pointsOf(workload);
    const out = new BatchResult(batch.anglesDeg.length);
    new FastSolver(workload.solveCase, loadKernel()).solveBatch(batch, out);
    const general = new StackSolver(workload.solveCase);
    for (let i = 0; i < batch.anglesDeg.length; i += 97) {
      const { r, R, kerr } = general.solve(batch.wavelengthIndex[i]!, batch.anglesDeg[i]!);
      r.forEach((part, k) => expect(out.columns[COLUMN.r + k]![i]).toBeCloseTo(part, 12));
      expect(out.columns[COLUMN.reflectanceS]![i]).toBeCloseTo(R.s, 12);
      expect(out.columns[COLUMN.rotationP]![i]).toBeCloseTo(kerr.p!.rotationDeg, 9);
      expect(out.columns[COLUMN.ellipticityS]![i]).toBeCloseTo(kerr.s!.ellipticityDeg, 9);
    }
  });
});
