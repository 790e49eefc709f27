import fs from 'node:fs';

/**
 * Counts from the file of vitest's json reporter.
 * @param {string} file
 * @param {boolean} succeeded whether vitest ended with 0
 * @returns {{ passed: number, failed: number }}
 */
export function vitestCounts(file, succeeded) {
  let passed = 0;
  let failed = 0;
  if (fs.existsSync(file)) {
    const report = JSON.parse(fs.readFileSync(file, 'utf8'));
    passed = report.numPassedTests;
    // A test file that does not even load has failed and holds no test that could say so.
    const unloadable = report.testResults.filter(
      (result) =>
        result.status === 'failed' && !result.assertionResults.some(({ status }) => status === 'failed'),
    );
    failed = report.numFailedTests + unloadable.length;
  }
  // A failure outside of tests: an unhandled error, the global setup, no test found.
  return { passed, failed: succeeded ? failed : Math.max(failed, 1) };
}
