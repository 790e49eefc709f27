import { describe, expect, it } from 'vitest';
import type { StackDocument, StackMedium } from '../../shared/stack.ts';
import { countStates, statesNeeded } from './magnetizationStates.ts';

function stackWith(medium: StackMedium): StackDocument {
  return {
    incident: { index: 1 },
    layers: [{ id: 'block', repeat: 3, layers: [{ id: 'film', medium, thicknessNm: 2, m: [0, 0, 1] }] }],
    substrate: { index: [3.88, 0.02] },
    workingPoint: { wavelengthNm: 633, angleDeg: 30, input: 'p', magnetization: { mode: 'drawn' } },
  };
}

const magnetic: StackMedium = { index: [2.25, 4.07], voigt: [0.03, 0.01] };

describe('statesNeeded', () => {
  it('solves only the given state where no reading compares', () => {
    const needed = statesNeeded(stackWith(magnetic), ['reflectanceP', 'crossSp', 'absorptanceS']);
    expect(needed).toEqual({ zero: 'never', reversed: false });
    expect(countStates(needed)).toBe(1);
  });

  it('needs no m = 0 solve for the Kerr angles of isotropic media', () => {
    expect(statesNeeded(stackWith(magnetic), ['rotationP']).zero).toBe('weak reflection');
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
});
