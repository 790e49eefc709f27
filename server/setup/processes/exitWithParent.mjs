import { isMainThread } from 'node:worker_threads';

/**
 * Preloaded (`node --import`) into the programs that the setup keeps running. They live in a process group of
 * their own, so nothing ends them when the setup is killed with SIGKILL; the closed channel to it does.
 */
const GRACE_MS = 15_000;

if (isMainThread && process.channel) {
  process.once('disconnect', () => {
    process.kill(process.pid, 'SIGTERM');
    setTimeout(() => process.kill(process.pid, 'SIGKILL'), GRACE_MS).unref();
  });
  // Listening must not keep a program alive that is done otherwise.
  process.channel.unref();
}
