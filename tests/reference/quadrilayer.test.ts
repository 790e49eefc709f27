import { describe, expect, it } from 'vitest';
import type { Complex } from '../../shared/complex.ts';
import type { SolveCase } from '../../shared/solve.ts';
import { solveCasePoints } from '../../worker/optics/solveRequest.ts';

// Source: Mansuripur, Appl. Phys. Lett. 49, 19 (1986), from memory; constants as physics.md section 8 states them:
// a film of eps -4.898 + 19.415i, eps_xy 0.432 + 0.006i between dielectrics 2.0 on silver (0.06 + 4.2i), 632.8 nm.
const epsilon: Complex = [-4.898, 19.415];
const size = Math.hypot(...epsilon);
const n = Math.sqrt((size + epsilon[0]) / 2);
const film = {
  index: [n, epsilon[1] / (2 * n)] as Complex,
  // Q = eps_xy / (i eps_d) = (0.006 - 0.432i) / eps_d
  voigt: [
    (0.006 * epsilon[0] - 0.432 * epsilon[1]) / size ** 2,
    (-0.432 * epsilon[0] - 0.006 * epsilon[1]) / size ** 2,
  ] as Complex,
  m: [0, 0, 1] as [number, number, number],
};

function shareReached([over, magnet, under]: number[]): number {
  const quadrilayer: SolveCase = {
    wavelengthNm: 632.8,
    angleDeg: 0,
    incident: { index: 1 },
    layers: [
      { thicknessNm: over!, index: 2 },
      { thicknessNm: magnet!, ...film },
      { thicknessNm: under!, index: 2 },
    ],
    substrate: { index: [0.06, 4.2] },
    outputs: ['ceiling'],
  };
  return [...solveCasePoints(quadrilayer)][0]!.ceiling!.shareReached!;
}

/** Climbs along one thickness after the other with shrinking steps; crude, but it needs no optimizer of ours. */
function climb(start: number[]): number {
  const at = [...start];
  let best = shareReached(at);
  for (let step = 16; step > 0.2; step /= 2) {
    for (let improved = true; improved;) {
      improved = false;
      for (const position of [0, 1, 2]) {
        for (const side of [-step, step]) {
          const trial = at.map((value, i) => (i === position ? Math.max(0, value + side) : value));
          const share = shareReached(trial);
          if (share <= best) continue;
          best = share;
          at.splice(0, 3, ...trial);
          improved = true;
        }
      }
    }
  }
  return best;
}

describe('quadrilayer', () => {
  it('can reach 99 % of the ceiling of its film, and nothing gets past it', () => {
    const reached = [40, 80, 120].flatMap((over) => [20, 60, 100].map((under) => climb([over, 12, under])));
    expect(Math.max(...reached)).toBeGreaterThan(0.99);
    // To first order in Q the ceiling is strict; |Q eps_d| / Im eps_d is 0.02 here.
    expect(Math.max(...reached)).toBeLessThan(1.001);
  });
});
