import { createPool } from '../../worker/pool.ts';

/** Rows of the table that the issue names: it must be read in under 3 s. */
const ROWS = 100_000;

/** Times of reading a table of 100,000 rows of n, k and Q in a thread that has loaded its code, ms. */
export async function timeReadTable(count: number): Promise<number[]> {
  const rows = Array.from({ length: ROWS }, (_, i) => {
    const phase = i / 10_000;
    return [300 + i / 64, 2 + Math.sin(phase), 3 + Math.cos(phase), 0.03, 0.01 * Math.sin(phase)].join(',');
  });
  const bytes = new TextEncoder().encode(`wavelength_nm,n,k,Q_re,Q_im\n${rows.join('\n')}\n`);
  const pool = createPool({ threads: 1 });
  try {
    await pool.warm();
    const times: number[] = [];
    for (let i = 0; i < count; i += 1) {
      const asked = performance.now();
      await pool.readTable(bytes);
      times.push(performance.now() - asked);
    }
    return times;
  } finally {
    await pool.close();
  }
}
