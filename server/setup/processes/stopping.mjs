import { Interrupted, SetupError } from '../setupError.mjs';
import { releaseChildren, terminateChildren } from './children.mjs';
import { watchNpm } from './npmAncestors.mjs';

/**
 * The frame around every entry: runs its body, takes SIGINT, SIGTERM and SIGHUP, and undoes in reverse order
 * what the body started. A signal ends the children; whatever the body waits for then fails with `Interrupted`
 * and the way out is the same as on success.
 */

/** @type {(() => Promise<void>)[]} */
const undoings = [];
/** @type {NodeJS.Signals | undefined} */
let stopSignal;
let puttingAway = false;

/** Registers what must be undone before the process ends, last first. @param {() => Promise<void>} undo */
export function undoAtEnd(undo) {
  undoings.push(undo);
}

/** The signal that asked this process to stop, if one did. */
export const stopRequested = () => stopSignal;

/** To be called in waiting loops, so that Ctrl-C is not waited out. */
export function throwIfStopping() {
  if (stopSignal && !puttingAway) throw new Interrupted();
}

/** @param {NodeJS.Signals} signal */
function onSignal(signal) {
  // npm hands on a Ctrl-C that the terminal has already sent to the whole group: only the first one counts.
  if (stopSignal) return;
  stopSignal = signal;
  void terminateChildren();
}

/** @param {unknown} error */
function explain(error) {
  if (error instanceof Interrupted) return;
  if (!(error instanceof SetupError)) {
    process.stderr.write(`${error instanceof Error ? error.stack : String(error)}\n`);
    return;
  }
  process.stderr.write(`\n${error.message}\n${error.remedy ? `${error.remedy}\n` : ''}`);
}

/**
 * @param {() => Promise<number>} body returns the exit code
 */
export async function runEntry(body) {
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) process.on(signal, onSignal);
  watchNpm(() => onSignal('SIGTERM'));
  // A closed terminal or pipe must not end the process before it has put everything away.
  process.stdout.on('error', () => {});
  process.stderr.on('error', () => {});

  let code = 1;
  try {
    code = await body();
  } catch (error) {
    explain(error);
    if (error instanceof Interrupted && stopSignal) code = stopSignal === 'SIGINT' ? 130 : 143;
  }
  await terminateChildren();
  releaseChildren();
  puttingAway = true;
  for (const undo of undoings.reverse()) {
    try {
      await undo();
    } catch (error) {
      explain(error);
      code ||= 1;
    }
  }
  process.exit(code);
}
