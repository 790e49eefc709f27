import { formatNumber } from '../../../lib/format.ts';

/** Windows in words: `1.23–4.56 nm and 7.00–8.00 nm`; empty for none. */
export function windowWords(windows: readonly { fromNm: number; toNm: number }[]): string {
  const end = (nm: number) => formatNumber(nm, { digits: 3 });
  return windows.map(({ fromNm, toNm }) => `${end(fromNm)}–${end(toNm)} nm`).join(' and ');
}
