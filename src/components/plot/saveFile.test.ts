import { describe, expect, it } from 'vitest';
import { fileNameOf, toCsv } from './saveFile.ts';

describe('toCsv', () => {
  it('writes full doubles, leaves gaps empty and quotes what needs it', () => {
    const text = toCsv([
      { header: 'angleDeg', values: [0, 0.1 + 0.2] },
      { header: 'rotation, p (mdeg)', values: Float64Array.of(NaN, -1.5e-9) },
    ]);
    expect(text).toBe('angleDeg,"rotation, p (mdeg)"\n0,\n0.30000000000000004,-1.5e-9\n');
  });
});

describe('fileNameOf', () => {
  it('keeps letters and digits', () => {
    expect(fileNameOf('Pt/Co/Pt on oxidised silicon', 'csv')).toBe('Pt-Co-Pt-on-oxidised-silicon.csv');
    expect(fileNameOf('///', 'png')).toBe('skewlight.png');
  });
});
