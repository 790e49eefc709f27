import { describe, expect, it } from 'vitest';
import { describeResult } from '../../../../shared/resultFormat.ts';
import type { Run, SweepAxis } from '../../../../shared/run.ts';
import { readRunIds, refusalOf } from './comparable.ts';
import { comparedCsv } from './comparedCsv.ts';
import { commonReadings, relatedCurves, valueCurves } from './comparedRun.ts';
import type { ComparedRun } from './comparedRun.ts';

const axis: SweepAxis = { kind: 'angle', from: 0, to: 40, points: 3, spacing: 'linear' };

function build(letter: string, grid: number[], rotation: number[], phrases: string[]): ComparedRun {
  const document: Run['document'] = {
    incident: { index: 1 },
    layers: [],
    substrate: { index: 3.88 },
    workingPoint: { wavelengthNm: 632.8, angleDeg: 30, input: 'p', magnetization: { mode: 'drawn' } },
  };
  const run: Run = {
    ...{
      id: letter,
      groupId: 'group',
      name: `run ${letter}`,
      stackId: null,
      stackName: null,
      axis,
      document,
    },
    progress: { state: 'done', done: 3, total: 3, secondsLeft: null, error: null },
    createdAt: '2026-03-01T10:00:00.000Z',
    ...{ finishedAt: null, createdBy: null, isDemo: false, readings: ['rotationP'], materials: [] },
    ...{ warnings: [], assumptions: [], solverVersion: '1', inputSha256: 'abc', computeSeconds: null },
  };
  const result = {
    header: describeResult({ axis }, ['rotationP'], { solverVersion: '1', inputSha256: 'abc' }),
    axis: Float64Array.from(grid),
    second: null,
    family: null,
    columns: { rotationP: Float64Array.from(rotation) },
  };
  return { run, result, letter, phrases };
}

const a = build('A', [0, 20, 40], [0.01, 0.02, 0.04], ['Pt cap 2 nm']);
const b = build('B', [20, 40, 60], [0.03, NaN, 0.05], ['Pt cap 3 nm']);

describe('compared runs as a plot and as a file', () => {
  it('keep the colour of the reading and differ in dash and name', () => {
    const drawn = valueCurves([a, b], 'rotationP', 'mdeg', false);
    expect(drawn?.series.map(({ name, tone, dash }) => [name, tone, dash])).toEqual([
      ['A Pt cap 2 nm', 'rotation', 'solid'],
      ['B Pt cap 3 nm', 'rotation', 'dashed'],
    ]);
    expect([...Array.from(drawn?.series[0]?.y ?? [])]).toEqual([10, 20, 40]);
  });

  it('show the difference over the same range of x as the values, with the gaps of both', () => {
    const drawn = relatedCurves([a, b], a, 'rotationP', 'difference', 'mdeg');
    const [only] = drawn?.series ?? [];
    expect(drawn?.series).toHaveLength(1);
    expect(only?.name).toBe('B − A');
    expect(Array.from(only?.x ?? [])).toEqual([0, 0, 20, 40, 60]);
    expect(Array.from(only?.y ?? [], (y) => Math.round(y * 1e9) / 1e9)).toEqual([NaN, NaN, 10, NaN, NaN]);
  });

  it('go into a file on the axis of the reference, in the unit of the screen, with empty fields for gaps', () => {
    const lines = comparedCsv([a, b], a, 'rotationP', 'ratio', 'deg').trim().split('\n');
    expect(lines).toEqual([
      'angle (deg),A Pt cap 2 nm: rotationP (deg),"B Pt cap 3 nm: rotationP (deg), interpolated",B / A',
      '0,0.01,,',
      '20,0.02,0.03,1.5',
      '40,0.04,,',
    ]);
  });

  it('offer the readings that all of them have', () => {
    expect(commonReadings([a.result, b.result])).toEqual(['rotationP']);
    expect(commonReadings([a.result, { ...b.result, columns: {} }])).toEqual([]);
  });
});

describe('runs that cannot be laid over each other', () => {
  it('are refused with the reason', () => {
    expect(refusalOf(a.run, 'angle')).toBeNull();
    expect(refusalOf(a.run, 'wavelength')).toContain(
      'sweeps the angle of incidence, the reference the wavelength',
    );
    expect(refusalOf({ ...a.run, second: { ...axis, kind: 'wavelength' } }, 'angle')).toContain(
      'map over two axes',
    );
    const failed = { ...a.run, progress: { ...a.run.progress, state: 'failed' as const } };
    expect(refusalOf(failed, 'angle')).toContain('no values (failed)');
  });

  it('are six at the most, each once', () => {
    expect(readRunIds(new URLSearchParams('runs=a,b,,a,c,d,e,f,g'))).toEqual(['a', 'b', 'c', 'd', 'e', 'f']);
  });
});
