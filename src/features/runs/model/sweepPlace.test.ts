import { describe, expect, it } from 'vitest';
import { describeResult } from '../../../../shared/resultFormat.ts';
import type { RunResult } from '../../../../shared/resultFormat.ts';
import type { SweepAxis } from '../../../../shared/run.ts';
import type { StackDocument } from '../../../../shared/stack.ts';
import {
  describeGridPlace,
  describePlace,
  homePlace,
  placeAt,
  pointAt,
  valuesAt,
  workingPlace,
} from './sweepPlace.ts';

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

  it('moves the drawing along with angle and wavelength, and says where it is', () => {
    expect(pointAt(angle, document.workingPoint, 25).angleDeg).toBe(25);
    expect(pointAt(thickness, document.workingPoint, 1)).toBe(document.workingPoint);
    expect(describePlace(angle, 29.9648241206, null)).toBe('angle 29.96482°');
    expect(describePlace(thickness, 1.5, 'Co')).toBe('thickness of Co 1.5 nm');
  });
});

describe('a point of a map', () => {
  const wavelength: SweepAxis = { kind: 'wavelength', from: 500, to: 600, points: 2, spacing: 'linear' };
  const axes = { axis: { ...angle, points: 3, from: 10, to: 80 }, second: wavelength };
  const result: RunResult = {
    header: describeResult(axes, ['rotationP'], { solverVersion: '1', inputSha256: 'abc' }),
    axis: Float64Array.from([10, 45, 80]),
    second: Float64Array.from([500, 600]),
    family: null,
    columns: { rotationP: Float64Array.from([1, 2, 3, 4, 5, 6]) },
  };

  it('is found by its index, read and said in words', () => {
    const place = placeAt(result, 5);
    expect(place).toEqual({ ix: 2, iy: 1, member: 0 });
    expect(valuesAt(result, place)).toEqual({ rotationP: 6 });
    expect(describeGridPlace(axes, result, place, () => undefined)).toBe('angle 80°, wavelength 600 nm');
  });

  it('lies where the film stands, or at the start of an axis that does not reach it', () => {
    expect(homePlace(axes, result, document)).toEqual({ ix: 1, iy: 0, member: 0 });
  });
});
