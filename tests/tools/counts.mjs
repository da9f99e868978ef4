// Sums of passed, failed and skipped tests over the runners.

export const nothing = { passed: 0, failed: 0, skipped: 0 };

export function add(a, b) {
  return { passed: a.passed + b.passed, failed: a.failed + b.failed, skipped: a.skipped + b.skipped };
}

/** The line that CI reads last. */
export function closingLine({ passed, failed, skipped }) {
  return `${passed} passed, ${failed} failed, ${skipped} skipped`;
}

/** A test file that breaks while it loads holds no failed test, yet it failed. */
export function fromVitest(report) {
  const broken = report.testResults.filter(
    (file) => file.status === 'failed' && file.assertionResults.every((test) => test.status !== 'failed'),
  );
  return {
    passed: report.numPassedTests,
    failed: report.numFailedTests + broken.length,
    skipped: report.numPendingTests + report.numTodoTests,
  };
}

/** A flaky test failed once; errors outside a test count too. */
export function fromPlaywright({ stats, errors }) {
  return { passed: stats.expected, failed: stats.unexpected + stats.flaky + errors.length, skipped: stats.skipped };
}
