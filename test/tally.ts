/** The parts of the test runner's JSON report that are counted. */
export interface TestReport {
  readonly numTotalTests: number;
  readonly numPassedTests: number;
  readonly numFailedTests: number;
  readonly testResults: readonly {
    readonly name: string;
    readonly status: string;
    readonly message?: string;
    readonly assertionResults: readonly { readonly fullName: string; readonly status: string }[];
  }[];
}

export interface Tally {
  readonly passed: number;
  readonly failed: number;
  /** Said above the closing line: what failed, what was left out. */
  readonly remarks: readonly string[];
}

/** Counts one check that is no test of the runner: types, lint, layers. */
export function tallyCheck(name: string, exitCode: number | null): Tally {
  return exitCode === 0
    ? { passed: 1, failed: 0, remarks: [] }
    : { passed: 0, failed: 1, remarks: [`failed: ${name} (exit code ${exitCode})`] };
}

/**
 * Counts what the runner reported. A file that did not load, a runner that failed without a failed test, a report
 * that is missing and a run of no test at all are failures too.
 */
export function tallyTests(report: TestReport | undefined, exitCode: number | null): Tally {
  if (!report)
    return { passed: 0, failed: 1, remarks: [`failed: the test runner left no report (exit code ${exitCode})`] };
  const failedTests = report.testResults.flatMap((file) =>
    file.assertionResults.filter((test) => test.status === 'failed').map((test) => `failed: ${test.fullName}`),
  );
  const failedFiles = report.testResults
    .filter((file) => file.status === 'failed' && !file.assertionResults.some((test) => test.status === 'failed'))
    .map((file) => `failed: ${file.name} did not run: ${file.message?.split('\n')[0] ?? ''}`);
  const executed = report.numPassedTests + report.numFailedTests;
  const leftOut = report.numTotalTests - executed;
  const failures = [...failedTests, ...failedFiles];
  if (executed === 0) failures.push('failed: no test was executed');
  if (exitCode !== 0 && failures.length === 0) failures.push(`failed: the test runner (exit code ${exitCode})`);
  const remarks = leftOut > 0 ? [...failures, `left out: ${leftOut} tests`] : failures;
  return { passed: report.numPassedTests, failed: failures.length, remarks };
}

export function addTallies(tallies: readonly Tally[]): Tally {
  return {
    passed: tallies.reduce((sum, tally) => sum + tally.passed, 0),
    failed: tallies.reduce((sum, tally) => sum + tally.failed, 0),
    remarks: tallies.flatMap((tally) => tally.remarks),
  };
}
