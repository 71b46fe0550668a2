import { writeFileSync } from 'node:fs';

function countSuite(suite) {
  const totals = { passed: 0, failed: 0 };
  for (const test of suite?.tests ?? []) {
    if (test.passed) totals.passed += 1;
    else if (!test.skipped) totals.failed += 1;
  }
  for (const inner of suite?.suites ?? []) {
    const counted = countSuite(inner);
    totals.passed += counted.passed;
    totals.failed += counted.failed;
  }
  return totals;
}

/**
 * Totals over test files. A file that failed without a failed test (it did not load, it timed out,
 * an error escaped) and a file without any test each count as one failure.
 */
export function countSessions(sessions) {
  const totals = { passed: 0, failed: 0 };
  for (const session of sessions) {
    const { passed, failed } = countSuite(session.testResults);
    const silent = failed === 0 && (session.passed !== true || passed === 0);
    totals.passed += passed;
    totals.failed += failed + (silent ? 1 : 0);
  }
  return totals;
}

/** A reporter that ends with `N passed, N failed`, and writes the totals as JSON to `file` if there is one. */
export function summaryReporter(file) {
  return {
    onTestRunFinished({ sessions }) {
      const totals = countSessions([...sessions]);
      if (file) writeFileSync(file, JSON.stringify(totals));
      console.log(`\n${totals.passed} passed, ${totals.failed} failed`);
    },
  };
}
