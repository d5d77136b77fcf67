/**
 * How many checks of a part held and how many did not.
 *
 * @typedef {{ passed: number, failed: number, skipped: number }} Counts
 */

/** @type {Counts} */
export const none = { passed: 0, failed: 0, skipped: 0 };

/** @param {readonly Counts[]} all @returns {Counts} */
export const sum = (all) =>
  all.reduce(
    (total, counts) => ({
      passed: total.passed + counts.passed,
      failed: total.failed + counts.failed,
      skipped: total.skipped + counts.skipped,
    }),
    none,
  );

/**
 * Counts of vitest's JSON report. A file that could not even be loaded has no tests to count, and counts as one failed.
 *
 * @param {{ numPassedTests: number, numFailedTests: number, numPendingTests?: number, numTodoTests?: number,
 *   testResults?: { status: string, assertionResults: { status: string }[] }[] }} report
 * @returns {Counts}
 */
export const fromVitest = (report) => ({
  passed: report.numPassedTests,
  failed:
    report.numFailedTests +
    (report.testResults ?? []).filter(
      (file) =>
        file.status === 'failed' && !file.assertionResults.some((result) => result.status === 'failed'),
    ).length,
  skipped: (report.numPendingTests ?? 0) + (report.numTodoTests ?? 0),
});

/**
 * Counts of Playwright's JSON report. Errors outside of any test count as one failed each.
 *
 * @param {{ stats: { expected: number, unexpected: number, flaky: number, skipped: number },
 *   errors?: readonly unknown[] }} report
 * @returns {Counts}
 */
export const fromPlaywright = ({ stats, errors = [] }) => ({
  passed: stats.expected,
  // A test that held only at the second try did not hold.
  failed: stats.unexpected + stats.flaky + errors.length,
  skipped: stats.skipped,
});

/**
 * What a part comes to, once its exit status has had its say: a part that ended badly without a failed test, or that
 * ran no test at all, has failed.
 *
 * @param {Counts} counts
 * @param {number} status
 * @returns {Counts}
 */
export const settled = (counts, status) => {
  const ranNothing = counts.passed + counts.failed === 0;
  const endedBadly = status !== 0 && counts.failed === 0;
  return ranNothing || endedBadly ? { ...counts, failed: counts.failed + 1 } : counts;
};
