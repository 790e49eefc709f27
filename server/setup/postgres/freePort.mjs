import net from 'node:net';

/**
 * Whether a server could listen there now.
 * @param {number} port 0 for any
 * @param {string} host
 * @returns {Promise<number | undefined>} the port, undefined when it is taken
 */
export function tryPort(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const probe = net.createServer();
    probe.once('error', () => resolve(undefined));
    probe.listen(port, host, () => {
      const found = /** @type {net.AddressInfo} */ (probe.address()).port;
      probe.close(() => resolve(found));
    });
  });
}
