import { describe, expect, it } from 'vitest';
import { readStrip, stripRequest } from './readingsStrip.ts';
import { librarySolveRequestSchema } from './solve.ts';
import type { SolvePoint } from './solve.ts';
import type { StackDocument } from './stack.ts';

const document: StackDocument = {
  incident: { index: 1 },
  layers: [
    {
      id: 'film',
      medium: { index: [2.87, 3.36], voigt: [0.0376, 0.0066] },
      thicknessNm: 10,
      m: [0, 0, 1],
    },
  ],
  substrate: { index: [3.88, 0.02] },
  workingPoint: { wavelengthNm: 632.8, angleDeg: 60, input: 'p', magnetization: { mode: 'drawn' } },
};

/** A point with the numbers that the readings look at; the rest does not matter here. */
function buildPoint(rotationDeg: number, reflectance = 0.5): SolvePoint {
  const zero: [number, number] = [0, 0];
  return {
    wavelengthNm: 632.8,
    angleDeg: 60,
    r: { pp: zero, ps: zero, sp: [3e-4, 4e-4], ss: zero },
    t: null,
    R: { p: reflectance, s: reflectance },
    T: { p: 0, s: 0 },
    A: { p: 0, s: 0 },
    kerr: { p: { rotationDeg, ellipticityDeg: 2 * rotationDeg }, s: null },
  };
}

describe('the readings strip', () => {
  it('asks for the film as given, with m = 0 and reversed, in one request that the contract accepts', () => {
    const request = stripRequest(document, document.workingPoint);
    expect(librarySolveRequestSchema.safeParse(request).success).toBe(true);
    expect(request.cases.map(({ layers }) => layers[0])).toMatchObject([
      { m: [0, 0, 1] },
      { m: [0, 0, 0] },
      { m: [0, 0, -1] },
    ]);
  });

  // The definitions of physics.md section 4: change against m = 0, contrast against the reversed film.
  it('reads the change against m = 0 and the contrast against the reversed film', () => {
    const { readings, warnings } = readStrip({
      results: [
        { points: [buildPoint(0.05, 0.51)] },
        { points: [buildPoint(0.01)] },
        { points: [buildPoint(-0.03, 0.49)] },
      ],
      warnings: [0, 1].map((position) => ({ case: position, path: `cases[${position}]`, message: 'odd' })),
    });
    expect(readings.rotationP).toBeCloseTo(0.04, 12);
    expect(readings.ellipticityP).toBeCloseTo(0.08, 12);
    expect(readings.rotationS).toBeNull();
    expect(readings.crossSp).toBeCloseTo(5e-4, 15);
    expect(readings.contrastP).toBeCloseTo(0.02, 12);
    expect(warnings).toEqual([{ case: 0, path: 'cases[0]', message: 'odd' }]);
  });
});
