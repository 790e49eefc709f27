import type { SolveCase } from '../../shared/solve.ts';
import { loadKernel } from '../../worker/kernel/loadKernel.ts';
import { baseFields } from '../../worker/optics/baseFields.ts';
import { layerShare } from '../../worker/optics/contributions.ts';
import { BatchResult, COLUMN } from '../../worker/optics/fast/batchResult.ts';
import { FastSolver } from '../../worker/optics/fast/fastSolver.ts';
import type { Batch } from '../../worker/optics/fast/fastSolver.ts';
import { StackSolver } from '../../worker/optics/stackSolver.ts';

/** Largest differences between the fast and the general solver over the points of a case. */
export type Difference = {
  /** r, t, R, T; absolute. */
  amplitude: number;
  /** Kerr angles, deg, weighted by the reflected power where that is small. */
  angleDeg: number;
  /** r_sp and r_ps against the sum of the moduli of the layer shares. */
  signal: number;
};

/** All points of a case, wavelength outermost. */
function batchOf({ wavelengthNm, angleDeg }: SolveCase): Batch {
  const angles = [angleDeg].flat();
  const wavelengths = [wavelengthNm].flat();
  return {
    wavelengthIndex: Int32Array.from(wavelengths.flatMap((_, i) => angles.map(() => i))),
    anglesDeg: Float64Array.from(wavelengths.flatMap(() => angles)),
  };
}

export function compare(solveCase: SolveCase, batch: Batch = batchOf(solveCase)): Difference {
  const out = new BatchResult(batch.anglesDeg.length, true);
  new FastSolver(solveCase, loadKernel()).solveBatch(batch, out);
  const general = new StackSolver(solveCase);
  const worst: Difference = { amplitude: 0, angleDeg: 0, signal: 0 };
  for (let i = 0; i < batch.anglesDeg.length; i++) {
    if (batch.thickness) general.setThickness(batch.thickness.path, batch.thickness.nm[i]!);
    const point = comparePoint(out, i, general, batch.wavelengthIndex[i]!, batch.anglesDeg[i]!);
    // Written so that NaN is the worst of all.
    for (const key of ['amplitude', 'angleDeg', 'signal'] as const) {
      if (!(point[key] <= worst[key])) worst[key] = point[key];
    }
  }
  return worst;
}

function comparePoint(
  { columns }: BatchResult,
  i: number,
  general: StackSolver,
  wavelengthIndex: number,
  angleDeg: number,
): Difference {
  const value = (column: number) => columns[column]![i]!;
  const { r, t, R, T, kerr } = general.solve(wavelengthIndex, angleDeg);
  const gaps = [...r].map((part, k) => Math.abs(part - value(COLUMN.r + k)));
  const amplitude = Math.max(
    ...gaps,
    ...[...(t ?? [])].map((part, k) => Math.abs(part - value(COLUMN.t + k))),
    Math.abs(R.p - value(COLUMN.reflectanceP)),
    Math.abs(R.s - value(COLUMN.reflectanceS)),
    Math.abs(T.p - value(COLUMN.transmittanceP)),
    Math.abs(T.s - value(COLUMN.transmittanceS)),
  );
  const angle = (general: number, column: number, power: number) => {
    const gap = Math.abs(general - value(column));
    return Math.min(gap, 180 - gap) * Math.min(1, power / 1e-3);
  };
  const angleGap = Math.max(
    kerr.p ? angle(kerr.p.rotationDeg, COLUMN.rotationP, R.p) : 0,
    kerr.p ? angle(kerr.p.ellipticityDeg, COLUMN.ellipticityP, R.p) : 0,
    kerr.s ? angle(kerr.s.rotationDeg, COLUMN.rotationS, R.s) : 0,
    kerr.s ? angle(kerr.s.ellipticityDeg, COLUMN.ellipticityS, R.s) : 0,
  );
  const fields = baseFields(general.stack, wavelengthIndex, angleDeg);
  const shares = fields.layers.map((_, j) => layerShare(fields, j));
  const sum = (name: 'sp' | 'ps') => shares.reduce((total, share) => total + Math.hypot(...share[name]), 0);
  const relative = (gap: number, size: number) => (gap === 0 ? 0 : gap / size);
  return {
    amplitude,
    angleDeg: angleGap,
    signal: Math.max(
      relative(Math.hypot(gaps[2]!, gaps[3]!), sum('ps')),
      relative(Math.hypot(gaps[4]!, gaps[5]!), sum('sp')),
    ),
  };
}
