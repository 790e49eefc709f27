import fc from 'fast-check';
import { expect, test } from 'vitest';
import { toComplex } from '../../shared/complex.ts';
import type { Complex } from '../../shared/complex.ts';
import type { MediumInput, TensorInput } from '../../shared/medium.ts';
import {
  angle,
  decades,
  incidentIndex,
  metalIndex,
  passiveMedium,
  runs,
  wavelength,
} from './arbitraryStack.ts';
import { solveByExponentials } from './matrixExponential.ts';
import { gyrotropic, uniaxial } from './plainTensor.ts';
import { distance, size, solvePoint } from './solvePoint.ts';

// Random stacks against the matrix exponential of Berreman's 4x4 matrix (J. Opt. Soc. Am. 62, 502 (1972)),
// evaluated by mathjs, with the boundary conditions solved by ml-matrix.

function tensorOf(medium: MediumInput): Complex[][] {
  if (medium.epsilon !== undefined) {
    return (medium.epsilon as TensorInput).map((row) => row.map(toComplex));
  }
  const index = toComplex(medium.index as Complex | number);
  if (medium.extraordinary !== undefined && medium.axis !== undefined) {
    return uniaxial(index, toComplex(medium.extraordinary as Complex | number), medium.axis);
  }
  const voigt = toComplex((medium.voigt ?? 0) as Complex | number);
  return gyrotropic(index, voigt, medium.m ?? [0, 0, 0]);
}

const layer = fc.tuple(passiveMedium, decades(0.2, 60)).map(([medium, thicknessNm]) => ({
  ...medium,
  thicknessNm,
}));

test('several hundred general stacks agree to 1e-10 in r and t', () => {
  let solved = 0;
  fc.assert(
    fc.property(
      wavelength,
      angle,
      incidentIndex,
      fc.array(layer, { minLength: 1, maxLength: 3 }),
      fc.oneof(metalIndex, fc.constantFrom<Complex>([1, 0], [1.52, 0], [3.88, 0.02])),
      (wavelengthNm, angleDeg, index, layers, substrate) => {
        const { r, t } = solvePoint({
          wavelengthNm,
          angleDeg,
          incident: { index },
          layers,
          substrate: { index: substrate },
        });
        const second = solveByExponentials({
          wavelengthNm,
          angleDeg,
          incidentIndex: index,
          layers: layers.map((one) => ({ thicknessNm: one.thicknessNm, epsilon: tensorOf(one) })),
          substrateIndex: substrate,
        });
        expect(t).not.toBeNull();
        for (const element of ['pp', 'ps', 'sp', 'ss'] as const) {
          expect(distance(r[element], second.r[element])).toBeLessThan(1e-10);
          const transmitted = second.t[element];
          expect(t && distance(t[element], transmitted)).toBeLessThan(1e-10 * (1 + size(transmitted)));
        }
        solved++;
      },
    ),
    runs(300),
  );
  expect(solved).toBeGreaterThanOrEqual(300);
});
