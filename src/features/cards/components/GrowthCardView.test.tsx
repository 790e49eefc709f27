// @vitest-environment jsdom
import { cleanup, render, screen, within } from '@testing-library/react';
import { afterEach, expect, it } from 'vitest';
import { cardLayerCells, cardReadingCells } from '../../../../shared/cardWords.ts';
import type { GrowthCard } from '../../../../shared/growthCard.ts';
import { usualTolerance } from '../model/cardDraft.ts';
import { GrowthCardView } from './GrowthCardView.tsx';

afterEach(cleanup);

const layer = { block: null, role: '', deviationNm: null, nmPerMin: null, seconds: null };
const card: Omit<GrowthCard, 'groupId' | 'studyId' | 'designId'> = {
  id: 'card',
  title: 'Made-up film',
  sampleId: '',
  document: {
    incident: { index: 1 },
    layers: [],
    substrate: { index: 1.5 },
    workingPoint: { wavelengthNm: 633, angleDeg: 0, input: 'p', magnetization: { mode: 'drawn' } },
  },
  layers: [
    { ...layer, step: null, material: 'Si', role: 'substrate', thicknessNm: null },
    {
      ...layer,
      step: 1,
      material: 'Co',
      thicknessNm: 0.8,
      block: '6 times steps 1 to 2',
      deviationNm: 0.025,
    },
    {
      ...layer,
      step: 2,
      material: 'Pt',
      thicknessNm: 1.5,
      block: '6 times steps 1 to 2',
      nmPerMin: 3,
      seconds: 30,
    },
  ],
  readings: [
    {
      pointId: 'a',
      label: 'HeNe',
      conditions: '633 nm',
      readings: [{ label: 'Kerr rotation', unit: 'deg', nominal: 0.0481, low: 0.0449, high: 0.0513 }],
    },
  ],
  bench: 'Crossed prisms',
  decision: { text: 'Grow it', by: 'A. Person', at: '2026-12-01T11:00:00Z' },
  tolerance: usualTolerance,
  assumptions: ['Light is a plane wave.'],
  sources: ['A source'],
  cautions: ['A caution'],
  url: 'http://localhost/share/abc',
  solverVersion: '1.0.0',
  inputSha256: 'f00d',
  createdAt: '2026-12-01T11:00:00Z',
  isDemo: false,
};

it('lists the layers as they are grown, with every number in the words of the card', () => {
  render(<GrowthCardView card={card} />);
  const table = screen.getByRole('table', { name: /order of growth/ });
  const heads = within(table).getAllByRole('rowheader');
  expect(heads.map((one) => one.textContent)).toEqual(['Si substrate', 'Co', 'Pt']);
  for (const one of card.layers) {
    for (const text of Object.values(cardLayerCells(one)).filter((cell) => cell !== '')) {
      expect(table.textContent).toContain(text);
    }
  }
  // The block is said once, above its first layer.
  expect(within(table).getAllByText('6 times steps 1 to 2')).toHaveLength(1);
  // Co has neither rate nor time; no layer has been grown yet.
  expect(within(heads[1]!.closest('tr')!).getAllByText('to fill in')).toHaveLength(3);
  expect(within(heads[2]!.closest('tr')!).getAllByText('to fill in')).toHaveLength(1);
});

it('says readings, decision, cautions and where the code leads', () => {
  render(<GrowthCardView card={card} />);
  const { nominal, band } = cardReadingCells(card.readings[0]!.readings[0]!);
  const row = screen.getByRole('row', { name: /Kerr rotation/ });
  expect(row.textContent).toContain(`${nominal} mdeg`);
  expect(row.textContent).toContain(band);
  for (const text of ['Grow it', 'Crossed prisms', 'A caution', 'A source', 'Light is a plane wave.']) {
    expect(screen.getByText(text)).toBeTruthy();
  }
  expect(screen.getByRole('img', { name: 'QR code of http://localhost/share/abc' })).toBeTruthy();
});

it('has no code without a link', () => {
  render(<GrowthCardView card={{ ...card, url: null }} />);
  expect(screen.queryByRole('img')).toBeNull();
});
