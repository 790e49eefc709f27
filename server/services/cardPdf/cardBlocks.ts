import {
  cardLayerCells,
  cardOrigin,
  cardReadingCells,
  cardTime,
  cardToleranceSentences,
} from '../../../shared/cardWords.ts';
import type { CardLayer, CardReading, SharedGrowthCard } from '../../../shared/growthCard.ts';
import type { Block, Column } from './blocks.ts';
import { beside } from './besideBlocks.ts';
import { heading, paragraph, tableHead, tableRow } from './blocks.ts';

const SMALL = 7.5;

const layerColumns: Column[] = [
  { title: 'Step', share: 0.05, align: 'right' },
  { title: 'Material, role', share: 0.3 },
  { title: 'Nominal, nm', share: 0.095, align: 'right' },
  { title: '± 1 σ, nm', share: 0.085, align: 'right' },
  { title: 'Rate, nm/min', share: 0.11, align: 'right', byHand: true },
  { title: 'Time, s', share: 0.11, align: 'right', byHand: true },
  { title: 'Sample', share: 0.125, byHand: true },
  { title: 'As grown, nm', share: 0.125, byHand: true },
];
const layerHead = tableHead(layerColumns);

/** The substrate is not deposited: nothing to write of it but which piece it was. */
const substrateColumns = layerColumns.map((column) => ({ ...column, byHand: column.title === 'Sample' }));

const readingColumns: Column[] = [
  { title: 'Reading', share: 0.4 },
  { title: 'Nominal', share: 0.13, align: 'right' },
  { title: 'Unit', share: 0.07 },
  { title: '68.27 % of films', share: 0.24 },
  { title: 'Measured', share: 0.16, byHand: true },
];
const readingHead = tableHead(readingColumns);

/** ... of two working points beside each other; the unit goes with the number. */
const narrowColumns: Column[] = [
  { title: 'Reading', share: 0.33 },
  { title: 'Nominal', share: 0.21, align: 'right' },
  { title: '68.27 % of films', share: 0.3 },
  { title: 'Measured', share: 0.16, byHand: true },
];

/**
 * Everything that the card says below its head, in the order of the page.
 *
 * @param isTight sets working points beside each other, and short sentences one after the other instead of a line each
 */
export function cardBlocks(card: SharedGrowthCard, isTight: boolean): Block[] {
  const bench = [heading('Bench'), paragraph(card.bench || 'Not stated.', { size: 8.5, before: 2 })];
  const decision = [
    heading('Decision'),
    paragraph(card.decision.text, { size: 8.5, before: 2 }),
    paragraph(`Decided by ${card.decision.by}, ${cardTime(card.decision.at)}.`, { size: SMALL, before: 1 }),
  ];
  const errors = cardToleranceSentences(card);
  return [
    heading('Film, in the order of growth'),
    layerHead,
    ...card.layers.flatMap((layer, at) => layerRows(layer, card.layers[at - 1] ?? null)),
    heading('Predicted readings'),
    ...(isTight && card.readings.length > 1
      ? readingPairs(card.readings)
      : [readingHead, ...card.readings.flatMap(readingRows)]),
    ...(isTight ? [beside(bench, decision)] : [...bench, ...decision]),
    ...sentences('Cautions', card.cautions, 8),
    ...(isTight
      ? sentences('Tolerances and assumptions', [[...errors, ...card.assumptions].join(' ')], SMALL)
      : [...sentences('Tolerances', errors, SMALL), ...sentences('Assumptions', card.assumptions, SMALL)]),
    ...sentences('Sources of the constants', card.sources, SMALL),
    paragraph(cardOrigin(card), { size: 6.5, before: 8 }),
  ];
}

function layerRows(layer: CardLayer, before: CardLayer | null): Block[] {
  const cells = cardLayerCells(layer);
  const { step, material, role, thickness, deviation, rate, time } = cells;
  const columns = step === '' ? substrateColumns : layerColumns;
  const named = role === '' ? material : `${material}, ${role}`;
  const row = tableRow(columns, [step, named, thickness, deviation, rate, time, '', ''], {
    isRepeated: layer.block !== null,
    head: layerHead,
  });
  const isNewBlock = layer.block !== null && layer.block !== before?.block;
  return isNewBlock
    ? [
        paragraph(layer.block!, {
          ...{ size: SMALL, before: 2, indent: 3 },
          keepsWithNext: true,
          head: layerHead,
        }),
        row,
      ]
    : [row];
}

function readingRows({ label, conditions, readings }: CardReading): Block[] {
  return [
    paragraph(`${label}: ${conditions}`, { size: 8.5, before: 4, keepsWithNext: true, head: readingHead }),
    ...readings.map((reading, at) => {
      const cells = cardReadingCells(reading);
      // What is read at one point stays on one page.
      return tableRow(readingColumns, [cells.label, cells.nominal, cells.unit, cells.band, ''], {
        keepsWithNext: at < readings.length - 1,
      });
    }),
  ];
}

function readingPairs(readings: CardReading[]): Block[] {
  const columns = readings.map(({ label, conditions, readings: values }) => [
    paragraph(`${label}: ${conditions}`, { size: 8.5, before: 5 }),
    tableHead(narrowColumns),
    ...values.map((reading) => {
      const { label: name, nominal, unit, band } = cardReadingCells(reading);
      return tableRow(narrowColumns, [name, `${nominal} ${unit}`.trim(), band, '']);
    }),
  ]);
  return columns.flatMap((left, at) => (at % 2 === 0 ? [beside(left, columns[at + 1] ?? [])] : []));
}

function sentences(title: string, said: string[], size: number): Block[] {
  if (said.length === 0) return [];
  return [heading(title), ...said.map((sentence) => paragraph(sentence, { size, before: 1.5 }))];
}
