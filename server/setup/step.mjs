/** @param {number} milliseconds */
export const seconds = (milliseconds) => `${(milliseconds / 1000).toFixed(1)} s`;

/**
 * Runs one step of the setup and prints one line for it: what, then how long. The first half is printed before
 * the work starts, so that a long `npm ci` is not silence.
 * @template T
 * @param {string} what for example "Installing npm packages"
 * @param {() => Promise<T>} work may return a string, which is added to the line
 * @returns {Promise<T>}
 */
export async function step(what, work) {
  const started = Date.now();
  process.stdout.write(`${what} ... `);
  try {
    const result = await work();
    const detail = typeof result === 'string' ? `${result}, ` : '';
    process.stdout.write(`${detail}${seconds(Date.now() - started)}\n`);
    return result;
  } catch (error) {
    process.stdout.write('failed\n');
    throw error;
  }
}
