import { describe, expect, it } from 'vitest';
import { describeResult } from '../../../../shared/resultFormat.ts';
import type { RunResult } from '../../../../shared/resultFormat.ts';
import { largestDifferences } from './largestDifferences.ts';

function buildResult(rotation: number[], axis = [0, 30, 60]): RunResult {
  const swept = { kind: 'angle', from: 0, to: 60, points: axis.length, spacing: 'linear' } as const;
  return {
    header: describeResult({ axis: swept }, ['rotationP'], { solverVersion: '1', inputSha256: 'abc' }),
    axis: Float64Array.from(axis),
    second: null,
    family: null,
    columns: { rotationP: Float64Array.from(rotation) },
  };
}

describe('largestDifferences', () => {
  it('finds the largest one and where it is', () => {
    const [rotation] = largestDifferences(buildResult([1, 2, 3]), buildResult([1, 2.5, 2.75]))!;
    expect(rotation).toEqual({ reading: 'rotationP', largest: 0.5, index: 1, oneSided: 0 });
  });

  it('counts points that have a value in one of the two only, and none where both have none', () => {
    const [rotation] = largestDifferences(buildResult([NaN, NaN, 3]), buildResult([NaN, 2, 3]))!;
    expect(rotation).toMatchObject({ largest: 0, oneSided: 1 });
  });

  it('looks at every row of a map', () => {
    const map = (values: number[]): RunResult => {
      const second = { kind: 'wavelength', from: 500, to: 600, points: 2, spacing: 'linear' } as const;
      const one = buildResult([1, 2, 3]);
      const { axis } = one.header;
      return {
        ...one,
        header: describeResult({ axis, second }, ['rotationP'], { solverVersion: '1', inputSha256: 'abc' }),
        second: Float64Array.from([500, 600]),
        columns: { rotationP: Float64Array.from(values) },
      };
    };
    const [rotation] = largestDifferences(map([1, 2, 3, 4, 5, 6]), map([1, 2, 3, 4, 5, 7]))!;
    expect(rotation).toMatchObject({ largest: 1, index: 5 });
  });

  it('compares nothing when the points differ', () => {
    expect(largestDifferences(buildResult([1, 2, 3]), buildResult([1, 2, 3], [0, 31, 60]))).toBeNull();
    expect(largestDifferences(buildResult([1, 2, 3]), buildResult([1, 2], [0, 60]))).toBeNull();
  });
});
