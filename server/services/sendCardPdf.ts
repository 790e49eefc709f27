import type { Response } from 'express';
import type { SharedGrowthCard } from '../../shared/growthCard.ts';
import { growthCardPdf } from './cardPdf/cardPdf.ts';
import { plainFileName } from './fileNames.ts';

/** Shown in the browser; kept under the title and, where there is one, the sample. */
export async function sendCardPdf(card: SharedGrowthCard, response: Response): Promise<void> {
  const name = [card.title, ...(card.sampleId === '' ? [] : [card.sampleId])].join(' ');
  const bytes = await growthCardPdf(card);
  response
    .set('Content-Disposition', `inline; filename="${plainFileName(name, 'growth-card')}.pdf"`)
    .type('application/pdf')
    .send(bytes);
}
