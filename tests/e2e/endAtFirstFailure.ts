import { afterEach, beforeEach } from 'vitest';

/** For a file whose tests are the parts of one story: when a part fails, those after it cannot say anything. */
export function endAtFirstFailure(): void {
  let failed = false;
  beforeEach(({ skip }) => {
    if (failed) skip('an earlier part of the story failed');
  });
  afterEach(({ task }) => {
    failed ||= task.result?.state === 'fail';
  });
}
