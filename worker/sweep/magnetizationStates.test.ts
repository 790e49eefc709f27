import { describe, expect, it } from 'vitest';
import type { SweepAxis } from '../../shared/run.ts';
import type { StackDocument, StackMedium } from '../../shared/stack.ts';
import { countStates, statesNeeded } from './magnetizationStates.ts';

const axis: SweepAxis = { kind: 'angle', from: 0, to: 80, points: 9, spacing: 'linear' };

function stackWith(medium: StackMedium, swept = axis): { document: StackDocument; axis: SweepAxis } {
  const document: StackDocument = {
    incident: { index: 1 },
    layers: [{ id: 'block', repeat: 3, layers: [{ id: 'film', medium, thicknessNm: 2, m: [0, 0, 1] }] }],
    substrate: { index: [3.88, 0.02] },
    workingPoint: { wavelengthNm: 633, angleDeg: 30, input: 'p', magnetization: { mode: 'drawn' } },
  };
  return { document, axis: swept };
}

const magnetic: StackMedium = { index: [2.25, 4.07], voigt: [0.03, 0.01] };

describe('statesNeeded', () => {
  it('solves only the given state where no reading compares', () => {
    const needed = statesNeeded(stackWith(magnetic), ['reflectanceP', 'crossSp', 'absorptanceS']);
    expect(needed).toEqual({ zero: 'never', reversed: false });
    expect(countStates(needed)).toBe(1);
  });

  it('needs no m = 0 solve for the Kerr angles of isotropic media', () => {
    expect(statesNeeded(stackWith(magnetic), ['rotationP']).zero).toBe('weak beam');
  });

  it('needs it where the stack turns light without magnetization, in a block too', () => {
    const uniaxial = { ...magnetic, extraordinary: [2.3, 4], axis: [1, 1, 0] } satisfies StackMedium;
    expect(statesNeeded(stackWith(uniaxial), ['ellipticityS']).zero).toBe('always');
    const tensor: StackMedium = {
      epsilon: [
        [2, [0, 0.1], 0],
        [[0, -0.1], 2, 0],
        [0, 0, 2],
      ],
    };
    expect(statesNeeded(stackWith(tensor), ['rotationS']).zero).toBe('always');
  });

  it('needs the reversed state for the contrast alone', () => {
    expect(statesNeeded(stackWith(magnetic), ['contrastS'])).toEqual({ zero: 'never', reversed: true });
  });

  it('solves no more than the parity of a Kerr angle takes', () => {
    expect(statesNeeded(stackWith(magnetic), ['oddRotationP'])).toEqual({ zero: 'never', reversed: true });
    expect(statesNeeded(stackWith(magnetic), ['evenEllipticityS'])).toEqual({
      zero: 'weak beam',
      reversed: true,
    });
  });

  it('needs the m = 0 state for light that is neither p nor s, and where interfaces are graded on the way', () => {
    expect(statesNeeded(stackWith(magnetic), ['rotationAtAzimuth']).zero).toBe('always');
    const graded: SweepAxis = { ...axis, kind: 'graded', layerId: 'film', from: 0, to: 1 };
    expect(statesNeeded(stackWith(magnetic, graded), ['rotationP']).zero).toBe('always');
    expect(statesNeeded(stackWith(magnetic), ['circularContrast', 'ceilingShare', 'polarPart']).zero).toBe(
      'never',
    );
  });
});
