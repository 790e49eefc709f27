// @vitest-environment jsdom
import { beforeEach, expect, test } from 'vitest';
import { emptyForm, usualTolerance } from './cardDraft.ts';
import type { CardForm } from './cardDraft.ts';
import { loadKeptCard, storeKeptCard } from './keptCard.ts';

const workingPoint = {
  wavelengthNm: 632.8,
  angleDeg: 0,
  input: 'p' as const,
  magnetization: { mode: 'drawn' as const },
};
const blank = emptyForm({
  title: 'Film',
  document: {
    incident: { index: 1 },
    layers: [
      { id: 'cap', medium: { index: 2 }, thicknessNm: 3 },
      { id: 'new', medium: { index: 2 }, thicknessNm: 1 },
    ],
    substrate: { index: 3 },
    workingPoint,
  },
  points: [{ id: 'red', label: 'HeNe', workingPoint }],
  signal: 'rotation',
  tolerance: usualTolerance,
});
const storage = window.sessionStorage;
beforeEach(() => storage.clear());

test('what was filled in comes back, to the layers that the film has now', () => {
  const filled: CardForm = {
    ...blank,
    decision: 'Gold.',
    // Emptied on the way to another value.
    ratePercent: NaN,
    points: [...blank.points, { ...blank.points[0]!, label: 'Second', angleDeg: 45 }],
    rates: [
      { layerId: 'gone', nmPerMin: '9' },
      { layerId: 'cap', nmPerMin: '1.7' },
    ],
  };
  storeKeptCard(storage, 'film', JSON.stringify(filled));
  expect(loadKeptCard(storage, 'film', blank)).toEqual({
    ...filled,
    ratePercent: usualTolerance.ratePercent,
    rates: blank.rates.map(({ layerId }) => ({ layerId, nmPerMin: layerId === 'cap' ? '1.7' : '' })),
  });
  expect(loadKeptCard(storage, 'another film', blank)).toBeNull();
  storeKeptCard(storage, 'film', null);
  expect(loadKeptCard(storage, 'film', blank)).toBeNull();
});

test('what another build kept, or is not JSON, is left alone', () => {
  for (const text of ['{"title":"Film"}', 'not JSON']) {
    storeKeptCard(storage, 'film', text);
    expect(loadKeptCard(storage, 'film', blank)).toBeNull();
  }
});
