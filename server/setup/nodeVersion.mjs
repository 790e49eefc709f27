/**
 * Stops at once on a Node that is too old. Imported first by every entry: a clear sentence here is better than
 * a syntax error from a dependency two minutes later.
 */
const OLDEST = [20, 19];

const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
if (major < OLDEST[0] || (major === OLDEST[0] && minor < OLDEST[1])) {
  process.stderr.write(
    `Skewlight needs Node ${OLDEST.join('.')} or newer; this is ${process.versions.node} (${process.execPath}).\n` +
      'Install a newer one, for example from https://nodejs.org/en/download, and run the command again.\n',
  );
  process.exit(1);
}
