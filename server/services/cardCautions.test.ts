import { expect, test } from 'vitest';
import { cardCautions } from './cardCautions.ts';

// The sentences are from memory and common practice, as data/hazards.json states; here only who gets which is looked at.
const namesOf = (formulas: string[]) =>
  cardCautions(formulas, '')
    .slice(1)
    .map((sentence) => sentence.split(':')[0]);

test('names the hazards of what is in the film, once each, with where to look', () => {
  expect(namesOf(['Pt', 'Co', 'Ni80Fe20', 'Co'])).toEqual(['Cobalt', 'Nickel']);
  expect(cardCautions(['Co'], '')[1]).toMatch(/safety data sheet and the local procedure\.$/);
  expect(namesOf(['GaAs'])).toEqual(['Arsenic compounds']);
  expect(namesOf(['ITO'])).toEqual(['Indium tin oxide']);
});

test('a metal that burns as a flake does not as an oxide; a word is no formula', () => {
  expect(namesOf(['Al'])).toEqual(['Aluminium']);
  expect(namesOf(['Al2O3', 'TiO2', 'SiO2'])).toEqual([]);
  expect(namesOf(['AlN'])).toEqual(['Aluminium nitride']);
  expect(namesOf(['Company glass', 'vacuum', 'C'])).toEqual([]);
});

test('always says what predictions are for, and speaks of lasers as soon as there is a bench', () => {
  expect(cardCautions([], '')).toEqual([
    'Predictions are for planning; constants of thin films differ from tabulated ones.',
  ]);
  expect(cardCautions([], 'HeNe at 632.8 nm')[1]).toMatch(/IEC 60825-1 .* laser safety officer/);
});
