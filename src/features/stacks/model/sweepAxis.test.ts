import { describe, expect, it } from 'vitest';
import type { SweepAxis } from '../../../../shared/run.ts';
import { buildBlock, buildDocument, buildLayer } from './stackFixtures.ts';
import { axisGrid, axisProblems, fitsFilm, previewGrid, previewPoints, sweepableKinds } from './sweepAxis.ts';

const angle = { kind: 'angle', from: 0, to: 89, points: 90, spacing: 'linear' } as const;
const thickness = { kind: 'thickness', layerId: 'pt', from: 1, to: 100, points: 3, spacing: 'log' } as const;

describe('axisGrid', () => {
  it('has its ends exactly and equal steps or ratios between', () => {
    expect(axisGrid(angle, 90)[60]).toBeCloseTo(60, 12);
    expect(axisGrid(angle, 90).at(-1)).toBe(89);
    expect(axisGrid(thickness, 3)[1]).toBeCloseTo(10, 12);
    expect(axisGrid({ ...angle, from: 80, to: 10 }, 3)).toEqual([80, 45, 10]);
    expect(axisGrid(angle, 1)).toEqual([0]);
  });
});

describe('axisProblems', () => {
  it('names the field and says what is wrong', () => {
    expect(axisProblems(angle)).toEqual({});
    expect(axisProblems({ ...angle, to: 0 })).toEqual({ to: 'must differ from the start' });
    expect(axisProblems({ ...thickness, from: 0 })).toEqual({ from: 'must be > 0 with log spacing' });
    expect(Object.keys(axisProblems({ ...angle, points: 0 }))).toEqual(['points']);
  });
});

describe('previewPoints', () => {
  it('is what is asked for, up to 200', () => {
    expect(previewPoints(angle, buildDocument())).toBe(90);
    expect(previewPoints({ ...angle, points: 1_000_000 }, buildDocument())).toBe(200);
  });

  it('shrinks for a thickness of a film of thousands of layers, whose copies would be a slow request', () => {
    const layers = Array.from({ length: 2000 }, (_, index) => buildLayer({ id: `layer ${index}` }));
    const axis: SweepAxis = { ...thickness, points: 200 };
    const points = previewPoints(axis, buildDocument({ layers }));
    expect(points).toBeGreaterThanOrEqual(2);
    expect(points).toBeLessThan(10);
    expect(previewPoints({ ...angle, points: 200 }, buildDocument({ layers }))).toBe(200);
  });
});

describe('a previewed map', () => {
  const square = { axis: { ...angle, points: 1000 }, second: { ...thickness, points: 1000 }, family: null };

  it('has at most 40 by 40 points, and fewer where each is an average of many', () => {
    expect(previewGrid(square, buildDocument())).toEqual({ axis: 40, second: 40 });
    const spread = { shape: 'normal', bandwidthNm: 5, divergenceDeg: 1 } as const;
    const { axis, second } = previewGrid(square, buildDocument({ spread }));
    // 20,000 points a request, three states, 7 x 7 nodes.
    expect(axis * second).toBeLessThanOrEqual(20_000 / 3 / 49);
  });
});

describe('what an axis names', () => {
  it('is kept while it is in the film', () => {
    const film = buildDocument({ layers: [buildLayer({ id: 'a' }), buildBlock([buildLayer({ id: 'b' })])] });
    const repeat = {
      kind: 'repeat',
      blockId: 'block',
      from: 1,
      to: 5,
      points: 5,
      spacing: 'linear',
    } as const;
    expect(fitsFilm(repeat, film)).toBe(true);
    expect(fitsFilm({ ...repeat, blockId: 'a' }, film)).toBe(false);
    expect(fitsFilm({ ...thickness, kind: 'graded', layerId: 'substrate' }, film)).toBe(true);
    expect(fitsFilm({ ...thickness, layerId: 'gone' }, film)).toBe(false);
    expect(sweepableKinds(film)).toEqual(['wavelength', 'angle', 'thickness', 'repeat', 'graded']);
  });

  it('has whole repeats in a preview of fewer points', () => {
    const repeat = {
      kind: 'repeat',
      blockId: 'block',
      from: 1,
      to: 10,
      points: 10,
      spacing: 'linear',
    } as const;
    expect(axisGrid(repeat, 4)).toEqual([1, 4, 7, 10]);
    expect(axisGrid(repeat, 5).every(Number.isInteger)).toBe(true);
  });
});
