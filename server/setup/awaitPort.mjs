import { setTimeout as sleep } from 'node:timers/promises';
import { tryPort } from './postgres/freePort.mjs';
import { throwIfStopping } from './processes/stopping.mjs';
import { serverAddress } from './serverEnvironment.mjs';
import { SetupError } from './setupError.mjs';

const PATIENCE_MS = 5_000;
const POLL_MS = 250;

/**
 * Says early and clearly that the port is taken. It waits a little first: the server of a start that was just
 * killed needs a moment to notice.
 */
export async function awaitServerPort() {
  const { host, port } = serverAddress();
  if (!/^\d+$/.test(port) || Number(port) > 65_535) {
    throw new SetupError(`PORT=${port} is no port number.`, 'Give a number from 1 to 65535, or unset it.');
  }
  const deadline = Date.now() + PATIENCE_MS;
  while ((await tryPort(Number(port), host)) === undefined) {
    throwIfStopping();
    if (Date.now() > deadline) {
      throw new SetupError(
        `Port ${port} on ${host} cannot be used: most likely something else listens there.`,
        `Stop it, or choose another port: PORT=${Number(port) + 90} npm start`,
      );
    }
    await sleep(POLL_MS);
  }
}
