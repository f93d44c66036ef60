import { describe, expect, it } from 'vitest';
import { addTallies, type TestReport, tallyCheck, tallyTests } from './tally.js';

function reportOf(statuses: readonly string[], unloadable: readonly string[] = []): TestReport {
  return {
    numTotalTests: statuses.length,
    numPassedTests: statuses.filter((status) => status === 'passed').length,
    numFailedTests: statuses.filter((status) => status === 'failed').length,
    testResults: [
      {
        name: 'a.test.ts',
        status: statuses.includes('failed') ? 'failed' : 'passed',
        assertionResults: statuses.map((status, i) => ({ fullName: `test ${i}`, status })),
      },
      ...unloadable.map((message) => ({ name: 'b.test.ts', status: 'failed', message, assertionResults: [] })),
    ],
  };
}

describe('counting a test run', () => {
  it.each([
    ['all pass', reportOf(['passed', 'passed']), 0, 2, 0],
    ['one fails', reportOf(['passed', 'failed']), 1, 1, 1],
    ['a file does not load', reportOf(['passed'], ['SyntaxError: x\n at y']), 1, 1, 1],
    ['the runner fails for another reason', reportOf(['passed']), 1, 1, 1],
    ['the runner is killed', reportOf(['passed']), null, 1, 1],
    ['nothing is executed', reportOf([]), 0, 0, 1],
    ['everything is left out', reportOf(['pending', 'skipped']), 0, 0, 1],
    ['there is no report', undefined, 0, 0, 1],
  ])('when %s', (_, report, exitCode, passed, failed) => {
    expect(tallyTests(report, exitCode)).toMatchObject({ passed, failed });
  });

  it('names what failed and says how much was left out', () => {
    expect(tallyTests(reportOf(['failed', 'pending']), 1).remarks).toEqual(['failed: test 0', 'left out: 1 tests']);
  });

  it('adds the checks to the tests', () => {
    const sum = addTallies([tallyCheck('types', 0), tallyCheck('lint', 2), tallyTests(reportOf(['passed']), 0)]);
    expect(sum).toEqual({ passed: 2, failed: 1, remarks: ['failed: lint (exit code 2)'] });
  });
});
