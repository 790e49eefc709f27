import { expect } from 'vitest';
import { PATIENCE_MS } from './visitor.ts';

/** Asks until the assertion that follows holds, for what no locator can wait for. */
export function eventually<Value>(read: () => Value | Promise<Value>) {
  return expect.poll(read, { timeout: PATIENCE_MS, interval: 50 });
}
