import { expect, it } from 'vitest';
import { angleMarks } from './angleMarks.ts';

const features = {
  pseudoBrewster: { angleDeg: 74.1234567891, reflectanceP: 0.34567 },
  signChanges: [
    { reading: 'rotationS' as const, angleDeg: 80.5, rising: true },
    { reading: 'ellipticityP' as const, angleDeg: 61.20000000012, rising: false },
  ],
};

it('names what is drawn, in the order of the angles, with the digits that are known', () => {
  const marks = angleMarks(features, ['ellipticityP', 'rotationP']);
  expect(marks.map(({ words }) => words)).toEqual([
    'Kerr ellipticity, p light is 0 at 61.2°, from positive to negative',
    'Pseudo-Brewster angle 74.123457°, where R_p is least: 0.3457',
  ]);
  expect(marks.map(({ label }) => label)).toEqual(['χ_p = 0', 'R_p least']);
});

it('says nothing where there is nothing', () => {
  expect(angleMarks({ pseudoBrewster: null, signChanges: features.signChanges }, ['rotationP'])).toEqual([]);
});
