import { describe, expect, it } from 'vitest';
import type { SweepAxis } from '../../../../shared/run.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import { describePlace, pointAt, sweptLayer, workingPlace } from './sweepPlace.ts';

const document: StackDocument = {
  incident: { index: 1 },
  layers: [
    {
      id: 'block',
      repeat: 3,
      layers: [{ id: 'co', medium: { index: [2.3, 4.1] }, thicknessNm: 0.4 }],
    },
  ],
  substrate: { index: 3.88 },
  workingPoint: { wavelengthNm: 632.8, angleDeg: 60, input: 'p', magnetization: { mode: 'drawn' } },
};
const span = { points: 11, spacing: 'linear' } as const;
const angle: SweepAxis = { kind: 'angle', from: 80, to: 10, ...span };
const thickness: SweepAxis = { kind: 'thickness', layerId: 'co', from: 0, to: 2, ...span };

describe('a place on a sweep', () => {
  it('is the working point where the axis reaches it, in either direction', () => {
    expect(workingPlace(angle, document)).toBe(60);
    expect(workingPlace({ ...angle, to: 70 }, document)).toBeNull();
    expect(workingPlace(thickness, document)).toBe(0.4);
  });

  it('finds the swept layer inside a block', () => {
    expect(sweptLayer(thickness, document)?.thicknessNm).toBe(0.4);
    expect(sweptLayer({ ...thickness, layerId: 'gone' }, document)).toBeNull();
    expect(sweptLayer(angle, document)).toBeNull();
  });

  it('moves the drawing along with angle and wavelength, and says where it is', () => {
    expect(pointAt(angle, document.workingPoint, 25).angleDeg).toBe(25);
    expect(pointAt(thickness, document.workingPoint, 1)).toBe(document.workingPoint);
    expect(describePlace(angle, 29.9648241206, null)).toBe('angle 29.96482°');
    expect(describePlace(thickness, 1.5, 'Co')).toBe('thickness of Co 1.5 nm');
  });
});
