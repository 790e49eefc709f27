import {
  cardLayerCells,
  cardOrigin,
  cardReadingCells,
  cardTime,
  cardToleranceSentences,
} from '../../../shared/cardWords.ts';
import type { CardLayer, CardReading, SharedGrowthCard } from '../../../shared/growthCard.ts';
import type { Block, Column } from './blocks.ts';
import { heading, paragraph, tableHead, tableRow } from './blocks.ts';

const SMALL = 7.5;

const layerColumns: Column[] = [
  { title: 'Step', share: 0.055, align: 'right' },
  { title: 'Material', share: 0.225 },
  { title: 'Role', share: 0.13 },
  { title: 'Nominal, nm', share: 0.085, align: 'right' },
  { title: '± 1 σ, nm', share: 0.085, align: 'right' },
  { title: 'Rate, nm/min', share: 0.1, align: 'right', byHand: true },
  { title: 'Time, s', share: 0.1, align: 'right', byHand: true },
  { title: 'Sample', share: 0.11, byHand: true },
  { title: 'As grown, nm', share: 0.11, byHand: true },
];

/** The substrate is not deposited: nothing to write of it but which piece it was. */
const substrateColumns = layerColumns.map((column) => ({ ...column, byHand: column.title === 'Sample' }));

const readingColumns: Column[] = [
  { title: 'Reading', share: 0.4 },
  { title: 'Nominal', share: 0.13, align: 'right' },
  { title: 'Unit', share: 0.07 },
  { title: '68.27 % of films', share: 0.24 },
  { title: 'Measured', share: 0.16, byHand: true },
];

/** Everything that the card says below its head, in the order of the page. */
export function cardBlocks(card: SharedGrowthCard): Block[] {
  return [
    heading('Film, in the order of growth'),
    tableHead(layerColumns),
    ...card.layers.flatMap((layer, at) => layerRows(layer, card.layers[at - 1] ?? null)),
    heading('Predicted readings'),
    ...card.readings.flatMap(readingRows),
    heading('Bench'),
    paragraph(card.bench || 'Not stated.', { size: 8.5, before: 2 }),
    heading('Decision'),
    paragraph(card.decision.text, { size: 8.5, before: 2 }),
    paragraph(`Decided by ${card.decision.by}, ${cardTime(card.decision.at)}.`, { size: SMALL, before: 1 }),
    ...sentences('Cautions', card.cautions, 8),
    ...sentences('Tolerances', cardToleranceSentences(card), SMALL),
    ...sentences('Assumptions', card.assumptions, SMALL),
    ...sentences('Sources of the constants', card.sources, SMALL),
    paragraph(cardOrigin(card), { size: 6.5, before: 8 }),
  ];
}

function layerRows(layer: CardLayer, before: CardLayer | null): Block[] {
  const cells = cardLayerCells(layer);
  const { step, material, role, thickness, deviation, rate, time } = cells;
  const columns = step === '' ? substrateColumns : layerColumns;
  const row = tableRow(columns, [step, material, role, thickness, deviation, rate, time, '', ''], {
    isRepeated: layer.block !== null,
  });
  const isNewBlock = layer.block !== null && layer.block !== before?.block;
  return isNewBlock
    ? [paragraph(layer.block!, { size: SMALL, before: 2, indent: 3, keepsWithNext: true }), row]
    : [row];
}

function readingRows({ label, conditions, readings }: CardReading): Block[] {
  return [
    paragraph(`${label}: ${conditions}`, { size: 8.5, before: 4, keepsWithNext: true }),
    tableHead(readingColumns),
    ...readings.map((reading) => {
      const cells = cardReadingCells(reading);
      return tableRow(readingColumns, [cells.label, cells.nominal, cells.unit, cells.band, '']);
    }),
  ];
}

function sentences(title: string, said: string[], size: number): Block[] {
  if (said.length === 0) return [];
  return [heading(title), ...said.map((sentence) => paragraph(sentence, { size, before: 1.5 }))];
}
