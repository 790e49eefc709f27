import { useEffect } from 'react';
import type { RefObject } from 'react';

/** What A4 holds within the margins that base.css states for paper, CSS px at 96 to the inch. */
const PAPER = { width: ((210 - 24) / 25.4) * 96, height: ((297 - 24) / 25.4) * 96 };
/** Rows are not cut at the end of a page, so that a part of each stays empty. */
const USED_OF_PAGE = 0.96;

/** Sizes in the order in which they are tried for the fewest pages; the least sets small words in 6.5 points. */
const fits = [
  { zoom: 0.86, isTight: false },
  { zoom: 0.8, isTight: false },
  { zoom: 0.86, isTight: true },
  { zoom: 0.8, isTight: true },
  { zoom: 0.76, isTight: true },
  { zoom: 0.72, isTight: true },
];

/** While the page is printed, the card is as large as the fewest sheets of A4 allow. */
export function usePaperFit(card: RefObject<HTMLElement | null>, heading: string): void {
  useEffect(() => {
    const fit = () => {
      if (card.current) fitToPaper(card.current, heading);
    };
    const undo = () => {
      const { dataset, style } = card.current ?? document.createElement('div');
      for (const name of ['paper', 'tight', 'pages']) delete dataset[name];
      for (const name of ['--paper-zoom', 'width']) style.removeProperty(name);
      document.documentElement.style.removeProperty('--paper-heading');
    };
    window.addEventListener('beforeprint', fit);
    window.addEventListener('afterprint', undo);
    return () => {
      window.removeEventListener('beforeprint', fit);
      window.removeEventListener('afterprint', undo);
    };
  }, [card, heading]);
}

function fitToPaper(card: HTMLElement, heading: string): void {
  let best = { fit: fits[0]!, pages: Infinity };
  for (const fit of fits) {
    apply(card, fit);
    const height = card.getBoundingClientRect().height;
    const pages = height <= PAPER.height ? 1 : Math.ceil(height / (USED_OF_PAGE * PAPER.height));
    if (pages < best.pages) best = { fit, pages };
    if (pages === 1) break;
  }
  apply(card, best.fit);
  card.style.removeProperty('width');
  if (best.pages === 1) return;
  card.dataset['pages'] = String(best.pages);
  document.documentElement.style.setProperty('--paper-heading', JSON.stringify(heading));
}

function apply(card: HTMLElement, { zoom, isTight }: (typeof fits)[number]): void {
  card.dataset['paper'] = '';
  if (isTight) card.dataset['tight'] = '';
  else delete card.dataset['tight'];
  card.style.setProperty('--paper-zoom', String(zoom));
  // The lines break as they will on paper, whatever the window.
  card.style.width = `${PAPER.width / zoom}px`;
}
