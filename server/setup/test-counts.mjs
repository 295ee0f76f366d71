// What the test runners report, as two numbers. A run that ended badly is never counted as one without failures.

/** @typedef {{ passed: number, failed: number }} Counts */

function honest(counts, ok) {
  return ok || counts.failed > 0 ? counts : { ...counts, failed: 1 };
}

/**
 * Counts of Vitest's JSON report. A file that could not be read into tests is one failure.
 * @param {{ numPassedTests: number, numFailedTests: number, testResults: { status: string, assertionResults: { status: string }[] }[] } | null} report
 * @param {boolean} ok whether the run ended well
 * @returns {Counts}
 */
export function vitestCounts(report, ok) {
  if (report === null) return { passed: 0, failed: 1 };
  const brokenFiles = report.testResults.filter(
    (file) => file.status === 'failed' && !file.assertionResults.some((test) => test.status === 'failed'),
  );
  return honest({ passed: report.numPassedTests, failed: report.numFailedTests + brokenFiles.length }, ok);
}

/**
 * Counts of Playwright's JSON report. A test that passed only at a second try has failed.
 * @param {{ stats: { expected: number, unexpected: number, flaky: number } } | null} report
 * @param {boolean} ok whether the run ended well
 * @returns {Counts}
 */
export function playwrightCounts(report, ok) {
  if (report === null) return { passed: 0, failed: 1 };
  const { expected, unexpected, flaky } = report.stats;
  return honest({ passed: expected, failed: unexpected + flaky }, ok);
}
