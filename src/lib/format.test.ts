import { describe, expect, it } from 'vitest';
import {
  formatAngle,
  formatDuration,
  formatFormula,
  formatNumber,
  formatRange,
  formatSince,
  formatTypedComplex,
} from './format.ts';

describe('formatNumber', () => {
  it.each([
    [40.2891, {}, '40.29'],
    [0.1951234, { digits: 3 }, '0.195'],
    [9.9996, {}, '10.00'],
    [123456.7, {}, '123500'],
    [123456.7, { digits: 6 }, '123457'],
    [0, {}, '0'],
    [-0.5, {}, '−0.5000'],
    [0.5, { signed: true, digits: 2 }, '+0.50'],
    [5.61e-4, { digits: 3 }, '5.61 × 10⁻⁴'],
    [-1.2e9, { digits: 2 }, '−1.2 × 10⁹'],
    [Infinity, {}, '∞'],
    [NaN, {}, 'not a number'],
  ])('prints %d with %o as %s', (value, options, text) => {
    expect(formatNumber(value, options)).toBe(text);
  });
});

describe('formatAngle', () => {
  it('gives mdeg, deg and mrad of the same angle, signed', () => {
    expect(formatAngle(0.04029)).toBe('+40.29');
    expect(formatAngle(-0.04029, 'deg')).toBe('−0.04029');
    // 0.04029 deg = 0.04029 pi/180 rad = 0.70319 mrad
    expect(formatAngle(0.04029, 'mrad')).toBe('+0.7032');
  });
});

it('keeps the digits a complex number was given with', () => {
  expect(formatTypedComplex([0.03, -0.007])).toBe('0.03 − 0.007i');
});

it('sets the counts of a formula low and leaves trade names alone', () => {
  expect(formatFormula('SiO2')).toBe('SiO₂');
  expect(formatFormula('Ni80Fe20')).toBe('Ni₈₀Fe₂₀');
  expect(formatFormula('BK7')).toBe('BK7');
});

it('prints a range of one point as that point', () => {
  expect(formatRange([632.8, 632.8], 'nm')).toBe('632.8 nm');
  expect(formatRange([199, 1937], 'nm')).toBe('199–1937 nm');
});

it('prints spans of time as people say them', () => {
  expect([0.0112, 4.21, 17, 200, 7500].map(formatDuration)).toEqual([
    '11 ms',
    '4.2 s',
    '17 s',
    '3 min',
    '2 h 5 min',
  ]);
  const now = Date.parse('2026-03-01T12:00:00Z');
  expect(formatSince('2026-03-01T11:59:40Z', now)).toBe('just now');
  expect(formatSince('2026-03-01T11:15:00Z', now)).toBe('45 min ago');
  expect(formatSince('2026-02-27T12:00:00Z', now)).toBe('27 Feb 2026');
});
