import { describe, expect, it } from 'vitest';
import { readStrip } from '../../../../shared/readingsStrip.ts';
import { stripReadings } from './stripReadings.ts';

const none = readStrip({ results: [] }).readings;
const readings = {
  ...none,
  rotationP: 0.04029,
  rotationS: 0.00193,
  reflectanceP: 0.195,
  crossSp: 0.561e-3,
  contrastP: -1e-16,
};

describe('stripReadings', () => {
  it('shows the input light large, the other small, in the unit of the screen', () => {
    const [rotation, , reflectance, cross] = stripReadings(readings, 'p', false, 'mdeg');
    expect(rotation).toMatchObject({
      label: 'Kerr rotation',
      anchor: 'kerr-rotation',
      value: '+40.29',
      unit: 'mdeg',
      other: 's light +1.930',
    });
    expect(reflectance).toMatchObject({ value: '0.1950', unit: '' });
    expect(cross).toMatchObject({ label: 'Cross-polarized |r_sp|', value: '0.5610', unit: '× 10⁻³' });
    expect(stripReadings(readings, 's', false, 'deg')[0]).toMatchObject({
      other: 'p light +0.04029',
      unit: 'deg',
    });
  });

  it('puts the contrast in place of the rotation for transverse m, rounding shown as 0', () => {
    expect(stripReadings(readings, 'p', true, 'mdeg')[0]).toMatchObject({
      label: 'Transverse contrast',
      value: '0',
    });
  });

  it('has a dash and no number where there is no polarization to read', () => {
    expect(stripReadings(none, 'p', false, 'mdeg')[0]).toMatchObject({ value: null, other: 's light –' });
    expect(stripReadings(null, 'p', false, 'mdeg')).toHaveLength(4);
  });
});
