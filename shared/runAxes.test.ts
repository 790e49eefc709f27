import { describe, expect, it } from 'vitest';
import { axisSchema, createRunSchema } from './run.ts';
import type { ReadingName, SweepAxes, SweepAxis } from './run.ts';
import { pointCountOf } from './runAxes.ts';

const angle: SweepAxis = { kind: 'angle', from: 0, to: 80, points: 100, spacing: 'linear' };
const wavelength: SweepAxis = { kind: 'wavelength', from: 400, to: 800, points: 50, spacing: 'linear' };
const scale: SweepAxis = { kind: 'voigtScale', layerId: 'a', from: 0, to: 2, points: 3, spacing: 'linear' };

function issuesOf(axes: SweepAxes, readings?: ReadingName[]): string[] {
  const parsed = createRunSchema.safeParse({
    groupId: 'g',
    document: {
      incident: { index: 1 },
      layers: [],
      substrate: { index: 1.5 },
      workingPoint: { wavelengthNm: 633, angleDeg: 0, input: 'p', magnetization: { mode: 'drawn' } },
    },
    ...axes,
    readings,
  });
  return (parsed.error?.issues ?? []).map(({ path, message }) => `${path.join('.')}: ${message}`);
}

describe('the axes of a run', () => {
  it('may be one, two, and a family', () => {
    expect(issuesOf({ axis: angle })).toEqual([]);
    expect(issuesOf({ axis: angle, second: wavelength, family: scale })).toEqual([]);
    expect(pointCountOf({ axis: angle, second: wavelength, family: scale })).toBe(15_000);
  });

  it('must not sweep one quantity twice; every layer includes each one', () => {
    expect(issuesOf({ axis: angle, second: angle })[0]).toMatch(/^second\.kind: .*axis already/);
    expect(issuesOf({ axis: angle, second: scale, family: { ...scale, layerId: undefined } })[0]).toMatch(
      /^family\.kind: .*second already/,
    );
    expect(issuesOf({ axis: angle, second: scale, family: { ...scale, layerId: 'b' } })).toEqual([]);
  });

  it('have at most a million points together, and few curves of a family', () => {
    const large = { axis: { ...angle, points: 1_001 }, second: { ...wavelength, points: 1_000 } };
    expect(issuesOf(large)).toEqual([
      'second.points: the axes have 1001 x 1000 = 1001000 points together: at most 1000000',
    ]);
    expect(issuesOf({ axis: angle, family: { ...scale, points: 13 } })).toEqual([
      'family.points: must be 2 to 12, got 13',
    ]);
  });

  it('store at most six readings of a map', () => {
    const seven: ReadingName[] = [
      'rotationP',
      'rotationS',
      'ellipticityP',
      'ellipticityS',
      'reflectanceP',
      'reflectanceS',
      'crossSp',
    ];
    expect(issuesOf({ axis: angle }, seven)).toEqual([]);
    expect(issuesOf({ axis: angle, second: wavelength }, seven)).toEqual([
      'readings: a map stores at most 6 readings, got 7',
    ]);
  });

  it('count repeats in whole numbers', () => {
    const repeat = { kind: 'repeat', blockId: 'b', from: 1, to: 21, points: 11, spacing: 'linear' } as const;
    expect(axisSchema.safeParse(repeat).success).toBe(true);
    const message = axisSchema.safeParse({ ...repeat, points: 8 }).error?.issues[0]?.message;
    expect(message).toBe('must give whole numbers from 1 to 21, such as 21 points');
  });

  it('have no logarithm of an angle below zero', () => {
    const parsed = axisSchema.safeParse({
      kind: 'direction',
      plane: 'xz',
      from: -90,
      to: 90,
      points: 9,
      spacing: 'log',
    });
    expect(parsed.error?.issues[0]?.path).toEqual(['from']);
  });
});
