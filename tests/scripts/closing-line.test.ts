import { addTallies, closingLine, exitCodeOf, NOTHING, tallyOfCheck, tallyOfJest } from '../../scripts/closing-line';

const report = (counts: Record<string, number>): Record<string, number> => ({
  numPassedTests: 0,
  numFailedTests: 0,
  numPendingTests: 0,
  numTodoTests: 0,
  numRuntimeErrorTestSuites: 0,
  ...counts,
});

describe('the closing line', () => {
  it('sums every step: lint and types count as one each', () => {
    const sum = [tallyOfCheck(0), tallyOfCheck(2), tallyOfJest(report({ numPassedTests: 40, numFailedTests: 2 }), 1)].reduce(
      addTallies,
      NOTHING,
    );
    expect(closingLine(sum)).toBe('41 passed, 3 failed');
  });

  it('names skipped tests only when there are some', () => {
    expect(closingLine({ passed: 3, failed: 0, skipped: 0 })).toBe('3 passed, 0 failed');
    expect(closingLine({ passed: 3, failed: 0, skipped: 2 })).toBe('3 passed, 0 failed, 2 skipped');
  });

  it('counts a suite that could not be run as failed, though it counted no test', () => {
    expect(tallyOfJest(report({ numPassedTests: 5, numRuntimeErrorTestSuites: 1 }), 1)).toEqual({
      passed: 5,
      failed: 1,
      skipped: 0,
    });
  });

  it.each([
    ['jest died before it wrote its report', undefined, 1],
    ['jest left in failure though every test passed', report({ numPassedTests: 5 }), 1],
    ['a project has no test', report({}), 0],
    ['the report is not one', 'nonsense', 0],
  ])('counts one failure when %s', (_, written, exitCode) => {
    expect(tallyOfJest(written, exitCode).failed).toBe(1);
  });

  it('counts skipped and planned tests as neither passed nor failed', () => {
    expect(tallyOfJest(report({ numPassedTests: 1, numPendingTests: 2, numTodoTests: 3 }), 0)).toEqual({
      passed: 1,
      failed: 0,
      skipped: 5,
    });
  });

  it('ends in failure when anything failed, and when nothing ran', () => {
    expect(exitCodeOf({ passed: 10, failed: 0, skipped: 0 })).toBe(0);
    expect(exitCodeOf({ passed: 10, failed: 1, skipped: 0 })).toBe(1);
    expect(exitCodeOf({ passed: 0, failed: 0, skipped: 4 })).toBe(1);
  });
});
