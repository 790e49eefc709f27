import { describe, expect, it } from 'vitest';
import { readingSeries, sweepXAxis } from './readingSeries.ts';
import { familiesOf, lightsOf, readReadingView, readingsOf, writeReadingView } from './readingView.ts';

const grid = [0, 30, 60];
const columns = {
  rotationP: Float64Array.of(0.01, 0.02, NaN),
  rotationS: Float64Array.of(0.01, 0.015, 0.02),
  reflectanceP: Float64Array.of(0.5, 0.4, 0.3),
  crossSp: Float64Array.of(1e-3, 2e-3, 3e-3),
};

describe('readingSeries', () => {
  it('gives angles the left axis in the unit of the screen, R and |r| axes on the right', () => {
    const { series, yAxes } = readingSeries(
      grid,
      columns,
      ['rotationP', 'reflectanceP', 'crossSp'],
      'mdeg',
      false,
    );
    expect(yAxes.map(({ label }) => label)).toEqual(['mdeg', 'R', '|r| × 10³']);
    expect(series.map(({ name, yAxisIndex }) => [name, yAxisIndex])).toEqual([
      ['rotation', 0],
      ['R', 1],
      ['|r_sp|', 2],
    ]);
    expect(Array.from(series[0]!.y)).toEqual([10, 20, NaN]);
    expect(series[2]!.y[1]).toBeCloseTo(2, 12);
  });

  it('tells p from s by weight, marker and name, not by colour', () => {
    const { series } = readingSeries(grid, columns, ['rotationP', 'rotationS'], 'deg', false);
    const [p, s] = series;
    expect(p!.tone).toBe(s!.tone);
    expect(p!.width).toBeGreaterThan(s!.width!);
    expect([p!.symbol, s!.symbol]).toEqual(['none', 'open']);
    expect([p!.name, s!.name]).toEqual(['rotation p', 'rotation s']);
  });

  it('says on the axis that a log scale shows the absolute value', () => {
    const { yAxes } = readingSeries(grid, columns, ['rotationP'], 'mrad', true);
    expect(yAxes[0]).toMatchObject({ label: 'abs(mrad)', log: true });
  });

  it('leaves out what is not there', () => {
    expect(readingSeries(grid, columns, ['contrastP'], 'mdeg', false).series).toEqual([]);
  });
});

describe('sweepXAxis', () => {
  it('names the quantity, the layer and the unit', () => {
    const axis = { kind: 'thickness', layerId: 'x', from: 1, to: 9, points: 3, spacing: 'log' } as const;
    expect(sweepXAxis(axis, 'Pt')).toMatchObject({ label: 'thickness of Pt (nm)', log: true });
  });
});

describe('the reading view in the address', () => {
  it('goes there and back, and defaults leave no trace', () => {
    const view = {
      shown: ['cross', 'contrast'] as const,
      light: 's' as const,
      reading: 'crossPs' as const,
      log: true,
      unit: 'deg' as const,
    };
    const search = new URLSearchParams('compare=abc');
    writeReadingView(view, search);
    expect(readReadingView(search)).toEqual(view);
    writeReadingView({ shown: null, light: null, reading: null, log: false, unit: 'mdeg' }, search);
    expect(search.toString()).toBe('compare=abc');
  });

  it('knows which families and lights a set of readings has', () => {
    expect(readingsOf(['rotation', 'cross'], 'ps')).toEqual(['rotationP', 'rotationS', 'crossSp', 'crossPs']);
    expect(familiesOf(['transmittanceP', 'crossPs', 'rotationS'])).toEqual(['rotation', 'cross']);
    expect([lightsOf(['rotationP', 'rotationS']), lightsOf(['crossPs']), lightsOf(['crossSp'])]).toEqual([
      'ps',
      's',
      'p',
    ]);
  });
});
