import { relative } from 'node:path';

/**
 * Counts vitest's JSON report. A file that could not be loaded counts as one failure, and so does an exit code that
 * no failed test explains (an unhandled error, or no report at all): a broken run never looks like a good one.
 * @param {any} report
 * @param {number} exitCode
 * @param {string} root
 */
export function countResults(report, exitCode, root) {
  if (!report) {
    console.error(`The test runner ended with ${exitCode} and left no results.`);
    return { passed: 0, failed: 1, skipped: 0 };
  }
  const broken = (report.testResults ?? []).filter(
    (/** @type {any} */ file) =>
      file.status === 'failed' &&
      !file.assertionResults.some((/** @type {any} */ test) => test.status === 'failed'),
  );
  for (const file of broken)
    console.error(`Could not run ${relative(root, file.name)}: ${file.message ?? ''}`);
  const failed = report.numFailedTests + broken.length;
  if (failed === 0 && exitCode !== 0)
    console.error(`The test runner ended with ${exitCode}. Its output above says why.`);
  return {
    passed: report.numPassedTests,
    failed: failed === 0 && exitCode !== 0 ? 1 : failed,
    skipped: (report.numPendingTests ?? 0) + (report.numTodoTests ?? 0),
  };
}
